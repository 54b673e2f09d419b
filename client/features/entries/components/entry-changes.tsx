import { queryOptions, useQuery } from '@tanstack/react-query';
import { useId } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { getEntryChanges, type EntryChanges as Changes, type EntryDetail } from '#shared/contracts/entries.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';
import { symbolWords } from '#shared/domain/kinds.ts';
import { stateWords } from '#shared/domain/states.ts';
import { call } from '#client/lib/api-client.ts';
import { formatDate } from '#client/lib/dates.ts';
import { Button } from '#client/ui/button.tsx';
import { SelectField, type Choice } from '#client/ui/field.tsx';
import { QuantityValue } from '#client/ui/quantity-value.tsx';
import { ErrorState, LoadingState } from '#client/ui/states.tsx';
import { boundText, uncertaintyText } from '../quantity-words.ts';

const changesOptions = (accession: string, from: string, to: string) => queryOptions({
  queryKey: ['entries', 'one', accession, 'changes', from, to],
  queryFn: ({ signal }) => call(getEntryChanges, { params: { accession }, query: { from, to }, signal }),
});

type Comparable = EntryDetail['revisions'][number];

/** A version by its number, a revision that is no version as "r3": what the address holds. */
const nameOf = ({ version, revision }: Pick<Comparable, 'version' | 'revision'>) => (version === null ? `r${revision}` : String(version));
const wordsOf = ({ version, revision }: Pick<Comparable, 'version' | 'revision'>) => (version === null ? `revision ${revision}` : `version ${version}`);

/** Two versions of the entry side by side, chosen by two pickers; the choice is in the address, so that a link shows the same. */
export function EntryChanges({ entry, unit }: { entry: EntryDetail; unit: EnergyUnit }) {
  const [params, setParams] = useSearchParams();
  const heading = useId();
  const { revisions, accession } = entry;
  const names = revisions.map(nameOf);
  const shownName = nameOf(entry);
  const own = Math.max(0, names.indexOf(shownName));
  const from = params.get('from');
  const to = params.get('to');
  const choose = (change: { from: string; to: string } | null) => setParams((before) => {
    const next = new URLSearchParams(before);
    for (const name of ['from', 'to'] as const) {
      if (change) next.set(name, change[name]);
      else next.delete(name);
    }
    return next;
  }, { replace: true, preventScrollReset: true });
  if (revisions.length < 2 && from === null && to === null) return null;
  const before = names[own - 1];
  // The first version has none before it: the next one is set beside it instead.
  const usual = before === undefined ? { from: shownName, to: names[own + 1] ?? shownName } : { from: before, to: shownName };
  if (from === null && to === null) {
    return (
      <p className="pt-3 no-print">
        <Button onClick={() => choose(usual)}>{before === undefined ? 'Compare with the version after' : 'Compare with the version before'}</Button>
      </p>
    );
  }
  const chosen = { from: from ?? usual.from, to: to ?? usual.to };
  const choices: Choice[] = revisions.map((one) => ({ value: nameOf(one), label: `${wordsOf(one)}, ${stateWords[one.state]}, ${formatDate(one.at)}` }));
  // What a link names and the viewer may not see stays in the picker, so that it does not say another than the one asked for.
  const withNamed = (name: string): Choice[] => (names.includes(name) ? choices : [{ value: name, label: `${name.slice(0, 8)}, not among those you may see` }, ...choices]);
  return (
    <section aria-labelledby={heading} className="pt-5">
      <h3 id={heading} className="pb-2">Two versions side by side</h3>
      <div className="flex flex-wrap items-end gap-3 pb-3 no-print">
        <SelectField label="From" className="min-w-0 grow" choices={withNamed(chosen.from)} value={chosen.from} onChange={(event) => choose({ ...chosen, from: event.target.value })} />
        <SelectField label="To" className="min-w-0 grow" choices={withNamed(chosen.to)} value={chosen.to} onChange={(event) => choose({ ...chosen, to: event.target.value })} />
        <Button onClick={() => choose(null)}>Close</Button>
      </div>
      <Difference accession={accession} from={chosen.from} to={chosen.to} unit={unit} />
    </section>
  );
}

function Difference({ accession, from, to, unit }: { accession: string; from: string; to: string; unit: EnergyUnit }) {
  const { data, error, refetch } = useQuery(changesOptions(accession, from, to));
  if (error) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (!data) return <LoadingState what="the two versions" rows={3} />;
  if (data.changes.length === 0 && data.quantities.length === 0) {
    return <p className="text-second">{from === to ? 'The same version is chosen twice.' : 'Nothing differs: neither what was typed nor what it was converted to.'}</p>;
  }
  return <DifferenceTable changes={data} unit={unit} />;
}

function DifferenceTable({ changes: { changes, quantities, from, to }, unit }: { changes: Changes; unit: EnergyUnit }) {
  return (
    <div className="table-frame" role="group" aria-label="What differs" tabIndex={0}>
      <table className="data-table entry-changes">
        <thead>
          <tr>
            <th scope="col">What differs</th>
            <th scope="col">{wordsOf(from)}</th>
            <th scope="col">{wordsOf(to)}</th>
          </tr>
        </thead>
        <tbody>
          {changes.map((change, index) => (
            <tr key={`${change.field} ${index}`} className="align-top">
              <th scope="row">{change.field}</th>
              <td className="text-second [overflow-wrap:anywhere]"><del className="no-underline">{change.before}</del></td>
              <td className="[overflow-wrap:anywhere]"><ins className="no-underline">{change.after}</ins></td>
            </tr>
          ))}
          {quantities.map(({ symbol, before, after }, index) => (
            <tr key={`converted ${symbol} ${index}`} className="align-top">
              <th scope="row">{`${symbolWords[symbol].replace(/^./, (first) => first.toUpperCase())}, converted`}</th>
              <td className="text-second"><del className="no-underline"><Converted quantity={before} unit={unit} /></del></td>
              <td><ins className="no-underline"><Converted quantity={after} unit={unit} /></ins></td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Converted({ quantity, unit }: { quantity: Quantity | null; unit: EnergyUnit }) {
  if (!quantity) return 'not given';
  return (
    <>
      <QuantityValue quantity={quantity} energyUnit={unit} />
      <span className="block text-fine text-second">{[boundText(quantity), uncertaintyText(quantity)].filter(Boolean).join('; ')}</span>
    </>
  );
}
