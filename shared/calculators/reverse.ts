import * as z from 'zod';
import { reverseStep } from '../kinetics/reverse.ts';
import { calculator } from './calculator.ts';

/** A figure outside double precision is left to its logarithm. */
const held = (value: number | undefined): number | null | undefined => (value === undefined || (Number.isFinite(value) && value > 0) ? value : null);
const figure = z.number().nullish();

export const reverseCalculator = calculator({
  name: 'reverse',
  title: 'Reverse step',
  summary: 'Finds the Arrhenius parameters and rate constant of the reverse step from those of the forward one and the thermodynamics of the step.',
  formulas: ['E_{f} − E_{r} = ΔH°', 'A_{f}/A_{r} = (p°)^{Δν} exp(ΔS°/R)', 'k_{r} = k_{f}/K', 'on concentrations: E_{f} − E_{r} = ΔH° − ΔνRT at T'],
  validity: 'Energies per mole of the step as written, of one type: an electronic barrier goes with an electronic reaction energy, a zero-point-corrected one with its own, a Gibbs energy with a Gibbs energy. ΔH° and ΔS° are taken as constant, coverages with θ° = 1. Gas factors are pressures in Pa unless the basis is said to be concentrations in mol m^{-3}; there the reverse step carries the temperature exponent n + Δν.',
  references: ['IUPAC glossary of terms used in chemical kinetics, Pure Appl. Chem. 68 (1996) 149', 'IUPAC Green Book, 3rd edition, 2.11'],
  input: z.strictObject({
    energyForwardKJPerMol: z.number(), reactionEnthalpyKJPerMol: z.number(), preExponentialForward: z.number().optional(), exponentForward: z.number().default(0),
    reactionEntropyJPerMolK: z.number().optional(), gasMoleChange: z.number().default(0), standardPressurePa: z.number().default(1e5), temperatureK: z.number().optional(),
    basis: z.enum(['pressure', 'concentration']).default('pressure'), referenceTemperatureK: z.number().default(1),
  }),
  output: z.object({
    energyReverseKJPerMol: z.number(), exponentReverse: z.number(), preExponentialReverse: figure, lnPreExponentialReverse: z.number().optional(),
    localEnergyForwardKJPerMol: z.number().optional(), localEnergyReverseKJPerMol: z.number().optional(), gibbsKJPerMol: z.number().optional(),
    equilibriumConstant: figure, lnEquilibriumConstant: z.number().optional(), kForward: figure, kReverse: figure, lnKReverse: z.number().optional(),
    warnings: z.array(z.object({ code: z.enum(['negative-energy', 'no-entropy']), message: z.string() })),
  }),
  calculate: (input) => {
    const result = reverseStep(input);
    const { preExponentialReverse, equilibriumConstant, kForward, kReverse } = result;
    return { ...result, preExponentialReverse: held(preExponentialReverse), equilibriumConstant: held(equilibriumConstant), kForward: held(kForward), kReverse: held(kReverse) };
  },
});
