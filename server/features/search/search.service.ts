import type * as z from 'zod';
import type { Actor } from '#server/actor.ts';
import type { Context } from '#server/context.ts';
import { readCursor, writeCursor } from '#server/db/keyset.ts';
import { renewSearchRows } from '#server/features/entries/make-search-rows.service.ts';
import type { EntryRecordsService } from '#server/features/entries/records.service.ts';
import { Refusal } from '#server/refusal.ts';
import type { EntryFilter, EntrySearch, FilterCounts, searchEntries, SearchSummary } from '#shared/contracts/entry-search.ts';
import {
  energyTypeWords, kindWords, provenanceWords, sampleTypeWords, type EnergyType, type Kind, type Provenance, type SampleType, type SiteType,
} from '#shared/domain/kinds.ts';
import { siteLabel } from '#shared/domain/surface.ts';
import { readStep, StepError } from '#shared/steps/parse-step.ts';
import * as repository from './search.repository.ts';
import type { SearchFilter } from './search.repository.ts';

/** Above this many values the strip becomes a histogram. */
const maxPoints = 400;
const histogramBins = 48;

/** The key of an elementary step given as a key or as an equation in any spelling. */
function stepKeyOf(text: string): string {
  try {
    return readStep(text).key;
  } catch (error) {
    if (!(error instanceof StepError)) throw error;
    return text;
  }
}

/** A filter as asked, brought to what the repository compares. */
export function toSearchFilter({ step, ...rest }: EntryFilter): SearchFilter {
  if ((rest.valueMin !== undefined || rest.valueMax !== undefined) && rest.kind?.length !== 1) {
    throw new Refusal('invalid-input', 'A value range needs exactly one kind of value, so that its unit is known.', { errors: [{ path: 'kind', message: 'Choose exactly one kind.' }] });
  }
  if (rest.valueMin !== undefined && rest.valueMax !== undefined && rest.valueMin > rest.valueMax) {
    throw new Refusal('invalid-input', 'The value range ends below its beginning.', { errors: [{ path: 'valueMax', message: 'Must not be below valueMin.' }] });
  }
  return { ...rest, stepKeys: step?.map(stepKeyOf) };
}

export function createSearchService({ db }: Context, records: EntryRecordsService) {
  async function counts(conditions: ReturnType<typeof repository.filterConditions>): Promise<FilterCounts> {
    const relabel = <T extends string>(items: repository.Counted[], words: (value: T) => string) => items.map((item) => ({ ...item, label: words(item.value as T) ?? item.value }));
    const by = (name: Parameters<typeof repository.countByColumn>[2]) => repository.countByColumn(db, conditions, name);
    const [kind, step, method, metal, stepClass, methodClass, facet, site, scope, provenance, energyType, sampleType] = await Promise.all([
      repository.countByKind(db, conditions), repository.countByStep(db, conditions), repository.countByMethod(db, conditions),
      by('metal'), by('stepClass'), by('methodClass'), by('facet'), by('site'), by('scope'), by('provenance'), by('energyType'), by('sampleType'),
    ]);
    return {
      step, method, metal, methodClass, facet, scope,
      kind: relabel<Kind>(kind, (value) => kindWords[value]),
      stepClass: relabel(stepClass, (value) => value.replaceAll('-', ' ').replace('eley rideal', 'Eley–Rideal')),
      site: relabel<SiteType>(site, siteLabel),
      provenance: relabel<Provenance>(provenance, (value) => provenanceWords[value]),
      energyType: relabel<EnergyType>(energyType, (value) => energyTypeWords[value]),
      sampleType: relabel<SampleType>(sampleType, (value) => sampleTypeWords[value]),
    };
  }

  return {
    /** Makes search rows anew that an older version of the product made, and gives how many. */
    renew: (): Promise<number> => renewSearchRows(db),

    async search(actor: Actor, { T, sort, counts: withCounts, limit, cursor, ...asked }: EntrySearch): Promise<z.infer<NonNullable<typeof searchEntries.response>>> {
      const filter = toSearchFilter(asked);
      const conditions = repository.filterConditions(filter);
      if ((sort === 'k' || sort === '-k') && T === undefined) throw new Refusal('invalid-input', 'Sorting by k needs a temperature of interest.', { errors: [{ path: 'T', message: 'Give T in K.' }] });
      const question = [filter, sort, T ?? null];
      const position = cursor ? readCursor(cursor, question, repository.sortWidth(sort)) : null;
      const [page, total, all] = await Promise.all([
        repository.searchPage(db, conditions, { sort, temperatureK: T, limit, position }), repository.countRows(db, conditions), repository.countRows(db, new Map()),
      ]);
      const emptiedBy = total > 0 ? null : (await Promise.all(
        [...conditions.keys()].map(async (name) => ({ filter: name === 'stepKeys' ? 'step' : name, totalWithout: await repository.countRows(db, conditions, [name]) })),
      )).filter(({ totalWithout }) => totalWithout > 0);
      return {
        items: await records.list(actor, page.revisionIds, T ?? null),
        total, totalIsExact: true, all,
        nextCursor: page.next ? writeCursor(page.next, question) : null,
        counts: withCounts ? await counts(conditions) : null,
        emptiedBy,
        withoutStatedRange: filter.validAt === undefined ? null : await repository.countWithoutRange(db, conditions),
      };
    },

    async summarise(asked: EntryFilter): Promise<SearchSummary> {
      const conditions = repository.filterConditions(toSearchFilter(asked));
      const figures = await repository.summaryFigures(db, conditions);
      if (!figures) return { sources: 0, measured: 0, computed: 0, energy: null, alike: true, points: [], histogram: null };
      const { sources, measured, computed, energies, median, low, high, unlike, drawn } = figures;
      const summary = { sources, measured, computed, alike: unlike <= 1, energy: median === null || low === null || high === null ? null : { count: energies, median, low, high } };
      if (drawn <= maxPoints || low === null || high === null || low === high) {
        const points = await repository.summaryPoints(db, conditions, maxPoints);
        return {
          ...summary, histogram: null,
          points: points.map(({ methodClass, bound, ...point }) => ({ ...point, bound: bound as '=', computed: methodClass === 'computed' })),
        };
      }
      const width = (high - low) / histogramBins;
      return {
        ...summary, points: null,
        histogram: {
          edges: Array.from({ length: histogramBins + 1 }, (_, i) => low + i * width),
          counts: await repository.summaryHistogram(db, conditions, low, high, histogramBins),
        },
      };
    },
  };
}
export type SearchService = ReturnType<typeof createSearchService>;
export { exportOrder, filterConditions, type SearchFilter } from './search.repository.ts';
