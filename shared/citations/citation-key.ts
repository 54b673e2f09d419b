import { callName } from './citation-text.ts';
import { yearOf } from './citation-text.ts';
import type { Csl } from './csl.ts';
import { plainText } from './rich-text.ts';

/** Letters that do not fall apart into a base letter and a mark; Cyrillic and Greek after ISO 9 and ISO 843 without their marks (from memory). */
const letters: Readonly<Record<string, string>> = {
  ø: 'o', ł: 'l', đ: 'd', ð: 'd', þ: 'th', æ: 'ae', œ: 'oe', ß: 'ss', ı: 'i', ŋ: 'ng', ħ: 'h', ĸ: 'k',
  а: 'a', б: 'b', в: 'v', г: 'g', д: 'd', е: 'e', ж: 'zh', з: 'z', и: 'i', к: 'k', л: 'l', м: 'm', н: 'n', о: 'o', п: 'p', р: 'r', с: 's',
  т: 't', у: 'u', ф: 'f', х: 'kh', ц: 'ts', ч: 'ch', ш: 'sh', щ: 'shch', ъ: '', ы: 'y', ь: '', э: 'e', ю: 'yu', я: 'ya', і: 'i', є: 'e', ј: 'j', ћ: 'c', ђ: 'd',
  α: 'a', β: 'v', γ: 'g', δ: 'd', ε: 'e', ζ: 'z', η: 'i', θ: 'th', ι: 'i', κ: 'k', λ: 'l', μ: 'm', ν: 'n', ξ: 'x', ο: 'o', π: 'p', ρ: 'r', σ: 's', ς: 's',
  τ: 't', υ: 'y', φ: 'f', χ: 'ch', ψ: 'ps', ω: 'o',
};

const maxWordLength = 40;

function asciiWord(text: string): string {
  const bare = text.toLowerCase().normalize('NFKD').replace(/\p{M}/gu, '');
  return [...bare].map((letter) => letters[letter] ?? letter).join('').replace(/[^a-z0-9]/g, '').slice(0, maxWordLength);
}

/**
 * Makes the citation key of a source from the first name that can be written in ASCII and the year: lower-case letters and digits only.
 *
 * Names come from the authors, then the editors, then the first words of the title; "nd" stands for a missing year. The key is
 * given once, when the source is stored, and never changed afterwards; `disambiguate` makes it unique.
 *
 * @example citationKey({ type: 'book', author: [{ family: 'Vantongeren' }], issued: { 'date-parts': [[1994]] } }) === 'vantongeren1994'
 */
export function citationKey(csl: Csl): string {
  const names = [...(csl.author ?? []), ...(csl.editor ?? [])].map((name) => asciiWord(callName(name)));
  const titleWords = plainText(csl.title ?? '').split(/\s+/).slice(0, 8).map(asciiWord).filter((word) => word.length > 3);
  // BibTeX keys of digits alone are read as numbers by some programs, so a key always begins with a letter.
  const word = [...names, ...titleWords].find((candidate) => /^[a-z]/.test(candidate)) ?? 'anon';
  return `${word}${yearOf(csl) ?? 'nd'}`.replace(/[^a-z0-9]/g, '');
}

function suffix(index: number): string {
  let rest = index;
  let letters = '';
  while (rest > 0) {
    letters = String.fromCharCode(97 + ((rest - 1) % 26)) + letters;
    rest = Math.floor((rest - 1) / 26);
  }
  return letters;
}

/**
 * Gives the key itself when it is free, or the key with the first free letter from "b" on; keys that differ only in case count as
 * taken, since BibTeX refuses them.
 *
 * @example disambiguate('vantongeren1994', ['Vantongeren1994']) === 'vantongeren1994b'
 */
export function disambiguate(key: string, taken: Iterable<string>): string {
  const used = new Set<string>();
  for (const other of taken) used.add(other.toLowerCase());
  if (!used.has(key.toLowerCase())) return key;
  for (let index = 2; ; index += 1) {
    const candidate = `${key}${suffix(index)}`;
    if (!used.has(candidate.toLowerCase())) return candidate;
  }
}
