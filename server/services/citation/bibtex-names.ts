import type { CslName } from '#shared/citations/csl.ts';
import { plainText } from '#shared/citations/rich-text.ts';
import { readTex } from './tex-read.ts';
import { writeTexName } from './tex-write.ts';

/** Splits at a pattern that stands outside braces. The pattern must be sticky. */
function splitOutside(text: string, separator: RegExp): string[] {
  const parts: string[] = [];
  let level = 0;
  let from = 0;
  for (let at = 0; at < text.length; at += 1) {
    const character = text[at];
    if (character === '\\') {
      at += 1;
      continue;
    }
    if (character === '{') level += 1;
    else if (character === '}') level = Math.max(0, level - 1);
    if (level > 0) continue;
    separator.lastIndex = at;
    const match = separator.exec(text);
    if (match !== null && match[0] !== '') {
      parts.push(text.slice(from, at));
      from = at + match[0].length;
      at = from - 1;
    }
  }
  parts.push(text.slice(from));
  return parts;
}

/** Whether BibTeX takes a word for a particle: its first letter outside braces is lower case (BibTeX's own rule, "btxdoc", from memory). */
function isParticle(word: string): boolean {
  const special = /^\{\\([a-zA-Z]+|.)\s*\{?([^}]*)/u.exec(word);
  if (special !== null) {
    const letter = /\p{L}/u.exec(/^(?:AA|AE|OE|O|L|DJ|TH|DH|NG|aa|ae|oe|o|l|dj|th|dh|ng|ss|i|j)$/.test(special[1] ?? '') ? special[1] ?? '' : special[2] ?? '');
    return letter !== null && letter[0] !== letter[0].toUpperCase();
  }
  if (word.startsWith('{')) return false;
  const letter = /\p{L}/u.exec(word);
  return letter !== null && letter[0] === letter[0].toLowerCase() && letter[0] !== letter[0].toUpperCase();
}

function plain(tex: string): string {
  return plainText(readTex(tex).text);
}

function isWholeGroup(text: string): boolean {
  if (!text.startsWith('{') || !text.endsWith('}')) return false;
  let level = 0;
  for (let at = 0; at < text.length; at += 1) {
    if (text[at] === '{') level += 1;
    else if (text[at] === '}') level -= 1;
    if (level === 0) return at === text.length - 1;
  }
  return false;
}

function nameFrom(parts: { particle?: string; family: string; given?: string; suffix?: string }): CslName | null {
  const name: CslName = {};
  const family = plain(parts.family);
  const given = plain(parts.given ?? '');
  const particle = plain(parts.particle ?? '');
  const suffix = plain(parts.suffix ?? '');
  if (family === '') return given === '' && particle === '' ? null : { literal: [particle, given].filter((piece) => piece !== '').join(' ') };
  name.family = family;
  if (given !== '') name.given = given;
  if (particle !== '') name['non-dropping-particle'] = particle;
  if (suffix !== '') name.suffix = suffix;
  return name;
}

function readOne(text: string): CslName | null {
  const trimmed = text.trim();
  if (trimmed === '') return null;
  const inner = trimmed.slice(1, -1);
  // A whole name in braces is a group; a special character such as {\O}rsted is a word, and so is a single word.
  if (isWholeGroup(trimmed) && !inner.startsWith('\\') && /\s/.test(inner.trim())) return { literal: plain(trimmed) };
  const pieces = splitOutside(trimmed, /,/y).map((piece) => piece.trim());
  const words = splitOutside(pieces[0] ?? '', /[\s~]+/y).filter((word) => word !== '');
  if (pieces.length === 1) {
    const firstParticle = words.slice(0, -1).findIndex(isParticle);
    if (firstParticle < 0) return nameFrom({ family: words.at(-1) ?? '', given: words.slice(0, -1).join(' ') });
    let lastParticle = firstParticle;
    for (let index = firstParticle; index < words.length - 1; index += 1) if (isParticle(words[index] ?? '')) lastParticle = index;
    return nameFrom({ given: words.slice(0, firstParticle).join(' '), particle: words.slice(firstParticle, lastParticle + 1).join(' '), family: words.slice(lastParticle + 1).join(' ') });
  }
  let particles = 0;
  words.slice(0, -1).forEach((word, index) => {
    if (isParticle(word)) particles = index + 1;
  });
  return nameFrom({
    particle: words.slice(0, particles).join(' '),
    family: words.slice(particles).join(' '),
    suffix: pieces.length > 2 ? pieces[1] : undefined,
    given: pieces.slice(pieces.length > 2 ? 2 : 1).filter((piece) => piece !== '').join(', '),
  });
}

/**
 * Reads a BibTeX list of names: "First von Last", "von Last, First", "von Last, Jr, First", groups in braces; "and others" is dropped.
 */
export function readBibtexNames(tex: string): CslName[] {
  return splitOutside(tex, /\s+and(?=\s)/iy)
    .filter((part) => part.trim().toLowerCase() !== 'others')
    .map(readOne)
    .filter((name): name is CslName => name !== null);
}

/** Braces a part that BibTeX would otherwise take apart: particles, commas and "and" inside it. */
function guarded(part: string, tex: string): string {
  const words = part.split(/\s+/);
  return words.some(isParticle) || /[,]|^others$|(?:^|\s)and(?:\s|$)/i.test(part) ? `{${tex}}` : tex;
}

function writeOne(name: CslName): string {
  if (name.family === undefined) return `{${writeTexName(name.literal ?? name.given ?? '')}}`;
  const particle = [name['dropping-particle'], name['non-dropping-particle']].filter((piece) => piece !== undefined).join(' ');
  const family = guarded(name.family, writeTexName(name.family));
  const glued = /['’-]$/.test(particle);
  // A particle that begins with a capital is not one to BibTeX; kept with the family it still sorts and prints right.
  const last = particle === '' ? family
    : glued || !particle.split(/\s+/).every(isParticle) ? `{${writeTexName(particle)}${glued ? '' : ' '}${writeTexName(name.family)}}`
      : `${writeTexName(particle)} ${family}`;
  const given = name.given === undefined ? '' : /[,]|(?:^|\s)and(?:\s|$)/i.test(name.given) ? `{${writeTexName(name.given)}}` : writeTexName(name.given);
  const suffix = name.suffix === undefined ? '' : /[,]|(?:^|\s)and(?:\s|$)/i.test(name.suffix) ? `{${writeTexName(name.suffix)}}` : writeTexName(name.suffix);
  if (suffix !== '') return `${last}, ${suffix}, ${given}`;
  if (given !== '') return `${last}, ${given}`;
  // Alone, several words would be taken for given and family names.
  return /\s/.test(name.family) && !last.startsWith('{') ? `{${last}}` : last;
}

/** Writes names as BibTeX and biber read them back, groups in braces. */
export function writeBibtexNames(names: readonly CslName[]): string {
  return names.map(writeOne).filter((name) => name !== '' && name !== '{}').join(' and ');
}
