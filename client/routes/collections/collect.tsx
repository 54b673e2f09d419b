import { useLocation } from 'react-router-dom';
import { useSession } from '#client/app/session.ts';
import { CollectButton } from '#client/features/collections/components/collect-button.tsx';

/** The way into a collection from any page that has entries. */
export function Collect({ accessions }: { accessions: readonly string[] }) {
  const { me } = useSession();
  const { pathname, search } = useLocation();
  return <CollectButton accessions={accessions} signedIn={me ? me.user !== null : null} returnTo={pathname + search} />;
}
