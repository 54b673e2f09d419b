/** Nuclides of light elements that papers label with, and the common ones they are set against; without D and T, which are written as letters. */
const nuclides = new Set(['11C', '12C', '13C', '14C', '13N', '14N', '15N', '15O', '16O', '17O', '18O', '32S', '33S', '34S', '35S', '36S', '35Cl', '37Cl']);

/** True for `13C`, `15N`, `18O` and the like: a number in front of them may be a mass number as well as a coefficient. */
export function isNuclide(text: string): boolean {
  return nuclides.has(text);
}

/** The largest count of atoms of one element that is taken for a count where a mass number would do: C2H6 has 6 hydrogens, C18O no 18 carbons. */
function couldBeCount(before: string, element: string, count: number): boolean {
  const heavy = [...before.matchAll(/([A-Z][a-z]?)(\d*)/g)].filter(([, symbol]) => symbol !== 'H' && symbol !== 'D').reduce((sum, match) => sum + (match[2] ? Number(match[2]) : 1), 0);
  return element === 'H' || element === 'D' ? count <= 2 * heavy + 3 : count < 11;
}

/**
 * Raises mass numbers that lost their place in the line: `C18O` becomes `C^18O`, `H218O` becomes `H2^18O`.
 *
 * Only where a count would make no molecule: `C6H15N` stays.
 */
export function raiseMassNumbers(formula: string): string {
  const bracketed = formula.replace(/^\d{2}(?=(C|N|O|S)(?![a-z]))/, (mass, next: string) => (isNuclide(`${mass}${next}`) ? `^${mass}` : mass)).replace(/\((\d{1,3}[A-Z][a-z]?)\)/g, (whole, nuclide: string) => (isNuclide(nuclide) ? `[${nuclide}]` : whole));
  return bracketed.replace(/([A-Z][a-z]?)(\d{2,3})(?=(C|N|O|S)(?![a-z]))/g, (whole, element: string, digits: string, next: string, at: number) => {
    const mass = digits.slice(-2);
    const count = digits.slice(0, -2);
    if (!isNuclide(`${mass}${next}`) || couldBeCount(bracketed.slice(0, at), element, Number(digits))) return whole;
    return `${element}${count}^${mass}`;
  });
}
