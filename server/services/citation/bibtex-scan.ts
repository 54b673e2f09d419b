/** What was wrong with one place of a bibliography file, for the person who sent it. */
export type ReadingProblem = { line: number; message: string };

/** One entry of a BibTeX file before its TeX is read. */
export type BibtexEntry = { line: number; type: string; key: string; fields: ReadonlyMap<string, string> };

/** What a BibTeX file holds. */
export type BibtexScan = { entries: BibtexEntry[]; problems: ReadingProblem[] };

/** Bounds on a file, so that no paste can hold the server up; beyond them a problem says so. */
export const bibtexBounds = { text: 2_000_000, entry: 100_000, entries: 5_000, field: 20_000, fields: 200, problems: 200, depth: 200 } as const;

const months: readonly (readonly [string, string])[] = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec']
  .map((month, index) => [month, String(index + 1)] as const);

/** Raised inside one entry only and turned into a problem; it never leaves this module. */
class EntryError extends Error {
  readonly at: number;

  constructor(at: number, message: string) {
    super(message);
    this.at = at;
  }
}

/** Reads the inside of one entry, whose text was cut out of the file beforehand. */
class EntryScanner {
  at: number;
  private readonly text: string;
  private readonly strings: ReadonlyMap<string, string>;

  constructor(text: string, at: number, strings: ReadonlyMap<string, string>) {
    this.text = text;
    this.at = at;
    this.strings = strings;
  }

  space(): void {
    while (/\s/.test(this.text[this.at] ?? '')) this.at += 1;
  }

  peek(): string {
    return this.text[this.at] ?? '';
  }

  word(): string {
    const start = this.at;
    while (this.at < this.text.length && !/[\s"#%'(),={}]/.test(this.peek())) this.at += 1;
    return this.text.slice(start, this.at);
  }

  /** The entry's key up to its comma; a key is missing when a field follows at once. */
  key(): string {
    this.space();
    const rest = this.text.slice(this.at, this.at + 400);
    const match = /^([^,{}=\s]*)\s*(,|\}|\)|$)/.exec(rest);
    if (match === null) {
      if (/^[A-Za-z][\w:+.-]*\s*=/.test(rest)) return '';
      throw new EntryError(this.at, 'The key of the entry must be one word followed by a comma');
    }
    this.at += match[1]?.length ?? 0;
    this.space();
    if (this.peek() === ',') this.at += 1;
    return (match[1] ?? '').slice(0, 200);
  }

  fields(close: string): Map<string, string> {
    const fields = new Map<string, string>();
    for (;;) {
      this.space();
      while (this.peek() === ',') {
        this.at += 1;
        this.space();
      }
      if (this.peek() === close) return fields;
      if (this.at >= this.text.length) throw new EntryError(this.at, 'The entry is not closed: a brace or bracket is missing');
      const start = this.at;
      const name = this.word().toLowerCase();
      if (name === '') throw new EntryError(start, `Expected a field name, found "${this.peek()}"`);
      this.space();
      if (this.peek() !== '=') throw new EntryError(start, `Expected "=" after the field name "${name.slice(0, 40)}"; a comma may be missing before it`);
      this.at += 1;
      const value = this.value(name);
      if (!fields.has(name)) fields.set(name, value);
      if (fields.size > bibtexBounds.fields) throw new EntryError(start, `The entry has more than ${bibtexBounds.fields} fields`);
      this.space();
      if (this.peek() !== ',' && this.peek() !== close && this.at < this.text.length) {
        throw new EntryError(this.at, `Expected a comma or the end of the entry after the field "${name.slice(0, 40)}"`);
      }
    }
  }

  value(name: string): string {
    let value = '';
    for (;;) {
      this.space();
      value += this.piece(name);
      if (value.length > bibtexBounds.field) throw new EntryError(this.at, `The field "${name.slice(0, 40)}" is longer than ${bibtexBounds.field} characters`);
      this.space();
      if (this.peek() !== '#') return value;
      this.at += 1;
    }
  }

  private piece(name: string): string {
    const open = this.peek();
    if (open === '{') return this.delimited('}');
    if (open === '"') return this.delimited('"');
    const word = this.word();
    if (word === '') throw new EntryError(this.at, `The field "${name.slice(0, 40)}" has no value`);
    if (/^\d+$/.test(word)) return word;
    const text = this.strings.get(word.toLowerCase());
    if (text === undefined) throw new EntryError(this.at, `The abbreviation "${word.slice(0, 40)}" is not defined in this text`);
    return text;
  }

