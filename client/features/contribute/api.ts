import * as z from 'zod';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { cite } from '#shared/contracts/citations.ts';
import { endpoint } from '#shared/contracts/endpoint.ts';
import {
  createEntry, getDraft, listMyEntries, patchEntry, previewEntry, reviseEntry, submitEntry, withdrawEntry, type EntryInput,
} from '#shared/contracts/entries.ts';
import { lookUpDoi } from '#shared/contracts/sources.ts';
import { getVocabulary } from '#shared/contracts/vocabulary.ts';
import { encodeDoi } from '#shared/citations/doi.ts';
import type { State } from '#shared/domain/states.ts';
import { call, callForAnswer, type Answer } from '#client/lib/api-client.ts';
import type { EntryForEditing } from '#shared/contracts/entries.ts';
import type { DraftStore, HeldDraft } from './draft-saver.ts';

const printedCitation = z.object({ formatted: z.string(), key: z.string() });

const held = ({ data, etag }: Answer<EntryForEditing>): HeldDraft => ({ draft: data, etag });

/** The drafts of the server. */
export const draftStore: DraftStore = {
  create: async (input) => held(await callForAnswer(createEntry, { body: input })),
  patch: async (accession, patch, etag) => held(await callForAnswer(patchEntry, { params: { accession }, body: patch, ...(etag ? { ifMatch: etag } : {}) })),
  load: async (accession) => held(await callForAnswer(getDraft, { params: { accession } })),
};

/** A draft as it was when the form was opened; the form itself follows it from there. */
export const draftOptions = (accession: string) => queryOptions({
  queryKey: ['draft', accession],
  queryFn: () => draftStore.load(accession),
  staleTime: 0,
  gcTime: 0,
});

/** What the entry would become at the temperature of interest [K]. */
export const previewOptions = (input: EntryInput, temperatureK: number) => queryOptions({
  queryKey: ['entry-preview', input, temperatureK],
  queryFn: ({ signal }) => call(previewEntry, { body: input, query: { T: temperatureK }, signal }),
  placeholderData: keepPreviousData,
  staleTime: Infinity,
  gcTime: 60_000,
  retry: 1,
});

/** What is known of a DOI: the source we hold, or the answer of the DOI service. */
export const doiOptions = (doi: string) => queryOptions({
  queryKey: ['doi', doi],
  // A DOI has slashes of its own, which belong to the path.
  queryFn: ({ signal }) => call(
    endpoint({ method: 'GET', path: `/doi/${encodeDoi(doi)}`, access: 'contributor', summary: lookUpDoi.summary, response: lookUpDoi.response }),
    { signal },
  ),
  staleTime: 60_000,
  retry: false,
});

/** A pasted citation as it would be printed. */
export const citationOptions = (pasted: { bibtex: string } | { ris: string }) => queryOptions({
  queryKey: ['citation', pasted],
  queryFn: async ({ signal }) => {
    // The endpoint answers one item or many; one was asked for.
    return printedCitation.parse(await call(cite, { body: pasted, signal }));
  },
  staleTime: Infinity,
  retry: false,
});

export const vocabularyOptions = queryOptions({
  queryKey: ['vocabulary'],
  queryFn: ({ signal }) => call(getVocabulary, { signal }),
  staleTime: 600_000,
});

export const myEntriesOptions = (state: State | null) => ({
  queryKey: ['my-entries', state] as const,
  queryFn: ({ pageParam, signal }: { pageParam: string | null; signal: AbortSignal }) =>
    call(listMyEntries, { query: { ...(state ? { state } : {}), ...(pageParam ? { cursor: pageParam } : {}) }, signal }),
  initialPageParam: null as string | null,
  getNextPageParam: (last: { nextCursor: string | null }) => last.nextCursor,
});

export const handIn = (accession: string, etag: string | null) =>
  call(submitEntry, { params: { accession }, ...(etag ? { ifMatch: etag } : {}) });
export const withdraw = (accession: string) => call(withdrawEntry, { params: { accession } });
export const revise = (accession: string, reason: string) =>
  call(reviseEntry, { params: { accession }, body: reason.trim() ? { reason: reason.trim() } : {} });
