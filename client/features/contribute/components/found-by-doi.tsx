import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { isApiError } from '#client/lib/api-error.ts';
import { Button, TextButton } from '#client/ui/button.tsx';
import { Equation } from '#client/ui/equation.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { Tag } from '#client/ui/tag.tsx';
import { doiOptions } from '../api.ts';

interface FoundByDoiProps {
  doi: string;
  accession: string | null;
  onType: () => void;
  onStartOver: () => void;
}

/** What a DOI leads to: the citation, a notice of retraction or correction, and what is already entered from it. */
export function FoundByDoi({ doi, accession, onType, onStartOver }: FoundByDoiProps) {
  const { data, error, isFetching, refetch } = useQuery(doiOptions(doi));
  const change = <TextButton onClick={onStartOver}>Use another source</TextButton>;

  if (error && !data) {
    const unknown = isApiError(error, 'doi-not-found', 'not-found');
    return (
      <div className="flex flex-col gap-3">
        <Notice kind={unknown ? 'refusal' : 'doubt'} live title={unknown ? 'This DOI is not registered.' : 'The DOI could not be looked up now.'}>
          <code>{doi}</code>
          {unknown
            ? '. Compare it with the paper, character by character; or type the citation.'
            : `. ${isApiError(error) ? error.detail : 'The answer could not be read.'} Go on with the rest of the form: the DOI is kept and looked up later, or type the citation now.`}
        </Notice>
        <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
          {!unknown && <Button busy={isFetching} onClick={() => void refetch()}>Look up again</Button>}
          <Button onClick={onType}>Type the citation</Button>
          {change}
        </div>
      </div>
    );
  }
  if (!data) return <p role="status" className="text-second">Looking up <code>{doi}</code></p>;
  return (
    <div className="flex flex-col gap-3" aria-live="polite">
      <SourceNotice status={data.status} notice={data.notice} />
      <Notice kind="quotation">
        <p>{data.citation}</p>
        <p className="flex flex-wrap gap-x-4 text-fine text-second"><span>doi:{data.doi}</span>{data.source && <span>already in the store</span>}</p>
      </Notice>
      <AlreadyEntered entries={data.entries.filter((entry) => entry.accession !== accession)} />
      <div>{change}</div>
    </div>
  );
}

/** A retraction or correction, said before anything is typed from the source. */
export function SourceNotice({ status, notice }: { status: 'current' | 'corrected' | 'retracted'; notice: string | null }) {
  if (status === 'current') return null;
  return status === 'retracted'
    ? <Notice kind="refusal" live title="This source is retracted.">{notice} A value from it is not fit to be relied on; a reviewer will see the same notice.</Notice>
    : <Notice kind="doubt" live title="This source was corrected.">{notice} Take the value from the correction where it differs.</Notice>;
}

interface Entered {
  accession: string;
  equation: string;
  surface: string;
  asPrinted: string;
  state: string;
}

/** Entries already taken from the source, so that nothing is entered twice. */
function AlreadyEntered({ entries }: { entries: readonly Entered[] }) {
  if (entries.length === 0) return <p className="text-fine text-second">No accepted value and none of yours is from this source yet.</p>;
  return (
    <section aria-label="Already entered from this source">
      <p className="field-label">Already entered from this source: {entries.length}</p>
      <ul className="max-h-60 overflow-y-auto border-t border-rule" tabIndex={entries.length > 5 ? 0 : undefined}>
        {entries.map((entry) => (
          <li key={entry.accession} className="flex flex-wrap items-baseline gap-x-4 border-b border-hairline py-1">
            <Link to={`/entries/${entry.accession}`} target="_blank" aria-label={`Entry ${entry.accession}, in a new window`}>{entry.accession}</Link>
            <Equation equation={entry.equation} />
            <span>{entry.surface}</span>
            <samp>{entry.asPrinted}</samp>
            {entry.state !== 'accepted' && <Tag>{entry.state.replace('-', ' ')}</Tag>}
          </li>
        ))}
      </ul>
    </section>
  );
}
