/** Text brought to plain characters, with where each of them stood in the text as typed. */
export interface PlainText {
  text: string;
  /** Position in the typed text of each character, and of what follows the last. */
  positions: number[];
}

/** Characters that people type or paste, and what they stand for here. */
const standsFor: Record<string, string> = {
  '∗': '*', '＊': '*', '⁎': '*', '✱': '*', '✻': '*', '﹡': '*', '⋆': '*', '★': '*', '☆': '*', '□': '*', '☐': '*', '◻': '*', '⬜': '*', '▢': '*', '⊡': '*',
  '−': '-', '–': '-', '—': '-', '‐': '-', '‑': '-', '―': '-', '﹣': '-', '－': '-', '＋': '+', '﹢': '+', '⁺': '^+', '⁻': '^-', '₊': '+', '₋': '-', '⊕': '+',
  '\u00a0': ' ', '\u2009': ' ', '\u202f': ' ', '\u2002': ' ', '\u2003': ' ', '\u2005': ' ', '\u200a': ' ', '\t': ' ', '\n': ' ', '\r': ' ', '\u200b': '', '\u2060': '', '\ufeff': '', '$': '',
  '→': '->', '⟶': '->', '⇒': '->', '➔': '->', '➝': '->', '➞': '->', '➜': '->', '➙': '->', '➡': '->', '⟹': '->', '⇀': '->', '⇁': '->', '↦': '->', '⇾': '->', '⭢': '->', '⇢': '->', '\uf0ae': '->', '\uf0e0': '->',
  '⇌': '<->', '⇋': '<->', '⇄': '<->', '⇆': '<->', '↔': '<->', '⟷': '<->', '⇔': '<->', '⟺': '<->', '⥂': '<->', '⇿': '<->', '⮂': '<->', '⥨': '<->', '⥦': '<->', '⇹': '<->', '←': '<-', '⟵': '<-', '⇐': '<-', '↑': '(g)',
  '½': '1/2 ', '¼': '1/4 ', '¾': '3/4 ', '⅓': '1/3 ', '⅔': '2/3 ', '＝': '=', '∙': '·', '•': '·', '⋅': '·', '‧': '·', '（': '(', '）': ')', '［': '[', '］': ']', 'ϑ': 'θ', 'ϴ': 'θ', 'ς': 'σ',
};

const lowered = '₀₁₂₃₄₅₆₇₈₉';
const raised = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** Brings each character to a plain one; a run of raised digits and a raised sign become `^13`, `^2-`. */
export function toPlain(original: string): PlainText {
  let text = '';
  const positions: number[] = [];
  let inRaised = false;
  const put = (characters: string, position: number): void => {
    text += characters;
    for (let i = 0; i < characters.length; i += 1) positions.push(position);
  };
  for (let i = 0; i < original.length; i += 1) {
    const character = original[i] as string;
    const power = raised.indexOf(character);
    if (power >= 0) {
      put(inRaised ? String(power) : `^${power}`, i);
      inRaised = true;
      continue;
    }
    if (inRaised && (character === '⁺' || character === '⁻')) put(character === '⁺' ? '+' : '-', i);
    else if (lowered.includes(character)) put(String(lowered.indexOf(character)), i);
    else if (character === '½' && /\d$/.test(text)) put('.5', i);
    else put(standsFor[character] ?? character, i);
    inRaised = false;
  }
  positions.push(original.length);
  return { text, positions };
}

/** Replaces what a pattern finds and keeps the positions of what stays. */
export function replacePlain(plain: PlainText, pattern: RegExp, replacement: (match: RegExpMatchArray) => string): PlainText {
  let text = '';
  const positions: number[] = [];
  let last = 0;
  const copy = (from: number, to: number): void => {
    text += plain.text.slice(from, to);
    for (let i = from; i < to; i += 1) positions.push(plain.positions[i] as number);
  };
  for (const match of plain.text.matchAll(pattern)) {
    copy(last, match.index);
    const added = replacement(match);
    text += added;
    for (let i = 0; i < added.length; i += 1) positions.push(plain.positions[match.index] as number);
    last = match.index + match[0].length;
  }
  copy(last, plain.text.length);
  positions.push(plain.positions.at(-1) as number);
  return { text, positions };
}

/** A part of a plain text, without the blanks around it. */
export function slicePlain(plain: PlainText, from: number, to: number): PlainText {
  const raw = plain.text.slice(from, to);
  const text = raw.trim();
  const begin = from + raw.length - raw.trimStart().length;
  return { text, positions: plain.positions.slice(begin, begin + text.length + 1) };
}
