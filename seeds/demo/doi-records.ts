import type { FakeDoiRecord } from '#server/services/doi/fake-doi-server.ts';
import { readBibtex } from '#server/services/citation/citation.ts';
import { readDemoNotices, readDemoSources, readLookupOnlySource } from './read-demo.ts';

/** The invented sources as the stand-in DOI service serves them, with their retraction and correction notices. */
export async function readDoiRecords(folder: string): Promise<FakeDoiRecord[]> {
  const { entries } = await readBibtex(`${readDemoSources(folder)}\n${readLookupOnlySource(folder)}`);
  const notices = readDemoNotices(folder);
  return entries.map((csl) => {
    const own = notices.filter(({ doi }) => doi === csl.DOI?.toLowerCase());
    if (own.length === 0) return csl;
    return {
      ...csl,
      'updated-by': own.map(({ type, noticeDoi, updated, label }) => ({ type, label, DOI: noticeDoi, updated: { 'date-parts': [updated.split('-').map(Number)] } })),
    };
  });
}
