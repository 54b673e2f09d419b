import * as z from 'zod';
import { derivationLine } from '../contracts/quantities.ts';
import { KineticsError } from '../kinetics/kinetics-error.ts';
import { StepError } from '../steps/parse-step.ts';

/** One calculation with everything that is said about it: computed alike on the Workbench and over HTTP. */
export interface Calculator<Input extends z.ZodType = z.ZodType, Output extends z.ZodType = z.ZodType> {
  /** Name in addresses, `/calc/<name>` and `/workbench/<name>`. */
  readonly name: string;
  readonly title: string;
  /** What it answers, in one sentence. */
  readonly summary: string;
  /** The formulas; `_{}` and `^{}` set indices. */
  readonly formulas: readonly string[];
  /** Where the result holds and where it does not. */
  readonly validity: string;
  /** The published sources of the formulas. */
  readonly references: readonly string[];
  readonly input: Input;
  /** The result with its derivation. */
  readonly output: Output;
  calculate(input: z.output<Input>): z.input<Output>;
}

/** Declares a calculator; adds the derivation to its output. */
export function calculator<Input extends z.ZodType, Output extends z.ZodObject>(
  declaration: Omit<Calculator<Input, Output>, 'calculate'> & { calculate: (input: z.output<Input>) => z.input<Output> & { derivation: z.input<typeof derivationLine>[] } },
) {
  return { ...declaration, output: declaration.output.extend({ derivation: z.array(derivationLine) }) };
}

/** Why a calculation was refused: which input, what is wrong with it. */
export interface CalculationFault {
  path: string;
  message: string;
  /** What a reader of equations adds: the imbalance, the place, a suggestion. */
  context?: Record<string, unknown>;
}

/** A result, or every fault that was found. */
export type Calculation = { result: Record<string, unknown> } | { faults: CalculationFault[] };

/**
 * Checks an input and calculates; what is meaningless comes back as faults that name the input.
 *
 * A result that leaves the range of double precision is a fault too: nothing returns NaN or infinity.
 */
export function runCalculator(one: Calculator, raw: unknown): Calculation {
  const parsed = one.input.safeParse(raw);
  if (!parsed.success) return { faults: parsed.error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message })) };
  try {
    const result = one.calculate(parsed.data) as Record<string, unknown>;
    const lost = notFinite(result);
    if (lost) return { faults: [{ path: lost, message: `${lost} leaves the range of double precision for this input.` }] };
    return { result };
  } catch (error) {
    if (error instanceof KineticsError) return { faults: [{ path: error.path, message: error.message }] };
    if (error instanceof StepError) {
      const { code, imbalance, suggestion, position } = error;
      return { faults: [{ path: 'text', message: error.message, context: { code, imbalance, suggestion, position } }] };
    }
    throw error;
  }
}

/** Where a result holds a number that is not finite; null when it holds none. */
function notFinite(value: unknown, path = ''): string | null {
  if (typeof value === 'number') return Number.isFinite(value) ? null : path;
  if (value === null || typeof value !== 'object') return null;
  for (const [name, part] of Object.entries(value)) {
    const found = notFinite(part, path ? `${path}.${name}` : name);
    if (found !== null) return found;
  }
  return null;
}
