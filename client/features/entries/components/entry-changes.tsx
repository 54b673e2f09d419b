import { queryOptions, useQuery } from '@tanstack/react-query';
import { useEffect, useId, useRef } from 'react';
import { useLocation, useSearchParams } from 'react-router-dom';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { getEntryChanges, type EntryChanges as Changes, type EntryDetail } from '#shared/contracts/entries.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';
import { symbolWords } from '#shared/domain/kinds.ts';
import { stateWords } from '#shared/domain/states.ts';
import { call } from '#client/lib/api-client.ts';
import { formatDate } from '#client/lib/dates.ts';
import { Button } from '#client/ui/button.tsx';
import { SelectField, type Choice } from '#client/ui/field.tsx';
import { ErrorState, LoadingState } from '#client/ui/states.tsx';
import { boundText, uncertaintyText } from '../quantity-words.ts';
import { Converted } from './entry-quantities.tsx';

const changesOptions = (accession: string, from: string, to: string) => queryOptions({
  queryKey: ['entries', 'one', accession, 'changes', from, to],
  queryFn: ({ signal }) => call(getEntryChanges, { params: { accession }, query: { from, to }, signal }),
});

type Comparable = EntryDetail['revisions'][number];

/** A version by its number, a revision that is no version as "r3": what the address holds. */
const nameOf = ({ version, revision }: Pick<Comparable, 'version' | 'revision'>) => (version === null ? `r${revision}` : String(version));
const wordsOf = ({ version, revision }: Pick<Comparable, 'version' | 'revision'>) => (version === null ? `revision ${revision}` : `version ${version}`);

/** The pair of versions in the address, and what changes it. */
function useChosenPair() {
  const [params, setParams] = useSearchParams();
  const choose = (change: { from: string; to: string } | null, opened = false) => setParams((before) => {
    const next = new URLSearchParams(before);
    for (const name of ['from', 'to'] as const) {
      if (change) next.set(name, change[name]);
      else next.delete(name);
    }
    return next;
  }, { replace: true, preventScrollReset: true, state: opened ? { opened: 'changes' } : null });
  return { pair: { from: params.get('from'), to: params.get('to') }, choose };
}

/** What is compared when nothing is named: the version shown with the one before it, or the first with the one after. */
function usualPair(entry: EntryDetail): { from: string; to: string; words: string } {
  const shown = nameOf(entry);
  // A version is set beside a version: a revision withdrawn in between says nothing to readers.
  const names = entry.revisions.filter(({ version, revision }) => entry.version === null || version !== null || revision === entry.revision).map(nameOf);
  const own = Math.max(0, names.indexOf(shown));
  const before = names[own - 1];
  if (before !== undefined) return { from: before, to: shown, words: 'Compare with the version before' };
  const after = names[own + 1] ?? entry.revisions.map(nameOf).find((name) => name !== shown) ?? shown;
  return { from: shown, to: after, words: 'Compare with the version after' };
}

/** Opens the comparison; nothing where there is only one version, or where it is open. */
export function CompareVersions({ entry }: { entry: EntryDetail }) {
  const { pair, choose } = useChosenPair();
  if (entry.revisions.length < 2 || pair.from !== null || pair.to !== null) return null;
  const { words, from, to } = usualPair(entry);
  return <p className="pt-3 no-print"><Button onClick={() => choose({ from, to }, true)}>{words}</Button></p>;
}

/** Two versions of the entry side by side, chosen by two pickers; the choice is in the address, so that a link shows the same. */
export function EntryChanges({ entry, unit }: { entry: EntryDetail; unit: EnergyUnit }) {
  const { pair, choose } = useChosenPair();
  const heading = useRef<HTMLHeadingElement>(null);
  const id = useId();
  const open = pair.from !== null || pair.to !== null;
  const opened = (useLocation().state as { opened?: unknown } | null)?.opened === 'changes';
  // Opened by a press, it takes the focus, since it stands elsewhere than the button did.
  useEffect(() => {
    if (open && opened) heading.current?.focus();
  }, [open, opened]);
  if (!open) return null;
  const { revisions, accession } = entry;
  const usual = usualPair(entry);
  const chosen = { from: pair.from ?? usual.from, to: pair.to ?? usual.to };
  const choices: Choice[] = revisions.map((one) => ({ value: nameOf(one), label: `${wordsOf(one)}, ${stateWords[one.state]}, ${formatDate(one.at)}` }));
  // What a link names and the viewer may not see stays in the picker, so that it does not say another than the one asked for.
  const withNamed = (name: string): Choice[] => (choices.some(({ value }) => value === name) ? choices : [{ value: name, label: `${name.slice(0, 8)}, not among those you may see` }, ...choices]);
  return (
    <section aria-labelledby={id} className="pt-9">
      <h2 id={id} ref={heading} tabIndex={-1} className="pb-2">Two versions side by side</h2>
      <div className="flex flex-wrap items-end gap-3 pb-3 no-print">
        <SelectField label="From" className="min-w-0 max-w-full" choices={withNamed(chosen.from)} value={chosen.from} onChange={(event) => choose({ ...chosen, from: event.target.value })} />
        <SelectField label="To" className="min-w-0 max-w-full" choices={withNamed(chosen.to)} value={chosen.to} onChange={(event) => choose({ ...chosen, to: event.target.value })} />
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
              <td className="text-second"><del className="no-underline"><ConvertedSide quantity={before} unit={unit} /></del></td>
              <td><ins className="no-underline"><ConvertedSide quantity={after} unit={unit} /></ins></td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function ConvertedSide({ quantity, unit }: { quantity: Quantity | null; unit: EnergyUnit }) {
  if (!quantity) return 'not given';
  return (
    <>
      <Converted quantity={quantity} unit={unit} />
      <span className="block text-fine text-second">{[boundText(quantity), uncertaintyText(quantity)].filter(Boolean).join('; ')}</span>
    </>
  );
}
