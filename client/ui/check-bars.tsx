import type { Check } from '#shared/contracts/entries.ts';
import type { CheckCode } from '#shared/domain/check-codes.ts';
import { Notice, type NoticeKind } from './notice.tsx';
import { Tag } from './tag.tsx';

/** The checks in a few words: the first ones of a bar, the whole of a tag. */
const checkTitles: Readonly<Record<CheckCode, string>> = {
  'temperature-out-of-range': 'Temperature out of reach',
  'valid-range-reversed': 'Valid range reversed',
  'sticking-out-of-range': 'Sticking coefficient out of range',
  'negative-value': 'Negative value',
  'facet-impossible': 'Impossible facet',
  'unit-contradicts-orders': 'Unit contradicts the orders',
  'step-unbalanced': 'Step not balanced',
  'pre-exponential-unusual': 'Unusual pre-exponential factor',
  'negative-energy': 'Negative energy',
  'energy-below-reaction-energy': 'Below the reaction energy',
  'rate-above-limit': 'Above the collision limit',
  'kie-unusual': 'Unusual isotope effect',
  'uncertainty-larger-than-value': 'Uncertainty larger than the value',
  'uncertainty-unknown': 'Kind of ± unknown',
  'valid-range-narrow': 'Narrow valid range',
  'outlier': 'Outlier',
  'locator-missing': 'No place in the source',
  'end-state-reference-missing': 'End states without reference',
  'reverse-inconsistent': 'At odds with the reverse',
  'kie-disagrees-with-rates': 'Isotope effect at odds with the rates',
  'same-source-same-value': 'Already in the store',
  'quoted-elsewhere': 'Same value elsewhere',
  'source-retracted': 'Source retracted',
  'source-corrected': 'Source corrected',
  'free-sites-added': 'Free sites added',
};

/** An outlier that a common slip of unit or factor would bring among the others; its message says which. */
function isLikelySlip({ code, message }: Check): boolean {
  return code === 'outlier' && message.includes('would explain it');
}

function lookOf(check: Check): NoticeKind {
  if (check.severity === 'blocking' || check.code === 'source-retracted' || isLikelySlip(check)) return 'refusal';
  return check.severity === 'warning' ? 'doubt' : 'quotation';
}

function titleOf(check: Check): string {
  if (isLikelySlip(check)) return 'A slip of unit?';
  return check.severity === 'blocking' ? `${checkTitles[check.code]}, must be put right.` : `${checkTitles[check.code]}.`;
}

const order = { refusal: 0, doubt: 1, quotation: 2, result: 3 } as const;
const weightiestFirst = (checks: readonly Check[]) => [...checks].sort((a, b) => order[lookOf(a)] - order[lookOf(b)]);

/** The checks an entry raised, as bars: rust for what must be put right and for a likely slip, ochre for a doubt. */
export function CheckBars({ checks, none }: { checks: readonly Check[]; none?: string }) {
  if (checks.length === 0) return none ? <p className="text-second">{none}</p> : null;
  return (
    <ul className="flex flex-col gap-2">
      {weightiestFirst(checks).map((check) => (
        <li key={check.code + check.message}>
          <Notice kind={lookOf(check)} title={titleOf(check)}>{check.message}</Notice>
        </li>
      ))}
    </ul>
  );
}

/** The checks in few words, the weightiest first; what is only a note is left to the entry's own page. */
export function CheckTags({ checks }: { checks: readonly Check[] }) {
  const named = weightiestFirst(checks).filter((check) => check.severity !== 'note');
  if (named.length === 0) return null;
  return (
    <ul className="flex flex-wrap gap-1.5 pt-1" aria-label="Checks raised">
      {named.map((check) => (
        <li key={check.code + check.message} title={check.message}>
          <Tag kind={lookOf(check) === 'refusal' ? 'refusal' : 'doubt'}>{isLikelySlip(check) ? 'slip of unit?' : checkTitles[check.code].toLowerCase()}</Tag>
        </li>
      ))}
    </ul>
  );
}
