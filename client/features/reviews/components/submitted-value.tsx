import type { Entry } from '#shared/contracts/entries.ts';
import { kindWord, provenanceWords, sampleTypeWords, type SampleType } from '#shared/domain/kinds.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { Derivation } from '#client/ui/derivation.tsx';
import { Equation } from '#client/ui/equation.tsx';
import { Facts } from '#client/ui/facts.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { printedText, QuantityValue, quantityWords } from '#client/ui/quantity-value.tsx';
import { Tag } from '#client/ui/tag.tsx';
import { Value } from '#client/ui/value.tsx';
import { SurfaceLabel } from '#client/ui/surface-label.tsx';
import { conditionFacts } from '../condition-facts.ts';

/** What was handed in: as printed, converted, and everything else a reviewer holds against the paper. */
export function SubmittedValue({ entry }: { entry: Entry }) {
  const { unit } = useInstrument();
  const { source, method, validRange, surface } = entry;
  return (
    <section aria-labelledby="submitted">
      <h2 id="submitted" className="pb-2">Submitted</h2>
      <div className="flex flex-col gap-2.5">
        {entry.quantities.map((quantity, index) => (
          <div key={index} className="flex flex-col gap-2.5">
            <Notice kind="quotation"><span className="sr-only">As printed: </span><samp className="printed-value">{printedText(quantity)}</samp></Notice>
            <Notice kind={quantity.value === null && quantity.low === null && quantity.high === null ? 'doubt' : 'result'}>
              <span className="sr-only">Converted: </span>
              <QuantityValue quantity={quantity} energyUnit={unit} large />
              <p className="text-second">
                {quantityWords(quantity)}
                {quantity.multiplier != null && `; the column heading multiplies by ${quantity.multiplier}`}
                {quantity.uncertaintyKind === 'unknown' && quantity.reportedUncertainty !== null && '; ± of unknown kind'}
              </p>
              {quantity.missing && quantity.missing.length > 0 && <p className="text-ochre">Missing: {quantity.missing.join('; ')}</p>}
            </Notice>
            {quantity.derivation.length > 0 && (
              <details open={entry.quantities.length === 1}>
                <summary className="w-fit text-fine text-second">Derivation</summary>
                <Derivation lines={quantity.derivation} />
              </details>
            )}
          </div>
        ))}
      </div>
      <div className="pt-4">
        <Facts
          facts={[
            { name: 'Elementary step', value: entry.step && <Equation equation={entry.step.equation} /> },
            { name: 'Surface', value: surface && <><SurfaceLabel label={surface.label} />{surface.sampleType && `, ${sampleTypeWords[surface.sampleType as SampleType] ?? surface.sampleType}`}</> },
            { name: 'Kind', value: [entry.kind && kindWord[entry.kind], entry.scope].filter(Boolean).join(', ') || null },
            { name: 'Came by', value: entry.provenance && provenanceWords[entry.provenance] },
            { name: 'Method', value: [method.class, method.technique, method.detail].filter(Boolean).join(', ') || null },
            ...conditionFacts(entry),
            { name: 'Valid range', value: validRange && (validRange.min !== null || validRange.max !== null) ? `${validRange.min ?? '…'} to ${validRange.max ?? '…'} K` : null },
            { name: 'Where', value: entry.locator },
            {
              name: 'Source',
              value: source && (
                <>
                  {source.label}{source.container && <>, <i>{source.container}</i></>}
                  {source.doi && <>, <a href={`https://doi.org/${encodeURI(source.doi)}`} rel="noreferrer" target="_blank">doi:{source.doi}</a></>}
                  {source.status !== 'current' && <>{' '}<Tag kind={source.status === 'retracted' ? 'refusal' : 'doubt'}>{source.status}</Tag></>}
                </>
              ),
            },
            ...(entry.kAtT ? [{
              name: `k at ${entry.kAtT.temperatureK} K`,
              value: <><Value value={entry.kAtT.value} unit={entry.kAtT.unit} significantDigits={3} />{entry.kAtT.extrapolated && <>{' '}<Tag kind="doubt">extrapolated</Tag></>}</>,
            }] : []),
            ...(entry.note ? [{ name: 'Note', value: <span className="whitespace-pre-wrap">{entry.note}</span> }] : []),
          ]}
        />
      </div>
    </section>
  );
}
