import type { DbOrTx } from '#server/db/pool.ts';
import { countsByState, countValues, facets, total, totalsWithoutEach, totalWithoutRange } from './search-counts.repository.ts';
import type { SearchEngine } from './search-engine.ts';
import { groupHeads, listGroups, summaryFigures, summaryHistogram, summaryPoints } from './search-figures.repository.ts';
import { positionWidth, searchPage } from './search-page.repository.ts';
import { nearWords } from './search-words.repository.ts';

/** The search engine that answers from the store's own PostgreSQL, on the narrow table of search rows. */
export function createPostgresSearch(db: DbOrTx): SearchEngine {
  return {
    page: (ask, request) => searchPage(db, ask, request),
    positionWidth,
    total: (ask, without) => total(db, ask, without),
    totalsWithoutEach: (ask) => totalsWithoutEach(db, ask),
    totalWithoutRange: (ask) => totalWithoutRange(db, ask),
    counts: (ask) => countValues(db, ask),
    countsByState: (ask) => countsByState(db, ask),
    facets: (ask, most) => facets(db, ask, most),
    figures: (ask) => summaryFigures(db, ask),
    points: (ask, most) => summaryPoints(db, ask, most),
    histogram: (ask, low, high, bins) => summaryHistogram(db, ask, low, high, bins),
    heads: (ask, by, names) => groupHeads(db, ask, by, names),
    groups: (ask, by, request) => listGroups(db, ask, by, request),
    nearWords: (words) => nearWords(db, words),
  };
}
