import { readFormula } from './formula.ts';
import type { Species, Term } from './species.ts';
import { StepError } from './step-error.ts';
import type { Slice } from './step-text.ts';

const siteWords = 'fcc|hcp|top|atop|ontop|bridge|br|hollow|fourfold|4f|3f|long|short|edge|step|kink|terrace|corner|defect|B5|f4|s|t|b|h|u|l|subsurface|sub|upper|lower';
const coefficientPattern = /^(\d+(?:\.\d+)?)(?:\s?\/\s?(\d+))?\s*(?=\D|$)/;

function fail(slice: Slice, expected: string, offset = 0): StepError {
  return new StepError('unreadable', `cannot read ${JSON.stringify(slice.text)}: expected ${expected}`, { position: slice.positions[Math.min(Math.max(0, offset), slice.text.length)] });
}

function freeSite(siteType: string | undefined): Species {
  return { formula: '*', spelling: '*', composition: {}, phase: 'free-site', sites: 1, ...(siteType ? { siteType } : {}) };
}

interface Placement {
  core: string;
  phase: 'gas' | 'adsorbed' | null;
  sites: number;
  siteType?: string;
}

/** Takes the marks of phase, sites and site type off a species. */
function place(text: string): Placement {
  const stars = new RegExp(String.raw`^(.*?)(\*+)(?:_\{?([A-Za-z0-9][A-Za-z0-9-]*)\}?|\{([A-Za-z0-9][A-Za-z0-9-]*)\}|\(([A-Za-z0-9][A-Za-z0-9-]*)\))?$`).exec(text);
  if (stars) {
    const siteType = stars[3] ?? stars[4] ?? stars[5];
    return { core: stars[1] as string, phase: 'adsorbed', sites: (stars[2] as string).length, ...(siteType ? { siteType } : {}) };
  }
  const prefix = new RegExp(String.raw`^(\*+)([^*]+?)(?:_\{?(${siteWords})\}?)?$`).exec(text);
  if (prefix && !/^[_({]/.test(prefix[2] as string)) return { core: prefix[2] as string, phase: 'adsorbed', sites: (prefix[1] as string).length, ...(prefix[3] ? { siteType: prefix[3] } : {}) };
  const ads = /^(.*?)\s?(?:\((?:ads|ad|a)(?:[,; ]\s?([A-Za-z0-9-]+))?\)|[_,]\s?\{?(?:ads|ad|a)(?:[,; ]\s?([A-Za-z0-9-]+))?\}?)$/i.exec(text);
  if (ads) {
    const siteType = ads[2] ?? ads[3];
    return { core: ads[1] as string, phase: 'adsorbed', sites: 1, ...(siteType ? { siteType } : {}) };
  }
  const gas = /^(.*?)\s?(?:\((?:g|gas)\)|_\{?(?:g|gas)\}?)$/i.exec(text);
  if (gas) return { core: gas[1] as string, phase: 'gas', sites: 0 };
  const named = new RegExp(String.raw`^(.*?)_\{?(${siteWords})\}?$`).exec(text);
  if (named) return { core: named[1] as string, phase: 'adsorbed', sites: 1, siteType: named[2] };
  return { core: text, phase: null, sites: 0 };
}

function takeCharge(text: string): { core: string; charge: number } {
  const written = /^(.*?)\^\{?(\d*)([+-])\}?$/.exec(text);
  if (written) return { core: written[1] as string, charge: (written[3] === '+' ? 1 : -1) * (written[2] ? Number(written[2]) : 1) };
  const bare = /^(.*[A-Za-z0-9)\]])([+-])$/.exec(text);
  return bare ? { core: bare[1] as string, charge: bare[2] === '+' ? 1 : -1 } : { core: text, charge: 0 };
}

/** Reads one term: coefficient, species, phase, sites. Throws a `StepError` with its position. */
export function readTerm(slice: Slice): Term {
  let text = slice.text;
  let coefficient = 1;
  const match = coefficientPattern.exec(text);
  if (match) {
    coefficient = Number(match[1]) / Number(match[2] ?? 1);
    if (!(coefficient > 0) || !Number.isFinite(coefficient) || coefficient > 1000) throw fail(slice, 'a coefficient above 0 and up to 1000');
    text = text.slice(match[0].length);
  }
  const offset = slice.text.length - text.length;
  if (text === '') throw fail(slice, 'a species after the coefficient', slice.text.length);
  if (/^\[?\(?\*\)?\]?$/.test(text)) return { coefficient, species: freeSite(undefined) };
  const placement = place(text);
  if (/\s/.test(placement.core)) throw fail(slice, 'one species without spaces; put + between species', offset + placement.core.search(/\s/));
  if (placement.core === '' && placement.phase === 'adsorbed' && text.includes('*')) {
    return { coefficient: coefficient * placement.sites, species: freeSite(placement.siteType) };
  }
  if (placement.core === '') throw fail(slice, 'a formula', offset);
  const { core, charge } = takeCharge(placement.core);
  if (core === 'e' && charge === -1) return { coefficient, species: { formula: 'e', spelling: 'e', composition: {}, phase: 'gas', sites: 0, charge } };
  const formula = readFormula(core);
  if ('at' in formula) {
    const star = placement.core.includes('*') ? 'one mark of adsorption, before or after the formula' : formula.expected;
    const solid = /\(s\)$/i.test(text) ? `${formula.expected}; write ${core.replace(/\(s\)$/i, '')}* for an adsorbed species` : star;
    throw fail(slice, solid, offset + formula.at);
  }
  return {
    coefficient,
    species: {
      formula: formula.formula,
      spelling: formula.spelling,
      composition: formula.composition,
      phase: placement.phase ?? 'gas',
      sites: placement.sites,
      ...(placement.siteType ? { siteType: placement.siteType } : {}),
      ...(Object.keys(formula.isotopes).length > 0 ? { isotopes: formula.isotopes } : {}),
      ...(charge !== 0 ? { charge } : {}),
    },
  };
}
