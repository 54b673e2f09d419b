import * as z from 'zod';
import { bounds, energyTypes, quantitySymbols, uncertaintyKinds } from '../domain/kinds.ts';

/** One step from as printed to converted: what was done, from what to what, with which constant or assumption, by which reference. */
export const derivationLine = z.object({
  operation: z.string(),
  from: z.string(),
  to: z.string(),
  constant: z.string().optional(),
  assumption: z.string().optional(),
  reference: z.string(),
});

/** A quantity as a contributor types it: the print, never a converted value. */
export const quantityInput = z.object({
  symbol: z.enum(quantitySymbols),
  energyType: z.enum(energyTypes).optional(),
  asPrinted: z.string().max(120),
  unitAsPrinted: z.string().max(80).default(''),
  /** Scaling of the column heading: the value is the printed figure times this, so a column headed `A/10^13` has 1e13 and one headed `10^3 k` has 1e-3. */
  multiplier: z.number().positive().optional(),
  uncertaintyKind: z.enum(uncertaintyKinds).optional(),
  coverageFactor: z.number().positive().max(10).optional(),
  level: z.number().gt(0).lt(1).optional(),
  degreesOfFreedom: z.int().positive().optional(),
});
export type QuantityInput = z.infer<typeof quantityInput>;

/** A quantity of an entry: as printed, read and converted. */
export const quantity = z.object({
  symbol: z.enum(quantitySymbols),
  energyType: z.enum(energyTypes).nullish(),
  asPrinted: z.string(),
  unitAsPrinted: z.string(),
  multiplier: z.number().nullish(),
  bound: z.enum(bounds),
  value: z.number().nullable(),
  low: z.number().nullable(),
  high: z.number().nullable(),
  /** The canonical unit of `value`, `low`, `high` and `standardUncertainty`. */
  unit: z.string(),
  siteValue: z.number().nullish(),
  siteUnit: z.string().nullish(),
  /** What is added to the temperature exponent when `siteValue` of a pre-exponential factor is used. */
  siteExponentChange: z.number().nullish(),
  /** What is not known that the next level of conversion would need. */
  missing: z.array(z.string()).nullish(),
  reportedUncertainty: z.number().nullable(),
  reportedMinus: z.number().nullish(),
  reportedPlus: z.number().nullish(),
  uncertaintyKind: z.enum(uncertaintyKinds),
  uncertaintyScale: z.enum(['linear', 'ln']),
  standardUncertainty: z.number().nullable(),
  significantDigits: z.int().nullable(),
  derivation: z.array(derivationLine),
});
export type Quantity = z.infer<typeof quantity>;
export type DerivationLine = z.infer<typeof derivationLine>;
