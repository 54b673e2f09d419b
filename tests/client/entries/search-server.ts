import { vi } from 'vitest';
import type { Entry } from '#shared/contracts/entries.ts';
import type { FilterCounts, SearchSummary } from '#shared/contracts/entry-search.ts';
import type { SearchPage } from '#client/features/entries/api.ts';

const noCounts: FilterCounts = {
  kind: [], metal: [], step: [], stepClass: [], method: [], methodClass: [], facet: [], site: [], scope: [], provenance: [], energyType: [], sampleType: [],
};

export const counts: FilterCounts = {
  ...noCounts,
  kind: [{ value: 'activation-energy', label: 'activation energies', count: 2 }, { value: 'kie', label: 'kinetic isotope effects', count: 1 }],
  metal: [{ value: 'Ru', label: 'Ru', count: 2 }, { value: 'Ni', label: 'Ni', count: 1 }],
  method: [{ value: 'TPD', label: 'temperature-programmed desorption', count: 2 }],
  scope: [{ value: 'elementary', label: 'elementary', count: 2 }],
};

export const noFigures: SearchSummary = { sources: 1, measured: 2, computed: 0, energy: null, alike: true, points: [], histogram: null };

/** A stand-in for the server's search, over fixed entries; it keeps the addresses it was asked at. */
export function searchServer(answer: (params: URLSearchParams) => { entries: Entry[]; page?: Partial<SearchPage> }, summary: SearchSummary = noFigures) {
  const asked: URL[] = [];
  vi.stubGlobal('fetch', vi.fn((address: string) => {
    const url = new URL(address, 'http://sillstone.test');
    asked.push(url);
    const json = (body: unknown, status = 200) => Promise.resolve(new Response(JSON.stringify(body), { status, headers: { 'Content-Type': 'application/json' } }));
    if (url.pathname === '/api/v1/vocabulary') return json({ metals: [], facets: [], techniques: [], supports: [], stepClasses: [], steps: [] });
    if (url.pathname === '/api/v1/entries/summary') return json(summary);
    if (url.pathname !== '/api/v1/entries') return json({ type: 'about:blank', title: 'There is nothing here', status: 404, detail: 'Not in this test.', code: 'not-found', requestId: 'r' }, 404);
    const { entries, page } = answer(url.searchParams);
    return json({
      items: entries, total: entries.length, totalIsExact: true, nextCursor: null, all: 9, counts: url.searchParams.has('counts') ? counts : null, emptiedBy: null,
      withoutStatedRange: null, ...page,
    } satisfies SearchPage);
  }));
  return {
    /** The searches for rows (not for counts), as asked. */
    rows: () => asked.filter((url) => url.pathname === '/api/v1/entries' && !url.searchParams.has('counts')).map((url) => url.searchParams),
  };
}
