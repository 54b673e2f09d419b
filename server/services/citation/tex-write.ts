import { richText, taggedScripts } from '#shared/citations/rich-text.ts';
import { accents, mathSymbols, textSymbols } from './tex-symbols.ts';

const accentCommands = new Map(accents.map(([command, mark]) => [mark, command]));
const textCommands = new Map<string, string>();
for (const [command, character] of textSymbols) if (!textCommands.has(character)) textCommands.set(character, command);
/** Characters with both kinds of command that read better as mathematics, and need no extra package there. */
for (const character of ['×', '±', '·', '→', '←', 'μ', '−']) textCommands.delete(character);
const mathCommands = new Map<string, string>();
for (const [command, character] of mathSymbols) if (!mathCommands.has(character)) mathCommands.set(character, command);

const escapes: Readonly<Record<string, string>> = {
  '%': '\\%', '&': '\\&', '#': '\\#', _: '\\_', $: '\\$', '{': '\\{', '}': '\\}',
  '\u00A0': '~', '\u202F': '~', '\u2009': ' ', '–': '--', '—': '---', '“': '``', '”': "''", '‐': '-', '‑': '-', '−': '$-$',
};

/** Typed as they stand in text although a command exists for them. */
const asTyped = new Set(["'", '"', '<', '>', '|', ':']);

function accented(character: string): string | null {
  const [base, mark, ...more] = character.normalize('NFD');
  if (base === undefined || mark === undefined || more.length > 0 || !/^[A-Za-z]$/.test(base)) return null;
  const command = accentCommands.get(mark);
  if (command === undefined) return null;
  return /^[a-zA-Z]$/.test(command) ? `{\\${command}{${base}}}` : `{\\${command}${base}}`;
}

/** BibTeX counts escaped braces too, so a brace without a partner needs a command. */
function isBalanced(text: string): boolean {
  let level = 0;
  for (const one of text) {
    if (one === '{') level += 1;
    else if (one === '}' && --level < 0) return false;
  }
  return level === 0;
}

const loneBraces: Readonly<Record<string, string>> = { '{': '{\\textbraceleft}', '}': '{\\textbraceright}' };

/** Greek words stay as they are; one or two Greek letters in a Latin text are symbols. */
const greekRun = /[\p{Script=Greek}]+/gu;

function character(text: string, greekIsSymbol: boolean): string {
  const escape = escapes[text];
  if (escape !== undefined) return escape;
  if (/^[\x20-\x7E]$/.test(text) && (asTyped.has(text) || !textCommands.has(text))) return text;
  const command = textCommands.get(text);
  if (command !== undefined) return `{\\${command}}`;
  const math = mathCommands.get(text);
  if (math !== undefined && (greekIsSymbol || !/\p{Script=Greek}/u.test(text))) return `$\\${math}$`;
  return accented(text) ?? text;
}

function writePlain(text: string, greek: boolean): string {
  const composed = text.normalize('NFC').replaceAll('µ', 'μ').replaceAll('Å', 'Å');
  const balanced = isBalanced(composed);
  let out = '';
  let from = 0;
  const add = (piece: string, symbol: boolean): void => {
    for (const one of piece) {
      const tex = balanced || !(one in loneBraces) ? character(one, symbol) : loneBraces[one] ?? '';
      // Hyphens, dashes and quotes that meet would join into another sign.
      const joins = (tex.startsWith('-') && out.endsWith('-')) || (tex.startsWith("'") && out.endsWith("'"));
      out += joins ? `{}${tex}` : tex;
    }
  };
  for (const run of composed.matchAll(greekRun)) {
    add(composed.slice(from, run.index), true);
    add(run[0], greek && [...run[0]].length <= 2);
    from = run.index + run[0].length;
  }
  add(composed.slice(from), true);
  return out;
}

/** Writes a script in mathematics: digits and signs as they are, words upright. */
function writeScript(text: string, sign: '_' | '^'): string {
  if (/^[0-9+\-−.,()/*=]+$/.test(text)) return `$${sign}{${text.replaceAll('−', '-')}}$`;
  if (/^[A-Za-z0-9+\-−., ]+$/.test(text)) {
    const upright = text.replaceAll('−', '-').replace(/[A-Za-z]+(?:[ -][A-Za-z]+)*/g, (word) => (/[ -]/.test(word) ? `\\mbox{${word}}` : `\\mathrm{${word}}`));
    return `$${sign}{${upright}}$`;
  }
  return `\\text${sign === '_' ? 'sub' : 'super'}script{${writePlain(text, true)}}`;
}

/**
 * Writes tagged text as TeX that BibTeX, biber and LaTeX all read: accents and symbols as commands, scripts as mathematics,
 * the special characters escaped, letters beyond Latin as UTF-8.
 */
export function writeTex(text: string): string {
  let out = '';
  for (const run of richText(taggedScripts(text.replace(/[\s\p{Cc}\p{Cs}]+/gu, ' ').trim()))) {
    const script = run.marks.includes('sub') ? '_' : run.marks.includes('sup') ? '^' : null;
    const body = script === null ? writePlain(run.text, true) : writeScript(run.text, script);
    if (run.text.trim() === '') {
      out += ' ';
      continue;
    }
    const italic = run.marks.includes('i') ? `\\emph{${body}}` : body;
    out += run.marks.includes('b') ? `\\textbf{${italic}}` : italic;
  }
  return out;
}

/** Writes a name or another text without marks; Greek letters in it are letters. */
export function writeTexName(text: string): string {
  return writePlain(text.replace(/[\s\p{Cc}\p{Cs}]+/gu, ' ').trim(), false);
}
