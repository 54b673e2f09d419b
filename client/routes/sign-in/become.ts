import { useQueryClient } from '@tanstack/react-query';
import type { Me } from '#shared/contracts/accounts.ts';
import { sessionOptions } from '#client/app/session.ts';

/** Takes over who is signed in now. What was fetched as somebody else is forgotten, since it may look different to this person. */
export function useBecome(): (me: Me) => void {
  const client = useQueryClient();
  return (me) => {
    client.setQueryData(sessionOptions.queryKey, me);
    client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'session' && !query.isActive() });
    void client.invalidateQueries({ predicate: ({ queryKey }) => queryKey[0] !== 'session' });
  };
}
