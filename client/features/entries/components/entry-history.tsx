import { Link } from 'react-router-dom';
import { stateWords } from '#shared/domain/states.ts';
import type { EntryDetail } from '#shared/contracts/entries.ts';
import { formatDate } from '#client/lib/dates.ts';
import { CompareVersions } from './entry-changes.tsx';

/** What happened to the entry, newest first, and its public versions. */
export function EntryHistory({ entry }: { entry: EntryDetail }) {
  const { history, versions, accession, version } = entry;
  const lines = [...history].reverse();
  return (
    <section>
      <h2 className="pb-2">History</h2>
      <ol>
        {lines.map((line, index) => (
          <li key={index} className="grid grid-cols-[6.5rem_minmax(0,1fr)] gap-x-4 py-1">
            <time className="text-second" dateTime={line.at}>{formatDate(line.at)}</time>
            <span>{withName(line.what, line.by)}</span>
          </li>
        ))}
      </ol>
      {versions.length > 1 && (
        <p className="pt-2 text-second">
          Versions:{' '}
          {versions.map((one, index) => (
            <span key={one.version}>
              {index > 0 && ', '}
              {one.version === version
                ? <b className="text-ink">{`${one.version}, shown`}</b>
                : <Link to={one.state === 'accepted' ? `/entries/${accession}` : `/entries/${accession}/v/${one.version}`}>{one.version}</Link>}
              {` (${stateWords[one.state]})`}
            </span>
          ))}
        </p>
      )}
      <CompareVersions entry={entry} />
    </section>
  );
}

/** "Version 2 accepted by I. Okonjo-Vale: uncertainty read as two standard deviations". */
function withName(what: string, by: string): string {
  if (what.includes(by)) return what;
  const [deed = '', ...words] = what.split(': ');
  return [`${deed} by ${by}`, ...words].join(': ');
}
