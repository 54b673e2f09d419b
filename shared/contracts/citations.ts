import * as z from 'zod';
import { calculatorEndpoint } from './calculator-endpoint.ts';
import { derivationLine } from './quantities.ts';

export const citeInput = z.strictObject({ bibtex: z.string().max(100_000).optional(), ris: z.string().max(100_000).optional(), doi: z.string().max(300).optional() })
  .refine((input) => Object.values(input).filter((text) => text !== undefined).length === 1, { message: 'Give the citation as exactly one of bibtex, ris and doi.', path: ['bibtex'] });
export type CiteInput = z.infer<typeof citeInput>;

/** Reads a citation and prints it in other forms; with the calculators, but only the server can do it. */
export const cite = calculatorEndpoint({
  name: 'cite', summary: 'Reads a citation and prints it in other forms.', input: citeInput,
  output: z.object({ csl: z.unknown(), bibtex: z.string(), ris: z.string(), key: z.string(), formatted: z.string(), derivation: z.array(derivationLine) }),
});
