import * as z from 'zod';
import { changeBasis } from '../kinetics/arrhenius.ts';
import { requirePositive } from '../kinetics/kinetics-error.ts';
import { calculator } from './calculator.ts';

const basis = z.enum(['concentration', 'pressure']);

export const changeBasisCalculator = calculator({
  name: 'change-basis',
  title: 'Change the basis of A and n',
  summary: 'Brings Arrhenius parameters from concentrations to pressures or back, exactly at every temperature.',
  formulas: ['k_p = k_c/(RT)^g', 'A_p = A_c/(R T_0)^g', 'n_p = n_c − g', 'E(k_p) = E(k_c) − gRT at T'],
  validity: 'Ideal gas; A in SI units (m^{3}, mol, Pa, s). E stays and n changes: dividing A by (RT)^g at one temperature with n kept would be wrong at every other. The gas order counts the gas factors of the rate law as printed.',
  references: ['Ideal gas law', 'IUPAC glossary of terms used in chemical kinetics, Pure Appl. Chem. 68 (1996) 149'],
  input: z.strictObject({
    preExponential: z.number(), exponent: z.number().default(0), referenceTemperatureK: z.number().optional(), energyKJPerMol: z.number(),
    gasOrder: z.number().min(-5).max(5), from: basis, to: basis,
  }),
  output: z.object({ preExponential: z.number(), exponent: z.number(), referenceTemperatureK: z.number(), energyKJPerMol: z.number() }),
  calculate: (input) => {
    const changed = changeBasis(input);
    requirePositive('preExponential', changed.preExponential, 'A on the new basis');
    return changed;
  },
});
