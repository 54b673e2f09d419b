import { useState } from 'react';
import type { Credentials } from './api.ts';

export interface CredentialFaults {
  email?: string;
  password?: string;
}

/** What is missing before a request is worth sending. */
export function credentialFaults({ email, password }: Credentials): CredentialFaults {
  const faults: CredentialFaults = {};
  if (!email.trim()) faults.email = 'Type the e-mail address of your account.';
  else if (!/^[^\s@]+@[^\s@]+$/.test(email.trim())) faults.email = 'An e-mail address has one @ with something on both sides.';
  if (!password) faults.password = 'Type your password.';
  return faults;
}

/** The two fields and what is wrong with them; faults are shown from the first attempt on. */
export function useCredentials() {
  const [credentials, setCredentials] = useState<Credentials>({ email: '', password: '' });
  const [tried, setTried] = useState(false);
  const found = credentialFaults(credentials);
  return {
    credentials,
    set: (change: Partial<Credentials>) => setCredentials((before) => ({ ...before, ...change })),
    faults: tried ? found : {},
    /** Shows the faults and gives them. */
    check: () => {
      setTried(true);
      return found;
    },
  };
}
