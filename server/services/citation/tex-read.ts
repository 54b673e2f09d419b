import { richTextSource, taggedScripts, richText } from '#shared/citations/rich-text.ts';
import { accents, markCommands, mathSymbols, plainCommands, silentCommands, spaceCommands, textSymbols } from './tex-symbols.ts';
import { chemistryToTex } from './tex-chemistry.ts';

const accentMarks = new Map(accents);
const symbols = new Map<string, string>([...mathSymbols, ...textSymbols]);
const fontSwitches = new Map<string, 'i' | 'b'>([['it', 'i'], ['em', 'i'], ['itshape', 'i'], ['bf', 'b'], ['bfseries', 'b']]);
/** Names of functions are set upright and read as themselves. */
const functionNames = new Set(['log', 'ln', 'exp', 'sin', 'cos', 'tan', 'max', 'min', 'lim', 'det', 'LaTeX', 'TeX']);
const maxDepth = 60;

/** A title read from TeX: tagged text as CSL-JSON has it, and the commands that were not known and were left out. */
export type TexReading = { text: string; unknownCommands: string[] };

/** Reads one field value. A class because position, depth and the unknown commands belong to one run over one text. */
class TexReader {
  readonly unknown = new Set<string>();
  private at = 0;
  private readonly tex: string;

  constructor(tex: string) {
    this.tex = tex;
  }

  /** Reads up to the closing character, or to the end of the text where it never comes. */
  sequence(until: '' | '}' | '$' | ')' | ']', math: boolean, depth: number, script = false): string {
    let out = '';
    let switched = '';
    while (this.at < this.tex.length) {
      const character = this.tex[this.at] ?? '';
      if (character === until) break;
      if (until === ')' || until === ']') {
        if (character === '\\' && this.tex[this.at + 1] === until) break;
      }
      const fontSwitch = character === '\\' ? /^\\([a-z]+)(?![a-zA-Z])\s*/.exec(this.tex.slice(this.at, this.at + 16)) : null;
      const mark = fontSwitch === null ? undefined : fontSwitches.get(fontSwitch[1] ?? '');
      if (fontSwitch !== null && mark !== undefined) {
        this.at += fontSwitch[0].length;
        out += `<${mark}>`;
        switched = `</${mark}>${switched}`;
        continue;
      }
      out += this.item(math, depth, script);
    }
    return out + switched;
  }

  private item(math: boolean, depth: number, script: boolean): string {
    const character = this.tex[this.at] ?? '';
    if (character === '\\') return this.command(math, depth, script);
    this.at += 1;
    if (character === '{') return this.closed('}', math, depth, script);
    if (character === '}') return '';
    if (character === '$') {
      const display = this.tex[this.at] === '$';
      if (display) this.at += 1;
      // A dollar sign with no partner is a sum of money, not mathematics.
      if (!math && this.tex.indexOf('$', this.at) < 0) return '$';
      const inside = this.closed('$', true, depth, false);
      if (display && this.tex[this.at] === '$') this.at += 1;
      return inside;
    }
    if (math && (character === '_' || character === '^')) {
      const mark = character === '_' ? 'sub' : 'sup';
      const inside = this.argument(true, depth, true);
      return inside === '' ? '' : `<${mark}>${inside}</${mark}>`;
    }
    if (math && character === '-' && !script) return '−';
    if (character === '~') return ' ';
    if (!math) {
      const ligature = this.ligature(character);
      if (ligature !== null) return ligature;
    }
    return character;
  }

  private ligature(character: string): string | null {
    const two = this.tex.slice(this.at - 1, this.at + 1);
    if (character === '-' && this.tex.startsWith('---', this.at - 1)) {
      this.at += 2;
      return '—';
    }
    const joined = two === '--' ? '–' : two === '``' ? '“' : two === "''" ? '”' : null;
    if (joined !== null) this.at += 1;
    return joined;
  }

  private closed(until: '}' | '$' | ')' | ']', math: boolean, depth: number, script: boolean): string {
    if (depth >= maxDepth) return '';
    const inside = this.sequence(until, math, depth + 1, script);
    this.at += until === ')' || until === ']' ? 2 : 1;
    return inside;
  }

  /** The argument of a command: a group, a command, or one character. */
  private argument(math: boolean, depth: number, script = false): string {
    while (/\s/.test(this.tex[this.at] ?? '')) this.at += 1;
    if (depth >= maxDepth || this.at >= this.tex.length) return '';
    const next = this.tex[this.at] ?? '';
    if (next === '}' || (math && next === '$')) return '';
    if (next === '\\' || next === '{') return this.item(math, depth + 1, script);
    const whole = String.fromCodePoint(this.tex.codePointAt(this.at) ?? 0);
    this.at += whole.length;
    return whole;
  }

