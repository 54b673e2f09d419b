import * as z from 'zod';
import { poolModels } from '../kinetics/heterogeneity.ts';
import { poolIntervals, poolValues } from '../kinetics/pool.ts';
import { calculator } from './calculator.ts';

const interval = z.tuple([z.number(), z.number()]).nullable();

/** Each value is left out once and the rest pooled anew: the work grows with the square of the number. */
const mostValues = 100;

export const poolCalculator = calculator({
  name: 'pool',
  title: 'Pool values',
  summary: 'Pools several values of one quantity with their standard uncertainties: mean, scatter beyond the uncertainties, intervals, and each value left out in turn.',
  formulas: ['w = 1/(u^{2} + τ^{2})', 'Q = Σ (x − x̄)^{2}/u^{2}', 'I^{2} = max(0, (Q − k + 1)/Q)', 'x̄ ± t_{k−2} √(τ^{2} + 1/Σw)'],
  validity: 'One quantity in one unit: energies in kJ/mol, rate constants as ln k at one temperature; never a pooled A beside a pooled E. Every value needs a standard uncertainty. Values of one source are not independent: give them one group. With few values τ² is poorly known; restricted maximum likelihood with the Hartung–Knapp interval is the cautious choice. The prediction interval needs three values and is not given for a fixed effect, which allows for no variance between values.',
  references: [
    'Viechtbauer, J. Educ. Behav. Stat. 30 (2005) 261',
    'DerSimonian and Laird, Control. Clin. Trials 7 (1986) 177',
    'Paule and Mandel, J. Res. Natl. Bur. Stand. 87 (1982) 377',
    'Hartung and Knapp, Stat. Med. 20 (2001) 3875',
    'Higgins and Thompson, Stat. Med. 21 (2002) 1539',
    'Higgins, Thompson and Spiegelhalter, J. R. Stat. Soc. A 172 (2009) 137',
  ],
  input: z.strictObject({
    values: z.array(z.strictObject({ value: z.number(), u: z.number(), group: z.string().max(200).optional() })).max(mostValues),
    model: z.enum(poolModels).default('reml'),
    interval: z.enum(poolIntervals).default('hartung-knapp'),
  }),
  output: z.object({
    mean: z.number(), standardError: z.number(), modelStandardError: z.number(), tau2: z.number().nullable(), q: z.number(),
    i2Percent: z.number().nullable(), i2Tau2Percent: z.number().nullable(), birgeRatio: z.number().nullable(), interval, predictionInterval: interval,
    model: z.enum(poolModels), intervalKind: z.enum(poolIntervals), k: z.number(),
    members: z.array(z.object({ indices: z.array(z.number()), group: z.string().nullable(), value: z.number(), u: z.number(), weightPercent: z.number() })),
    leaveOneOut: z.array(z.object({ indices: z.array(z.number()), group: z.string().nullable(), mean: z.number(), standardError: z.number(), interval, tau2: z.number().nullable() })),
    warnings: z.array(z.object({ code: z.enum(['one-value', 'few-values', 'grouped', 'narrowed']), message: z.string() })),
  }),
  calculate: ({ values, model, interval: kind }) => poolValues(values, { model, interval: kind }),
});
