import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { stateWords } from '#shared/domain/states.ts';
import { LinkButton } from '#client/ui/button.tsx';
import { PageHead } from '#client/ui/page-head.tsx';
import { ErrorState, LoadingState, StatePanel } from '#client/ui/states.tsx';
import { draftOptions } from '../api.ts';
import type { HeldDraft } from '../draft-saver.ts';

/** Fetches a draft before the form opens; one that may not be edited any more says so. */
export function DraftGate({ accession, children }: { accession: string; children: (held: HeldDraft) => ReactNode }) {
  const { data, error, refetch } = useQuery({ ...draftOptions(accession), refetchOnReconnect: false });
  if (error && !data) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (!data) return <><PageHead title={`Draft ${accession}`} /><LoadingState what="the draft" /></>;
  const { draft } = data;
  if (!draft.actions.includes('edit')) {
    return (
      <>
        <PageHead title={`Entry ${accession}`} trail={[{ label: 'My submissions', to: '/contributions' }]} />
        <StatePanel
          line="sill"
          title={`This entry is ${stateWords[draft.state]} and cannot be edited`}
          actions={<><LinkButton look="primary" to="/contributions">Go to my submissions</LinkButton><LinkButton to={`/entries/${accession}`}>Open the entry</LinkButton></>}
        >
          <p>{draft.state === 'returned' ? 'Answer the reviewer from My submissions: that opens a new draft copied from this version.' : 'What was submitted is frozen; a change is a new version.'}</p>
        </StatePanel>
      </>
    );
  }
  return children(data);
}
