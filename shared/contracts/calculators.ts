import * as z from 'zod';
import { endpoint } from './endpoint.ts';
import { derivationLine } from './quantities.ts';

const finite = z.number();

/** One object, or up to a thousand of them under `items`, answered in the same order. */
function calculator<I extends z.ZodObject, O extends z.ZodObject>(name: string, summary: string, input: I, output: O) {
  const result = output.extend({ derivation: z.array(derivationLine) });
  const failure = z.object({ error: z.object({ path: z.string(), message: z.string() }) });
  return {
    name, input, result,
    endpoint: endpoint({
      method: 'POST', path: `/calc/${name}`, access: 'visitor', csrf: false, summary,
      body: z.union([z.object({ items: z.array(z.unknown()).max(1000) }), input]),
      response: z.union([z.object({ items: z.array(z.union([result, failure])) }), result]),
    }),
  };
}

export const parseValueCalculator = calculator('parse-value', 'Read a value as papers print it',
  z.object({ text: z.string().max(200), unit: z.string().max(80).optional() }),
  z.object({
    value: z.number().nullable(), low: z.number().nullable(), high: z.number().nullable(), bound: z.string(),
    reportedUncertainty: z.number().nullable(), reportedMinus: z.number().nullable(), reportedPlus: z.number().nullable(),
    uncertaintyKind: z.string(), uncertaintyScale: z.string(), standardUncertainty: z.number().nullable(),
    significantDigits: z.number().nullable(), unit: z.string().nullable(),
  }));

export const energyCalculator = calculator('energy', 'Convert an energy',
  z.object({ value: finite, from: z.string().max(40), to: z.string().max(40), standardUncertainty: finite.nonnegative().optional() }),
  z.object({ value: z.number(), unit: z.string(), standardUncertainty: z.number().nullable() }));

export const rateConstantCalculator = calculator('rate-constant', 'Convert a rate constant at one temperature',
  z.object({
    value: finite, from: z.string().max(80), to: z.string().max(80), temperatureK: finite.optional(), siteDensityPerM2: finite.optional(),
    standardUncertainty: finite.nonnegative().optional(),
  }),
  z.object({ value: z.number(), unit: z.string(), assumptions: z.array(z.string()) }));

export const arrheniusCalculator = calculator('arrhenius', 'The rate constant at a temperature',
  z.object({
    preExponential: finite, exponent: finite.default(0), referenceTemperatureK: finite.default(1), energyKJPerMol: finite, temperatureK: finite,
    uLnPreExponential: finite.optional(), uEnergyKJPerMol: finite.optional(), correlation: finite.optional(),
  }),
  z.object({
    k: z.number().nullable(), lnK: z.number(), localEnergyKJPerMol: z.number(), uLnK: z.number().nullable(), uLnKRange: z.tuple([z.number(), z.number()]).nullish(),
  }));

export const parseStepCalculator = calculator('parse-step', 'Read the equation of an elementary step',
  z.object({ text: z.string().max(500) }),
  z.object({
    key: z.string(), variantKey: z.string(), equation: z.string(), direction: z.union([z.literal(1), z.literal(-1)]), class: z.string(),
    reactants: z.array(z.unknown()), products: z.array(z.unknown()), gasOrder: z.number(), surfaceOrder: z.number(),
  }));

export const citeCalculator = calculator('cite', 'Read a citation and print it in other forms',
  z.object({ bibtex: z.string().max(100_000).optional(), ris: z.string().max(100_000).optional(), doi: z.string().max(300).optional() }),
  z.object({ csl: z.unknown(), bibtex: z.string(), ris: z.string(), key: z.string(), formatted: z.string() }));
