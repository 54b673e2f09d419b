import { replacePlain, toPlain, type PlainText } from './plain-text.ts';

/** What is pasted from a page: tags of indices and names of characters. */
const pageMarks: [RegExp, string][] = [
  [/<sub(?:\s[^<>]*)?>/gi, '_{'],
  [/<sup(?:\s[^<>]*)?>/gi, '^{'],
  [/<\/su[bp]>/gi, '}'],
  [/<\/?(?:i|b|em|strong|span|p)(?:\s[^<>]*)?>/gi, ''],
  [/&(?:rarr|rightarrow|#8594|#x2192);/gi, '->'],
  [/&(?:harr|rlhar|rlarr|lrarr|lrhar|#8652|#x21cc|#8596);/gi, '<->'],
  [/&(?:larr|#8592);/gi, '<-'],
  [/&(?:lowast|ast|#42|squ|square);/gi, '*'],
  [/&(?:nbsp|thinsp|#160);/gi, ' '],
  [/&(?:minus|ndash|#8722);/gi, '-'],
  [/&(?:plus|#43);/gi, '+'],
  [/&(?:middot|sdot|#183);/gi, '·'],
  [/&(?:frac12|half);/gi, '1/2 '],
  [/&lt;/gi, '<'],
  [/&gt;/gi, '>'],
];

/** Commands of LaTeX and of its chemistry packages that stand for one sign. */
const commands: [RegExp, string][] = [
  [/\\x?(?:long)?(?:rightleftharpoons|leftrightharpoons|leftrightarrows?|rightleftarrows|Leftrightarrow|LeftRightArrow)(?![A-Za-z])(?:\[[^\]{}]*\])?(?:\{[^{}]*\})?/g, '<->'],
  [/\\x?(?:long)?(?:rightarrow|Rightarrow|rightharpoonup|to)(?![A-Za-z])(?:\[[^\]{}]*\])?(?:\{[^{}]*\})?/g, '->'],
  [/\\(?:longr|Longr)ightarrow(?![A-Za-z])/g, '->'],
  [/\\x?(?:long)?(?:leftarrow|gets)(?![A-Za-z])(?:\[[^\]{}]*\])?(?:\{[^{}]*\})?/g, '<-'],
  [/\\(?:ast|star|square|Box|bigstar|sqcup)(?![A-Za-z])/g, '*'],
  [/\\(?:cdot|bullet)(?![A-Za-z])/g, '·'],
  [/\\times(?![A-Za-z])/g, '×'],
  [/\\theta(?![A-Za-z])/g, 'θ'],
  [/\\sigma(?![A-Za-z])/g, 'σ'],
  [/\\eta(?![A-Za-z])/g, 'η'],
  [/\\kappa(?![A-Za-z])/g, 'κ'],
  [/\\mu(?![A-Za-z])/g, 'μ'],
  [/\\pi(?![A-Za-z])/g, 'π'],
  [/\\delta(?![A-Za-z])/g, 'δ'],
  [/\\uparrow(?![A-Za-z])/g, '(g)'],
  [/\\[dt]?frac\s?\{(\d+)\}\s?\{(\d+)\}/g, '$1/$2 '],
  [/\\[dt]?frac(\d)(\d)/g, '$1/$2 '],
  [/\\textsubscript\s?\{/g, '_{'],
  [/\\textsuperscript\s?\{/g, '^{'],
  [/\\(?:left|right|rm|displaystyle|limits|big|Big)(?![A-Za-z])\s?/g, ''],
  [/\\(?:[,;:! ]|quad(?![a-z])|qquad(?![a-z]))|~/g, ' '],
  [/\\\{/g, '['],
  [/\\\}/g, ']'],
];

const styleCommand = /\\(?:mathrm|mathit|mathsf|mathbf|mathsfit|text|textrm|textit|textbf|textsf|ce|cf|chem|operatorname|ensuremath|hbox|mbox|rm)\s?$/;

/**
 * Takes braces that only hold together, and the commands of style before them, off; those of an index (`_{ads}`, `^{2-}`, `*{fcc}`) stay.
 */
function unwrap(plain: PlainText): PlainText {
  const { text } = plain;
  const drop = new Set<number>();
  const open: boolean[] = [];
  for (let i = 0; i < text.length; i += 1) {
    if (text[i] === '{') {
      const command = styleCommand.exec(text.slice(Math.max(0, i - 16), i));
      const before = text[i - 1];
      const keep = !command && (before === '_' || before === '^' || before === '*');
      open.push(keep);
      if (keep) continue;
      drop.add(i);
      for (let j = i - (command?.[0].length ?? 0); j < i; j += 1) drop.add(j);
    } else if (text[i] === '}' && open.length > 0 && open.pop() === false) drop.add(i);
  }
  if (drop.size === 0) return plain;
  return { text: text.split('').filter((_, i) => !drop.has(i)).join(''), positions: plain.positions.filter((_, i) => !drop.has(i)) };
}

/** Brings an equation as typed or pasted (Unicode, LaTeX, mhchem, HTML) to plain text. */
export function plainEquation(original: string): PlainText {
  let marked: PlainText = { text: original, positions: Array.from({ length: original.length + 1 }, (_, i) => i) };
  if (/[<&\\]/.test(original)) {
    for (const [pattern, mark] of [...pageMarks, ...commands]) marked = replacePlain(marked, pattern, (match) => mark.replace(/\$(\d)/g, (_, n: string) => match[Number(n)] as string));
  }
  const characters = toPlain(marked.text);
  let plain = unwrap({ text: characters.text, positions: characters.positions.map((at) => marked.positions[at] as number) });
  // A raised or lowered asterisk is an asterisk.
  plain = replacePlain(plain, /[\^_](?:\{\s?(\*+)\s?\}|\s?(\*+))/g, (match) => (match[1] ?? match[2]) as string);
  // What stands over and under an arrow is no species: ->[k1][k-1].
  plain = replacePlain(plain, /((?:->|<=>|<->|=>))((?:\[(?:[a-z\\ΔδT][^[\]]*)?\]){1,2})/g, (match) => match[1] as string);
  // A lowered number counts atoms, but on an asterisk it may name a site.
  return replacePlain(plain, /(?<!\*)_(?:(\d+)|\{(\d+)\})/g, (match) => (match[1] ?? match[2]) as string);
}
