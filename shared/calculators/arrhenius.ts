import * as z from 'zod';
import { rateAt } from '../kinetics/arrhenius.ts';
import { calculator } from './calculator.ts';

export const arrheniusCalculator = calculator({
  name: 'arrhenius',
  title: 'Rate constant at a temperature',
  summary: 'Evaluates the modified Arrhenius equation with its uncertainty.',
  formulas: ['k = A (T/T_0)^n exp(−E/RT)', 'E_{local} = E + nRT', 'u^2(ln k) = u^2(ln A) + u^2(E)/(RT)^2 − 2 r u(ln A) u(E)/(RT)'],
  validity: 'Inside the temperatures that A and E were found at; outside it is an extrapolation. Without a correlation of ln A and E there is no single uncertainty, only the interval between full correlation and full anticorrelation.',
  references: ['IUPAC Gold Book, modified Arrhenius equation', 'JCGM 100:2008 (GUM) 5.2.2'],
  input: z.strictObject({
    preExponential: z.number(), exponent: z.number().default(0), referenceTemperatureK: z.number().default(1), energyKJPerMol: z.number(), temperatureK: z.number(),
    uLnPreExponential: z.number().optional(), uEnergyKJPerMol: z.number().optional(), correlation: z.number().optional(),
  }),
  output: z.object({
    k: z.number().nullable(), lnK: z.number(), localEnergyKJPerMol: z.number(), uLnK: z.number().nullable(), uLnKRange: z.tuple([z.number(), z.number()]).nullish(),
  }),
  calculate: (input) => {
    const result = rateAt(input);
    // Outside double precision only ln k can be given.
    return { ...result, k: Number.isFinite(result.k) && result.k > 0 ? result.k : null };
  },
});
