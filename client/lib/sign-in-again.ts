/** Asks the person to sign in again without leaving the page; gives whether they did. */
type Ask = () => Promise<boolean>;

let ask: Ask | null = null;
let pending: Promise<boolean> | null = null;

/** Sets who asks: the dialog, while somebody is signed in. Gives the way to withdraw it. */
export function onSignInRequired(next: Ask): () => void {
  ask = next;
  return () => {
    if (ask === next) ask = null;
  };
}

/** Asks once however many requests were refused at the same time; false when there is nobody to ask. */
export function askToSignIn(): Promise<boolean> {
  if (!ask) return Promise.resolve(false);
  pending ??= ask().finally(() => {
    pending = null;
  });
  return pending;
}

let signedOut = false;

/** Notes that somebody left their account by their own choice, or signed in again. */
export function noteSignedOut(byChoice: boolean): void {
  signedOut = byChoice;
}

/** Whether the account was left by choice: then its pages close; after an ended session they stay open behind the dialog. */
export function wasSignedOut(): boolean {
  return signedOut;
}
