import { takeCharge } from './charge.ts';
import { takeCoefficient } from './coefficient.ts';
import { readFormula, type Formula, type FormulaFault } from './formula.ts';
import { raiseMassNumbers } from './nuclides.ts';
import { placeSpecies, type Placement } from './placement.ts';
import type { PlainText } from './plain-text.ts';
import type { Choices } from './readings.ts';
import { starSites, type SiteMarks } from './site-marks.ts';
import type { Species, Term } from './species.ts';
import { StepError } from './step-error.ts';

/** How one equation is read: its marks of the surface, and its decisions on what can be read in two ways. */
export interface TermContext {
  marks: SiteMarks;
  /** Whether some term has a bare `a` for adsorbed, as in `COa`. */
  bareA: boolean;
  choices: Choices;
}

function fail(slice: PlainText, expected: string, offset = 0): StepError {
  return new StepError('unreadable', `cannot read ${JSON.stringify(slice.text)}: expected ${expected}`, { position: slice.positions[Math.min(Math.max(0, offset), slice.text.length)] });
}

/** Names that a free site bears because it is free. */
const vacant = new Set(['v', 'vac', 'vacant', 'free', 'empty', '0']);

function freeSite(siteType: string | undefined): Species {
  return { formula: '*', spelling: '*', composition: {}, phase: 'free-site', sites: 1, ...(siteType ? { siteType } : {}) };
}

function isFault(formula: Formula | FormulaFault): formula is FormulaFault {
  return 'at' in formula;
}

/** Species that a slip of the shift key turns into an element: Co for CO, No for NO, Ho for OH. */
const slips = new Set(['CO', 'CO2', 'CO3', 'HCO', 'COH', 'CHO', 'COOH', 'HCOO', 'NO', 'NO2', 'NO3', 'HNO', 'NOH', 'HO', 'HO2', 'HOO', 'HOCO']);
const elementNames: Record<string, string> = { Co: 'cobalt', No: 'nobelium', Ho: 'holmium' };

function refuseSlip(slice: PlainText, core: string): void {
  const symbol = /^[^[]*?(Co|No|Ho)(?![\]])/.exec(core)?.[1];
  if (!symbol || !slips.has(core.toUpperCase()) || !slips.has(core.replace(symbol, symbol.toUpperCase()))) return;
  const readings = [slice.text.replace(symbol, symbol.toUpperCase()), slice.text.replace(symbol, `[${symbol}]`)];
  throw new StepError('ambiguous', `${JSON.stringify(slice.text)} can be ${core.toUpperCase()} or hold ${elementNames[symbol]}: write ${readings[0]} or ${readings[1]}`, { position: slice.positions[0], readings });
}

/** What was probably meant by letters that are no formula. */
function hint(core: string): string {
  if (/^[a-z]+\d*$/.test(core)) {
    const upper = core.toUpperCase();
    const capital = core.charAt(0).toUpperCase() + core.slice(1);
    const likely = [...new Set([upper, capital])].filter((text) => !isFault(readFormula(text)));
    if (likely.length > 0) return `; in capitals it is ${likely.join(' or ')}`;
  }
  const metal = core.charAt(0) + core.slice(1).toLowerCase();
  return /^[A-Z]{2}$/.test(core) && !isFault(readFormula(metal)) ? `; the element is ${metal}` : '';
}

/** Hapticity, denticity and mode of binding written before a formula: `η2-C2H4`, `κ2-HCOO`, `di-σ-C2H4`, `π-C2H4`, `μ3-CO`. */
function takeBinding(core: string): { core: string; sites: number | null; siteType: string | null } {
  const count = /^(?:η|κ|eta|kappa)\s?\^?\{?(\d)\}?[-\s(]+/.exec(core);
  if (count) return { core: core.slice(count[0].length).replace(/\)$/, core.includes('(') && count[0].endsWith('(') ? '' : ')'), sites: Number(count[1]), siteType: null };
  const sigma = /^(?:di-?\s?(?:σ|sigma))-?/.exec(core);
  if (sigma) return { core: core.slice(sigma[0].length), sites: 2, siteType: null };
  const dentate = /^(mono|bi)dentate[-\s]/.exec(core);
  if (dentate) return { core: core.slice(dentate[0].length), sites: dentate[1] === 'bi' ? 2 : 1, siteType: null };
  const pi = /^(?:π|pi)-/.exec(core);
  if (pi) return { core: core.slice(pi[0].length), sites: null, siteType: 'pi' };
  const bridging = /^μ\s?\^?\d?-/.exec(core);
  return bridging ? { core: core.slice(bridging[0].length), sites: null, siteType: null } : { core, sites: null, siteType: null };
}

/** Brackets around a whole formula hold nothing but it: `(CO)*`, `[NO]^-`; those of a nuclide or of one element stay. */
function withoutBrackets(core: string): string {
  if (/^\[[A-Z][a-z]\]$/.test(core)) return core;
  const inner = /^\(([^()]+)\)$/.exec(core)?.[1] ?? /^\[((?!\^?\d+[A-Z][a-z]?\d*\])[^[\]]+)\]$/.exec(core)?.[1];
  return inner ?? core;
}

interface Bare {
  formula: Formula | FormulaFault;
  phase: Placement['phase'];
}

const looseTail = /^(.*[A-Za-z0-9)\]])(ads|ad|a|gas|g)$/;

/** Whether a term ends in an `a` that can only mean adsorbed. */
export function endsInBareA(text: string): boolean {
  const tail = /^([A-Z][A-Za-z0-9]*)a$/.exec(text);
  return tail !== null && isFault(readFormula(text)) && !isFault(readFormula(tail[1] as string));
}

