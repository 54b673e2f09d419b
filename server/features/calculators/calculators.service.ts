import type * as z from 'zod';
import { Refusal } from '#server/refusal.ts';
import { formatCitation, readBibtex, readRis, writeBibtex, writeRis } from '#server/services/citation/citation.ts';
import { citationKey } from '#shared/citations/citation-key.ts';
import type * as contract from '#shared/contracts/calculators.ts';
import { rateAt } from '#shared/kinetics/arrhenius.ts';
import { printedLine } from '#shared/kinetics/derivation.ts';
import { convertEnergy } from '#shared/kinetics/energy.ts';
import { KineticsError } from '#shared/kinetics/kinetics-error.ts';
import { readPrintedValue } from '#shared/kinetics/printed-value.ts';
import { convertRateConstant } from '#shared/kinetics/rate-constant.ts';
import { readStep, StepError } from '#shared/steps/parse-step.ts';

type Input<C extends { input: z.ZodType }> = z.output<C['input']>;

async function cite(input: Input<typeof contract.citeCalculator>) {
  const text = input.bibtex ?? input.ris;
  if (!text) throw new Refusal('invalid-input', 'Give the citation as BibTeX or RIS.', { errors: [{ path: 'bibtex', message: 'Give the citation as BibTeX or RIS.' }] });
  const { entries, problems } = input.bibtex ? await readBibtex(input.bibtex) : await readRis(text);
  const [csl] = entries;
  if (!csl) {
    const message = problems[0] ? `Line ${problems[0].line}: ${problems[0].message}` : 'No citation was found in the text.';
    throw new Refusal('invalid-input', message, { errors: [{ path: input.bibtex ? 'bibtex' : 'ris', message }] });
  }
  const key = citationKey(csl);
  return {
    csl, key, bibtex: await writeBibtex(csl, key), ris: await writeRis(csl), formatted: await formatCitation(csl),
    derivation: [{ operation: 'Read the citation', from: input.bibtex ? 'BibTeX' : 'RIS', to: 'CSL-JSON', reference: 'CSL-JSON 1.0.2' }],
  };
}

const calculators: Readonly<Record<string, (input: never) => unknown>> = {
  'parse-value': ({ text, unit }: Input<typeof contract.parseValueCalculator>) => {
    const value = readPrintedValue(text, unit);
    return { ...value, derivation: [printedLine(text, value.unit, String(value.value ?? value.low ?? value.high))] };
  },
  'energy': (input: Input<typeof contract.energyCalculator>) => convertEnergy(input),
  'rate-constant': (input: Input<typeof contract.rateConstantCalculator>) => convertRateConstant(input),
  'arrhenius': (input: Input<typeof contract.arrheniusCalculator>) => {
    const result = rateAt(input);
    return { ...result, k: Number.isFinite(result.k) && result.k > 0 ? result.k : null };
  },
  'parse-step': ({ text }: Input<typeof contract.parseStepCalculator>) => {
    const step = readStep(text);
    return { ...step, derivation: [{ operation: 'Read the equation', from: text, to: step.equation, reference: 'Balance of elements, isotopes, sites and charge' }] };
  },
  'cite': cite,
};

/** Runs a calculator by its name. @throws Refusal naming the part of the input that is not right. */
export async function calculate(name: string, input: unknown): Promise<unknown> {
  try {
    return await calculators[name]?.(input as never);
  } catch (error) {
    if (error instanceof KineticsError) throw new Refusal('invalid-input', error.message, { errors: [{ path: error.path, message: error.message }] });
    if (error instanceof StepError) {
      throw new Refusal('invalid-input', error.message, { errors: [{ path: 'text', message: error.message }], context: { code: error.code, imbalance: error.imbalance, suggestion: error.suggestion, position: error.position } });
    }
    throw error;
  }
}
