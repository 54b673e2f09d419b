import * as z from 'zod';
import { readStep } from '../steps/parse-step.ts';
import { calculator } from './calculator.ts';

export const parseStepCalculator = calculator({
  name: 'parse-step',
  title: 'Read an elementary step',
  summary: 'Reads the equation of an elementary step in any common notation, balances it and finds its class.',
  formulas: ['CO* + * → C* + O*'],
  validity: 'Balanced for elements, isotopes, sites and charge. Half of all papers leave out the free site: it is offered, never added silently.',
  references: ['Balance of elements, sites and charge (common practice)'],
  input: z.strictObject({ text: z.string().max(500) }),
  output: z.object({
    key: z.string(), variantKey: z.string(), equation: z.string(), direction: z.union([z.literal(1), z.literal(-1)]), class: z.string(),
    reactants: z.array(z.unknown()), products: z.array(z.unknown()), gasOrder: z.number(), surfaceOrder: z.number(),
  }),
  calculate: ({ text }) => {
    const step = readStep(text);
    return { ...step, derivation: [{ operation: 'Read the equation', from: text, to: step.equation, reference: 'Balance of elements, isotopes, sites and charge' }] };
  },
});
