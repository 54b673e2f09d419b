import type { Preview } from '#shared/contracts/entries.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { isApiError } from '#client/lib/api-error.ts';
import { CheckBars } from '#client/ui/check-bars.tsx';
import { Derivation } from '#client/ui/derivation.tsx';
import { NeighbourScale } from '#client/ui/neighbour-scale.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { PrintedConverted } from '#client/ui/printed-converted.tsx';
import { printedText, QuantityValue, quantityText, quantityWords } from '#client/ui/quantity-value.tsx';
import { Tag } from '#client/ui/tag.tsx';
import { Value } from '#client/ui/value.tsx';
import type { FormFault } from '../faults.ts';
import { FaultsList } from './faults-list.tsx';

interface LiveResultProps {
  preview: Preview | undefined;
  error: unknown;
  faults: readonly FormFault[];
  /** Nothing is typed yet. */
  empty: boolean;
}

/** What the entry would become, beside the form and as it is typed. */
export function LiveResult({ preview, error, faults, empty }: LiveResultProps) {
  const { unit, temperatureK } = useInstrument();
  const converted = preview?.quantities.filter((quantity) => quantity.asPrinted) ?? [];
  const own = ownOf(converted, unit);
  return (
    <div className="flex flex-col gap-7">
      <section className="section-line" aria-labelledby="live-converted">
        <h2 id="live-converted" className="pb-3">Converted</h2>
        {Boolean(error) && (
          <Notice kind="doubt" live title="The conversion is not up to date.">
            {isApiError(error) ? error.detail : 'The answer could not be read.'} The form goes on; it is tried again with the next change.
          </Notice>
        )}
        {converted.length === 0
          ? <p className="text-second">{empty ? 'Once a value is typed as printed, its conversion and derivation appear here.' : 'No value is typed yet.'}</p>
          : <div className="flex flex-col gap-5">{converted.map((quantity, index) => <ConvertedQuantity key={index} quantity={quantity} />)}</div>}
        {preview?.kAtT && (
          <div className="mt-5 border-t border-hairline pt-3">
            <p className="field-label">k at {temperatureK} K</p>
            <p className="text-lead">
              <Value value={preview.kAtT.value} unit={preview.kAtT.unit} u={preview.kAtT.uLnK} uScale="ln" significantDigits={3} />
              {preview.kAtT.extrapolated && <>{' '}<Tag kind="doubt">extrapolated</Tag></>}
            </p>
          </div>
        )}
      </section>

      {preview && preview.checks.length > 0 && (
        <section aria-labelledby="live-checks">
          <h2 id="live-checks" className="pb-3">Checks</h2>
          <CheckBars checks={preview.checks} />
        </section>
      )}

      {!empty && (
        <section aria-labelledby="live-faults">
          <h2 id="live-faults" className="pb-2">{faults.length === 0 ? 'Ready to submit' : 'What still stands in the way'}</h2>
          {faults.length === 0
            ? <p className="text-second">{preview ? 'Nothing is missing. The checks above do not block it; the reviewer sees them too.' : 'Waiting for the checks.'}</p>
            : <FaultsList faults={faults} />}
        </section>
      )}

      {preview?.step && (own || preview.neighbours.length > 0) && (
        <section aria-labelledby="live-neighbours">
          <h2 id="live-neighbours" className="pb-3">Among its neighbours</h2>
          <NeighbourScale neighbours={preview.neighbours} own={own} energyUnit={unit} most={8} />
        </section>
      )}
    </div>
  );
}

/** The value to set among the neighbours: the first energy that has one. */
function ownOf(quantities: readonly Quantity[], unit: Parameters<typeof quantityText>[1]) {
  const energy = quantities.find((quantity) => quantity.unit === 'kJ/mol');
  const at = energy?.value ?? energy?.high ?? energy?.low;
  return energy && at != null ? { energyKJPerMol: at, label: `this entry, ${quantityText(energy, unit)}` } : null;
}

function ConvertedQuantity({ quantity }: { quantity: Quantity }) {
  const { unit } = useInstrument();
  const reached = quantity.value !== null || quantity.low !== null || quantity.high !== null;
  return (
    <article>
      <PrintedConverted
        printed={printedText(quantity)}
        converted={<QuantityValue quantity={quantity} energyUnit={unit} large />}
        meaning={(
          <>
            {quantityWords(quantity)}
            {quantity.uncertaintyKind === 'unknown' && quantity.reportedUncertainty !== null && '; ± of unknown kind'}
            {quantity.missing && quantity.missing.length > 0 && <span className="block text-ochre">Missing: {quantity.missing.join('; ')}</span>}
          </>
        )}
        state={reached ? 'result' : 'doubt'}
      />
      {quantity.derivation.length > 0 && (
        <details className="pt-2" open>
          <summary className="w-fit text-fine text-second">Derivation, {quantity.derivation.length === 1 ? 'one step' : `${quantity.derivation.length} steps`}</summary>
          <Derivation lines={quantity.derivation} />
        </details>
      )}
    </article>
  );
}
