import { useQuery } from '@tanstack/react-query';
import { Navigate, useNavigate, useSearchParams } from 'react-router-dom';
import { announce } from '#client/lib/announce.ts';
import { ErrorState, LoadingState } from '#client/ui/states.tsx';
import { PageHead } from '#client/ui/page-head.tsx';
import { sessionOptions } from '#client/app/session.ts';
import { SignInForm } from '#client/features/accounts/components/sign-in-form.tsx';
import { readNext } from '#client/features/accounts/next-address.ts';
import { useBecome } from './become.ts';

/** Sign in, and go back to where one came from. */
export function Component() {
  const [search] = useSearchParams();
  const next = readNext(search.get('next'));
  const { data: me, error, refetch } = useQuery(sessionOptions);
  const become = useBecome();
  const navigate = useNavigate();

  if (me?.user) return <Navigate to={next} replace />;
  return (
    <>
      <PageHead title="Sign in" />
      {next !== '/search' && <p className="mb-5 text-second">After signing in you return to <code>{next}</code>.</p>}
      {me ? (
        <SignInForm
          demonstration={me.demonstration}
          onSignedIn={(signedIn) => {
            become(signedIn);
            announce(`Signed in as ${signedIn.user?.name ?? ''}`);
            void navigate(next, { replace: true });
          }}
        />
      ) : error ? <ErrorState error={error} onRetry={() => void refetch()} /> : <LoadingState what="the sign-in page" rows={2} />}
    </>
  );
}
