import { useInfiniteQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { queueOptions, queueStates, type QueueState } from '#client/features/reviews/api.ts';
import { QueueList } from '#client/features/reviews/components/queue-list.tsx';
import { RequireRole } from '#client/routes/sign-in/require-role.tsx';
import { ChoiceLine } from '#client/ui/choice-line.tsx';
import { PageHead } from '#client/ui/page-head.tsx';

const words: Readonly<Record<QueueState, string>> = { waiting: 'waiting', mine: 'claimed by me', decided: 'decided' };

/** The review queue. */
export function Component() {
  return <RequireRole role="reviewer" title="Review">{() => <Queue />}</RequireRole>;
}

function Queue() {
  const [search] = useSearchParams();
  const state = queueStates.find((one) => one === search.get('state')) ?? 'waiting';
  const { data } = useInfiniteQuery(queueOptions(state));
  const counts = data?.pages.at(-1)?.counts;
  return (
    <>
      <PageHead title="Review" />
      <ChoiceLine
        label="Which submissions"
        choices={queueStates.map((one) => ({
          key: one, label: words[one], count: counts?.[one], to: one === 'waiting' ? '?' : `?state=${one}`, current: one === state,
        }))}
      />
      <QueueList state={state} />
    </>
  );
}
