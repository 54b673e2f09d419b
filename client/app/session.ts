import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { getMe, signOut, type Me } from '#shared/contracts/accounts.ts';
import { hasRole, type Role } from '#shared/domain/roles.ts';
import { call } from '#client/lib/api-client.ts';

/** Who is signed in. */
export const sessionOptions = queryOptions({
  queryKey: ['session'],
  queryFn: ({ signal }) => call(getMe, { signal }),
  staleTime: 60_000,
});

export interface Session {
  me: Me | undefined;
  /** Whether who is signed in may do what asks for this role; false until it is known. */
  may: (role: Role) => boolean;
}

/** Who is signed in and what their roles allow. */
export function useSession(): Session {
  const { data: me } = useQuery(sessionOptions);
  return { me, may: (role) => hasRole(me?.user?.roles ?? [], role) };
}

/** Signs out; everything fetched as somebody is forgotten. */
export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(signOut, {}),
    onSuccess: (me) => {
      // The session's own query stays, so that every page that follows it hears at once that nobody is signed in.
      client.setQueryData(sessionOptions.queryKey, me);
      client.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== sessionOptions.queryKey[0] });
    },
  });
}
