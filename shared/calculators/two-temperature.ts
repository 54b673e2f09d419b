import * as z from 'zod';
import { twoTemperature } from '../kinetics/arrhenius.ts';
import { calculator } from './calculator.ts';

export const twoTemperatureCalculator = calculator({
  name: 'two-temperature',
  title: 'A and E from two temperatures',
  summary: 'Finds the Arrhenius line through two rate constants.',
  formulas: ['E = R ln(k_1/k_2)/(1/T_2 − 1/T_1)', 'ln A = (T_2 ln k_2 − T_1 ln k_1)/(T_2 − T_1)'],
  validity: 'Two points fix a line and say nothing about its errors: close temperatures turn small errors of k into large ones of A and E. Both rate constants in the same unit, which is also that of A.',
  references: ['IUPAC Gold Book, Arrhenius equation', 'IUPAC glossary of terms used in chemical kinetics, Pure Appl. Chem. 68 (1996) 149'],
  input: z.strictObject({ k1: z.number(), temperature1K: z.number(), k2: z.number(), temperature2K: z.number() }),
  output: z.object({ preExponential: z.number().nullable(), lnPreExponential: z.number(), energyKJPerMol: z.number() }),
  calculate: (input) => {
    const line = twoTemperature(input);
    // Outside double precision only ln A can be given.
    return { ...line, preExponential: Number.isFinite(line.preExponential) && line.preExponential > 0 ? line.preExponential : null };
  },
});
