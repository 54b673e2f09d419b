import { NotFoundState } from '#client/ui/states.tsx';
import { useTitle } from '#client/lib/use-title.ts';

/** No screen has this address. */
export function NotFoundPage() {
  useTitle('Nothing here');
  return <NotFoundState page />;
}
