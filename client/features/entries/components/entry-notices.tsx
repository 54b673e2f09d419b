import { Link } from 'react-router-dom';
import { stateWords } from '#shared/domain/states.ts';
import type { EntryDetail } from '#shared/contracts/entries.ts';
import { formatDate } from '#client/lib/dates.ts';
import { Notice } from '#client/ui/notice.tsx';

/** What must be known before the value is read: it is replaced, taken back, not public, or its source has a notice. */
export function EntryNotices({ entry }: { entry: EntryDetail }) {
  const { state, accession, source, versions, version } = entry;
  const current = versions.find((one) => one.state === 'accepted' && one.version !== version);
  const link = current && <Link to={`/entries/${accession}`}>{`Version ${current.version}`}</Link>;
  return (
    <div className="flex flex-col gap-3 pb-6 empty:hidden">
      {state === 'superseded' && (
        <Notice kind="doubt" title="This version is superseded.">
          {link ? <>{link} stands in its place, accepted {current && formatDate(current.acceptedAt)}.</> : 'A later version stood in its place.'} It stays readable; it is no longer searched, counted or exported.
        </Notice>
      )}
      {state === 'retracted' && (
        <Notice kind="refusal" title="This version is retracted.">
          {entry.notice ?? 'No public reason is given.'} It is no longer searched, counted or exported. {link && <>{link} is accepted.</>}
        </Notice>
      )}
      {!(['accepted', 'superseded', 'retracted'] as string[]).includes(state) && (
        <Notice kind="doubt" title={`Not public: ${stateWords[state]}.`}>
          Only its contributor, reviewers and curators see this revision. Its value has not been accepted.
        </Notice>
      )}
      {source && source.status !== 'current' && (
        <Notice kind={source.status === 'retracted' ? 'refusal' : 'doubt'} title={source.status === 'retracted' ? 'The source is retracted.' : 'The source has a correction.'}>
          {source.notice ?? 'The DOI service says so; no further words are given.'}
        </Notice>
      )}
    </div>
  );
}
