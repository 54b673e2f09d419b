import type { Choices } from './readings.ts';
import { adsorbedWords, gasWords, siteName, siteWordPattern } from './site-words.ts';

/** A species without the marks of where it is. */
export interface Placement {
  /** The formula with its charge. */
  core: string;
  /** Where the core begins in the text. */
  at: number;
  phase: 'gas' | 'adsorbed' | null;
  sites: number;
  siteType?: string;
  /** What is wrong with the marks. */
  fault?: string;
}

const name = String.raw`[A-Za-z0-9][A-Za-z0-9'-]{0,30}`;
const words = siteWordPattern;
const ads = [...adsorbedWords].sort((a, b) => b.length - a.length).join('|');
const gas = [...gasWords].sort((a, b) => b.length - a.length).join('|');

/** The name of a site behind an asterisk: `_fcc`, `_{fcc}`, `{fcc}`, `(fcc)`, `-fcc`, `fcc`, `_s`, `s`. Without a mark it is in small letters, so that `*Br` is bromine. */
const siteTail = String.raw`(?:_?\{\s?(${name})\s?\}|_?\(\s?(${name})\s?\)|_(${name})|[-,/]?\s?(${words}|ads|ad|B5|B6|F4)|([a-z\d]))`;
const starred = new RegExp(String.raw`^(.*?)(\*+)${siteTail}?$`);
const starFirst = new RegExp(String.raw`^(\*+)([^*]+?)(?:_\{?(${words})\}?|\(\s?(${words})\s?\))?$`, 'i');
const bothEnds = /^\*([^*]+)\*$/;
const starNumber = /^([^*]*)\*(_?)\{?([2-6])\}?(?:_\{?([A-Za-z][A-Za-z0-9-]*)\}?)?$/;
const chargeOnStar = /^(.+?)(\*+)(?:\^\{?(\d?[+-]+)\}?|([+-]))(.*)$/;
const adsorbedTail = new RegExp(String.raw`^(.+?)\s?(?:\(\s?(?:${ads})(?:[,;: ]\s?(${name}(?:\s[A-Za-z]+)?))?\s?\)|[_,]\s?[{(]*(?!A\b)(?:${ads})(?:[,;: ]\s?(${name}))?[})]*)$`, 'i');
const gasTail = new RegExp(String.raw`^(.+?)\s?(?:\(\s?(?:${gas})\s?\)|[_,]\s?[{(]*(?:${gas})[})]*)$`, 'i');
const wordTail = new RegExp(String.raw`^(.+?)(?:_\{?(${words})\}?|\(\s?(${words})\s?\))$`, 'i');
const letterTail = /^(.+?)_\{?([A-FS-Zstbhf])\}?$/;

function named(typed: string | undefined): { siteType?: string; fault?: string } {
  if (!typed || (typed !== 'A' && adsorbedWords.includes(typed.toLowerCase()))) return {};
  if ([...gasWords, 'l', 'aq'].includes(typed.toLowerCase())) return { fault: 'either an adsorbed species (*) or a gas (g), not both' };
  return { siteType: siteName(typed) };
}

/** A single atom can't hold two sites at its two ends. */
function holdsTwo(core: string): boolean {
  return (core.match(/[A-Z][a-z]?/g) ?? []).filter((symbol) => symbol !== 'H' && symbol !== 'D').length > 1 || /[B-Z]\d/.test(core.replace(/[HD]\d*/g, ''));
}

function withNumber(text: string, choices: Choices, numbered: boolean): Placement | null {
  const match = starNumber.exec(text);
  if (!match) return null;
  const [, core, low, digit, site] = match as unknown as [string, string, string, string, string | undefined];
  const ways: ['sites', ...string[]] = low && core !== '' ? ['sites', 'type', 'count'] : ['sites', 'type'];
  const way = numbered ? 'type' : choices.pick('number-on-asterisk', ways);
  const siteType = site ? { siteType: siteName(site) } : {};
  if (way === 'sites') return { core, at: 0, phase: 'adsorbed', sites: Number(digit), ...siteType };
  if (way === 'count') return { core: `${core}${digit}`, at: 0, phase: 'adsorbed', sites: 1, ...siteType };
  return { core, at: 0, phase: 'adsorbed', sites: 1, siteType: siteName(digit) };
}

/** Takes the marks of phase, sites and kind of site off a species; where sites are numbered (`*1`, `*2`), a number on an asterisk is never a count. */
export function placeSpecies(typed: string, choices: Choices, numberedSites: boolean): Placement {
  const charged = chargeOnStar.exec(typed);
  // OH*^- is OH^-*.
  const text = charged && /^(?:$|[_{(])/.test(charged[5] as string) ? `${charged[1]}^${charged[3] ?? charged[4]}${charged[2]}${charged[5]}` : typed;
  const ends = bothEnds.exec(text);
  if (ends && holdsTwo(ends[1] as string)) return { core: ends[1] as string, at: 1, phase: 'adsorbed', sites: 2 };
  const numbered = withNumber(text, choices, numberedSites);
  if (numbered) return numbered;
  const stars = starred.exec(text);
  if (stars) {
    const typedName = stars.slice(3).find((part) => part !== undefined);
    return { core: stars[1] as string, at: 0, phase: 'adsorbed', sites: (stars[2] as string).length, ...named(typedName) };
  }
  const prefix = starFirst.exec(text);
  if (prefix && !/^[_{]/.test(prefix[2] as string)) {
    // *CO(ads) says the same twice; *CO(g) contradicts itself.
    const again = adsorbedTail.exec(prefix[2] as string);
    const fault = gasTail.test(prefix[2] as string) ? { fault: 'either an adsorbed species (*) or a gas (g), not both' } : {};
    return { core: again ? (again[1] as string) : (prefix[2] as string), at: (prefix[1] as string).length, phase: 'adsorbed', sites: (prefix[1] as string).length, ...named(prefix[3] ?? prefix[4] ?? again?.[2] ?? again?.[3]), ...fault };
  }
  const adsorbed = adsorbedTail.exec(text);
  if (adsorbed) return { core: adsorbed[1] as string, at: 0, phase: 'adsorbed', sites: 1, ...named(adsorbed[2] ?? adsorbed[3]) };
  const vapour = gasTail.exec(text);
  if (vapour) return { core: vapour[1] as string, at: 0, phase: 'gas', sites: 0 };
  const word = wordTail.exec(text) ?? letterTail.exec(text);
  if (word) return { core: word[1] as string, at: 0, phase: 'adsorbed', sites: 1, ...named(word[2] ?? word[3]) };
  return { core: text, at: 0, phase: null, sites: 0 };
}
