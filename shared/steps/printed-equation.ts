import { isElement } from './elements.ts';
import { isNuclide } from './nuclides.ts';
import type { SetSides, SetTerm } from './set-terms.ts';

const prefix = '(?:cis|trans|iso|sec|tert|anti|syn|n|i|t)-';
const piece = String.raw`(?:\[\d{1,3}[A-Z][a-z]?\]|\[[A-Z][a-z]\]|[A-Z][a-z]?|[()])\d{0,3}`;
const term = new RegExp(String.raw`^(?:(\d+(?:\.\d+)?(?:\/\d+)?)(\s?))?((?:${prefix})?(?:e(?=\^-)|(?:${piece})*))(?:\^(\d?)([+-]))?(\((?:g|ads)\)|\*+)?(?:_([A-Za-z0-9-]+))?$`);
const unbracketed = new Set(['Co', 'No', 'Ho']);

function known(spelling: string): boolean {
  const symbols = spelling.replace(new RegExp(`^${prefix}`), '').match(/\[?\d*[A-Z][a-z]?\]?/g) ?? [];
  return symbols.every((symbol) => {
    const letters = symbol.replace(/[[\]\d]/g, '');
    return symbol.startsWith('[') ? isElement(letters) : !unbracketed.has(letters) && (isElement(letters) || letters === 'D' || letters === 'T');
  });
}

function readTerm(text: string): SetTerm | null {
  const match = text.length > 80 ? null : term.exec(text);
  if (!match) return null;
  const [, counted, blank, spelling = '', size, sign, place = '', siteType] = match;
  const [numerator, denominator] = (counted ?? '1').split('/').map(Number) as [number, number | undefined];
  const coefficient = numerator / (denominator ?? 1);
  if (!(coefficient > 0) || !Number.isFinite(coefficient) || (spelling === '' && !place.startsWith('*')) || !known(spelling)) return null;
  // 15N* can be a nuclide: printed it is 15 N* or [15N]*.
  if (counted && !blank && isNuclide(`${counted}${/^[A-Z][a-z]?/.exec(spelling)?.[0] ?? ''}`)) return null;
  const sites = place.startsWith('*') ? place.length : place === '(ads)' ? 1 : 0;
  if (siteType && sites === 0) return null;
  const charge = sign ? (sign === '+' ? 1 : -1) * Number(size || 1) : undefined;
  return {
    coefficient,
    species: { formula: spelling === '' ? '*' : spelling, spelling: spelling === '' ? '*' : spelling, phase: spelling === '' ? 'free-site' : sites > 0 ? 'adsorbed' : 'gas', sites, ...(siteType ? { siteType } : {}), ...(charge ? { charge } : {}) },
  };
}

/**
 * Reads an equation in the one spelling that is printed, without weighing it: enough to set it and to say it, and a fraction of the size of the whole reader.
 *
 * An equilibrium arrow, `(g)` and `(ads)` are let through. Null for any other spelling.
 * @example readPrinted('2N* -> N2 + 2*').reactants[0].species.spelling // 'N'
 */
export function readPrinted(equation: string): SetSides | null {
  const sides = equation.trim().split(/ (?:->|<->|<=>|→|⇌|↔) /);
  if (sides.length !== 2 || equation.length > 400) return null;
  const read = sides.map((side) => side.split(' + ').map((text) => readTerm(text.trim())));
  return read.every((side) => side.every((one) => one !== null)) ? { reactants: read[0] as SetTerm[], products: read[1] as SetTerm[] } : null;
}
