import type { SourceDetail, SourceSummary } from '#shared/contracts/sources.ts';
import type { SourceRow } from './sources.repository.ts';

export function presentSource(row: SourceRow): SourceSummary {
  return {
    id: row.id, doi: row.doi, key: row.citationKey, title: row.title, authors: row.authors, label: row.label, year: row.year, container: row.container,
    status: row.status as SourceSummary['status'], notice: row.notice,
  };
}

export function presentSourceDetail(row: SourceRow, acceptedEntries: number): SourceDetail {
  return { ...presentSource(row), citation: row.citation, bibtex: row.bibtex, ris: row.ris, confirmed: row.confirmedAt !== null || row.doi === null, acceptedEntries };
}
