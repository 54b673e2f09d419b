import { primarySymbol, uncertaintyKindWords } from '#shared/domain/kinds.ts';
import type { Entry } from '#shared/contracts/entries.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';

/** The quantities of an entry, the primary one first. */
export function orderedQuantities(entry: Pick<Entry, 'kind' | 'quantities'>): Quantity[] {
  const primary = entry.kind ? primarySymbol[entry.kind] : null;
  const first = entry.quantities.filter((one) => one.symbol === primary);
  return [...first, ...entry.quantities.filter((one) => one.symbol !== primary)];
}

/** The uncertainty of a quantity and its kind, in words. */
export function uncertaintyText(quantity: Quantity): string {
  const { uncertaintyKind, standardUncertainty, reportedUncertainty, reportedMinus, reportedPlus, bound } = quantity;
  const asymmetric = reportedMinus != null && reportedPlus != null;
  const reported = asymmetric ? `+${reportedPlus}/\u2212${reportedMinus} reported` : reportedUncertainty !== null ? `± ${reportedUncertainty} reported` : null;
  if (reported === null) return bound === '=' || bound === '≈' ? 'no uncertainty reported' : 'a limit, without uncertainty';
  if (uncertaintyKind === 'none' || uncertaintyKind === 'unknown') return `${reported}, kind unknown`;
  if (uncertaintyKind === 'standard' && standardUncertainty !== null) return '± is one standard uncertainty, as reported';
  const kind = `${reported} as ${withArticle(uncertaintyKindWords[uncertaintyKind])}`;
  return standardUncertainty === null ? `${kind}, from which no standard uncertainty follows` : `${kind}; ± is one standard uncertainty`;
}

function withArticle(words: string): string {
  return `${/^[aeiou]/.test(words) ? 'an' : 'a'} ${words}`;
}

/** What a bound says of the value, in words; null for a plain value. */
export function boundText({ bound }: Quantity): string | null {
  switch (bound) {
    case '=': return null;
    case '≈': return 'printed as approximate; left out of means';
    case 'range': return 'printed as a range; left out of means';
    case '<':
    case '≤': return 'an upper limit; left out of means';
    case '>':
    case '≥': return 'a lower limit; left out of means';
  }
}
