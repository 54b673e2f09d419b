import { PageHead } from '#client/ui/page-head.tsx';

/** Every piece of the design kit on one page, to look at while working on it; not part of the built application. */
export function Component() {
  return <PageHead title="Gallery" />;
}
