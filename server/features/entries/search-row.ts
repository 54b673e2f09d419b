import { rateParameters } from '#shared/assessment/rate-at-temperature.ts';
import { kindsHeld, primarySymbol, type EnergyType, type Kind, type QuantitySymbol } from '#shared/domain/kinds.ts';
import { plainText } from '#shared/citations/rich-text.ts';
import { readStep, StepError } from '#shared/steps/parse-step.ts';
import type { EntryRecord } from './entries.repository.ts';
import { readPromoters } from './promoters.ts';
import type { NewSearchRow } from './search-rows.repository.ts';

/** Version of what is below: rows of a lower one are made anew. */
export const SEARCH_ROW_MAKER = 2;

/** Label and synonyms that the vocabulary has for a code of a list. */
export type TermNames = (list: 'metal' | 'technique' | 'support' | 'step-class' | 'species', code: string) => readonly string[];

/** The middle of a range, the limit of a bound, the value itself: where a value stands when it is sorted or drawn. */
function position({ value, low, high }: { value: number | null; low: number | null; high: number | null }): number | null {
  if (value !== null) return value;
  if (low !== null && high !== null) return (low + high) / 2;
  return low ?? high;
}

interface EquationFacts {
  species: string[];
  cleavage: string | null;
}

/** Equations come again and again: the last ones read are kept. */
const readings = new Map<string, EquationFacts>();
const mostReadings = 1000;

function readEquation(equation: string): EquationFacts {
  const known = readings.get(equation);
  if (known) return known;
  if (readings.size >= mostReadings) readings.clear();
  const facts = equationFacts(equation);
  readings.set(equation, facts);
  return facts;
}

/** What the equation says besides its key. The reader that made the key reads the print again; a newer one may refuse it. */
function equationFacts(equation: string): EquationFacts {
  try {
    const { reactants, products, assistance } = readStep(equation);
    return { species: [...new Set([...reactants, ...products].filter(({ species }) => species.phase !== 'free-site').map(({ species }) => species.formula))].sort(), cleavage: assistance };
  } catch (error) {
    if (!(error instanceof StepError)) throw error;
    return { species: [], cleavage: null };
  }
}

/** Formulas of the species in an equation. */
export const speciesIn = (equation: string): string[] => readEquation(equation).species;

/** ln of the pre-exponential factor, per site where it could be brought there. */
function factorOf(held: readonly { symbol: QuantitySymbol; value: number | null; low: number | null; high: number | null; unit: string; siteValue: number | null; siteUnit: string | null }[]) {
  const factor = held.find(({ symbol }) => symbol === 'preExponential');
  const at = factor && (factor.siteValue ?? position(factor));
  return factor && typeof at === 'number' && at > 0 ? { lnFactor: Math.log(at), factorUnit: factor.siteValue === null ? factor.unit : (factor.siteUnit ?? factor.unit) } : { lnFactor: null, factorUnit: null };
}

/** The row Search filters by, made from a frozen revision and its conversion. */
export function searchRowOf(record: EntryRecord, names: TermNames): NewSearchRow {
  const { revision, step, surface } = record;
  const held = record.quantities.map(({ printed, converted }) => ({
    symbol: printed.symbol as QuantitySymbol, energyType: printed.energyType as EnergyType | null, bound: printed.bound, value: converted.value,
    low: converted.low, high: converted.high, unit: converted.unit, siteValue: converted.siteValue, siteUnit: converted.siteUnit, siteExponentChange: converted.siteExponentChange,
    standardUncertainty: converted.standardUncertainty, uncertaintyScale: printed.uncertaintyScale as 'linear' | 'ln',
  }));
  const kinds = kindsHeld(held);
  const values: Record<string, number> = {};
  for (const kind of kinds) {
    const quantity = held.find(({ symbol, energyType }) => symbol === primarySymbol[kind] && (symbol !== 'energy' || (kind === 'activation-energy') === (energyType === 'arrhenius')));
    const at = quantity ? position(quantity) : null;
    if (at !== null) values[kind] = at;
  }
  const energy = held.find(({ symbol }) => symbol === 'energy');
  const own = held.find(({ symbol }) => symbol === primarySymbol[revision.kind as Kind]);
  const rate = rateParameters(held);
  const { input } = revision;
  const { species, cleavage } = readEquation(step.equation);
  const promoters = readPromoters(input.conditions?.promoter);
  const words = [
    step.equation, ...species, step.stepClass.replaceAll('-', ' '), surface.label, surface.formula, surface.support ?? '', revision.methodClass ?? '', revision.technique ?? '',
    input.method?.detail ?? '', input.conditions?.promoter ?? '', ...promoters, input.conditions?.functional ?? '', input.conditions?.text ?? '', input.note ?? '', record.accession,
    ...species.flatMap((formula) => names('species', formula)), ...names('step-class', step.stepClass), ...surface.elements.flatMap((element) => names('metal', element)),
    ...promoters.flatMap((element) => names('metal', element)), ...names('support', surface.support ?? ''), ...names('technique', revision.technique ?? ''),
  ];
  return {
    revisionId: revision.id, madeBy: SEARCH_ROW_MAKER, authorId: revision.authorId, sourceId: record.source.id, accession: record.accession, kind: revision.kind as Kind, kindsHeld: kinds, scope: revision.scope ?? '', provenance: revision.provenance ?? '',
    energyType: energy?.energyType ?? null, stepKey: step.key, stepDirection: step.direction, equation: step.equation, stepClass: step.stepClass, bond: step.bond, cleavage, species,
    metal: surface.metal, formula: surface.formula, elements: surface.elements, facet: surface.facet, site: surface.site, sampleType: surface.sampleType, support: surface.support, promoters,
    surfaceLabel: surface.label, methodClass: revision.methodClass ?? '', technique: revision.technique, validMinK: revision.validMinK, validMaxK: revision.validMaxK,
    energyKJPerMol: energy ? position(energy) : null, energyBound: energy?.bound ?? null, uEnergyKJPerMol: energy?.standardUncertainty ?? null,
    hasUncertainty: typeof own?.standardUncertainty === 'number',
    lnPreExponential: rate ? Math.log(rate.preExponential) : null, exponent: rate?.exponent ?? null, referenceTemperatureK: rate?.referenceTemperatureK ?? null, rateUnit: rate?.unit ?? null,
    ...factorOf(held), values,
    // Names may come twice: once is enough.
    searchText: plainText([...new Set(words)].join(' ')).replace(/\p{Cc}/gu, ' ').replace(/\p{Cf}/gu, '').toLowerCase().slice(0, 8000),
  };
}
