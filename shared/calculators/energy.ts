import * as z from 'zod';
import { convertEnergy } from '../kinetics/energy.ts';
import { calculator } from './calculator.ts';

export const energyCalculator = calculator({
  name: 'energy',
  title: 'Convert an energy',
  summary: 'Converts a molar energy, or an energy per particle, between units.',
  formulas: ['E(J/mol) = E(eV) e N_A', 'E(J/mol) = E(K) R', 'E(J/mol) = E(cm^{-1}) N_A h c'],
  validity: 'Exact in the SI of 2019, save for the hartree, whose value is measured. A unit of energy says nothing about the type of energy: electronic, enthalpy and Arrhenius values stay what they are.',
  references: ['BIPM SI Brochure, 9th edition', 'NIST SP 811 (2008)', 'CODATA 2022'],
  input: z.strictObject({ value: z.number(), from: z.string().max(40), to: z.string().max(40), standardUncertainty: z.number().nonnegative().optional() }),
  output: z.object({ value: z.number(), unit: z.string(), standardUncertainty: z.number().nullable() }),
  calculate: (input) => convertEnergy(input),
});
