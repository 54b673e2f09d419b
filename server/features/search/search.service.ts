import type { Actor } from '#server/actor.ts';
import type { Context } from '#server/context.ts';
import { readCursor, writeCursor } from '#server/db/keyset.ts';
import type { DbOrTx } from '#server/db/pool.ts';
import { accessionsCollected } from '#server/features/collections/collections.service.ts';
import { renewSearchRows, speciesIn } from '#server/features/entries/make-search-rows.service.ts';
import type { EntryRecordsService } from '#server/features/entries/records.service.ts';
import { Refusal } from '#server/refusal.ts';
import type { QueryOf, ResponseOf } from '#shared/contracts/endpoint.ts';
import type { EntryFilter, EntrySearch, groupEntries, searchEntries, SearchNote, SearchSummary } from '#shared/contracts/entry-search.ts';
import { labelCounts, labelStates } from './count-labels.ts';
import { matchesIn } from './highlight.ts';
import { findNearMisses } from './near-misses.ts';
import { readFilter } from './read-filter.ts';
import { createPostgresSearch } from './search.repository.ts';
import { publicRows, visibilityOf, widestVisibility } from './search.policy.ts';
import type { Ask, SearchEngine, SearchFilter } from './search-engine.ts';
import { readVocabularyNames } from './search-vocabulary.repository.ts';
import { nearSpelling } from './spelling.ts';
import type { VocabularyNames } from './vocabulary-names.ts';

/** Above this many values the strip becomes a histogram. */
const maxPoints = 400;
const histogramBins = 48;

interface Reading {
  ask: Ask;
  notes: SearchNote[];
  showingResultsFor: string | null;
  names: VocabularyNames;
}

/** A filter as asked by somebody, brought to what the engine compares. Near spellings are those of the accepted entries, so they are looked for among these only. */
async function readQuestion(db: DbOrTx, engine: SearchEngine, actor: Actor, asked: EntryFilter): Promise<Reading> {
  const names = await readVocabularyNames(db);
  const { filter: read, notes } = readFilter(asked, names);
  const filter = asked.collection?.length ? { ...read, collection: await accessionsCollected(db, actor, asked.collection) } : read;
  const visible = visibilityOf(actor, asked.state);
  const acceptedOnly = visible.states.every((state) => state === 'accepted');
  const showingResultsFor = filter.q && acceptedOnly ? await nearSpelling(engine, filter.q) : null;
  return { ask: { filter: showingResultsFor === null ? filter : { ...filter, q: showingResultsFor }, visible }, notes, showingResultsFor, names };
}

/** What an export walks through: the accepted entries that the same filter finds on the page. */
export async function readExportFilter(db: DbOrTx, actor: Actor, asked: EntryFilter): Promise<SearchFilter> {
  const { ask } = await readQuestion(db, createPostgresSearch(db), actor, { ...asked, state: undefined });
  return ask.filter;
}

/** Whether a value that the vocabulary does not know found something all the same: then there is nothing to tell. */
const isRefuted = ({ filter, found }: SearchNote, asked: EntryFilter, total: number): boolean => !found && total > 0 && (asked[filter as keyof EntryFilter] as readonly string[] | undefined)?.length === 1;

