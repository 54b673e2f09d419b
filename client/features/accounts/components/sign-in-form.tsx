import { useQuery } from '@tanstack/react-query';
import { useRef, type FormEvent } from 'react';
import type { Me } from '#shared/contracts/accounts.ts';
import { isApiError } from '#client/lib/api-error.ts';
import { Button } from '#client/ui/button.tsx';
import { InputField } from '#client/ui/field.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { demoAccountsOptions, useSignIn } from '../api.ts';
import { useCredentials } from '../use-credentials.ts';
import { DemoAccounts } from './demo-accounts.tsx';

interface SignInFormProps {
  onSignedIn: (me: Me) => void;
  demonstration: boolean;
  /** In one column, as a dialog needs it. */
  stacked?: boolean;
}

/** E-mail and password; what is wrong is said in place, and nothing typed is lost. */
export function SignInForm({ onSignedIn, demonstration, stacked = false }: SignInFormProps) {
  const { credentials, set, faults, check } = useCredentials();
  const signIn = useSignIn(onSignedIn);
  const email = useRef<HTMLInputElement>(null);
  const password = useRef<HTMLInputElement>(null);
  const accounts = useQuery({ ...demoAccountsOptions, enabled: demonstration });

  function submit(event: FormEvent) {
    event.preventDefault();
    const found = check();
    if (found.email) email.current?.focus();
    else if (found.password) password.current?.focus();
    else signIn.mutate({ ...credentials, email: credentials.email.trim() }, { onError: () => password.current?.focus() });
  }

  return (
    <div className={stacked ? 'grid gap-6' : 'grid gap-8 mid:grid-cols-2'}>
      <form className="flex max-w-[26rem] flex-col gap-4" noValidate onSubmit={submit} aria-label="Sign in">
        {signIn.isError && (
          <Notice kind="refusal" live title={refusalTitle(signIn.error)}>{refusalText(signIn.error)}</Notice>
        )}
        <InputField
          ref={email} label="E-mail" type="email" autoComplete="username" inputMode="email" autoFocus
          value={credentials.email} error={faults.email} onChange={(event) => set({ email: event.target.value })}
        />
        <InputField
          ref={password} label="Password" type="password" autoComplete="current-password"
          value={credentials.password} error={faults.password} onChange={(event) => set({ password: event.target.value })}
        />
        <div><Button type="submit" look="primary" busy={signIn.isPending}>Sign in</Button></div>
      </form>
      {accounts.data && accounts.data.accounts.length > 0 && (
        <DemoAccounts
          {...accounts.data}
          chosen={credentials.email}
          onChoose={(next) => {
            set({ email: next, password: accounts.data.password ?? '' });
            signIn.reset();
          }}
        />
      )}
    </div>
  );
}

function refusalTitle(error: unknown): string {
  return isApiError(error) ? `${error.title}.` : 'Signing in did not succeed.';
}

function refusalText(error: unknown): string {
  if (isApiError(error, 'sign-in-failed')) return 'Check both and try again.';
  if (isApiError(error, 'too-many-requests')) {
    return error.retryAfterS ? `Wait ${Math.ceil(error.retryAfterS / 60)} min, then try again.` : 'Wait a few minutes, then try again.';
  }
  return isApiError(error) ? error.detail : 'Try again in a moment.';
}
