import { Link, useLocation } from 'react-router-dom';
import { hasRole, strongestRole } from '#shared/domain/roles.ts';
import { Button } from '#client/ui/button.tsx';
import { Popover } from '#client/ui/popover.tsx';
import { useSession, useSignOut } from './session.ts';

/** The way to the sign-in page that comes back to the present one. */
function useSignInAddress(): string {
  const { pathname, search } = useLocation();
  const here = pathname + search;
  return pathname === '/sign-in' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(here)}`;
}

/** A link to sign in for a visitor; name and role with the way out for others. */
export function AccountMenu() {
  const { me } = useSession();
  const signInAddress = useSignInAddress();
  if (!me) return <div className="account w-16" />;
  if (!me.user) return <div className="account"><Link className="nav-link" to={signInAddress}>Sign in</Link></div>;
  const { name, roles } = me.user;
  return (
    <div className="account">
      <Popover
        align="end"
        buttonClassName="account-button"
        panelClassName="account-panel"
        label={<><strong>{name}</strong><span className="text-second">{`\u00a0· ${strongestRole(roles)}`}</span></>}
      >
        {(close) => (
          <>
            {hasRole(roles, 'contributor') && <Link to="/contributions" onClick={close}>My submissions</Link>}
            <SignOut />
          </>
        )}
      </Popover>
    </div>
  );
}

/** Leaves the account on this device. */
export function SignOut() {
  const signOut = useSignOut();
  return (
    <>
      <Button busy={signOut.isPending} onClick={() => signOut.mutate()}>Sign out</Button>
      {signOut.isError && <p className="field-error" role="alert">Signing out did not succeed. Try again.</p>}
    </>
  );
}

/** The same in the narrow menu, without a second layer. */
export function AccountLines({ onFollow }: { onFollow: () => void }) {
  const { me } = useSession();
  const signInAddress = useSignInAddress();
  if (!me?.user) return <Link className="nav-link" to={signInAddress} onClick={onFollow}>Sign in</Link>;
  return (
    <>
      <p><strong>{me.user.name}</strong><span className="text-second"> · {strongestRole(me.user.roles)}</span></p>
      {hasRole(me.user.roles, 'contributor') && <Link className="nav-link" to="/contributions" onClick={onFollow}>My submissions</Link>}
      <SignOut />
    </>
  );
}
