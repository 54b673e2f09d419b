import * as z from 'zod';
import { bondOrderBarrier, bondOrderForms, bondOrderStarts } from '../kinetics/bond-order.ts';
import { calculator } from './calculator.ts';

const common = {
  form: z.enum(bondOrderForms), interpolation: z.number().default(0.5), dissociationEnergy: z.number(), heatA: z.number(), heatAB: z.number().optional(),
  from: z.enum(bondOrderStarts), unit: z.string().max(40),
};

export const bondOrderCalculator = calculator({
  name: 'bond-order',
  title: 'Estimate a barrier by bond-order conservation',
  summary: 'Estimates the barrier of a dissociation or an exchange on a surface from bond energies and heats of adsorption.',
  formulas: [
    'ΔH = D_{AB} + Q_{AB} − Q_{A} − Q_{B}',
    'E_{ads} = ΔH + Q_{A}Q_{B}/(Q_{A} + Q_{B}), early form',
    'E_{ads} = φ [ΔH + Q_{A}Q_{B}/(Q_{A} + Q_{B})], interpolated',
    'E_{gas} = E_{ads} − Q_{AB}',
    'AB* + C* → A* + BC*: ΔH = D_{AB} − D_{BC} + Q_{AB} + Q_{C} − Q_{A} − Q_{BC}, with Q_{BC} for Q_{B}',
  ],
  validity: 'An estimate from a model with two-body terms at zero coverage, shown beside literature values and never stored as one. The dissociation energy is that of the bond that breaks, not of the whole molecule. Never below 0 or the reaction energy. In an exchange the product that holds B is BC, whose heat is asked for (that of B is read in its place). The interpolated form and the exchange are recalled from memory and not checked against the text.',
  references: ['Shustorovich, Surf. Sci. Rep. 6 (1986) 1', 'Shustorovich, Adv. Catal. 37 (1990) 101', 'Shustorovich and Sellers, Surf. Sci. Rep. 31 (1998) 1'],
  input: z.discriminatedUnion('process', [
    z.strictObject({ process: z.literal('dissociation'), ...common, heatB: z.number() }),
    z.strictObject({ process: z.literal('exchange'), ...common, formedBondEnergy: z.number(), heatB: z.number().optional(), heatBC: z.number().optional(), heatC: z.number() }),
  ]),
  output: z.object({
    barrier: z.number(), reverseBarrier: z.number(), reactionEnergy: z.number(), unboundedBarrier: z.number(), unboundedReverseBarrier: z.number(),
    bound: z.enum(['none', 'zero', 'reaction-energy']), unit: z.string(),
  }),
  calculate: (input) => bondOrderBarrier(input),
});
