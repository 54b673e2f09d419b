import type { DerivationLine } from '#shared/contracts/quantities.ts';
import { Formula } from './formula.tsx';

/** The way from as printed to converted: what was done at the left, the figure at the right, an assumption in ochre. */
export function Derivation({ lines }: { lines: readonly DerivationLine[] }) {
  if (lines.length === 0) return <p className="text-second">No operation was needed: the value is shown as printed.</p>;
  return (
    <ol className="derivation">
      {lines.map((line, index) => (
        <li key={index} className="derivation-step">
          <span className="derivation-number" aria-hidden="true">{index + 1}</span>
          <div className="min-w-0">
            <Formula text={line.operation} line />
            {line.constant && <span className="text-second">; <Formula text={line.constant} line /></span>}
            {' '}
            <span className="text-second text-fine">{line.reference}</span>
            {line.assumption && <p className="derivation-assumption"><b>Assumed:</b> <Formula text={line.assumption} line /></p>}
          </div>
          <samp className="derivation-figure">{line.to}</samp>
        </li>
      ))}
    </ol>
  );
}