  /** The raw text of a braced argument, or null when none follows. */
  private rawArgument(): string | null {
    const start = /^\s*\{/.exec(this.tex.slice(this.at, this.at + 20));
    if (start === null) return null;
    let level = 0;
    for (let at = this.at + start[0].length - 1; at < this.tex.length; at += 1) {
      const character = this.tex[at];
      if (character === '\\') at += 1;
      else if (character === '{') level += 1;
      else if (character === '}' && --level === 0) {
        const raw = this.tex.slice(this.at + start[0].length, at);
        this.at = at + 1;
        return raw;
      }
    }
    return null;
  }

  private command(math: boolean, depth: number, script: boolean): string {
    const match = /^\\([a-zA-Z]+|.|$)/su.exec(this.tex.slice(this.at, this.at + 40));
    const name = match?.[1] ?? '';
    this.at += match?.[0].length ?? 1;
    const isWord = /^[a-zA-Z]/.test(name);
    // TeX swallows the space after a command word; in mathematics we keep one, since it reads better than none.
    if (isWord && !math) while (/[ \t\n]/.test(this.tex[this.at] ?? '')) this.at += 1;
    if (name === '') return '';
    const accent = accentMarks.get(name);
    if (accent !== undefined && !(math && name === '=')) return this.accented(accent, math, depth);
    if (name === 'ce' || name === 'cee' || name === 'ch') {
      const raw = this.rawArgument();
      if (raw !== null) return readTexInside(chemistryToTex(raw), depth + 1, this.unknown);
    }
    if (name === '(' || name === '[') return this.closed(name === '(' ? ')' : ']', true, depth, false);
    if (name === 'href') {
      this.rawArgument();
      return this.argument(math, depth);
    }
    if (name === 'noopsort' || name === 'SortNoop' || name === 'label' || name === 'footnote' || name === 'thanks' || name === 'hspace' || name === 'vspace') {
      this.rawArgument();
      return '';
    }
    if (name === 'frac' || name === 'tfrac' || name === 'dfrac' || name === 'nicefrac' || name === 'sfrac') {
      return `${this.argument(math, depth, script)}/${this.argument(math, depth, script)}`;
    }
    const mark = markCommands.get(name);
    if (mark !== undefined) return `<${mark}>${this.argument(name.startsWith('math') || name === 'bm' || name === 'boldsymbol', depth)}</${mark}>`;
    if (plainCommands.has(name)) {
      if (/\s|\{/.test(this.tex[this.at] ?? '')) {
        // Hyphens in upright text inside mathematics are hyphens, as in \mathrm{pre-exponential}.
        return this.argument(math && !name.startsWith('text') && name !== 'mbox' && name !== 'hbox', depth, true);
      }
      return '';
    }
    const symbol = symbols.get(name);
    if (symbol !== undefined) {
      // A Greek letter stands close to what follows; an arrow or a relation keeps its space.
      if (math && /\p{L}/u.test(symbol)) while (/\s/.test(this.tex[this.at] ?? '')) this.at += 1;
      return symbol;
    }
    if (functionNames.has(name)) return name;
    if (silentCommands.has(name)) return '';
    if (spaceCommands.has(name)) return name === ',' || name === ';' || name === ':' || name === '>' ? (math ? '' : ' ') : ' ';
    if (!isWord) return name;
    this.unknown.add(`\\${name}`);
    return '';
  }

  private accented(mark: string, math: boolean, depth: number): string {
    const inside = this.argument(math, depth);
    const base = inside.startsWith('ı') ? `i${inside.slice(1)}` : inside.startsWith('ȷ') ? `j${inside.slice(1)}` : inside;
    const first = String.fromCodePoint(base.codePointAt(0) ?? 0x20);
    if (base === '' || !/^\p{L}/u.test(first)) return inside;
    return (first + mark).normalize('NFC') + base.slice(first.length);
  }
}

function readTexInside(tex: string, depth: number, unknown: Set<string>): string {
  if (depth >= maxDepth) return '';
  const reader = new TexReader(tex);
  const text = reader.sequence('', false, depth);
  for (const command of reader.unknown) unknown.add(command);
  return text;
}

/**
 * Reads the TeX of one bibliography field into tagged text: accents, symbols, mathematics, chemical formulas, italics.
 *
 * Commands we do not know are left out, their arguments kept, and named in the answer. Never throws; time grows with the length.
 */
export function readTex(tex: string): TexReading {
  const unknown = new Set<string>();
  const text = readTexInside(tex, 0, unknown);
  const tidy = text.replace(/[\s\p{Cc}\u00A0]+/gu, ' ').trim();
  return { text: richTextSource(richText(taggedScripts(tidy))), unknownCommands: [...unknown] };
}
