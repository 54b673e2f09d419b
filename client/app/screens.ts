import type { ComponentType } from 'react';
import type { Role } from '#shared/domain/roles.ts';

/** What a page's module gives the router; loaded when the page is first opened. */
export interface ScreenModule {
  Component: ComponentType;
}

export interface Screen {
  path: string;
  load: () => Promise<ScreenModule>;
  /** The word in the header; a screen without it is reached from others. */
  nav?: { label: string; group: 'read' | 'write'; needs?: Role; count?: 'reviewsWaiting' };
  /** The temperature of interest and the unit change what is shown: they are kept in the address. */
  instrument?: true;
}

/** Every page of the application, one line each, in the order of the header. */
export const screens: readonly Screen[] = [
  { path: '/search', load: () => import('#client/routes/search/search-page.tsx'), nav: { label: 'Search', group: 'read' }, instrument: true },
  { path: '/entries/:accession', load: () => import('#client/routes/entry/entry-page.tsx'), instrument: true },
  { path: '/entries/:accession/v/:version', load: () => import('#client/routes/entry/entry-page.tsx'), instrument: true },
  { path: '/sources', load: () => import('#client/routes/sources/sources-page.tsx'), nav: { label: 'Sources', group: 'read' } },
  { path: '/sources/:id', load: () => import('#client/routes/sources/source-page.tsx'), instrument: true },
  { path: '/collections', load: () => import('#client/routes/collections/collections-page.tsx'), nav: { label: 'Collections', group: 'read' } },
  { path: '/collections/:id', load: () => import('#client/routes/collections/collection-page.tsx'), instrument: true },
  { path: '/workbench', load: () => import('#client/routes/workbench/list-page.tsx'), nav: { label: 'Workbench', group: 'read' } },
  { path: '/workbench/:name', load: () => import('#client/routes/workbench/calculator-page.tsx'), instrument: true },
  { path: '/contribute', load: () => import('#client/routes/contribute/page.tsx'), nav: { label: 'Contribute', group: 'write', needs: 'contributor' } },
  { path: '/contribute/:accession', load: () => import('#client/routes/contribute/page.tsx') },
  { path: '/contributions', load: () => import('#client/routes/contributions/page.tsx') },
  { path: '/review', load: () => import('#client/routes/review/queue-page.tsx'), nav: { label: 'Review', group: 'write', needs: 'reviewer', count: 'reviewsWaiting' } },
  { path: '/review/:submission', load: () => import('#client/routes/review/submission-page.tsx') },
  { path: '/sign-in', load: () => import('#client/routes/sign-in/page.tsx') },
];
