import { StepError } from './step-error.ts';

/** A piece of the typed text with where it stands. */
export interface Slice {
  text: string;
  /** Position in the typed text of each character, and of what follows the last. */
  positions: number[];
}

/** The two sides of an equation, split into terms. */
export interface SplitEquation {
  left: Slice[];
  right: Slice[];
}

const one: Record<string, string> = {
  '∗': '*', '＊': '*', '⁎': '*', '✱': '*', '﹡': '*', '□': '*', '☐': '*', '◻': '*', '−': '-', '–': '-', '‐': '-', '\u2011': '-', '\u00a0': ' ', '\u2009': ' ', '\u202f': ' ', '\t': ' ', '\n': ' ', '\r': ' ', '⁺': '^+', '⁻': '^-',
  '→': '->', '⟶': '->', '⇒': '->', '➔': '->', '➝': '->', '⟹': '->', '⇌': '<->', '⇋': '<->', '⇄': '<->', '⇆': '<->', '↔': '<->', '⟷': '<->', '⇔': '<->', '⟺': '<->', '←': '<-', '⟵': '<-', '½': '1/2 ', '¼': '1/4 ', '¾': '3/4 ', '⅓': '1/3 ', '⅔': '2/3 ', '＋': '+', '﹢': '+', '$': '', '\u200b': '', '\ufeff': '',
};
const lowered = '₀₁₂₃₄₅₆₇₈₉';
const raised = '⁰¹²³⁴⁵⁶⁷⁸⁹';
const raisedOf: Record<string, string> = { '⁰': '0', '¹': '1', '²': '2', '³': '3', '⁴': '4', '⁵': '5', '⁶': '6', '⁷': '7', '⁸': '8', '⁹': '9' };

interface Mapped {
  text: string;
  positions: number[];
}

function toPlain(original: string): Mapped {
  let text = '';
  const positions: number[] = [];
  let inRaised = false;
  const put = (characters: string, position: number): void => {
    text += characters;
    for (let i = 0; i < characters.length; i += 1) positions.push(position);
  };
  for (let i = 0; i < original.length; i += 1) {
    const character = original[i] as string;
    if (raised.includes(character)) {
      put(inRaised ? (raisedOf[character] as string) : `^${raisedOf[character]}`, i);
      inRaised = true;
      continue;
    }
    if (inRaised && (character === '⁺' || character === '⁻')) put(character === '⁺' ? '+' : '-', i);
    else if (lowered.includes(character)) put(String(lowered.indexOf(character)), i);
    else if (character === '½' && /\d$/.test(text)) put('.5', i);
    else put(one[character] ?? character, i);
    inRaised = false;
  }
  positions.push(original.length);
  return { text, positions };
}

/** Replaces matches and keeps the positions of what stays. */
function replaceMapped(mapped: Mapped, pattern: RegExp, replacement: (match: RegExpExecArray) => string): Mapped {
  let text = '';
  const positions: number[] = [];
  let last = 0;
  const copy = (from: number, to: number): void => {
    text += mapped.text.slice(from, to);
    for (let i = from; i < to; i += 1) positions.push(mapped.positions[i] as number);
  };
  for (const match of mapped.text.matchAll(pattern)) {
    copy(last, match.index);
    const added = replacement(match as unknown as RegExpExecArray);
    text += added;
    for (let i = 0; i < added.length; i += 1) positions.push(mapped.positions[match.index] as number);
    last = match.index + match[0].length;
  }
  copy(last, mapped.text.length);
  positions.push(mapped.positions.at(-1) as number);
  return { text, positions };
}

const commands: [RegExp, string][] = [
  [/\\(?:rightleftharpoons|leftrightarrows?|leftrightharpoons)(?![a-z])/g, '<->'],
  [/\\(?:long)?(?:rightarrow|to)(?![a-z])/g, '->'],
  [/\\(?:ast|star)(?![a-z])/g, '*'],
];

function clean(original: string): Mapped {
  let mapped = toPlain(original);
  for (const [pattern, text] of commands) mapped = replaceMapped(mapped, pattern, () => text);
  mapped = replaceMapped(mapped, /\\(?:mathrm|text|ce)\{([^{}]*)\}/g, (match) => match[1] as string);
  mapped = replaceMapped(mapped, /\^\{?\s?(\*+)\s?\}?/g, (match) => match[1] as string);
  return replaceMapped(mapped, /_(?:(\d+)|\{(\d+)\})/g, (match) => (match[1] ?? match[2]) as string);
}

const arrow = /<[-=]+>|[-=]+>|<-+|<=+/g;

/** Splits an equation at its arrow and its plus signs. Throws a `StepError` when there is no arrow, more than one, or nothing on a side. */
export function splitEquation(original: string): SplitEquation {
  if (original.length > 400) throw new StepError('unreadable', 'an equation has at most 400 characters', { position: 400 });
  const mapped = clean(original);
  let found = [...mapped.text.matchAll(arrow)];
  if (found.length === 0) found = [...mapped.text.matchAll(/=+/g)];
  const first = found[0];
  if (!first) throw new StepError('no-arrow', 'no arrow: write -> between reactants and products', { position: original.length });
  if (found.length > 1) {
    throw new StepError('unreadable', 'more than one arrow: write one elementary step at a time', { position: mapped.positions[(found[1] as RegExpMatchArray).index as number] });
  }
  const at = first.index as number;
  const left = splitSide(mapped, 0, at);
  const right = splitSide(mapped, at + first[0].length, mapped.text.length);
  const backwards = first[0].startsWith('<') && !first[0].endsWith('>');
  return backwards ? { left: right, right: left } : { left, right };
}

/** A plus belongs to a charge when it is raised, or stands on a species and another plus, a bracket or the end follows. */
function isCharge(text: string, at: number, end: number): boolean {
  const before = text.slice(0, at);
  if (/\^\{?\d*$/.test(before)) return true;
  const touches = at > 0 && /[A-Za-z0-9)\]]/.test(text[at - 1] as string);
  return touches && /^\s*(?:\+|$|\((?:g|gas|aq|a|ads)\))/.test(text.slice(at + 1, end)) && !/^\s+\+?\s*$/.test(text.slice(at + 1, end));
}

function splitSide(mapped: Mapped, start: number, end: number): Slice[] {
  const slices: Slice[] = [];
  let from = start;
  let depth = 0;
  const close = (to: number): void => {
    const raw = mapped.text.slice(from, to);
    const text = raw.trim();
    const begin = from + raw.length - raw.trimStart().length;
    if (text === '') throw new StepError('empty-side', 'a species is missing here', { position: mapped.positions[begin] });
    slices.push({ text, positions: mapped.positions.slice(begin, begin + text.length + 1) });
  };
  for (let i = start; i < end; i += 1) {
    const character = mapped.text[i];
    if (character === '(' || character === '[') depth += 1;
    else if (character === ')' || character === ']') depth = Math.max(0, depth - 1);
    else if (character === '+' && depth === 0 && !isCharge(mapped.text, i, end)) {
      close(i);
      from = i + 1;
    }
  }
  close(end);
  return slices;
}
