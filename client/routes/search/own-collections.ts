import { useQuery } from '@tanstack/react-query';
import { useSession } from '#client/app/session.ts';
import { collectionsOptions } from '#client/features/collections/api.ts';

/** The reader's own collections by name; nothing for a visitor. */
export function useOwnCollections(): readonly { id: string; name: string }[] | undefined {
  const { me } = useSession();
  const { data } = useQuery({ ...collectionsOptions, enabled: Boolean(me?.user) });
  return data?.items;
}
