import { queryOptions, useMutation } from '@tanstack/react-query';
import { demoAccounts, signIn, type Me } from '#shared/contracts/accounts.ts';
import { call } from '#client/lib/api-client.ts';

/** The demonstration accounts; none outside demonstration mode. */
export const demoAccountsOptions = queryOptions({
  queryKey: ['demo-accounts'],
  queryFn: ({ signal }) => call(demoAccounts, { signal }),
  staleTime: Infinity,
});

export interface Credentials {
  email: string;
  password: string;
}

/** Signs in; what follows from it is the caller's matter. */
export function useSignIn(onSignedIn: (me: Me) => void) {
  return useMutation({
    mutationFn: (body: Credentials) => call(signIn, { body }),
    onSuccess: onSignedIn,
  });
}
