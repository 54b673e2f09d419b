import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { EntryAction } from '#shared/contracts/entries.ts';
import { kindWord } from '#shared/domain/kinds.ts';
import { stateWords, type State } from '#shared/domain/states.ts';
import { formatDate } from '#client/lib/dates.ts';
import { Button, LinkButton } from '#client/ui/button.tsx';
import { Equation } from '#client/ui/equation.tsx';
import { LoadMore } from '#client/ui/pagination.tsx';
import { EmptyState, ErrorState, LoadingState } from '#client/ui/states.tsx';
import { Tag, type TagKind } from '#client/ui/tag.tsx';
import { SurfaceLabel } from '#client/ui/surface-label.tsx';
import { useMyEntries } from '../use-my-entries.ts';
import { ReviseDialog } from './revise-dialog.tsx';
import { WithdrawDialog } from './withdraw-dialog.tsx';

const stateLook: Partial<Record<State, TagKind>> = { accepted: 'result', returned: 'doubt', rejected: 'refusal', retracted: 'refusal' };

/** The colour of a state's tag repeats what its word says. */
function StateTag({ state }: { state: State }) {
  return <Tag kind={stateLook[state] ?? 'plain'}>{stateWords[state]}</Tag>;
}

type MyEntry = ReturnType<typeof useMyEntries>['items'][number];
type Asked = { what: 'withdraw' | 'revise'; entry: MyEntry } | null;

interface MyEntriesProps {
  state: State | null;
  onOpenDraft: (accession: string) => void;
}

/** My entries, each with where it stands and what can be done about it. */
export function MyEntries({ state, onOpenDraft }: MyEntriesProps) {
  const { items, total, totalIsExact, error, isPending, hasNextPage, isFetchingNextPage, fetchNextPage, refetch } = useMyEntries(state);
  const [asked, setAsked] = useState<Asked>(null);

  if (error && items.length === 0) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (isPending) return <LoadingState what="your submissions" />;
  if (items.length === 0) {
    return (
      <EmptyState
        title={state ? `Nothing of yours is ${stateWords[state]}` : 'You have entered nothing yet'}
        actions={<LinkButton look="primary" to="/contribute">Enter a value</LinkButton>}
      >
        <p>{state ? 'Choose another state above, or enter a value from a paper.' : 'Take a paper at hand: its DOI, one value as printed, and the place where it stands are enough for a draft.'}</p>
      </EmptyState>
    );
  }
  return (
    <>
      <ul className="border-t border-ink">
        {items.map((entry) => <MyEntryRow key={`${entry.accession}-${entry.revision}`} entry={entry} onAsk={(what) => setAsked({ what, entry })} />)}
      </ul>
      <LoadMore
        shown={items.length} total={total} totalIsExact={totalIsExact} hasMore={hasNextPage} busy={isFetchingNextPage} onMore={() => void fetchNextPage()}
      />
      <WithdrawDialog entry={asked?.what === 'withdraw' ? asked.entry : null} onClose={() => setAsked(null)} />
      <ReviseDialog entry={asked?.what === 'revise' ? asked.entry : null} onClose={() => setAsked(null)} onOpened={onOpenDraft} />
    </>
  );
}

function MyEntryRow({ entry, onAsk }: { entry: MyEntry; onAsk: (what: 'withdraw' | 'revise') => void }) {
  const may = (action: EntryAction) => entry.actions.includes(action);
  const isDraft = may('edit');
  const title = entry.equation ? <Equation display equation={entry.equation} /> : <span className="text-second">no elementary step yet</span>;
  return (
    <li className="grid gap-x-8 gap-y-2 border-b border-hairline py-4 mid:grid-cols-[minmax(0,1fr)_minmax(0,1fr)_9.5rem]">
      <div className="min-w-0">
        <p className="text-lead">{title}</p>
        <p>
          {entry.surface ? <SurfaceLabel label={entry.surface} /> : <span className="text-second">no surface yet</span>}
          {entry.kind && <span className="text-second">{`, ${kindWord[entry.kind]}`}</span>}
        </p>
        <p><samp>{[entry.asPrinted, entry.unitAsPrinted].filter(Boolean).join(' ')}</samp></p>
        <p className="text-fine text-second">{entry.sourceLabel ?? 'no source yet'} · {entry.accession}{entry.version !== null && `, version ${entry.version}`}</p>
      </div>
      <div className="min-w-0">
        <p><StateTag state={entry.state} /> <span>{entry.standing}</span></p>
        <p className="text-fine text-second">{formatDate(entry.changedAt)}</p>
        {entry.lastComment && (
          <blockquote className="mt-2 border-l-4 border-ochre pl-3 whitespace-pre-wrap" aria-label="The reviewer's last comment">{entry.lastComment}</blockquote>
        )}
      </div>
      <div className="flex flex-wrap items-start gap-2 mid:flex-col mid:items-stretch">
        {isDraft && <LinkButton small to={`/contribute/${entry.accession}`}>Continue editing</LinkButton>}
        {may('revise') && <Button small onClick={() => onAsk('revise')}>{entry.state === 'returned' ? 'Answer' : entry.state === 'withdrawn' ? 'Take up again' : 'Revise'}</Button>}
        {!isDraft && <Link className="button button-small" to={`/entries/${entry.accession}`}>Open</Link>}
        {may('withdraw') && <Button small look="quiet" onClick={() => onAsk('withdraw')}>{isDraft ? 'Discard' : 'Withdraw'}</Button>}
      </div>
    </li>
  );
}
