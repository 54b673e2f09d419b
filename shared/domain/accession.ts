/*
 * Accession: the public, permanent name of an entry, such as `K7Q-4MD-2`: six random characters and a check character.
 * Characters are digits and capitals that are not mistaken for one another (no 0 or O, no 1 or I, no U): 31 in all, a prime number, so that
 * the weighted sum below finds every single wrong character and every swap of two neighbours.
 */
const alphabet = '23456789ABCDEFGHJKLMNPQRSTVWXYZ';

function checkCharacter(body: string): string {
  let sum = 0;
  for (let i = 0; i < body.length; i += 1) sum += (i + 2) * alphabet.indexOf(body.charAt(i));
  return alphabet.charAt(sum % alphabet.length);
}

/** How many characters an accession can be made of. */
export const accessionAlphabetSize = alphabet.length;

/**
 * Builds an accession from six random indices, each from 0 to 30.
 * @throws RangeError when there are not six of them or one is out of range.
 * @example accessionFrom([0, 0, 0, 0, 0, 0]) // '222-222-2'
 */
export function accessionFrom(indices: readonly number[]): string {
  if (indices.length !== 6 || indices.some((i) => !Number.isInteger(i) || i < 0 || i >= alphabet.length)) {
    throw new RangeError('An accession is made from six integers from 0 to 30.');
  }
  const body = indices.map((i) => alphabet.charAt(i)).join('');
  return `${body.slice(0, 3)}-${body.slice(3)}-${checkCharacter(body)}`;
}

/**
 * Reads an accession as people type it (any case, with or without hyphens and spaces), or null when it is not one.
 * @example readAccession('222 222 2') // '222-222-2'
 */
export function readAccession(text: string): string | null {
  const plain = text.toUpperCase().replace(/[\s-]/g, '');
  if (plain.length !== 7 || [...plain].some((character) => !alphabet.includes(character))) return null;
  if (checkCharacter(plain.slice(0, 6)) !== plain[6]) return null;
  return `${plain.slice(0, 3)}-${plain.slice(3, 6)}-${plain.slice(6)}`;
}
