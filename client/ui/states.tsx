import type { ReactNode } from 'react';
import { ApiError } from '#client/lib/api-error.ts';
import { Button, LinkButton } from './button.tsx';
import { SillLine } from './sill-line.tsx';

interface StatePanelProps {
  title: string;
  children?: ReactNode;
  /** What to do next. */
  actions?: ReactNode;
  line?: 'flat' | 'sill' | 'broken';
  /** The panel is the whole page, so that its title is the page's. */
  page?: boolean;
}

/** A page or part of it that has nothing to show, and says why and what to do. */
export function StatePanel({ title, children, actions, line = 'flat', page = false }: StatePanelProps) {
  const Title = page ? 'h1' : 'h2';
  return (
    <section className="state-panel">
      <SillLine shape={line} />
      <Title>{title}</Title>
      {children && <div className="w-full max-w-[62ch] text-second">{children}</div>}
      {actions && <div className="flex flex-wrap gap-3 pt-2">{actions}</div>}
    </section>
  );
}

/** Nothing to show though all went well. */
export function EmptyState(props: Omit<StatePanelProps, 'line'>) {
  return <StatePanel {...props} line="flat" />;
}

/** Lines in the place of what is on its way; the words are heard, the lines are not. */
export function LoadingState({ what, rows = 6 }: { what: string; rows?: number }) {
  return (
    <div className="loading" role="status">
      <p className="text-second">{`Fetching ${what}`}</p>
      <div aria-hidden="true">
        {Array.from({ length: rows }, (_, row) => <div className="loading-row" key={row}><span /><span /><span /></div>)}
      </div>
    </div>
  );
}

/** What went wrong, in the words of the answer, with a way to try again; chooses the forbidden and not-found words itself. */
export function ErrorState({ error, onRetry }: { error: unknown; onRetry?: () => void }) {
  if (error instanceof ApiError && error.status === 404) return <NotFoundState detail={error.detail} />;
  if (error instanceof ApiError && (error.status === 401 || error.status === 403)) return <ForbiddenState error={error} />;
  const known = error instanceof ApiError ? error : null;
  return (
    <StatePanel
      line="broken"
      title={known?.title ?? 'This page met an error'}
      actions={onRetry && <Button onClick={onRetry}>Try again</Button>}
    >
      <p role="alert">{known?.detail ?? 'Something in the page did not work as it should. Reload it; if it happens again, tell the people who run this service what you were doing.'}</p>
      {known && known.errors.length > 0 && (
        <ul className="pt-2">{known.errors.map((one) => <li key={one.path + one.message}><code>{one.path}</code>: {one.message}</li>)}</ul>
      )}
      {known?.requestId && <p className="pt-2 text-fine">Request <code>{known.requestId}</code></p>}
    </StatePanel>
  );
}

/** The reader may not do this: says who may, and where to sign in. */
export function ForbiddenState({ error }: { error: ApiError }) {
  const signIn = error.status === 401;
  return (
    <StatePanel
      line="sill"
      title={error.title}
      actions={signIn
        ? <LinkButton look="primary" to={`/sign-in?next=${encodeURIComponent(location.pathname + location.search)}`}>Sign in</LinkButton>
        : <LinkButton to="/search">Go to the search</LinkButton>}
    >
      <p>{error.detail}</p>
    </StatePanel>
  );
}

/** There is nothing at this address. */
export function NotFoundState({ detail, page }: { detail?: string; page?: boolean }) {
  return (
    <StatePanel line="flat" page={page} title="There is nothing here" actions={<LinkButton to="/search">Go to the search</LinkButton>}>
      <p>{detail ?? 'No page has this address. Check it for a slip, or look for what you need by the search.'}</p>
    </StatePanel>
  );
}
