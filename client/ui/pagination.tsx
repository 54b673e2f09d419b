import { Button } from './button.tsx';

interface LoadMoreProps {
  shown: number;
  total: number;
  totalIsExact?: boolean;
  hasMore: boolean;
  busy: boolean;
  onMore: () => void;
  what?: string;
}

/** How much of a list is shown, and a button for the next part. */
export function LoadMore({ shown, total, totalIsExact = true, hasMore, busy, onMore, what = 'entries' }: LoadMoreProps) {
  return (
    <div className="flex flex-wrap items-center gap-4 py-5">
      {hasMore && <Button busy={busy} onClick={onMore}>{`Show more ${what}`}</Button>}
      <p className="text-second" role="status">
        {hasMore ? `${shown} of ${totalIsExact ? '' : 'about '}${total} ${what} shown` : shown === 1 ? '1 of 1 shown' : `All ${shown} ${what} shown`}
      </p>
    </div>
  );
}
