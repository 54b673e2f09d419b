import { useEffect, useRef, useState } from 'react';
import { useBeforeUnload, useBlocker } from 'react-router-dom';
import type { DraftSaver } from './draft-saver.ts';

interface LeaveGuard {
  /** Leaving was asked for and the draft could not be saved: the person decides. */
  asking: boolean;
  leave: () => void;
  stay: () => void;
}

/** Before the page is left, what is not saved is saved; where that fails, the person is asked. */
export function useLeaveGuard(saver: DraftSaver): LeaveGuard {
  const blocker = useBlocker(({ currentLocation, nextLocation }) => {
    const created = saver.snapshot().accession;
    // The page takes its own address when the draft is made: that is not leaving.
    const same = nextLocation.pathname === currentLocation.pathname || (created !== null && nextLocation.pathname === `/contribute/${created}`);
    return !same && saver.isBehind();
  });
  const [asking, setAsking] = useState(false);
  const latest = useRef(blocker);
  useEffect(() => {
    latest.current = blocker;
  });

  useEffect(() => {
    if (blocker.state !== 'blocked') return;
    let current = true;
    void saver.save().then((done) => {
      if (!current) return;
      if (done) latest.current.proceed?.();
      else setAsking(true);
    });
    return () => {
      current = false;
    };
  }, [blocker.state, saver]);

  useBeforeUnload((event) => {
    if (saver.isBehind()) event.preventDefault();
  });

  return {
    asking: asking && blocker.state === 'blocked',
    leave: () => {
      setAsking(false);
      blocker.proceed?.();
    },
    stay: () => {
      setAsking(false);
      blocker.reset?.();
    },
  };
}
