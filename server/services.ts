import type { Context } from './context.ts';
import { createAccountsService } from './features/accounts/accounts.service.ts';
import { createCollectionsService } from './features/collections/collections.service.ts';
import { createEntriesService } from './features/entries/entries.service.ts';
import { createEntryRecordsService } from './features/entries/records.service.ts';
import { createExportsService } from './features/exports/exports.service.ts';
import { createReviewsService } from './features/reviews/reviews.service.ts';
import { createSearchService } from './features/search/search.service.ts';
import { createSourcesService } from './features/sources/sources.service.ts';
import { createVocabularyService } from './features/vocabulary/vocabulary.service.ts';

/** Every feature's service, made once for a process (and once more, with its own clock, by the demonstration data). */
export function createServices(context: Context) {
  const sources = createSourcesService(context);
  const records = createEntryRecordsService(context);
  return {
    accounts: createAccountsService(context),
    vocabulary: createVocabularyService(context),
    sources,
    entries: createEntriesService(context, sources),
    reviews: createReviewsService(context, records),
    search: createSearchService(context, records),
    exports: createExportsService(context),
    collections: createCollectionsService(context),
  };
}
export type Services = ReturnType<typeof createServices>;
