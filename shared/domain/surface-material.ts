import type { Arrangement } from './kinds.ts';
import { plainFormula, readComposition, type Composition } from './surface-composition.ts';
import { SurfaceError } from './surface-error.ts';
import { isMetal, metalByName, metalName } from './surface-metals.ts';

/** A material as it is written, with what is written beside it. */
export interface Material {
  /** The bulk: a metal, an alloy, a compound. */
  bulk: Composition;
  /** The metal in or on the first layers of another. */
  guest: string | null;
  arrangement: Arrangement | null;
  /** A support written behind a stroke: `Ru/MgO`. */
  support: string | null;
  /** A facet written in brackets: `Ni(111)`. */
  facet: string | null;
  /** Monolayers of the guest written before it: `2 ML Ni/Pt`. */
  monolayers: number | null;
}

/** Words behind a material that say where its guest is. */
const arrangementWords: readonly [RegExp, Arrangement][] = [
  [/,?\s?\(?\b(?:over-?layer|monolayer|ML|skin|film)\b\)?$/i, 'overlayer'],
  [/,?\s?\(?\b(?:sub-?surface(?: alloy| layer)?)\b\)?$/i, 'subsurface'],
  [/,?\s?\(?\b(?:single-?\s?atom(?:s| alloy)?|SAA)\b\)?$/i, 'single-atom'],
  [/,?\s?\(?\bsurface alloy\b\)?$/i, 'surface-alloy'],
  [/,?\s?\(?\bcore[-–\s]shell\b\)?$/i, 'core-shell'],
];

function takeArrangement(text: string): { text: string; arrangement: Arrangement | null } {
  for (const [words, arrangement] of arrangementWords) if (words.test(text)) return { text: text.replace(words, '').trim(), arrangement };
  return { text, arrangement: null };
}

