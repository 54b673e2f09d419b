import * as z from 'zod';
import { printedLine, readingText } from '../kinetics/derivation.ts';
import { KineticsError } from '../kinetics/kinetics-error.ts';
import { PrintedValueError, readPrintedValue, type PrintedValue } from '../kinetics/printed-value.ts';
import { calculator } from './calculator.ts';

/** The reader calls its text `asPrinted`, as an entry does; here the input is `text`. */
function reading(text: string, unit: string | undefined): PrintedValue {
  try {
    return readPrintedValue(text, unit);
  } catch (error) {
    if (error instanceof PrintedValueError) throw new KineticsError('text', error.message, error.code, text);
    throw error;
  }
}

export const parseValueCalculator = calculator({
  name: 'parse-value',
  title: 'Read a printed value',
  summary: 'Reads a value the way papers print it: central value, interval, bound, uncertainty and its kind.',
  formulas: ['26.4(12) → 26.4, u = 1.2', '10^{13.5±0.4} → u(ln A) = 0.4 ln 10'],
  validity: 'A bare ± stays unknown until somebody says what it stands for; nothing is taken for granted about the last digit.',
  references: ['JCGM 100:2008 (GUM) 7.2.2'],
  input: z.strictObject({ text: z.string().max(200), unit: z.string().max(80).optional() }),
  output: z.object({
    value: z.number().nullable(), low: z.number().nullable(), high: z.number().nullable(), bound: z.string(),
    reportedUncertainty: z.number().nullable(), reportedMinus: z.number().nullable(), reportedPlus: z.number().nullable(),
    uncertaintyKind: z.string(), uncertaintyScale: z.string(), standardUncertainty: z.number().nullable(),
    significantDigits: z.number().nullable(), unit: z.string().nullable(),
  }),
  calculate: ({ text, unit }) => {
    const value = reading(text, unit);
    return { ...value, derivation: [printedLine(text, value.unit, readingText(value, value.unit ?? ''))] };
  },
});
