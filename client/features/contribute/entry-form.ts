import type { EntryInput } from '#shared/contracts/entries.ts';
import type {
  EnergyType, Kind, MethodClass, Provenance, QuantitySymbol, SampleType, Scope, SiteType, Structure, UncertaintyKind,
} from '#shared/domain/kinds.ts';
import { emptyCitation, typedFromCsl, type TypedCitation } from './typed-citation.ts';

/** The conditions as fields, in the order in which they are asked. */
export const conditionNames = [
  'coverage', 'coverageDefinition', 'pressures', 'temperatureK', 'heatingRateKPerS', 'exposureLangmuir', 'promoter', 'siteDensityPerM2',
  'siteDensitySource', 'functional', 'supercell', 'endStateReference', 'isotopes', 'kieDirection', 'text',
] as const;
export type ConditionName = (typeof conditionNames)[number];
const surfaceNames = ['metal', 'formula', 'structure', 'facet', 'site', 'sampleType', 'support', 'particleSizeNm'];

export interface QuantityForm {
  symbol: QuantitySymbol;
  energyType: EnergyType | '';
  asPrinted: string;
  unitAsPrinted: string;
  multiplier: string;
  uncertaintyKind: UncertaintyKind | '';
  coverageFactor: string;
  level: string;
  degreesOfFreedom: string;
}

/**
 * The form as it is typed: every field is text, under the path that the same thing has in the entry's input,
 * so that a fault found by the server is found again as a field.
 */
export interface EntryForm {
  source: { via: '' | 'id' | 'doi' | 'bibtex' | 'ris' | 'typed'; id: string; doi: string; text: string; typed: TypedCitation };
  kind: Kind | '';
  scope: Scope | '';
  provenance: Provenance | '';
  /** `balancedAs` is the equation to which the free sites were added, empty when the source writes them itself. */
  step: { equation: string; balancedAs: string };
  surface: {
    of: 'metal' | 'alloy'; metal: string; formula: string; structure: Structure | ''; facet: string; site: SiteType | '';
    sampleType: SampleType | ''; support: string; particleSizeNm: string;
  };
  locator: string;
  method: { class: MethodClass | ''; technique: string; detail: string };
  quantities: QuantityForm[];
  correlation: string;
  rateOf: { counts: '' | 'event' | 'consumption' | 'unknown'; species: string };
  kineticOrders: { species: string; order: string }[];
  conditions: Record<ConditionName, string>;
  validRange: { min: string; max: string };
  note: string;
  /** What the entry says that this form has no field for, so that saving does not lose it. */
  kept: { surface: Record<string, unknown>; conditions: Record<string, unknown> };
}

/** An empty row for a quantity. */
export function quantityRow(symbol: QuantitySymbol, energyType: EnergyType | '' = ''): QuantityForm {
  return {
    symbol, energyType, asPrinted: '', unitAsPrinted: '', multiplier: '', uncertaintyKind: '', coverageFactor: '', level: '', degreesOfFreedom: '',
  };
}

/** The form before anything is typed. */
export function emptyForm(): EntryForm {
  return {
    source: { via: '', id: '', doi: '', text: '', typed: emptyCitation },
    kind: '', scope: '', provenance: '',
    step: { equation: '', balancedAs: '' },
    surface: { of: 'metal', metal: '', formula: '', structure: '', facet: '', site: '', sampleType: '', support: '', particleSizeNm: '' },
    locator: '',
    method: { class: '', technique: '', detail: '' },
    quantities: [quantityRow('energy')],
    correlation: '',
    rateOf: { counts: '', species: '' },
    kineticOrders: [],
    conditions: Object.fromEntries(conditionNames.map((name) => [name, ''])) as Record<ConditionName, string>,
    validRange: { min: '', max: '' },
    note: '',
    kept: { surface: {}, conditions: {} },
  };
}

const text = (value: string | number | null | undefined): string => (value === undefined || value === null ? '' : String(value));

const without = (members: object, names: readonly string[]) => Object.fromEntries(Object.entries(members).filter(([name]) => !names.includes(name)));

/** The form of what was typed before, as the server kept it. */
export function formOf(input: EntryInput): EntryForm {
  const empty = emptyForm();
  const { source, surface = {}, method = {}, conditions = {}, validRange = {}, quantities = [], rateOf, kineticOrders = {} } = input;
  return {
    source: sourceForm(source),
    kind: input.kind ?? '',
    scope: input.scope ?? '',
    provenance: input.provenance ?? '',
    step: { equation: text(input.step?.equation), balancedAs: input.step?.sitesAdded ? text(input.step.equation) : '' },
    surface: {
      of: surface.formula ? 'alloy' : 'metal',
      metal: text(surface.metal), formula: text(surface.formula), structure: surface.structure ?? '', facet: text(surface.facet),
      site: surface.site ?? '', sampleType: surface.sampleType ?? '', support: text(surface.support), particleSizeNm: text(surface.particleSizeNm),
    },
    locator: text(input.locator),
    method: { class: method.class ?? '', technique: text(method.technique), detail: text(method.detail) },
    quantities: quantities.length === 0 ? empty.quantities : quantities.map((quantity) => ({
      symbol: quantity.symbol, energyType: quantity.energyType ?? '', asPrinted: quantity.asPrinted, unitAsPrinted: text(quantity.unitAsPrinted),
      multiplier: text(quantity.multiplier), uncertaintyKind: quantity.uncertaintyKind ?? '', coverageFactor: text(quantity.coverageFactor),
      level: text(quantity.level), degreesOfFreedom: text(quantity.degreesOfFreedom),
    })),
    correlation: text(input.correlation),
    rateOf: typeof rateOf === 'object' ? { counts: 'consumption', species: rateOf.consumptionOf } : { counts: rateOf ?? '', species: '' },
    kineticOrders: Object.entries(kineticOrders).map(([species, order]) => ({ species, order: String(order) })),
    conditions: Object.fromEntries(conditionNames.map((name) => [name, text(conditions[name])])) as Record<ConditionName, string>,
    validRange: { min: text(validRange.min), max: text(validRange.max) },
    note: text(input.note),
    kept: { surface: without(surface, surfaceNames), conditions: without(conditions, conditionNames) },
  };
}

function sourceForm(source: EntryInput['source']): EntryForm['source'] {
  const empty = emptyForm().source;
  if (source?.id) return { ...empty, via: 'id', id: source.id, doi: text(source.doi) };
  if (source?.bibtex) return { ...empty, via: 'bibtex', text: source.bibtex };
  if (source?.ris) return { ...empty, via: 'ris', text: source.ris };
  if (source?.csl) return { ...empty, via: 'typed', typed: typedFromCsl(source.csl) };
  if (source?.doi) return { ...empty, via: 'doi', doi: source.doi };
  return empty;
}
