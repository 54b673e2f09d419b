import { replacePlain, type PlainText } from './plain-text.ts';
import type { Choices } from './readings.ts';
import { StepError } from './step-error.ts';

/** How one equation marks the surface, where it does so with something else than an asterisk. */
export interface SiteMarks {
  /** Letter or metal that stands for a free site: `M`, `X`, `Z`, `S`, `Pt`. */
  letter: string | null;
  /** Whether the letter may follow a formula without a sign between: `HX`. */
  attached: boolean;
  /** Whether `(s)` marks what is on the surface. */
  solid: boolean;
  /** Whether sites are numbered: `*1`, `*2`. */
  numbered: boolean;
}

const marked = /[*θσ@]|\(\s?(?:ads?|a|surf)\b|_\{?\(?(?:ads?|a|surf)\b|[A-Za-z0-9)]ads?\b|\[\s?\]/i;
const catalysts = new Set('Ru Rh Pd Ag Os Ir Pt Au Ni Co Fe Cu Mn Cr V Mo W Re Ti Nb Ta Zr Zn'.split(' '));

function metalOf(text: string): string | null {
  // CO and OS are formulas; other metals may be in capitals, as mechanisms for solvers have them.
  if (text === 'CO' || text === 'OS') return null;
  const symbol = text.charAt(0) + text.slice(1).toLowerCase();
  return catalysts.has(symbol) ? symbol : null;
}

function escape(text: string): string {
  return text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');
}

/** The metal whose `Pt(s)` are free sites, or null. Throws when there are two. */
function solidMetal(terms: readonly PlainText[]): string | null {
  let metal: string | null = null;
  for (const { text, positions } of terms) {
    const symbol = metalOf(/^([A-Z][A-Za-z]?)\([sS]\)$/.exec(text)?.[1] ?? '');
    if (!symbol) continue;
    if (metal && metal !== symbol) throw new StepError('unreadable', `two kinds of free site, ${metal}(s) and ${symbol}(s): write * with the names of the sites, as *_${metal} and *_${symbol}`, { position: positions[0] });
    metal = symbol;
  }
  return metal;
}

/** Finds how an equation marks its free sites, from its terms without coefficients. */
export function findSiteMarks(terms: readonly PlainText[], choices: Choices): SiteMarks {
  const texts = terms.map(({ text }) => text);
  const asterisks = texts.some((text) => marked.test(text));
  const metal = solidMetal(terms);
  // Beside O* a C(s) is more likely solid carbon: (s) marks the surface only where nothing else marks what is on it.
  const solid = metal !== null || (!texts.some((text) => /[A-Za-z0-9)\]]\*|\*[A-Z]/.test(text)) && texts.some((text) => /^[([][sS][)\]]$/.test(text) || /^\*+$/.test(text)));
  const letter = ['M', 'X', 'Z'].find((name) => texts.includes(name)) ?? null;
  const numbered = texts.some((text) => /\*_?\{?1\}?$/.test(text));
  if (letter || asterisks || metal) return { letter, attached: letter === 'X', solid, numbered };
  if (texts.includes('S')) {
    if (texts.some((text) => /[^·]·S$/.test(text))) return { letter: 'S', attached: false, solid, numbered };
    const site = choices.pick('letter-S', ['sulfur', 'site']) === 'site';
    return { letter: site ? 'S' : null, attached: site, solid, numbered };
  }
  const bonded = texts.find((text) => metalOf(text) === text && texts.some((other) => new RegExp(`^${text}[-·=≡]|[-·=≡]${text}$`).test(other)));
  return { letter: bonded ?? null, attached: false, solid, numbered };
}

/** Writes each mark of a site as an asterisk. */
export function starSites(slice: PlainText, { letter, attached, solid }: SiteMarks): PlainText {
  let plain = slice;
  const put = (pattern: RegExp, mark: string | ((match: RegExpMatchArray) => string)): void => {
    if (pattern.test(plain.text)) plain = replacePlain(plain, new RegExp(pattern, 'g'), typeof mark === 'string' ? () => mark : mark);
  };
  put(/^(?:[[({]\s?[\])}]|\((?:ads?|a|surf)\))$/, '*');
  if (/^θ_?\{?[A-Z]/.test(plain.text)) throw new StepError('unreadable', `${JSON.stringify(slice.text)} is a coverage: write the species, such as CO*, and * for a free site`, { position: slice.positions[0] });
  put(/^[θσ](?:_?\{?(?:v|0|\*|free|vac|vacant|e)\}?)?$/, '*');
  put(/[-·]?[θσ]$/, '*');
  put(/^[θσ][-·]?(?=[A-Z([^])/, '*');
  if (letter) {
    const name = escape(letter);
    put(new RegExp(`^${name}$`), '*');
    put(new RegExp(`^${name}[-·=≡]+(?=[A-Z([^])`), '*');
    put(new RegExp(`[-·=≡]${name}$`), '*');
    if (letter === 'M' || letter === 'Z') put(new RegExp(`^${name}(?=[A-Z([^])`), '*');
    if (attached) put(new RegExp(`(?<=[A-Za-z0-9)\\]])${name}$`), '*');
  }
  const alone = /^([A-Z][A-Za-z]?)\([sS]\)$/.exec(plain.text);
  if (alone && metalOf(alone[1] as string)) put(/^.*$/, '*');
  put(/^[([][sS][)\]]$/, '*');
  if (!plain.text.includes('*')) put(solid ? /\s?\([sS]\)$/ : /\s?\(S\)$/, '*');
  put(/\s?[[({]\*[\])}]$/, '*');
  put(/\s+(?=\*+(?:$|[_({]))/, '');
  put(/·(?=\*)/, '');
  put(/^(\*+)\s?[-·=≡]+\s?(?=[A-Z([^])/, (match) => match[1] as string);
  put(/\*?@\{?([A-Za-z0-9-]{1,24})\}?$/, (match) => `*_{${match[1]}}`);
  return plain;
}
