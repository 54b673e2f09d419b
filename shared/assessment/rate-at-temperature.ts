import type { kAtT } from '../contracts/entries.ts';
import type { EnergyType, QuantitySymbol } from '../domain/kinds.ts';
import { rateAt } from '../kinetics/arrhenius.ts';
import type * as z from 'zod';

/** The converted quantities a rate constant is made from. */
interface Converted {
  symbol: QuantitySymbol;
  energyType?: EnergyType | null;
  bound: string;
  value: number | null;
  unit: string;
  siteValue?: number | null;
  siteUnit?: string | null;
  siteExponentChange?: number | null;
  standardUncertainty: number | null;
  uncertaintyScale: 'linear' | 'ln';
}

/** Parameters of k(T) = A (T/T0)^n exp(-E/RT), A per site where it could be brought there. */
export interface RateParameters {
  preExponential: number;
  unit: string;
  exponent: number;
  referenceTemperatureK: number;
  energyKJPerMol: number;
  uLnPreExponential: number | null;
  uEnergyKJPerMol: number | null;
}

const exact = (quantity: Converted | undefined): quantity is Converted & { value: number } =>
  quantity !== undefined && quantity.value !== null && (quantity.bound === '=' || quantity.bound === '≈');

/** The parameters of k(T) that an entry holds, or null when it lacks A or E, or has only a bound for one. */
export function rateParameters(quantities: readonly Converted[]): RateParameters | null {
  const find = (symbol: QuantitySymbol) => quantities.find((quantity) => quantity.symbol === symbol);
  const energy = find('energy');
  const factor = find('preExponential');
  if (!exact(energy) || !exact(factor) || factor.value <= 0) return null;
  const exponent = find('exponent');
  const reference = find('referenceTemperature');
  const u = factor.standardUncertainty;
  return {
    preExponential: factor.siteValue ?? factor.value,
    unit: factor.siteUnit ?? factor.unit,
    exponent: (exponent?.value ?? 0) + (typeof factor.siteValue === 'number' ? (factor.siteExponentChange ?? 0) : 0),
    referenceTemperatureK: reference?.value ?? 1,
    energyKJPerMol: energy.value,
    uLnPreExponential: u === null ? null : factor.uncertaintyScale === 'ln' ? u : u / factor.value,
    uEnergyKJPerMol: energy.standardUncertainty,
  };
}

/**
 * The rate constant of an entry at a temperature, marked as extrapolated outside the valid range (and where no range is stated by a measurement).
 * Null without A and E, and where k leaves the range of a double.
 * @param temperatureK temperature of interest [K]
 */
export function rateAtTemperature(
  quantities: readonly Converted[],
  { temperatureK, correlation, validRange, measured }: {
    temperatureK: number; correlation: number | null; validRange: { min?: number | null; max?: number | null } | null; measured: boolean;
  },
): z.infer<typeof kAtT> | null {
  const parameters = rateParameters(quantities);
  if (!parameters) return null;
  const { unit, ...rest } = parameters;
  const { k, uLnK, uLnKRange } = rateAt({ ...rest, temperatureK, correlation });
  if (!Number.isFinite(k) || k === 0) return null;
  const { min = null, max = null } = validRange ?? {};
  const stated = min !== null || max !== null;
  const outside = (min !== null && temperatureK < min) || (max !== null && temperatureK > max);
  return { temperatureK, value: k, unit, uLnK, uLnKRange: uLnKRange ?? null, extrapolated: outside || (measured && !stated) };
}