export function createSearchService({ db }: Context, records: EntryRecordsService, engine: SearchEngine = createPostgresSearch(db)) {
  async function counts(ask: Ask, actor: Actor) {
    const widest = widestVisibility(actor);
    const [counted, byState] = await Promise.all([engine.counts(ask), widest ? engine.countsByState({ filter: ask.filter, visible: widest }) : null]);
    return { ...labelCounts(counted), ...(byState ? { state: labelStates(byState) } : {}) };
  }

  async function emptiedBy(ask: Ask, asked: EntryFilter) {
    const found = (await engine.totalsWithoutEach(ask)).map(({ filter, total }) => ({ filter: filter as string, totalWithout: total }));
    const accepted = asked.state ? await engine.total({ filter: ask.filter, visible: publicRows }) : 0;
    return accepted > 0 ? [...found, { filter: 'state', totalWithout: accepted }] : found;
  }

  return {
    /** Makes search rows anew that an older version of the product made, and gives how many. */
    renew: (): Promise<number> => renewSearchRows(db),

    async search(actor: Actor, { T, sort, groupBy, counts: withCounts, limit, cursor, ...asked }: EntrySearch): Promise<ResponseOf<typeof searchEntries>> {
      if ((sort === 'k' || sort === '-k') && T === undefined) throw new Refusal('invalid-input', 'Sorting by k needs a temperature of interest.', { errors: [{ path: 'T', message: 'Give T in K.' }] });
      const question = [asked, sort, groupBy ?? null, T ?? null];
      const position = cursor ? readCursor(cursor, question, engine.positionWidth(sort, groupBy)) : null;
      const { ask, notes, showingResultsFor, names } = await readQuestion(db, engine, actor, asked);
      const { filter, visible } = ask;
      const ranged = filter.validAt !== undefined || filter.validFrom !== undefined || filter.validTo !== undefined;
      const [page, total, all, counted, withoutStatedRange] = await Promise.all([
        engine.page(ask, { sort, groupBy, temperatureK: T, limit, position }), engine.total(ask), engine.total({ filter: {}, visible: publicRows }),
        withCounts ? counts(ask, actor) : null, ranged ? engine.totalWithoutRange(ask) : null,
      ]);
      const [items, groups, emptied, nearMisses] = await Promise.all([
        records.list(actor, page.revisionIds, T ?? null), groupBy ? engine.heads(ask, groupBy, page.groups) : null,
        total > 0 ? null : emptiedBy(ask, asked), total > 0 ? null : findNearMisses(engine, ask, names),
      ]);
      return {
        items: items.map((entry) => (filter.q ? { ...entry, matches: matchesIn(entry, speciesIn(entry.step?.equation ?? ''), filter.q, names) } : entry)),
        total, totalIsExact: true, all, nextCursor: page.next ? writeCursor(page.next, question) : null,
        counts: counted, emptiedBy: emptied, nearMisses, withoutStatedRange, showingResultsFor, groups,
        notes: notes.filter((note) => !isRefuted(note, asked, total)),
        states: visible.states.filter((state) => state === 'accepted' || visible.unaccepted !== 'nobody'),
      };
    },

    /** The groups that a search falls into, the largest first. */
    async groups(actor: Actor, { groupBy, limit, cursor, ...asked }: QueryOf<typeof groupEntries>): Promise<ResponseOf<typeof groupEntries>> {
      const question = ['groups', asked, groupBy];
      const position = cursor ? readCursor(cursor, question, 3) : null;
      const { ask } = await readQuestion(db, engine, actor, asked);
      const { heads, total, next } = await engine.groups(ask, groupBy, { limit, position });
      return { items: heads, total, totalIsExact: true, nextCursor: next ? writeCursor(next, question) : null };
    },

    async summarise(actor: Actor, asked: EntryFilter): Promise<SearchSummary> {
      const { ask } = await readQuestion(db, engine, actor, asked);
      const { sources, measured, computed, energies, median, low, high, unlike, drawn } = await engine.figures(ask);
      const summary = { sources, measured, computed, alike: !unlike, energy: median === null || low === null || high === null ? null : { count: energies, median, low, high } };
      if (drawn <= maxPoints || low === null || high === null || low === high) {
        const points = await engine.points(ask, maxPoints);
        return { ...summary, histogram: null, points: points.map(({ methodClass, bound, ...point }) => ({ ...point, bound: bound as '=', computed: methodClass === 'computed' })) };
      }
      const width = (high - low) / histogramBins;
      return {
        ...summary, points: null,
        histogram: { edges: Array.from({ length: histogramBins + 1 }, (_, i) => low + i * width), counts: await engine.histogram(ask, low, high, histogramBins) },
      };
    },
  };
}
export type SearchService = ReturnType<typeof createSearchService>;
export { exportOrder, filterConditions } from './search-conditions.repository.ts';
export type { SearchFilter } from './search-engine.ts';
