/** One operation on the way from the value as printed to the converted value. */
export interface DerivationLine {
  /** What was done, in plain words. */
  operation: string;
  /** The value with its unit before the operation. */
  from: string;
  /** The value with its unit after it. */
  to: string;
  /** The constant used, with its value and unit. */
  constant?: string;
  /** What was taken for granted, and where it came from. */
  assumption?: string;
  /** The standard, paper or rule behind the operation. */
  reference: string;
}

/** References that derivations cite, spelled once. */
export const references = {
  siBrochure: 'BIPM SI Brochure, 9th edition',
  sp811: 'NIST SP 811 (2008)',
  codata: 'CODATA 2022',
  gum: 'JCGM 100:2008 (GUM)',
  greenBook: 'IUPAC Green Book, 3rd edition',
  glossary: 'IUPAC glossary of terms used in chemical kinetics, Pure Appl. Chem. 68 (1996) 149',
  printed: 'as printed in the source',
  idealGas: 'ideal gas law, k_p = k_c/(RT)^g',
  siteBalance: 'rate per area = site density × rate per site',
} as const;

/** Writes a number at full double precision, as a power of ten outside 1e-4 to 1e7, with a unit after it when there is one. */
export function quantityText(value: number, unit = ''): string {
  const size = Math.abs(value);
  const text = size !== 0 && (size >= 1e7 || size < 1e-4) ? value.toExponential().replace('e+', 'e') : String(value);
  return unit && unit !== '1' ? `${text} ${unit}` : text;
}

/** The first line of every derivation: what the source prints. */
export function printedLine(text: string, unit: string | null, reading: string): DerivationLine {
  return {
    operation: 'Read the printed value',
    from: unit && !text.includes(unit) ? `${text} ${unit}` : text,
    to: reading,
    reference: references.printed,
  };
}

/** What was read, as the first line states it: `≥ 22.1 kcal/mol`, `24 to 27 kJ/mol`. */
export function readingText({ bound, value, low, high }: { bound: string; value: number | null; low: number | null; high: number | null }, unit = ''): string {
  if (bound === 'range') return `${quantityText(low as number)} to ${quantityText(high as number, unit)}`;
  return `${bound === '=' ? '' : `${bound} `}${quantityText(value as number, unit)}`;
}

/** A line for a multiplication or another operation that turns one number into another. */
export function operationLine(
  operation: string,
  from: { value: number; unit?: string },
  to: { value: number; unit?: string },
  reference: string,
  extra: { constant?: string; assumption?: string } = {},
): DerivationLine {
  return { operation, from: quantityText(from.value, from.unit), to: quantityText(to.value, to.unit), ...extra, reference };
}

/**
 * Lets every line of a value with a bound keep it, and every line of a range show both of its ends.
 *
 * @param lines the lines of the value, of the limit, or of the lower end
 * @param upper the lines of the upper end of a range
 * @example boundLines('≥', [operationLine('Unit kept', { value: 1, unit: 'eV' }, { value: 1, unit: 'eV' }, '')])[0].to // '≥ 1 eV'
 */
export function boundLines(bound: string, lines: readonly DerivationLine[], upper: readonly DerivationLine[] = []): DerivationLine[] {
  const figure = (text: string, other: string | undefined): string => {
    if (other !== undefined) return `${text.split(' ', 1)[0]} to ${other}`;
    return bound === '=' ? text : `${bound} ${text}`;
  };
  return lines.map((line, i) => ({ ...line, from: figure(line.from, upper[i]?.from), to: figure(line.to, upper[i]?.to) }));
}
