import { PrintedValueError } from '#shared/kinetics/printed-text.ts';
import { readPrintedValue, type PrintedValue } from '#shared/kinetics/printed-value.ts';
import { findUnit } from '#shared/kinetics/units.ts';

/** A number as typed, or the sentence that says why it is none. */
export type TypedNumber = { value: number } | { fault: string };

/**
 * Reads one number as people type and print it: 1e13, 10^13, 1.0×10¹³, 26,4; a unit after it is taken when it is the field's own.
 * A limit, a range or an uncertainty is refused: a calculation takes one number.
 */
export function readTypedNumber(text: string, unit = ''): TypedNumber {
  let read: PrintedValue;
  try {
    read = readPrintedValue(text);
  } catch (error) {
    if (!(error instanceof PrintedValueError)) throw error;
    return { fault: sentence(/ambiguous|superscript/.test(error.message) ? error.message : `${quoted(text)} is not a number: write 0.0012, 1.2e-3 or 1.2×10^-3`) };
  }
  if (read.bound === 'range') return { fault: `${quoted(text)} is a range: a calculation takes one number.` };
  if (read.bound !== '=' || read.value === null) return { fault: `${quoted(text)} is a limit or an approximate value: a calculation takes one number, without a sign before it.` };
  if (read.reportedUncertainty !== null || read.reportedMinus !== null) return { fault: `${quoted(text)} has an uncertainty: the number alone belongs here.` };
  if (read.unit !== null && read.unit !== (findUnit(unit)?.symbol ?? unit)) {
    return { fault: unit ? `${quoted(text)} is in ${read.unit}, this field in ${unit}.` : `${quoted(text)} has a unit, and this field takes a number without one.` };
  }
  return { value: read.value };
}

const quoted = (text: string) => `"${text.trim().length > 30 ? `${text.trim().slice(0, 29)}…` : text.trim()}"`;

/** A message as a sentence: a capital at the start, a stop at the end. */
export function sentence(message: string): string {
  const text = message.trim();
  const first = text.charAt(0);
  // A letter that is a symbol ("k must be …") keeps its case.
  const start = /^[a-z][a-z]/.test(text) ? first.toUpperCase() + text.slice(1) : text;
  return /[.?]$/.test(start) ? start : `${start}.`;
}
