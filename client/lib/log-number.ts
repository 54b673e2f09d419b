import { setNumber, type SetNumber } from './numbers.ts';

/** The number whose natural logarithm is given, ready to be set with a power of ten; right also where the number itself is too large or too small for a double. */
export function numberFromLn(ln: number, digits = 3): SetNumber {
  if (!Number.isFinite(ln)) return setNumber(Math.exp(ln));
  const log10 = ln / Math.LN10;
  const exponent = Math.floor(log10);
  const rounded = Number((10 ** (log10 - exponent)).toFixed(digits - 1));
  return rounded >= 10
    ? { text: (rounded / 10).toFixed(digits - 1), exponent: exponent + 1 }
    : { text: rounded.toFixed(digits - 1), exponent };
}
