import { useQuery } from '@tanstack/react-query';
import type { SourceSummary } from '#shared/contracts/sources.ts';
import { isApiError } from '#client/lib/api-error.ts';
import { TextButton } from '#client/ui/button.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { citationOptions } from '../api.ts';
import { FoundByDoi, SourceNotice } from './found-by-doi.tsx';

interface FoundCitationProps {
  via: 'bibtex' | 'ris';
  text: string;
  onStartOver: () => void;
}

const names = { bibtex: 'BibTeX', ris: 'RIS' } as const;

/** A pasted citation as it is read. */
export function FoundCitation({ via, text, onStartOver }: FoundCitationProps) {
  const { data, error, isPending } = useQuery(citationOptions(via === 'bibtex' ? { bibtex: text } : { ris: text }));
  return (
    <div className="flex flex-col gap-3" aria-live="polite">
      {isPending && <p role="status" className="text-second">Reading the {names[via]}</p>}
      {data && (
        <Notice kind="quotation">
          <p>{data.formatted}</p>
          <p className="text-fine text-second">read from {names[via]}; citation key {data.key}</p>
        </Notice>
      )}
      {error && (
        <Notice kind="refusal" live title={`The ${names[via]} could not be read.`}>
          {isApiError(error) ? error.detail : 'The answer could not be read.'} Paste it again, or type the citation.
        </Notice>
      )}
      <details>
        <summary className="w-fit text-fine text-second">As pasted</summary>
        <pre className="mt-2 max-h-56 overflow-auto border-l-4 border-ink bg-raised p-3 text-fine whitespace-pre-wrap" tabIndex={0}>{text}</pre>
      </details>
      <div><TextButton onClick={onStartOver}>Use another source</TextButton></div>
    </div>
  );
}

interface HeldSourceProps {
  held: SourceSummary | null;
  doi: string;
  accession: string | null;
  onStartOver: () => void;
}

/** A source the store holds already. */
export function HeldSource({ held, doi, accession, onStartOver }: HeldSourceProps) {
  if (doi) return <FoundByDoi doi={doi} accession={accession} onType={onStartOver} onStartOver={onStartOver} />;
  return (
    <div className="flex flex-col gap-3">
      {held && <SourceNotice status={held.status} notice={held.notice} />}
      <Notice kind="quotation">
        {held
          ? <p>{held.authors}{held.year !== null && ` (${held.year})`}. {held.title}.{held.container && <> <i>{held.container}</i>.</>}</p>
          : <p>A source the store holds; its citation is shown when the draft is saved.</p>}
      </Notice>
      <div><TextButton onClick={onStartOver}>Use another source</TextButton></div>
    </div>
  );
}
