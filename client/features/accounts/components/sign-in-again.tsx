import { useEffect, useRef, useState } from 'react';
import type { Me } from '#shared/contracts/accounts.ts';
import { onSignInRequired } from '#client/lib/sign-in-again.ts';
import { Dialog } from '#client/ui/dialog.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { SignInForm } from './sign-in-form.tsx';

interface SignInAgainProps {
  user: { id: string; name: string };
  demonstration: boolean;
  onSignedIn: (me: Me) => void;
}

/**
 * Asks who was signed in to sign in again, above the page they are on, when a request is refused because the session ended.
 * The refused request then goes on; what is typed behind the dialog stays as it is.
 */
export function SignInAgain({ user, demonstration, onSignedIn }: SignInAgainProps) {
  const [open, setOpen] = useState(false);
  const answer = useRef<((signedIn: boolean) => void) | null>(null);

  useEffect(() => onSignInRequired(() => new Promise((resolve) => {
    answer.current = resolve;
    setOpen(true);
  })), []);

  function finish(signedIn: boolean) {
    setOpen(false);
    answer.current?.(signedIn);
    answer.current = null;
  }

  return (
    <Dialog open={open} title="Your session has ended" onClose={() => finish(false)}>
      <p className="pb-4">
        Sign in again as {user.name} and what you were doing goes on; nothing on the page behind is lost. Escape leaves it unsaved for now.
      </p>
      <SignInForm
        stacked demonstration={demonstration}
        onSignedIn={(me) => {
          onSignedIn(me);
          // Somebody else's session must not carry out what this person asked for.
          finish(me.user?.id === user.id);
        }}
      />
      {demonstration && <Notice kind="doubt" className="mt-5">Sign in with the account you had: another person cannot save this one's work.</Notice>}
    </Dialog>
  );
}
