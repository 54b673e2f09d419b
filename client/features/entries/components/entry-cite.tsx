import { useId } from 'react';
import type { EntryDetail } from '#shared/contracts/entries.ts';
import { exportAddress } from '../api.ts';
import { entryTitle } from '../entry-words.ts';
import { orderedQuantities } from '../quantity-words.ts';
import { asPrinted } from '../row-figures.ts';
import { CopyButton } from './copy-button.tsx';

/** The address of this version for ever; of an entry that was never public there is none. */
export function permalinkOf({ links, version }: EntryDetail): string | null {
  return version === null ? null : `${links.page}/v/${version}`;
}

/** How the version shown is cited: the value, its source, and where it is kept. */
export function citationOf(entry: EntryDetail, demonstration: boolean): string | null {
  const permalink = permalinkOf(entry);
  if (permalink === null) return null;
  const [primary] = orderedQuantities(entry);
  const { state, accession, version, acceptedAt, source, step, surface } = entry;
  const what = primary ? `${asPrinted(primary)} for ${step?.equation ?? 'an elementary step'} on ${surface?.label ?? 'a surface'}` : entryTitle(entry);
  const standing = [acceptedAt ? `accepted ${acceptedAt.slice(0, 10)}` : null, state === 'accepted' ? null : state].filter(Boolean).join(', ');
  return `${what}${source ? `, reported by ${source.label}` : ''}. Sillstone, entry ${accession}, version ${version}${standing ? ` (${standing})` : ''}. ${permalink}${demonstration ? ' Invented demonstration data, not for use.' : ''}`;
}

/** How to cite the version shown, its permanent address, and its export. */
export function EntryCite({ entry, temperatureK, demonstration }: { entry: EntryDetail; temperatureK: number; demonstration: boolean }) {
  const heading = useId();
  const { accession, actions, version, state } = entry;
  const citation = citationOf(entry, demonstration);
  const permalink = permalinkOf(entry);
  return (
    <section aria-labelledby={heading}>
      <h2 id={heading} className="pb-2">Cite this entry</h2>
      {citation === null || permalink === null
        ? <p className="text-second">This revision is not public: it has no version and cannot be cited yet.</p>
        : (
          <>
            <p className="[overflow-wrap:anywhere]">{citation}</p>
            <p className="pt-1 text-fine text-second">
              {`The address names version ${version} and stays; without it, /entries/${accession} is the version accepted last. Cite the source as well.`}
              {state === 'accepted' ? '' : ` This version is ${state}: cite it only to say so.`}
            </p>
            <div className="flex flex-wrap gap-3 pt-3 no-print">
              <CopyButton label="Copy this sentence" copied="Sentence copied." text={citation} />
              <CopyButton label="Copy permalink" copied="Permalink copied." text={permalink} />
              {actions.includes('export') && <a className="button" href={exportAddress('zip', temperatureK, { accession: [accession] })} download>Export</a>}
            </div>
          </>
        )}
    </section>
  );
}
