import { KineticsError } from './kinetics-error.ts';

/** A printed value that can't be read: where it stopped and what was expected there. */
export class PrintedValueError extends KineticsError {
  /** Position in the text as given, counted from 0. */
  readonly position: number;
  /** What was expected at that position. */
  readonly expected: string;

  constructor(text: string, position: number, expected: string, detail?: string) {
    const at = position >= text.length ? 'at the end' : `at position ${position + 1}`;
    super('asPrinted', detail ?? `cannot read ${JSON.stringify(clip(text))}: ${at}, expected ${expected}`, 'unreadable-value', text);
    this.name = 'PrintedValueError';
    this.position = position;
    this.expected = expected;
  }
}

function clip(text: string): string {
  return text.length > 80 ? `${text.slice(0, 77)}...` : text;
}

const superscripts: Record<string, string> = {
  '⁰': '0', '¹': '1', '²': '2', '³': '3', '⁴': '4', '⁵': '5', '⁶': '6', '⁷': '7', '⁸': '8', '⁹': '9', '⁻': '-', '⁺': '+', '·': '.', '⋅': '.',
};
const superscriptOnly = /[⁰¹²³⁴⁵⁶⁷⁸⁹⁻⁺]/u;

const plain: Record<string, string> = {
  '\u2212': '-', '\u2010': '-', '\u2011': '-', '\uFE63': '-', '\uFF0D': '-', '\u00a0': ' ', '\u2009': ' ', '\u202f': ' ', '\u2007': ' ', '\u2002': ' ', '\u2003': ' ', '\u200a': ' ',
  '\t': ' ', '\n': ' ', '\r': ' ', '⩽': '≤', '⩾': '≥', '≦': '≤', '≧': '≥', '≲': '≤', '≳': '≥', '∼': '≈', '~': '≈', '≃': '≈', '≅': '≈', '≂': '≈', '∓': '±', '\u2014': '\u2013', '\u2015': '\u2013', '\u2012': '\u2013',
  '✕': '×', '⨯': '×', '∙': '·', '⋅': '·', '•': '·',
};

/** Text in one spelling of its signs, with the position each character came from. */
export interface PlainText {
  text: string;
  /** Position in the original of each character, with the original's length at the end. */
  positions: number[];
}

/** Brings minus signs, spaces, relation signs and raised digits to one spelling; raised digits become `^` and digits. */
export function toPlainText(original: string): PlainText {
  let text = '';
  const positions: number[] = [];
  let raised = false;
  const put = (characters: string, position: number): void => {
    text += characters;
    for (let i = 0; i < characters.length; i += 1) positions.push(position);
  };
  for (let i = 0; i < original.length; i += 1) {
    const character = original[i] as string;
    if (superscriptOnly.test(character) || (raised && (character === '·' || character === '⋅') && superscriptOnly.test(original[i + 1] ?? ''))) {
      if (!raised) put('^', i);
      put(superscripts[character] as string, i);
      raised = true;
    } else {
      raised = false;
      put(plain[character] ?? character, i);
    }
  }
  positions.push(original.length);
  return { text, positions };
}

/** Reads a plain text from left to right; every failure carries the position in the original. */
export class Scanner {
  readonly original: string;
  readonly text: string;
  private readonly positions: number[];
  at = 0;

  constructor(original: string) {
    this.original = original;
    const plainText = toPlainText(original);
    this.text = plainText.text;
    this.positions = plainText.positions;
  }

  get rest(): string {
    return this.text.slice(this.at);
  }

  get atEnd(): boolean {
    return this.at >= this.text.length;
  }

  skipSpace(): void {
    while (this.text[this.at] === ' ') this.at += 1;
  }

  /** Takes a match of a sticky expression at this place, or null. */
  take(pattern: RegExp): RegExpExecArray | null {
    pattern.lastIndex = this.at;
    const match = pattern.exec(this.text);
    if (match) this.at += match[0].length;
    return match;
  }

  /** Looks without moving. */
  peek(pattern: RegExp): boolean {
    pattern.lastIndex = this.at;
    return pattern.test(this.text);
  }

  position(at: number = this.at): number {
    return this.positions[Math.min(at, this.positions.length - 1)] as number;
  }

  fail(expected: string, detail?: string, at: number = this.at): PrintedValueError {
    return new PrintedValueError(this.original, this.position(at), expected, detail);
  }
}
