import type { Entry } from '#shared/contracts/entries.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';
import { primarySymbol } from '#shared/domain/kinds.ts';
import { csvLine, type Cell } from './csv-line.ts';

/** Columns of `parameters.csv`: name, CSV-on-the-Web datatype, and what it holds. One row an entry. */
export const parameterColumns = [
  ['accession', 'string', 'Permanent name of the entry'],
  ['version', 'integer', 'Public version of the entry'],
  ['kind', 'string', 'Kind of the primary quantity'],
  ['scope', 'string', 'elementary, lumped or apparent'],
  ['provenance', 'string', 'How the source came by the value'],
  ['step', 'string', 'Elementary step as a balanced equation'],
  ['step_class', 'string', 'Class of the elementary step'],
  ['direction', 'integer', 'Sense of the step against its key: 1 or -1'],
  ['metal', 'string', 'Symbol of a pure metal; empty for an alloy'],
  ['facet', 'string', 'Miller indices'],
  ['site', 'string', 'Site type'],
  ['surface', 'string', 'Surface in words'],
  ['quantity', 'string', 'Symbol of the primary quantity'],
  ['energy_type', 'string', 'What the energy is'],
  ['value_as_printed', 'string', 'Primary value exactly as printed'],
  ['unit_as_printed', 'string', 'Unit exactly as printed'],
  ['bound', 'string', 'How the print bounds the value: = ≈ < ≤ > ≥ range'],
  ['value', 'number', 'Primary value in `unit`'],
  ['value_low', 'number', 'Lower end or limit in `unit`'],
  ['value_high', 'number', 'Upper end or limit in `unit`'],
  ['unit', 'string', 'Canonical unit'],
  ['reported_uncertainty', 'number', 'Uncertainty as reported, in the printed unit'],
  ['standard_uncertainty', 'number', 'Standard uncertainty in `unit`; of the logarithm for values printed as a power of ten'],
  ['uncertainty_kind', 'string', 'Kind of the reported uncertainty'],
  ['pre_exponential_as_printed', 'string', 'Pre-exponential factor exactly as printed, with its unit'],
  ['pre_exponential', 'number', 'Pre-exponential factor in `pre_exponential_unit`'],
  ['pre_exponential_unit', 'string', 'Unit of the pre-exponential factor, per site where it could be brought there'],
  ['u_ln_pre_exponential', 'number', 'Standard uncertainty of ln A'],
  ['correlation', 'number', 'Correlation of ln A and the energy'],
  ['temperature_exponent', 'number', 'n of A (T/T0)^n'],
  ['reference_temperature_K', 'number', 'T0'],
  ['rate_of', 'string', 'What the printed rate counts'],
  ['rate_basis', 'string', 'site when per site, else the printed basis'],
  ['kinetic_orders', 'string', 'Reported orders by species'],
  ['temperature_K', 'number', 'Temperature of a single rate constant'],
  ['valid_from_K', 'number', 'Lower end of the valid range'],
  ['valid_to_K', 'number', 'Upper end of the valid range'],
  ['k_at_T', 'number', 'Rate constant at the temperature of interest'],
  ['k_unit', 'string', 'Unit of `k_at_T`'],
  ['temperature_of_interest_K', 'number', 'Temperature `k_at_T` holds for'],
  ['k_extrapolated', 'boolean', 'Whether that temperature lies outside the valid range'],
  ['coverage', 'string', 'Coverage as reported'],
  ['pressures', 'string', 'Pressures as reported'],
  ['promoter', 'string', 'Promoter and loading'],
  ['method', 'string', 'measured or computed'],
  ['technique', 'string', 'Technique by its vocabulary code'],
  ['citation_key', 'string', 'Key of the source in references.bib'],
  ['doi', 'string', 'DOI of the source'],
  ['locator', 'string', 'Where in the source'],
  ['note', 'string', 'Note of the contributor'],
  ['core_version', 'string', 'Version of the computing core that converted the values'],
  ['constants_version', 'string', 'Set of physical constants used'],
  ['permalink', 'anyURI', 'Address of the entry'],
] as const;

type Column = (typeof parameterColumns)[number][0];

export const csvHeader = (): string => csvLine(parameterColumns.map(([name]) => name));

const printed = (quantity: Quantity | undefined) => (quantity ? `${quantity.asPrinted} ${quantity.unitAsPrinted}`.trim() : null);

/** One entry as a line of `parameters.csv`. */
export function csvRow(entry: Entry, temperatureK: number | null): string {
  const find = (symbol: Quantity['symbol']) => entry.quantities.find((quantity) => quantity.symbol === symbol);
  const primary = (entry.kind ? find(primarySymbol[entry.kind]) : undefined) ?? entry.quantities[0];
  const factor = find('preExponential');
  const rate = factor ?? find('rateConstant');
  const { rateOf } = entry;
  const values: Record<Column, Cell> = {
    accession: entry.accession, version: entry.version, kind: entry.kind, scope: entry.scope, provenance: entry.provenance,
    step: entry.step?.equation, step_class: entry.step?.class, direction: entry.step?.direction,
    metal: entry.surface?.metal, facet: entry.surface?.facet, site: entry.surface?.site, surface: entry.surface?.label,
    quantity: primary?.symbol, energy_type: primary?.energyType, value_as_printed: primary?.asPrinted, unit_as_printed: primary?.unitAsPrinted,
    bound: primary?.bound, value: primary?.value, value_low: primary?.low, value_high: primary?.high, unit: primary?.unit,
    reported_uncertainty: primary?.reportedUncertainty, standard_uncertainty: primary?.standardUncertainty, uncertainty_kind: primary?.uncertaintyKind,
    pre_exponential_as_printed: printed(factor), pre_exponential: factor?.siteValue ?? factor?.value, pre_exponential_unit: factor?.siteUnit ?? factor?.unit,
    u_ln_pre_exponential: factor?.standardUncertainty === null || factor?.standardUncertainty === undefined || !factor.value
      ? null : factor.uncertaintyScale === 'ln' ? factor.standardUncertainty : factor.standardUncertainty / factor.value,
    correlation: entry.correlation, temperature_exponent: find('exponent')?.value, reference_temperature_K: find('referenceTemperature')?.value,
    rate_of: rateOf === null ? null : typeof rateOf === 'string' ? rateOf : `consumption of ${rateOf.consumptionOf}`,
    rate_basis: rate ? (rate.siteValue !== null && rate.siteValue !== undefined ? 'site' : 'as printed') : null,
    kinetic_orders: entry.kineticOrders ? Object.entries(entry.kineticOrders).map(([species, order]) => `${species}: ${order}`).join('; ') : null,
    temperature_K: entry.conditions.temperatureK, valid_from_K: entry.validRange?.min, valid_to_K: entry.validRange?.max,
    k_at_T: entry.kAtT?.value, k_unit: entry.kAtT?.unit, temperature_of_interest_K: entry.kAtT ? temperatureK : null, k_extrapolated: entry.kAtT?.extrapolated,
    coverage: entry.conditions.coverage, pressures: entry.conditions.pressures, promoter: entry.conditions.promoter,
    method: entry.method.class, technique: entry.method.technique, citation_key: entry.source?.key, doi: entry.source?.doi, locator: entry.locator, note: entry.note,
    core_version: entry.conversion?.coreVersion, constants_version: entry.conversion?.constantsVersion, permalink: entry.links.page,
  };
  return csvLine(parameterColumns.map(([name]) => values[name]));
}
