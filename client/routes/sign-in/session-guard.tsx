import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Me } from '#shared/contracts/accounts.ts';
import { sessionOptions } from '#client/app/session.ts';
import { wasSignedOut } from '#client/lib/sign-in-again.ts';
import { SignInAgain } from '#client/features/accounts/components/sign-in-again.tsx';
import { useBecome } from './become.ts';

/** While somebody is signed in: an ended session is taken up again in place. */
export function SessionGuard() {
  const { data: me } = useQuery(sessionOptions);
  const become = useBecome();
  const [kept, setKept] = useState<Me['user']>(null);
  if (me?.user && me.user.id !== kept?.id) setKept(me.user);
  const user = me?.user ?? (wasSignedOut() ? null : kept);
  if (!me || !user) return null;
  return <SignInAgain key={user.id} user={user} demonstration={me.demonstration} onSignedIn={become} />;
}
