import { rateParameters } from '#shared/assessment/rate-at-temperature.ts';
import { kindsHeld, primarySymbol, type EnergyType, type Kind, type QuantitySymbol } from '#shared/domain/kinds.ts';
import { plainText } from '#shared/citations/rich-text.ts';
import type { EntryRecord } from './entries.repository.ts';
import type { NewSearchRow } from './search-rows.repository.ts';

/** The middle of a range, the limit of a bound, the value itself: where a value stands when it is sorted or drawn. */
function position({ value, low, high }: { value: number | null; low: number | null; high: number | null }): number | null {
  if (value !== null) return value;
  if (low !== null && high !== null) return (low + high) / 2;
  return low ?? high;
}

/** The row Search filters by, made from an accepted revision and the conversion it is accepted with. */
export function searchRowOf(record: EntryRecord, acceptedAt: Date): NewSearchRow {
  const { revision, step, surface, source } = record;
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
  const rate = rateParameters(held);
  const { input } = revision;
  const words = [
    step.equation, step.stepClass.replaceAll('-', ' '), surface.label, surface.formula, source.title, source.authors, source.container ?? '', String(source.year ?? ''),
    revision.technique ?? '', input.method?.detail ?? '', input.conditions?.promoter ?? '', input.conditions?.functional ?? '', input.conditions?.text ?? '', input.note ?? '',
    record.accession, source.doi ?? '',
  ];
  const searchText = plainText(words.join(' ')).toLowerCase().slice(0, 8000);
  return {
    revisionId: revision.id, accession: record.accession, kind: revision.kind as Kind, kindsHeld: kinds, scope: revision.scope ?? '', provenance: revision.provenance ?? '',
    energyType: energy?.energyType ?? null, stepKey: step.key, stepDirection: step.direction, equation: step.equation, stepClass: step.stepClass, bond: step.bond,
    metal: surface.metal, formula: surface.formula, elements: surface.elements, facet: surface.facet, site: surface.site, sampleType: surface.sampleType, surfaceLabel: surface.label,
    methodClass: revision.methodClass ?? '', technique: revision.technique, sourceId: source.id, sourceLabel: source.label, doi: source.doi, year: source.year,
    validMinK: revision.validMinK, validMaxK: revision.validMaxK,
    energyKJPerMol: energy ? position(energy) : null, energyBound: energy?.bound ?? null, uEnergyKJPerMol: energy?.standardUncertainty ?? null,
    lnPreExponential: rate ? Math.log(rate.preExponential) : null, exponent: rate?.exponent ?? null, referenceTemperatureK: rate?.referenceTemperatureK ?? null, rateUnit: rate?.unit ?? null,
    values, searchText, acceptedAt,
  };
}
