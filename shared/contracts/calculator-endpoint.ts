import * as z from 'zod';
import { endpoint } from './endpoint.ts';

const failure = z.object({ error: z.object({ path: z.string(), message: z.string() }) });

/** Most items of one batch; the batch counts as one call. */
export const mostItems = 1000;

/** The endpoint of a calculator: one object, or up to a thousand under `items`, answered in the same order. */
export function calculatorEndpoint<I extends z.ZodType, O extends z.ZodType>({ name, summary, input, output }: { name: string; summary: string; input: I; output: O }) {
  return endpoint({
    method: 'POST', path: `/calc/${name}`, access: 'visitor', csrf: false, summary,
    body: z.union([z.object({ items: z.array(z.unknown()).max(mostItems) }), input]),
    response: z.union([z.object({ items: z.array(z.union([output, failure])) }), output]),
  });
}