  /** BibTeX counts braces whether or not a backslash stands before them, and so do we. */
  private delimited(close: '}' | '"'): string {
    const start = this.at + 1;
    let level = 0;
    for (let at = start; at < this.text.length; at += 1) {
      const character = this.text[at];
      if (level === 0 && character === close) {
        this.at = at + 1;
        return this.text.slice(start, at);
      }
      if (character === '{') level += 1;
      else if (character === '}') level -= 1;
      if (level > bibtexBounds.depth) throw new EntryError(at, `Braces are nested more than ${bibtexBounds.depth} deep`);
      if (level < 0) throw new EntryError(at, 'A closing brace has no opening one');
    }
    throw new EntryError(start, 'The entry is not closed: a brace or quotation mark is missing');
  }
}

/** Start of an entry at the start of a line. One broken entry ends at the latest where the next of these begins. */
const entryStart = /^[ \t]*@[ \t]*([A-Za-z]+)[ \t\r\n]*([{(])/gm;
const inlineStart = /@\s*([A-Za-z]+)\s*([{(])/g;

/** Cuts the text at the entries, each piece with the line it begins on. */
function pieces(text: string): { text: string; line: number }[] {
  const starts = [...text.matchAll(entryStart)].map((match) => match.index);
  const cuts = starts[0] === 0 ? starts : [0, ...starts];
  let line = 1;
  let counted = 0;
  return cuts.map((from, index) => {
    for (; counted < from; counted += 1) if (text.charCodeAt(counted) === 10) line += 1;
    return { text: text.slice(from, cuts[index + 1] ?? text.length), line };
  });
}

/** Counts lines as a position moves forward, so that a long file is walked once. */
class LineCounter {
  private position = 0;
  private readonly text: string;
  private line: number;

  constructor(text: string, firstLine: number) {
    this.text = text;
    this.line = firstLine;
  }

  at(position: number): number {
    const end = Math.min(position, this.text.length);
    for (; this.position < end; this.position += 1) if (this.text.charCodeAt(this.position) === 10) this.line += 1;
    return this.line;
  }
}

/**
 * Splits a BibTeX file into entries with their raw field values; a broken entry becomes a problem and spoils no other.
 *
 * Understands `@string` with `#`, month abbreviations, `@comment` and `@preamble` (passed over), round or curly outer brackets.
 * Never throws; sizes are bounded by `bibtexBounds`.
 */
export function scanBibtex(text: string): BibtexScan {
  const entries: BibtexEntry[] = [];
  const problems: ReadingProblem[] = [];
  if (text.length > bibtexBounds.text) {
    return { entries, problems: [{ line: 1, message: `The text is longer than ${bibtexBounds.text} characters. Split it.` }] };
  }
  const strings = new Map<string, string>(months);
  for (const piece of pieces(text.replace(/^\uFEFF/, ''))) {
    inlineStart.lastIndex = 0;
    const lines = new LineCounter(piece.text, piece.line);
    for (let start = inlineStart.exec(piece.text); start !== null; start = inlineStart.exec(piece.text)) {
      const type = (start[1] ?? '').toLowerCase();
      if (problems.length >= bibtexBounds.problems) {
        problems.push({ line: piece.line, message: `There are more than ${bibtexBounds.problems} problems. The text from here on was not read.` });
        return { entries, problems };
      }
      const line = lines.at(start.index);
      if (type === 'comment') continue;
      if (entries.length >= bibtexBounds.entries) {
        problems.push({ line, message: `The text holds more than ${bibtexBounds.entries} entries. Split it.` });
        return { entries, problems };
      }
      const scanner = new EntryScanner(piece.text.slice(0, start.index + bibtexBounds.entry), start.index + start[0].length, strings);
      const close = start[2] === '{' ? '}' : ')';
      let key = '';
      try {
        if (type === 'preamble') {
          scanner.value('preamble');
        } else if (type === 'string') {
          for (const [name, value] of scanner.fields(close)) strings.set(name, value);
        } else {
          key = scanner.key();
          entries.push({ line, type, key, fields: scanner.fields(close) });
        }
        inlineStart.lastIndex = scanner.at;
      } catch (error) {
        if (!(error instanceof EntryError)) throw error;
        const name = key === '' ? 'The entry' : `Entry "${key.slice(0, 60)}"`;
        problems.push({ line: lines.at(error.at), message: `${name} from line ${line} was passed over. ${error.message}.` });
        // What follows a break up to the next entry at the start of a line can't be told apart from its fields.
        break;
      }
    }
  }
  return { entries, problems };
}
