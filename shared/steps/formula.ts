import { binaryOrder, isElement } from './elements.ts';

/** A formula read atom by atom. */
export interface Formula {
  /** Without isotopes, in one spelling. */
  formula: string;
  /** With isotopes. */
  spelling: string;
  composition: Record<string, number>;
  isotopes: Record<string, number>;
}

/** A formula that can't be read: the position in it, and what is expected there. */
export interface FormulaFault {
  at: number;
  expected: string;
}

interface Piece {
  /** Element symbol, or null for a bracket. */
  element: string | null;
  mass: number | null;
  count: number;
  inner: Piece[];
}

const hydrogenLetters: Record<string, number> = { D: 2, T: 3 };

class Reader {
  at = 0;
  fault: FormulaFault | null = null;
  private readonly text: string;

  constructor(text: string) {
    this.text = text;
  }

  private take(pattern: RegExp): RegExpExecArray | null {
    pattern.lastIndex = this.at;
    const match = pattern.exec(this.text);
    if (match) this.at += match[0].length;
    return match;
  }

  private stop(expected: string): null {
    this.fault ??= { at: this.at, expected };
    return null;
  }

  private count(): number {
    const match = this.take(/\d{1,4}/y);
    return match ? Number(match[0]) : 1;
  }

  pieces(depth: number): Piece[] | null {
    const result: Piece[] = [];
    while (this.at < this.text.length && this.text[this.at] !== ')') {
      const piece = this.piece(depth);
      if (piece === null) return null;
      if (piece.count === 0) return this.stop('a count above 0');
      result.push(piece);
      // A bond drawn between two atoms is not kept.
      this.take(/[-=≡](?=[A-Z([^])/y);
    }
    return result.length > 0 ? result : this.stop('an element symbol');
  }

  private piece(depth: number): Piece | null {
    if (this.text[this.at] === '(') {
      if (depth > 8) return this.stop('fewer nested brackets');
      this.at += 1;
      const inner = this.pieces(depth + 1);
      if (inner === null) return null;
      if (this.text[this.at] !== ')') return this.stop('a closing bracket');
      this.at += 1;
      return { element: null, mass: null, count: this.count(), inner };
    }
    const alone = this.take(/\[([A-Z][a-z]?)\]/y);
    if (alone) {
      const element = this.known(alone[1] as string, 1);
      return element === null ? null : { element, mass: null, count: this.count(), inner: [] };
    }
    const labelled = this.take(/\[\^?(\d{1,3})([A-Z][a-z]?)(\d{0,3})\]/y) ?? this.take(/\^\{?(\d{1,3})\}?([A-Z][a-z]?)/y);
    if (labelled) {
      const element = this.known(labelled[2] as string, labelled[0].endsWith(']') ? 1 : 0);
      if (element === null) return null;
      const inside = labelled[3] ? Number(labelled[3]) : 1;
      return { element, mass: Number(labelled[1]), count: inside * this.count(), inner: [] };
    }
    const match = this.take(/[A-Z][a-z]?/y);
    if (!match) return this.stop('an element symbol');
    const element = this.known(match[0], 0);
    if (element === null) return null;
    const mass = hydrogenLetters[element];
    return { element: mass ? 'H' : element, mass: mass ?? null, count: this.count(), inner: [] };
  }

  /** The element of a letter group; `Co` is cobalt, `No` nobelium, and a lower-case letter that makes none is refused. */
  private known(group: string, trailing: number): string | null {
    if (isElement(group) || hydrogenLetters[group]) return group;
    this.at -= group.length + trailing;
    return this.stop('an element symbol');
  }

  get done(): boolean {
    return this.at >= this.text.length;
  }
}

function countAtoms(pieces: readonly Piece[], times: number, composition: Record<string, number>, isotopes: Record<string, number>): void {
  for (const piece of pieces) {
    if (piece.element === null) countAtoms(piece.inner, times * piece.count, composition, isotopes);
    else {
      composition[piece.element] = (composition[piece.element] ?? 0) + times * piece.count;
      const common: Record<string, number> = { H: 1, C: 12, N: 14, O: 16 };
      if (piece.mass !== null && piece.mass !== common[piece.element]) {
        const name = `${piece.mass}${piece.element}`;
        isotopes[name] = (isotopes[name] ?? 0) + times * piece.count;
      }
    }
  }
}

function atom(element: string, mass: number | null): string {
  if (mass === null) return element;
  if (element === 'H' && mass === 2) return 'D';
  if (element === 'H' && mass === 3) return 'T';
  return `[${mass}${element}]`;
}

/** Joins hydrogens that stand side by side: ND2H is NH3 without its isotopes. */
function merge(pieces: readonly Piece[], labelled: boolean): Piece[] {
  const result: Piece[] = [];
  for (const piece of pieces) {
    const mass = labelled ? piece.mass : null;
    const last = result.at(-1);
    if (piece.element === 'H' && last?.element === 'H' && last.mass === mass) last.count += piece.count;
    else result.push({ ...piece, mass, inner: merge(piece.inner, labelled) });
  }
  return result;
}

function print(pieces: readonly Piece[]): string {
  return pieces.map((piece) => `${piece.element === null ? `(${print(piece.inner)})` : atom(piece.element, piece.mass)}${piece.count === 1 ? '' : piece.count}`).join('');
}

/** Other spellings of common adsorbates, by the one kept. Structure counts: CHO (formyl) and COH are different species. */
const otherSpellings: Record<string, string> = {
  HCO: 'CHO', OCH: 'CHO', HOC: 'COH', OCO: 'CO2', CHOO: 'HCOO', OCHO: 'HCOO', HCO2: 'HCOO', HOCO: 'COOH', OCOH: 'COOH', CO2H: 'COOH', HNC: 'CNH', NCH: 'HCN', OCN: 'NCO', HOO: 'OOH', HO2: 'OOH',
  NNH: 'N2H', HNN: 'N2H', HN2: 'N2H', NHNH: 'N2H2', HNNH: 'N2H2', NH2NH2: 'N2H4', H2NNH2: 'N2H4', NHNH2: 'N2H3', NH2NH: 'N2H3', H2CO: 'CH2O', HCHO: 'CH2O', OCH2: 'CH2O', H2COH: 'CH2OH', HOCH2: 'CH2OH',
  H3CO: 'CH3O', OCH3: 'CH3O', H3COH: 'CH3OH', HOCH3: 'CH3OH', CH3CH3: 'C2H6', H3CCH3: 'C2H6', CH2CH2: 'C2H4', H2CCH2: 'C2H4', CHCH: 'C2H2', HCCH: 'C2H2', CH3CH2: 'C2H5', CH2CH3: 'C2H5', ON: 'NO', ONO: 'NO2', NNO: 'N2O', HON: 'NOH', ONH: 'HNO',
  HCOH: 'CHOH', HOCH: 'CHOH', OOCH: 'HCOO', CHOOH: 'HCOOH', HCO2H: 'HCOOH', HOOC: 'COOH', HOOH: 'H2O2', HONO: 'HNO2', H2NN: 'NNH2', NH2N: 'NNH2', HNNH2: 'N2H3', H2NNH: 'N2H3', H2NOH: 'NH2OH', HONH2: 'NH2OH', HNOH: 'NHOH', HONH: 'NHOH', H2CN: 'CH2N', HCNH: 'CHNH',
  H2CCH: 'CHCH2', CH2CH: 'CHCH2', H3CC: 'CCH3', CH3C: 'CCH3', H2CC: 'CCH2', CH2C: 'CCH2', HCC: 'CCH', C2H: 'CCH', C2H5OH: 'CH3CH2OH', C2H5O: 'CH3CH2O', CH3CO2: 'CH3COO', CH3CO2H: 'CH3COOH', H3CCO: 'CH3CO',
};

function single(element: string, count: number): string {
  return count === 1 ? element : `${element}${count}`;
}

/** One spelling of an isotope-free formula: where atoms alone decide the species their order is fixed, else the typed order is kept. */
function oneSpelling(typed: string, composition: Record<string, number>): string {
  const known = otherSpellings[typed];
  if (known) return known;
  const heavy = Object.entries(composition).filter(([element]) => element !== 'H');
  const hydrogens = composition.H ?? 0;
  if (heavy.length === 0) return single('H', hydrogens);
  const [first, second] = heavy as [[string, number], [string, number] | undefined];
  if (heavy.length === 1 && (first[1] === 1 || hydrogens === 0)) {
    const [element, count] = first;
    if (hydrogens === 0) return single(element, count);
    if (['F', 'Cl', 'Br', 'I'].includes(element) || (['O', 'S', 'Se', 'Te'].includes(element) && hydrogens > 1)) return `${single('H', hydrogens)}${element}`;
    return `${element}${single('H', hydrogens)}`;
  }
  if (heavy.length === 2 && hydrogens === 0 && first[1] === 1 && second?.[1] === 1) {
    const rank = (element: string): number => (binaryOrder as readonly string[]).indexOf(element);
    return rank(first[0]) <= rank(second[0]) ? `${first[0]}${second[0]}` : `${second[0]}${first[0]}`;
  }
  return typed;
}

/**
 * The labelled spelling in the order of the plain formula, or null where an element stands in more than one place.
 *
 * `D2N`, `ND2` and `NDD` become one; the common isotope is written first.
 */
function labelledSpelling(formula: string, isotopes: Record<string, number>): string | null {
  const runs = [...formula.matchAll(/([A-Z][a-z]?)(\d*)/g)].map((match) => ({ element: match[1] as string, count: match[2] ? Number(match[2]) : 1 }));
  if (/[()-]/.test(formula) || new Set(runs.map(({ element }) => element)).size !== runs.length) return null;
  return runs
    .map(({ element, count }) => {
      const labels = Object.entries(isotopes).filter(([name]) => name.replace(/^\d+/, '') === element).sort();
      const plain = count - labels.reduce((sum, [, labelled]) => sum + labelled, 0);
      return [...(plain > 0 ? [single(element, plain)] : []), ...labels.map(([name, labelled]) => single(atom(element, Number.parseInt(name, 10)), labelled))].join('');
    })
    .join('');
}

/** Cobalt, nobelium and holmium are printed in brackets: without them they are taken for slips of CO, NO and OH. */
function markSlips(formula: string): string {
  return formula.replace(/(?<!\[)(?:Co|No|Ho)/g, '[$&]');
}

const prefixPattern = /^(?:cis|trans|iso|sec|tert|anti|syn|n|i|t)-/;

/**
 * Reads a chemical formula: counts, brackets, `D`, `T`, `[13C]`, `^13C`, drawn bonds, a prefix such as `trans-`.
 *
 * Source: IUPAC Red Book 2005 (formulas, isotopes in square brackets).
 */
export function readFormula(text: string): Formula | FormulaFault {
  const prefix = prefixPattern.exec(text)?.[0] ?? '';
  const reader = new Reader(text.slice(prefix.length));
  const pieces = reader.pieces(0);
  if (pieces === null || !reader.done) {
    const fault = reader.fault ?? { at: reader.at, expected: 'an element symbol' };
    return { at: fault.at + prefix.length, expected: fault.expected };
  }
  const composition: Record<string, number> = {};
  const isotopes: Record<string, number> = {};
  countAtoms(pieces, 1, composition, isotopes);
  const tritium = text.slice(prefix.length).search(/T(?![a-z])/);
  if (tritium >= 0 && Object.keys(composition).some((element) => !['H', 'C', 'N', 'O', 'S'].includes(element))) return { at: prefix.length + Math.max(0, tritium - 1), expected: 'an element symbol (T is tritium)' };
  const typed = print(merge(pieces, false));
  const formula = prefix + oneSpelling(typed, composition);
  const labelled = Object.keys(isotopes).length > 0;
  const spelling = labelled ? (labelledSpelling(formula, isotopes) ?? prefix + print(merge(pieces, true))) : formula;
  return { formula: markSlips(formula), spelling: markSlips(spelling), composition, isotopes };
}
