import * as z from 'zod';
import { arrheniusToEyring, eyringToArrhenius } from '../kinetics/eyring.ts';
import { calculator } from './calculator.ts';

const system = {
  temperatureK: z.number(), phase: z.enum(['surface', 'gas', 'gas-surface']), molecularity: z.union([z.literal(1), z.literal(2)]),
  transmission: z.number().default(1), standardState: z.enum(['1 bar', '1 mol/L']).optional(),
};

export const eyringCalculator = calculator({
  name: 'eyring',
  title: 'Eyring and Arrhenius parameters',
  summary: 'Turns enthalpy and entropy of activation into k, A and E at a temperature, or A and E back into them.',
  formulas: [
    'k = κ (k_BT/h) (p°)^{Δn‡} exp(−ΔG‡/RT)',
    'Surface, unimolecular gas: E = ΔH‡ + RT, A = κ e (k_BT/h) exp(ΔS‡/R)',
    'Gas, bimolecular: E = ΔH‡ + 2RT, A = κ e^2 (k_BT/h) (RT/p°) exp(ΔS‡/R)',
    'Gas onto surface: E = ΔH‡ + RT, A = κ e (k_BT/h) (1/p°) exp(ΔS‡/R)',
    'ΔS‡(c) = ΔS‡(p) + (m − 1) R ln(RT c°/p°)',
  ],
  validity: 'A and E are tangent values at T: over a wide range they drift. Surface species in the standard state θ° = 1, κ as given. Gas bimolecular constants in m^{3} mol^{−1} s^{−1}, gas onto surface per site in Pa^{−1} s^{−1}. The standard state of the gas is 1 bar unless 1 mol/L is stated.',
  references: ['IUPAC Gold Book E02142', 'IUPAC glossary of terms used in chemical kinetics, Pure Appl. Chem. 68 (1996) 149'],
  input: z.discriminatedUnion('direction', [
    z.strictObject({ direction: z.literal('to-arrhenius'), enthalpyKJPerMol: z.number(), entropyJPerMolK: z.number(), ...system }),
    z.strictObject({ direction: z.literal('to-eyring'), preExponential: z.number(), energyKJPerMol: z.number(), ...system }),
  ]),
  /** To Arrhenius: k, A, E and their unit. To Eyring: enthalpy and entropy. Both: the Gibbs energy of activation. */
  output: z.object({
    k: z.number().nullish(), preExponential: z.number().optional(), energyKJPerMol: z.number().optional(), unit: z.string().optional(),
    enthalpyKJPerMol: z.number().optional(), entropyJPerMolK: z.number().optional(), gibbsKJPerMol: z.number(),
  }),
  calculate: (input) => {
    if (input.direction === 'to-eyring') return arrheniusToEyring(input);
    const result = eyringToArrhenius(input);
    // A barrier so high that k leaves double precision still has A and E.
    return { ...result, k: result.k > 0 ? result.k : null };
  },
});
