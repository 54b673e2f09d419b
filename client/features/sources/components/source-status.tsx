import type { SourceSummary } from '#shared/contracts/sources.ts';
import { Notice } from '#client/ui/notice.tsx';
import { Tag } from '#client/ui/tag.tsx';

/** "corrected" or "retracted"; nothing for a source that stands as it was. */
export function SourceStatus({ status }: Pick<SourceSummary, 'status'>) {
  if (status === 'current') return null;
  return <Tag kind={status === 'retracted' ? 'refusal' : 'doubt'}>{status}</Tag>;
}

/** What the DOI service says of a correction or retraction. */
export function SourceNotice({ source }: { source: SourceSummary }) {
  if (source.status === 'current') return null;
  const retracted = source.status === 'retracted';
  return (
    <Notice kind={retracted ? 'refusal' : 'doubt'} title={retracted ? 'This source is retracted.' : 'This source has a correction.'} className="mb-6">
      {source.notice ?? 'The DOI service says so; no further words are given.'}
    </Notice>
  );
}
