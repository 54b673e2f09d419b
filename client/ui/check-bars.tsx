import type { Check } from '#shared/contracts/entries.ts';
import { Notice, type NoticeKind } from './notice.tsx';

function lookOf({ code, severity }: Check): NoticeKind {
  if (severity === 'blocking' || code.includes('slip')) return 'refusal';
  return severity === 'warning' ? 'doubt' : 'quotation';
}

/** The first words of a check: what it is about, from its code, unless the message says so itself. */
function titleOf({ code, severity }: Check): string {
  const words = code.replaceAll('-', ' ');
  const sentence = words.charAt(0).toUpperCase() + words.slice(1);
  return severity === 'blocking' ? `${sentence}, must be put right.` : `${sentence}.`;
}

const order = { blocking: 0, warning: 1, note: 2 } as const;

/** The checks an entry raised, as bars: rust for what must be put right and for a likely slip, ochre for a doubt. */
export function CheckBars({ checks, none }: { checks: readonly Check[]; none?: string }) {
  if (checks.length === 0) return none ? <p className="text-second">{none}</p> : null;
  const sorted = [...checks].sort((a, b) => order[a.severity] - order[b.severity]);
  return (
    <ul className="flex flex-col gap-2">
      {sorted.map((check) => (
        <li key={check.code + check.message}>
          <Notice kind={lookOf(check)} title={titleOf(check)}>{check.message}</Notice>
        </li>
      ))}
    </ul>
  );
}
