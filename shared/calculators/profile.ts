import * as z from 'zod';
import { energeticSpan, profileQuantities, spanTurnover } from '../kinetics/energetic-span.ts';
import { energyProfile } from '../kinetics/energy-profile.ts';
import { requireTemperature } from '../kinetics/kinetics-error.ts';
import { calculator } from './calculator.ts';

const state = z.object({
  name: z.string(), kind: z.enum(['start', 'transition-state', 'intermediate', 'end']), step: z.int().nullable(), run: z.int().nullable(), energyKJPerMol: z.number(),
});

export const profileCalculator = calculator({
  name: 'profile',
  title: 'Energy profile of a pathway',
  summary: 'Puts the steps of a pathway on one scale, finds its highest transition state and, for a cycle, its energetic span.',
  formulas: ['T_i = Σ_{j<i} n_jΔE_j + E_i', 'δE = T_{TDTS} − I_{TDI}, plus ΔG_r if the TDTS precedes', 'TOF = (k_BT/h) exp(−δE/RT)'],
  validity: 'Energies of one type on one reference: end states taken together in one cell do not chain with separated ones, so enter their pairing energy as a step of its own, without a barrier. A step run n times adds nΔE, and its transition state is met in each run. The turnover needs Gibbs energies at T.',
  references: ['Kozuch and Shaik, Acc. Chem. Res. 44 (2011) 101', 'Highest transition state above the start (common practice)'],
  input: z.strictObject({
    /** A step without a transition state has `barrierKJPerMol: null`; `u` is the standard uncertainty of either energy of the step. */
    steps: z.array(z.strictObject({ barrierKJPerMol: z.number().nullable(), reactionEnergyKJPerMol: z.number(), u: z.number().optional(), times: z.number().default(1) })).max(200),
    cyclic: z.boolean().default(false), quantity: z.enum(profileQuantities), temperatureK: z.number().optional(),
  }),
  /** `highestStep` and `step` count from 1; `turnoverRefusal` says why a cycle has no turnover. */
  output: z.object({
    states: z.array(state), highestKJPerMol: z.number(), highestStep: z.int(), highestRun: z.int(), reactionEnergyKJPerMol: z.number(),
    uHighestKJPerMol: z.object({ independent: z.number(), correlated: z.number() }).nullable(),
    spanKJPerMol: z.number().optional(), spanTransitionState: z.string().optional(), spanIntermediate: z.string().optional(),
    turnoverPerS: z.number().optional(), turnoverAllStatesPerS: z.number().optional(), turnoverRefusal: z.string().optional(),
    warnings: z.array(z.object({ code: z.string(), step: z.int(), message: z.string() })),
  }),
  calculate: ({ steps, cyclic, quantity, temperatureK }) => {
    if (temperatureK !== undefined) requireTemperature('temperatureK', temperatureK);
    const profile = energyProfile(steps);
    if (!cyclic) return profile;
    const span = energeticSpan(profile);
    const { turnoverPerS, turnoverAllStatesPerS, refusal, derivation } = spanTurnover(profile, quantity, temperatureK);
    return {
      ...profile, spanKJPerMol: span.spanKJPerMol, spanTransitionState: span.transitionState.name, spanIntermediate: span.intermediate.name,
      ...(turnoverPerS === null || turnoverAllStatesPerS === null ? {} : { turnoverPerS, turnoverAllStatesPerS }), ...(refusal === null ? {} : { turnoverRefusal: refusal }),
      derivation: [...profile.derivation, ...span.derivation, ...derivation],
    };
  },
});
