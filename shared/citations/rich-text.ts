/** A piece of a title with the marks that hold on it. */
export type RichTextRun = { text: string; marks: readonly RichTextMark[] };

/** The marks CSL-JSON allows inside a title and that we keep: italic, bold, subscript, superscript. */
export type RichTextMark = 'i' | 'b' | 'sub' | 'sup';

const tag = /<(\/?)(i|b|sub|sup|em|strong|jats:i|jats:b|jats:sub|jats:sup|jats:italic|jats:bold|italic|bold)\s*>/gi;
const droppedTag = /<\/?(?:span|sc|scp|inf|p|jats:(?!(?:i|b|sub|sup|italic|bold)\b)[a-z-]+|mml:[a-z]+|title)(?:\s[^<>]{0,200})?\/?>/gi;

const markOf: Readonly<Record<string, RichTextMark>> = {
  i: 'i', em: 'i', italic: 'i', b: 'b', strong: 'b', bold: 'b', sub: 'sub', sup: 'sup',
};

/**
 * Splits a title as CSL-JSON writes it into runs of text with their marks; anything that is not one of the known tags stays text.
 *
 * A tag that is never closed ends with the title, and a closing tag that was never opened is dropped. Nothing in the
 * result is markup: it is safe to show each run as text.
 *
 * @example richText('CH<sub>4</sub>')[1].marks[0] === 'sub'
 */
export function richText(text: string): RichTextRun[] {
  let runs = scan(text);
  // Taking a tag away can join what stood around it into another one; each round takes at least one away, so it ends.
  for (let written = richTextSource(runs); ; ) {
    const again = scan(written);
    const rewritten = richTextSource(again);
    runs = again;
    if (rewritten === written) return runs;
    written = rewritten;
  }
}

function scan(text: string): RichTextRun[] {
  const runs: RichTextRun[] = [];
  const open: RichTextMark[] = [];
  const source = text.replace(droppedTag, '');
  let from = 0;
  const add = (piece: string): void => {
    if (piece === '') return;
    const last = runs.at(-1);
    if (last !== undefined && last.marks.join() === open.join()) last.text += piece;
    else runs.push({ text: piece, marks: [...open] });
  };
  for (const match of source.matchAll(tag)) {
    add(source.slice(from, match.index));
    from = match.index + match[0].length;
    const mark = markOf[(match[2] ?? '').toLowerCase().replace('jats:', '')];
    if (mark === undefined) continue;
    if (match[1] === '') {
      // Marks deeper than any title needs are read as text without a mark.
      if (open.length < 8) open.push(mark);
    } else {
      const at = open.lastIndexOf(mark);
      if (at >= 0) open.splice(at, 1);
    }
  }
  add(source.slice(from));
  return runs;
}

/**
 * Writes runs back as the tagged text CSL-JSON uses, each run closed, so that the result is always well formed.
 *
 * @example richTextSource(richText('CH<sub>4')) === 'CH<sub>4</sub>'
 */
export function richTextSource(runs: readonly RichTextRun[]): string {
  return runs.map((run) => run.marks.map((mark) => `<${mark}>`).join('') + run.text + [...run.marks].reverse().map((mark) => `</${mark}>`).join('')).join('');
}

/**
 * Gives a title without its marks.
 *
 * @example plainText('CH<sub>4</sub>') === 'CH4'
 */
export function plainText(text: string): string {
  return richText(text).map((run) => run.text).join('');
}

const subscripts: Readonly<Record<string, string>> = {
  '0': '₀', '1': '₁', '2': '₂', '3': '₃', '4': '₄', '5': '₅', '6': '₆', '7': '₇', '8': '₈', '9': '₉', '+': '₊', '-': '₋', '−': '₋',
};
const superscripts: Readonly<Record<string, string>> = {
  '0': '⁰', '1': '¹', '2': '²', '3': '³', '4': '⁴', '5': '⁵', '6': '⁶', '7': '⁷', '8': '⁸', '9': '⁹', '+': '⁺', '-': '⁻', '−': '⁻',
};

/**
 * Gives a title in plain text with Unicode subscripts and superscripts where every character of the run has one.
 *
 * @example unicodeText('<sup>13</sup>CH<sub>4</sub>, CO<sub>x</sub>') === '¹³CH₄, COx'
 */
export function unicodeText(text: string): string {
  return richText(text).map((run) => {
    const table = run.marks.includes('sub') ? subscripts : run.marks.includes('sup') ? superscripts : null;
    if (table === null) return run.text;
    const characters = [...run.text];
    return characters.every((character) => character in table) ? characters.map((character) => table[character]).join('') : run.text;
  }).join('');
}

const scriptRun = /[₀-₉₊₋]+|[⁰¹²³⁴-⁹⁺⁻]+/g;
const digitOf = new Map<string, string>();
for (const table of [subscripts, superscripts]) {
  for (const [plain, script] of Object.entries(table)) if (!digitOf.has(script)) digitOf.set(script, plain);
}

/**
 * Turns Unicode subscript and superscript digits into tags, so that a title has one way of writing them.
 *
 * @example taggedScripts('H₂ and ¹³C') === 'H<sub>2</sub> and <sup>13</sup>C'
 */
export function taggedScripts(text: string): string {
  return text.replace(scriptRun, (run) => {
    const mark = /^[₀-₉₊₋]/.test(run) ? 'sub' : 'sup';
    return `<${mark}>${[...run].map((character) => digitOf.get(character) ?? character).join('')}</${mark}>`;
  });
}
