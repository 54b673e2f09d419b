import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import type { Bound } from '#shared/domain/kinds.ts';
import { numberFromLn } from '#client/lib/log-number.ts';
import { energyIn, plainNumber, setNumber } from '#client/lib/numbers.ts';
import { valueText, type ValueProps } from '#client/ui/value.tsx';

/** One figure of a result, or words in its place. */
export interface Figure {
  label: string;
  /** Its letter; `_{}` and `^{}` set indices. */
  symbol?: string;
  value?: number | null;
  low?: number | null;
  high?: number | null;
  bound?: Bound;
  /** Natural logarithm of the value: shown in its place where the value itself leaves double precision. */
  ln?: number | null;
  u?: number | null;
  /** Uncertainty of the natural logarithm where `ln`. */
  uScale?: 'linear' | 'ln';
  unit?: string;
  /** In kJ/mol, and shown in the reader's unit. */
  energy?: true;
  /** Significant digits that are shown; four when not given. */
  digits?: number;
  /** Words in the place of a figure. */
  text?: string;
  /** An equation in the place of a figure. */
  equation?: string;
  /** Said after the figure. */
  note?: string;
}

/** The figure as the kit sets a value, an energy in the reader's unit. */
export function valueOf(figure: Figure, energyUnit: EnergyUnit): ValueProps {
  const { value = null, low, high, bound, u, uScale, energy, unit, digits = 4 } = figure;
  const inUnit = (number: number | null | undefined) => (energy && number != null ? energyIn(energyUnit, number) : number ?? null);
  return {
    value: inUnit(value), low: inUnit(low), high: inUnit(high), bound, uScale, u: uScale === 'ln' ? u : inUnit(u),
    unit: energy ? energyUnit : unit === '1' ? '' : unit, ...(u != null && uScale !== 'ln' ? {} : { digits }),
  };
}

/** Whether only the logarithm of a figure can be given in double precision. */
export function isBeyondDouble(figure: Figure): figure is Figure & { ln: number } {
  return figure.value == null && figure.ln != null;
}

/** The figure as text: "186.2 ± 2.9 kJ/mol". */
export function figureText(figure: Figure, energyUnit: EnergyUnit): string {
  const { text, equation } = figure;
  if (text !== undefined) return text;
  if (equation !== undefined) return equation;
  if (isBeyondDouble(figure)) return `${plainNumber(numberFromLn(figure.ln, 4))}${figure.unit ? ` ${figure.unit}` : ''} (ln = ${setNumber(figure.ln, { digits: 7 }).text})`;
  return valueText(valueOf(figure, energyUnit));
}
