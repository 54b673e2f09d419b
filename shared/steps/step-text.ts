import { plainEquation } from './markup.ts';
import { slicePlain, type PlainText } from './plain-text.ts';
import { Choices } from './readings.ts';
import { StepError } from './step-error.ts';

/** The two sides of an equation, split into terms. */
export interface SplitEquation {
  left: PlainText[];
  right: PlainText[];
}

const arrow = /<[-=]+>{1,2}|<<=+>|[-=]+>{1,2}|<-+|<=+/g;

/** Where the arrow stands. An equals sign is one when nothing else is; between letters it may be a double bond, so one with room about it goes first. */
function findArrows(text: string): RegExpMatchArray[] {
  const arrows = [...text.matchAll(arrow)];
  if (arrows.length > 0) return arrows;
  const equals = [...text.matchAll(/=+/g)];
  const apart = equals.filter((match) => /\s/.test(text[match.index - 1] ?? ' ') && /\s/.test(text[match.index + match[0].length] ?? ' '));
  return apart.length === 1 ? apart : equals;
}

/** What tables have before an equation: a quotation mark, `R1:`, `(R12)`, `(3)`, `4)`. */
const label = /^\s*["'`“‘]?(?:(?:\(\s*R?\s?\d{1,3}[a-z]?\s*\)[.:]?|R\s?\d{1,3}[a-z]?\s*[.:)]|\d{1,3}[a-z]?\s*[:)])\s+(?=\S))?/i;

/** Splits an equation at its arrow and its plus signs. Throws a `StepError` when there is no arrow, more than one, or nothing on a side. */
export function splitEquation(original: string, choices: Choices = new Choices()): SplitEquation {
  if (original.length > 400) throw new StepError('unreadable', 'an equation has at most 400 characters', { position: 400 });
  const whole = plainEquation(original);
  const before = (label.exec(whole.text) as RegExpExecArray)[0];
  // (2) before an equation is its number, or the coefficient of the first species.
  const start = /^\s*\(\d+\)\s/.test(before) && choices.pick('number-in-brackets', ['label', 'coefficient']) === 'coefficient' ? 0 : before.length;
  const end = whole.text.length - (/(?:\s+\(R?\d{1,3}[a-z]?\))?[\s.,;"'`”’]*$/i.exec(whole.text) as RegExpExecArray)[0].length;
  const plain = start > 0 || end < whole.text.length ? { text: whole.text.slice(start, Math.max(start, end)), positions: whole.positions.slice(start) } : whole;
  const found = findArrows(plain.text);
  const first = found[0];
  if (!first) throw new StepError('no-arrow', 'no arrow: write -> between reactants and products', { position: original.length });
  if (found.length > 1) {
    throw new StepError('unreadable', 'more than one arrow: write one elementary step at a time', { position: plain.positions[(found[1] as RegExpMatchArray).index as number] });
  }
  // e--> is an electron and an arrow.
  const at = (first.index as number) + (/(?:^|[\s+\d])e$/.test(plain.text.slice(0, first.index)) && first[0].startsWith('--') ? 1 : 0);
  const left = splitSide(plain, 0, at);
  const right = splitSide(plain, (first.index as number) + first[0].length, plain.text.length);
  const backwards = first[0].startsWith('<') && !first[0].endsWith('>');
  return backwards ? { left: right, right: left } : { left, right };
}

/** A plus belongs to a charge when it is raised, or stands on a species and another plus, a phase or the end follows. */
function isCharge(text: string, at: number, end: number, second: boolean): boolean {
  if (/\^\{?\d*$/.test(text.slice(Math.max(0, at - 6), at))) return true;
  const rest = text.slice(at + 1, end);
  if (second) return /^\s*(?:\+|$)/.test(rest);
  const touches = at > 0 && /[A-Za-z0-9)\]]/.test(text[at - 1] as string);
  return touches && /^\s*(?:\+|$|\((?:g|gas|aq|a|ads|ad)\))/.test(rest);
}

function splitSide(plain: PlainText, start: number, end: number): PlainText[] {
  const slices: PlainText[] = [];
  let from = start;
  let depth = 0;
  let charged = -2;
  const close = (to: number): void => {
    const slice = slicePlain(plain, from, to);
    if (slice.text === '') throw new StepError('empty-side', 'a species is missing here', { position: slice.positions[0] });
    slices.push(slice);
  };
  for (let i = start; i < end; i += 1) {
    const character = plain.text[i] as string;
    if ('([{'.includes(character)) depth += 1;
    else if (')]}'.includes(character)) depth = Math.max(0, depth - 1);
    else if (character === '+' && depth === 0) {
      if (isCharge(plain.text, i, end, charged === i - 1)) charged = i;
      else {
        close(i);
        from = i + 1;
      }
    }
  }
  close(end);
  return slices;
}
