import { isElement } from './elements.ts';
import { isNuclide } from './nuclides.ts';
import type { PlainText } from './plain-text.ts';
import type { Choices } from './readings.ts';

/** A term without its coefficient. */
export interface Counted {
  coefficient: number;
  rest: PlainText;
}

const mixed = /^(\d{1,4})\s+(\d{1,4})\s?\/\s?(\d{1,4})(?=\D|$)/;
const fraction = /^(?:\(\s?(?=[^)]*\)))?(\d+(?:\.\d+)?)\s?\/\s?(\d+)(?:\s?\))?(?=\D|$)/;
const decimal = /^(\d{0,6})[.,](\d{1,12})(?=\D|$)/;
const whole = /^(?:\((?=\d+\)\s))?(\d+)(?:(?<=^\(\d+)\))?/;
const times = /^\s*(?:[×·]|x(?=\s?[A-Z*([]))?\s*/;

/** Takes the coefficient off a term; a number that stands right before an element it labels can be read as a mass number. */
export function takeCoefficient(slice: PlainText, choices: Choices): Counted {
  const { text } = slice;
  const cut = (length: number): PlainText => ({ text: text.slice(length), positions: slice.positions.slice(length) });
  const found = mixed.exec(text) ?? fraction.exec(text) ?? decimal.exec(text) ?? whole.exec(text);
  if (!found) return { coefficient: 1, rest: slice };
  const after = (times.exec(text.slice(found[0].length)) as RegExpExecArray)[0];
  const rest = cut(found[0].length + after.length);
  if (mixed.test(text)) return { coefficient: Number(found[1]) + Number(found[2]) / Number(found[3]), rest: massNumber(rest) };
  if (fraction.test(text)) return { coefficient: Number(found[1]) / Number(found[2]), rest: massNumber(rest) };
  if (decimal.test(text)) return { coefficient: Number(`${found[1]}.${found[2]}`), rest: massNumber(rest) };
  const symbol = /^[A-Z][a-z]?/.exec(rest.text)?.[0] ?? '';
  const element = isElement(symbol) ? symbol : symbol.slice(0, 1);
  if (after === '' && isNuclide(`${found[1]}${element}`) && choices.pick('mass-number', ['isotope', 'coefficient']) === 'isotope') return { coefficient: 1, rest: massNumber(slice) };
  return { coefficient: Number(found[1]), rest: massNumber(rest) };
}

/** Raises a number at the start: after a coefficient it can only be a mass number. */
function massNumber(slice: PlainText): PlainText {
  return /^\d{1,3}[A-Z]/.test(slice.text) ? { text: `^${slice.text}`, positions: [slice.positions[0] as number, ...slice.positions] } : slice;
}
