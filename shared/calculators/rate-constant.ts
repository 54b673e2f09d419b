import * as z from 'zod';
import { convertRateConstant } from '../kinetics/rate-constant.ts';
import { calculator } from './calculator.ts';

export const rateConstantCalculator = calculator({
  name: 'rate-constant',
  title: 'Convert a rate constant',
  summary: 'Converts one rate constant at one temperature between units of the same rate law.',
  formulas: ['k_p = k_c/(RT)^g', 'k_{site} = k Γ^{q−a}'],
  validity: 'Ideal gas. The site density is yours to state; no factor of 2 is applied for A + A. Arrhenius parameters have their own calculator: dividing A at one temperature and keeping E would be wrong at every other.',
  references: ['IUPAC glossary of terms used in chemical kinetics, Pure Appl. Chem. 68 (1996) 149', 'NIST SP 811 (2008)'],
  input: z.strictObject({
    value: z.number(), from: z.string().max(80), to: z.string().max(80), temperatureK: z.number().optional(), siteDensityPerM2: z.number().optional(),
    standardUncertainty: z.number().nonnegative().optional(),
  }),
  output: z.object({ value: z.number(), unit: z.string(), standardUncertainty: z.number().nullable(), assumptions: z.array(z.string()) }),
  calculate: (input) => convertRateConstant(input),
});
