import * as z from 'zod';
import { evaluateUncertainty } from '../kinetics/uncertainty.ts';
import { calculator } from './calculator.ts';

export const uncertaintyCalculator = calculator({
  name: 'uncertainty',
  title: 'Standard uncertainty',
  summary: 'Turns a reported uncertainty of a known kind into a standard uncertainty.',
  formulas: ['u = U/k', 'u = half-width/t_p(ν)', 'Rectangular: u = a/√3', 'Triangular: u = a/√6', 'Arcsine: u = a/√2', 'Trapezoidal: u = a √((1 + β^2)/6)', 'Factor f: u(ln x) = ln f/z_p'],
  validity: 'Only for an uncertainty whose kind the source states: a bare ± has none. Without degrees of freedom a confidence interval is taken as normal. A factor gives the uncertainty of ln x, and stands for an interval from x/f to x f with the two-sided level given.',
  references: ['JCGM 100:2008 (GUM) 4.2.3, 4.3.3, 4.3.7, 4.3.9, H.1.3.4, annex G'],
  input: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('expanded'), value: z.number(), coverageFactor: z.number() }),
    z.strictObject({ kind: z.literal('confidence'), halfWidth: z.number(), level: z.number(), degreesOfFreedom: z.number().optional() }),
    z.strictObject({ kind: z.literal('rectangular'), halfWidth: z.number() }),
    z.strictObject({ kind: z.literal('triangular'), halfWidth: z.number() }),
    z.strictObject({ kind: z.literal('arcsine'), halfWidth: z.number() }),
    z.strictObject({ kind: z.literal('trapezoidal'), halfWidth: z.number(), topFraction: z.number() }),
    z.strictObject({ kind: z.literal('factor'), factor: z.number(), level: z.number() }),
  ]),
  /** The standard uncertainty, of ln x where the scale is `ln`, and what the reported figure was divided by. */
  output: z.object({ standardUncertainty: z.number(), divisor: z.number(), scale: z.enum(['linear', 'ln']) }),
  calculate: (input) => evaluateUncertainty(input),
});
