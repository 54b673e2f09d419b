/** Longest DOI we keep [characters]. The handbook sets no limit; this leaves room for every SICI form. */
export const maxDoiLength = 300;

const prefixForms = [
  /^(?:https?:)?\/\/(?:www\.|dx\.)?doi\.org\//i,
  /^(?:www\.|dx\.)?doi\.org\//i,
  /^(?:info:doi\/|urn:doi:|doi:)\s*/i,
  /^doi\s+(?=10\.)/i,
];

/** U+200B to U+200F, U+00AD, U+2060 and U+FEFF come along when text is copied from a page and are never part of a DOI. */
const invisible = /[\u00AD\u200B-\u200F\u2060\uFEFF]/g;

const doiForm = /^10\.[0-9]{4,9}(?:\.[0-9]+)*\/[^\s\p{Cc}\p{Cs}]+$/u;

const pairs: Readonly<Record<string, string>> = { ')': '(', ']': '[', '}': '{', '>': '<' };

function count(text: string, character: string): number {
  return text.split(character).length - 1;
}

/** Takes off what belongs to the sentence around a DOI: full stops, quotes, and closing brackets that were opened outside it. */
function withoutTrailingPunctuation(text: string): string {
  let rest = text;
  for (;;) {
    const last = rest.at(-1);
    if (last === undefined) return rest;
    const open = pairs[last];
    const strip = open === undefined ? '.,;:\'"”’!?'.includes(last) : count(rest, last) > count(rest, open);
    if (!strip) return rest;
    rest = rest.slice(0, -1);
  }
}

function percentDecoded(text: string): string | null {
  let rest = text;
  for (let round = 0; round < 3; round += 1) {
    if (!/%[0-9a-f]{2}/i.test(rest)) return rest;
    try {
      rest = decodeURIComponent(rest.replace(/%(?![0-9a-f]{2})/gi, '%25'));
    } catch {
      return null;
    }
  }
  return /%[0-9a-f]{2}/i.test(rest) ? null : rest;
}

/**
 * Reads a DOI in any of the forms people paste and gives its one canonical form, or null when the text is not a DOI.
 *
 * Takes addresses, the `doi:` prefix, percent-encoding, upper case and trailing punctuation; the suffix is otherwise kept
 * as it is, so the SICI forms with `<>();_` survive. DOI names compare without regard to the case of ASCII letters
 * (ISO 26324; DOI Handbook, section on case sensitivity, from memory), so they are written in lower case.
 *
 * @example normaliseDoi('https://dx.doi.org/10.5555/ABC%3C1::AID%3E3.0.CO;2-A.') === '10.5555/abc<1::aid>3.0.co;2-a'
 */
export function normaliseDoi(text: string): string | null {
  if (text.length > 4 * maxDoiLength) return null;
  let rest = text.replace(invisible, '').trim().replace(/^[<("'“]+(?=doi|10\.|https?:)/i, '');
  let isAddress = false;
  for (const form of prefixForms) {
    const shorter = rest.replace(form, '');
    if (shorter !== rest) {
      isAddress = isAddress || form.source.includes('doi\\.org');
      rest = shorter.trimStart();
    }
  }
  // A lone final "#" is the check character of some SICI forms; anything after one is a fragment of the address.
  if (isAddress) rest = rest.replace(/\?.*$/s, '').replace(/#.+$/s, '');
  const decoded = percentDecoded(rest);
  if (decoded === null) return null;
  const plain = decoded.replace(invisible, '').replaceAll('&lt;', '<').replaceAll('&gt;', '>').replaceAll('&amp;', '&').trim();
  const doi = withoutTrailingPunctuation(plain).replace(/[A-Z]+/g, (letters) => letters.toLowerCase());
  if (doi.length > maxDoiLength || !doiForm.test(doi)) return null;
  // An address made from "." or ".." would lead somewhere else on the resolver.
  if (doi.split('/').some((segment) => segment === '.' || segment === '..')) return null;
  return doi;
}

/**
 * Says whether a text is a DOI already in its canonical form.
 *
 * @example isDoi('10.5555/test.0001') === true
 */
export function isDoi(text: string): boolean {
  return normaliseDoi(text) === text;
}

/**
 * Percent-encodes a DOI for use in the path of an address, leaving slashes and harmless punctuation readable.
 *
 * @example encodeDoi('10.5555/a<1>#') === '10.5555/a%3C1%3E%23'
 */
export function encodeDoi(doi: string): string {
  return encodeURI(doi.replace(/\p{Cs}/gu, '\uFFFD')).replace(/[?#+]/g, (character) => encodeURIComponent(character));
}

/**
 * Gives the public address of a DOI.
 *
 * @example doiUrl('10.5555/test.0001') === 'https://doi.org/10.5555/test.0001'
 */
export function doiUrl(doi: string): string {
  return `https://doi.org/${encodeDoi(doi)}`;
}
