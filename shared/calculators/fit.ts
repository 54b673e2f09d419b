import * as z from 'zod';
import { fitArrhenius } from '../kinetics/fit.ts';
import { calculator } from './calculator.ts';

const interval = z.tuple([z.number(), z.number()]).nullable();

export const fitCalculator = calculator({
  name: 'fit',
  title: 'Fit A and E',
  summary: 'Fits the Arrhenius line to rate constants at several temperatures, with errors, correlation and warnings.',
  formulas: ['ln k = ln A − E/RT', 'w = (k/u)^2', 's^2 = Σ w (ln k − fit)^2/(n − 2)', 'value ± t_{0.95}(n − 2) u'],
  validity: 'Least squares of ln k on 1/T: errors of ln k are taken as independent, those of T as none. Scaled errors come from the residuals (Student t), absolute ones from the standard uncertainties given (normal). Keep the correlation of ln A and E with them: it is near 1.',
  references: ['JCGM 100:2008 (GUM) H.3', 'Cook, Technometrics 19 (1977) 15'],
  input: z.strictObject({
    points: z.array(z.strictObject({ temperatureK: z.number(), k: z.number(), u: z.number().optional() })).max(10_000),
    weights: z.enum(['none', 'given']).default('none'), covariance: z.enum(['scaled', 'absolute']).default('scaled'),
  }),
  output: z.object({
    preExponential: z.number().nullable(), lnPreExponential: z.number(), energyKJPerMol: z.number(), uLnPreExponential: z.number().nullable(), uEnergyKJPerMol: z.number().nullable(),
    correlation: z.number(), ciLnPreExponential: interval, ciEnergyKJPerMol: interval, residualSd: z.number().nullable(), rSquared: z.number().nullable(),
    n: z.int(), degreesOfFreedom: z.int(),
    /** Residuals of ln k and leverage, in the order of the points. */
    residuals: z.array(z.number()), leverage: z.array(z.number()),
    warnings: z.array(z.object({ code: z.string(), message: z.string() })),
  }),
  calculate: (input) => {
    const fit = fitArrhenius(input);
    // Outside double precision only ln A can be given.
    return { ...fit, preExponential: Number.isFinite(fit.preExponential) && fit.preExponential > 0 ? fit.preExponential : null };
  },
});
