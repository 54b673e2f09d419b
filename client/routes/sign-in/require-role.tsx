import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { useLocation } from 'react-router-dom';
import type { Me } from '#shared/contracts/accounts.ts';
import { hasRole, strongestRole, type Role } from '#shared/domain/roles.ts';
import { sessionOptions } from '#client/app/session.ts';
import { wasSignedOut } from '#client/lib/sign-in-again.ts';
import { LinkButton } from '#client/ui/button.tsx';
import { PageHead } from '#client/ui/page-head.tsx';
import { ErrorState, LoadingState, StatePanel } from '#client/ui/states.tsx';

interface RequireRoleProps {
  role: Role;
  title: string;
  children: (user: NonNullable<Me['user']>) => ReactNode;
}

/** Shows a page to those whose role allows it; others are told what it takes and where to sign in. */
export function RequireRole({ role, title, children }: RequireRoleProps) {
  const { data: me, error, refetch } = useQuery(sessionOptions);
  const { pathname, search } = useLocation();
  const [kept, setKept] = useState<Me['user']>(null);
  const user = me?.user && hasRole(me.user.roles, role) ? me.user : null;
  if (user && user.id !== kept?.id) setKept(user);
  if (user) return children(user);
  // A session that ended by itself closes no form: what is typed stays, and the next save asks to sign in again.
  if (me && !me.user && kept && !wasSignedOut()) return children(kept);
  return (
    <>
      <PageHead title={title} />
      {!me && !error && <LoadingState what="your account" rows={3} />}
      {!me && error && <ErrorState error={error} onRetry={() => void refetch()} />}
      {me && !me.user && (
        <StatePanel
          line="sill" title="Sign in to do this"
          actions={<LinkButton look="primary" to={`/sign-in?next=${encodeURIComponent(pathname + search)}`}>Sign in</LinkButton>}
        >
          <p>This page is for a {role}. Reading, comparing and exporting accepted entries needs no account.</p>
        </StatePanel>
      )}
      {me?.user && (
        <StatePanel line="sill" title="Your role does not allow this" actions={<LinkButton to="/search">Go to the search</LinkButton>}>
          <p>You are signed in as {me.user.name}, {strongestRole(me.user.roles)}; this page is for a {role}. A curator can change your role.</p>
        </StatePanel>
      )}
    </>
  );
}