/** Takes a facet in brackets off a material: `Ni(111)`, `Pt(S)-[4(111)×(100)]`, `Pt(100)-hex`. */
function takeFacet(text: string): { text: string; facet: string | null } {
  const stepped = /^(.*?)\s?(\(S\)\s?-?\s?\[?.+)$/i.exec(text) ?? /^([^()[\]\d]+?)-?(\[?\d{1,3}\(\d{3}\)\s?[×x].+)$/.exec(text);
  if (stepped) return { text: stepped[1] as string, facet: stepped[2] as string };
  const plain = /^(.*?)\s?(\(\s?[-\d](?:[-\d\s,.]|\u0304|\u0305)*\)(?:-.+)?)$/.exec(text.normalize('NFD'));
  return plain ? { text: plain[1] as string, facet: plain[2] as string } : { text, facet: null };
}

/** The place of a guest in its host, or an error that names both readings. */
function refusePlace(field: string, guest: string, host: string): SurfaceError {
  const [a, b] = [metalName(guest), metalName(host)];
  return new SurfaceError(
    field,
    `“${guest}/${host}” can be a layer of ${a} on ${b} or a layer of ${a} under the first layer of ${b}. Write “${guest}/${host} overlayer” or “${guest}/${host} subsurface”; for single atoms write “${guest}1${host}”.`,
    'ambiguous',
  );
}

function isSymbol(text: string): boolean {
  return /^[A-Z][a-z]?$/.test(text) && isMetal(text);
}

interface Layers {
  bulk: string;
  guest: string | null;
  arrangement: Arrangement | null;
  support: string | null;
}

/** Reads what stands on, in or under what: `Ni/Pt`, `Pt/Ni/Pt`, `Pt-Ni-Pt`, `Ni-Pt-Pt`, `Pt1Cu`, `Pd1/Cu`, `Ni@Pt`, `Ru/MgO`. */
function readLayers(text: string, field: string, said: Arrangement | null): Layers {
  const stroke = text.lastIndexOf('/');
  const [before, after] = stroke < 0 ? [text, null] : [text.slice(0, stroke).trim(), text.slice(stroke + 1).trim()];
  const under = after === null ? null : readComposition(after);
  if (after !== null && under !== null && ('fault' in under || !under.elements.every(isMetal))) {
    const atom = /^([A-Z][a-z]?)1$/.exec(before)?.[1];
    return atom && isMetal(atom) ? { bulk: atom, guest: null, arrangement: said ?? 'single-atom', support: after } : { ...readLayers(before, field, said), support: after };
  }
  const shell = /^([^@/]+)@([^@/]+)$/.exec(text);
  if (shell) return { bulk: shell[1] as string, guest: shell[2] as string, arrangement: 'core-shell', support: null };
  const single = /^([A-Z][a-z]?)1\/?([A-Z][a-z]?)$/.exec(text);
  if (single && isSymbol(single[1] as string) && isSymbol(single[2] as string)) return { bulk: single[2] as string, guest: single[1] as string, arrangement: said ?? 'single-atom', support: null };
  const sandwich = /^([A-Z][a-z]?)([-/])([A-Z][a-z]?)\2([A-Z][a-z]?)$/.exec(text);
  if (sandwich && [sandwich[1], sandwich[3], sandwich[4]].every((part) => isSymbol(part as string))) {
    const [first, second, third] = [sandwich[1], sandwich[3], sandwich[4]] as [string, string, string];
    if (first === third && first !== second) return { bulk: first, guest: second, arrangement: said ?? 'subsurface', support: null };
    if (second === third && first !== second) return { bulk: second, guest: first, arrangement: said ?? 'overlayer', support: null };
  }
  if (after === null) return { bulk: text, guest: null, arrangement: said, support: null };
  if (said === null) throw refusePlace(field, before, after);
  return { bulk: after, guest: before.replace(/^([A-Z][a-z]?)1$/, '$1'), arrangement: said, support: null };
}

/**
 * Reads a material with what is written beside it: its facet, its support, the metal on, in or under its first layer.
 *
 * `Ni/Pt` alone can mean two things and is refused with both.
 * @throws SurfaceError naming the field
 * @example readMaterial('Pt/Ni/Pt(111)', 'formula').guest // 'Ni'
 */
export function readMaterial(typed: string, field: 'metal' | 'formula'): Material {
  const plain = plainFormula(typed);
  const monolayers = /^(\d{1,2}(?:\.\d{1,3})?)\s?ML\s(?:of\s)?/i.exec(plain);
  const named = takeArrangement(plain.slice(monolayers?.[0].length ?? 0));
  const { text, facet } = takeFacet(named.text);
  const layers = readLayers(text.replace(/\s(?:on|over)\s/i, '/'), field, named.arrangement ?? (monolayers ? 'overlayer' : null));
  const bulk = readComposition(layers.bulk);
  if ('fault' in bulk) {
    const symbol = metalByName(layers.bulk);
    if (symbol) throw new SurfaceError(field, `“${typed}” is not an element symbol: write ${symbol}.`);
    throw new SurfaceError(field, field === 'metal' && !/\d/.test(layers.bulk) && !/^[A-Z][a-z]?$/.test(layers.bulk) ? `“${typed}” is not an element symbol. Write it as Ru or Ni; an alloy goes under formula.` : bulk.fault);
  }
  const guest = layers.guest === null ? null : readComposition(layers.guest);
  if (guest && 'fault' in guest) throw new SurfaceError(field, guest.fault);
  return { bulk, guest: guest?.formula ?? null, arrangement: layers.arrangement, support: layers.support, facet, monolayers: monolayers ? Number(monolayers[1]) : null };
}

/** What a material is called; read again, the name means the same: `Ni/Pt overlayer`, `Ni/Pt subsurface`, `Pt1Cu` (single atoms), `Sn/Pt surface alloy`, `Ni@Pt` (a shell of Pt). */
export function materialName(bulk: string, guest: string | null, arrangement: Arrangement | null): string {
  if (arrangement === null) return bulk;
  if (guest === null) return `${bulk} single-atom`;
  if (arrangement === 'core-shell') return `${bulk}@${guest}`;
  if (arrangement === 'single-atom' && isSymbol(guest) && isSymbol(bulk)) return `${guest}1${bulk}`;
  return `${guest}/${bulk} ${arrangement === 'surface-alloy' ? 'surface alloy' : arrangement}`;
}