/** Reads a formula that bears no mark; `COads`, `COa` and `N2g` are read where no element makes another sense of the letters. */
function readBare(core: string, { choices, bareA }: TermContext): Bare {
  const formula = readFormula(core);
  const tail = looseTail.exec(core);
  if (!tail) return { formula, phase: null };
  const rest = readFormula(tail[1] as string);
  if (isFault(rest)) return { formula, phase: null };
  const placed: Bare = { formula: rest, phase: (tail[2] as string).startsWith('g') ? 'gas' : 'adsorbed' };
  if (isFault(formula)) return placed;
  // OHg is OH as a gas or with mercury; Na in company of Ha is adsorbed N or sodium.
  const marked = tail[2] === 'g' ? choices.pick('letter-g', ['element', 'gas']) === 'gas' : tail[2] === 'a' && bareA && choices.pick('letter-a', ['adsorbed', 'element']) === 'adsorbed';
  return marked ? placed : { formula, phase: null };
}

function refuseFormula(slice: PlainText, placement: Placement, core: string, offset: number, fault: FormulaFault): StepError {
  const at = offset + placement.at + Math.min(fault.at, placement.core.length);
  const condensed = /^(.*?)\s?[_,]?[({]?(aq|l|liq|s)[)}]?$/i.exec(core);
  if (placement.core.includes('*')) return fail(slice, 'one mark of adsorption, before or after the formula', at);
  if (condensed && /[({_,]/.test(core) && condensed[2]?.toLowerCase() === 's') return fail(slice, `${fault.expected}; write ${condensed[1]}* for an adsorbed species`, at);
  if (condensed && /[({_,]/.test(core)) return fail(slice, `a gas, an adsorbed species or a free site; leave (${condensed[2]}) out: ${condensed[1]}`, at);
  return fail(slice, `${fault.expected}${hint(core)}`, at);
}

/** Reads one term: coefficient, species, phase, sites. Throws a `StepError` with its position. */
export function readTerm(slice: PlainText, context: TermContext): Term {
  const { choices } = context;
  const counted = takeCoefficient(slice, choices);
  const { coefficient } = counted;
  if (!(coefficient > 0) || !Number.isFinite(coefficient) || coefficient > 1000) throw fail(slice, 'a coefficient above 0 and up to 1000');
  if (counted.rest.text === '') throw fail(slice, 'a species after the coefficient', slice.text.length);
  const inner = /^[([{]([^()[\]{}]*\*[^()[\]{}]*)[)\]}]$/.exec(counted.rest.text)?.[1];
  const rest = starSites(inner && inner !== '*' ? { text: inner, positions: counted.rest.positions.slice(1) } : counted.rest, context.marks);
  const where = (offset: number): number => {
    const position = rest.positions[Math.min(Math.max(0, offset), rest.text.length)] as number;
    return slice.positions.findIndex((at) => at >= position);
  };
  const placement = placeSpecies(rest.text, choices, context.marks.numbered);
  if (placement.fault) throw fail(slice, placement.fault);
  const typed = placement.core.trim();
  if (/\s/.test(typed)) throw fail(slice, 'one species without spaces; put + between species', where(placement.at + placement.core.search(/\S\s/) + 1));
  if (typed === '') return { coefficient: coefficient * placement.sites, species: freeSite(vacant.has(placement.siteType ?? '') ? undefined : placement.siteType) };
  // A line before the asterisk is a bond to the surface or a charge.
  const bonded = placement.phase === 'adsorbed' && /[A-Za-z0-9)\]][-=≡]$/.test(typed) && /[-=≡]\*/.test(rest.text) && (/[=≡]$/.test(typed) || choices.pick('line-before-asterisk', ['charge', 'bond']) === 'bond');
  const { core: neutral, charge } = takeCharge(bonded ? typed.slice(0, -1) : typed, choices);
  if (neutral === 'e' && charge === -1 && placement.phase !== 'adsorbed') return { coefficient, species: { formula: 'e', spelling: 'e', composition: {}, phase: 'gas', sites: 0, charge } };
  const binding = takeBinding(neutral);
  const core = raiseMassNumbers(withoutBrackets(binding.core.replace(/(?<=[A-Za-z0-9)\]])·$/, '')));
  const bare: Bare = placement.phase === null && charge === 0 ? readBare(core, context) : { formula: readFormula(core), phase: null };
  const { formula } = bare;
  if (isFault(formula)) throw refuseFormula(slice, placement, core, where(placement.at) - placement.at, formula);
  refuseSlip(slice, core);
  const phase = placement.phase ?? bare.phase ?? (binding.sites ? 'adsorbed' : 'gas');
  if (binding.sites && phase === 'gas') throw fail(slice, 'either an adsorbed species or a gas (g), not both');
  // η2-C2H4* takes as many sites as it has asterisks or points of binding: the balance tells.
  const asterisks = placement.phase === 'adsorbed' && rest.text.includes('*') ? placement.sites : null;
  const sites = binding.sites === null || binding.sites === asterisks ? (asterisks ?? 1) : asterisks === null || choices.pick('points-of-binding', ['asterisks', 'number']) === 'number' ? binding.sites : asterisks;
  const siteType = placement.siteType ?? binding.siteType ?? undefined;
  return {
    coefficient,
    species: {
      formula: formula.formula,
      spelling: formula.spelling,
      composition: formula.composition,
      phase,
      sites: phase === 'gas' ? 0 : sites,
      ...(siteType && phase === 'adsorbed' ? { siteType } : {}),
      ...(Object.keys(formula.isotopes).length > 0 ? { isotopes: formula.isotopes } : {}),
      ...(charge !== 0 ? { charge } : {}),
    },
  };
}
