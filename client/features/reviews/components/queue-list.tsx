import { useInfiniteQuery } from '@tanstack/react-query';
import type { QueueItem } from '#shared/contracts/reviews.ts';
import { stateWords } from '#shared/domain/states.ts';
import { formatAge, formatDateTime } from '#client/lib/dates.ts';
import { LinkButton } from '#client/ui/button.tsx';
import { CheckTags } from '#client/ui/check-bars.tsx';
import { Equation } from '#client/ui/equation.tsx';
import { LoadMore } from '#client/ui/pagination.tsx';
import { EmptyState, ErrorState, LoadingState } from '#client/ui/states.tsx';
import { Tag } from '#client/ui/tag.tsx';
import { SurfaceLabel } from '#client/ui/surface-label.tsx';
import { queueOptions, type QueueState } from '../api.ts';

const nothing: Readonly<Record<QueueState, { title: string; text: string }>> = {
  waiting: { title: 'Nothing waits for review', text: 'Every submission has been decided. A new one appears here when it is handed in.' },
  mine: { title: 'You hold no submission', text: 'Claim one from those that wait: it is yours for 72 hours.' },
  decided: { title: 'Nothing has been decided yet', text: 'Decisions appear here, the latest first.' },
};

/** The queue, oldest first. */
export function QueueList({ state }: { state: QueueState }) {
  const { data, error, isPending, hasNextPage, isFetchingNextPage, fetchNextPage, refetch } = useInfiniteQuery(queueOptions(state));
  const items = data?.pages.flatMap((page) => page.items) ?? [];
  const last = data?.pages.at(-1);
  if (error && items.length === 0) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (isPending) return <LoadingState what="the review queue" />;
  if (items.length === 0) {
    return <EmptyState title={nothing[state].title} actions={state === 'mine' && <LinkButton to="/review">Those that wait</LinkButton>}><p>{nothing[state].text}</p></EmptyState>;
  }
  return (
    <>
      <ul className="border-t border-ink">{items.map((item) => <QueueRow key={item.submission} item={item} />)}</ul>
      <LoadMore
        shown={items.length} total={last?.total ?? items.length} totalIsExact={last?.totalIsExact ?? true} hasMore={hasNextPage}
        busy={isFetchingNextPage} onMore={() => void fetchNextPage()} what="submissions"
      />
    </>
  );
}

function QueueRow({ item }: { item: QueueItem }) {
  const waits = item.state === 'submitted' || item.state === 'under-review';
  return (
    <li className="grid gap-x-8 gap-y-1 border-b border-hairline py-3 mid:grid-cols-[minmax(0,1.5fr)_minmax(0,1.2fr)_minmax(0,1.1fr)_5.5rem]">
      <div className="min-w-0">
        <p className="text-lead"><Equation display equation={item.equation} /></p>
        <p><SurfaceLabel label={item.surface} /> <samp className="ml-3">{[item.asPrinted, item.unitAsPrinted].filter(Boolean).join(' ')}</samp></p>
      </div>
      <div className="min-w-0">
        <p>{item.sourceLabel}</p>
        <p className="text-fine text-second">
          by {item.contributor}{item.round > 1 && `, round ${item.round}`}
        </p>
        <CheckTags checks={item.checks} />
      </div>
      <div className="min-w-0">
        <p>{waits ? <>waiting <time dateTime={item.submittedAt} title={formatDateTime(item.submittedAt)}>{formatAge(item.submittedAt)}</time></> : <Tag>{stateWords[item.state]}</Tag>}</p>
        {item.own && <p className="text-ochre">yours: another reviewer decides</p>}
        {item.claim && (
          <p className="text-fine text-second">{item.claim.mine ? 'claimed by you' : `claimed by ${item.claim.by}`} until {formatDateTime(item.claim.until)}</p>
        )}
      </div>
      <div className="pt-1 mid:pt-0">
        <LinkButton small to={`/review/${item.submission}`} aria-label={`${waits && !item.own ? 'Review' : 'Open'} ${item.accession}, ${item.asPrinted} ${item.unitAsPrinted} on ${item.surface}`}>
          {waits && !item.own ? 'Review' : 'Open'}
        </LinkButton>
      </div>
    </li>
  );
}
