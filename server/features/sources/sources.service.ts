import type { Actor } from '#server/actor.ts';
import type { Context } from '#server/context.ts';
import { appendEvents } from '#server/db/event-log.ts';
import { isUniqueViolation } from '#server/db/pg-errors.ts';
import { readCursor, writeCursor } from '#server/db/keyset.ts';
import { notFound, Refusal } from '#server/refusal.ts';
import type { DoiAnswer } from '#server/services/doi/doi-service.ts';
import { formatCitation, readBibtex, readRis, writeBibtex, writeRis } from '#server/services/citation/citation.ts';
import { citationKey, disambiguate } from '#shared/citations/citation-key.ts';
import { authorsText, containerText, shortLabel, titleText, yearOf } from '#shared/citations/citation-text.ts';
import { readCsl, type Csl } from '#shared/citations/csl.ts';
import { normaliseDoi } from '#shared/citations/doi.ts';
import { noticeSentence, type SourceStanding } from '#shared/citations/notice.ts';
import type { EntryInput } from '#shared/contracts/entries.ts';
import type { SourceDetail, SourceSummary } from '#shared/contracts/sources.ts';
import { presentSource, presentSourceDetail } from './sources.present.ts';
import * as repository from './sources.repository.ts';

export type SourceInput = NonNullable<EntryInput['source']>;
type Origin = 'doi' | 'bibtex' | 'ris' | 'typed';

/** What came of the source a contributor named: the record, or what is wrong and where. */
export interface ResolvedSource {
  source: SourceSummary | null;
  fault: { path: string; message: string; code: string } | null;
}

const isSourceId = (text: string): boolean => /^[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i.test(text);

/** A source that failed to be confirmed is tried again after this long [min]. */
const retryMinutes = 2;
/** While a draft saves itself, a DOI that was just looked up in vain is not asked for again for this long [ms]. */
const patienceMs = 30_000;
const mostRemembered = 1000;

export function createSourcesService({ db, doi: doiService, clock }: Context) {
  /** Everything the record shows, rendered once from the citation. */
  async function rendered(csl: Csl, key: string) {
    return {
      csl: csl as Record<string, unknown>, title: titleText(csl), authors: authorsText(csl), label: shortLabel(csl), year: yearOf(csl), container: containerText(csl),
      citation: await formatCitation(csl), bibtex: await writeBibtex(csl, key), ris: await writeRis(csl),
    };
  }

  /** Look-ups that led to nothing a moment ago, so that saving a draft does not wait for a slow service each time. */
  const inVain = new Map<string, { at: number; answer: DoiAnswer }>();

  async function ask(doi: string, again: boolean): Promise<DoiAnswer> {
    const last = inVain.get(doi);
    if (!again && last && clock().getTime() - last.at < patienceMs) return last.answer;
    const answer = await doiService.lookup(doi);
    inVain.delete(doi);
    if (answer.kind !== 'found') {
      if (inVain.size >= mostRemembered) inVain.clear();
      inVain.set(doi, { at: clock().getTime(), answer });
    }
    return answer;
  }

  function standing(notice: SourceStanding): { status: SourceStanding['status']; notice: string | null } {
    return { status: notice.status, notice: notice.notice ? noticeSentence(notice.notice) : null };
  }

  async function store(csl: Csl, origin: Origin, found: SourceStanding | null): Promise<repository.SourceRow> {
    const doi = csl.DOI ? normaliseDoi(csl.DOI) : null;
    const base = citationKey(csl);
    // Two people may add the same source, or two sources with the same key, at once: look again and go on.
    for (let attempt = 0; ; attempt += 1) {
      const existing = doi ? await repository.findSourceByDoi(db, doi) : await repository.findSourceByTitle(db, titleText(csl), yearOf(csl));
      if (existing) return existing;
      const key = disambiguate(base, await repository.listKeysLike(db, base));
      try {
        const record = {
          doi, citationKey: key, ...(await rendered(csl, key)), origin, createdAt: clock(),
          ...(found ? { ...standing(found), confirmedAt: clock(), lookedUpAt: clock() } : {}),
        };
        return await db.transaction(async (tx) => {
          const row = await repository.insertSource(tx, record);
          await appendEvents(tx, [{ at: clock(), actorId: null, action: 'source.added', subjectType: 'source', subjectId: row.id, payload: { origin } }]);
          return row;
        });
      } catch (error) {
        const taken = isUniqueViolation(error, 'sources_doi_key') || isUniqueViolation(error, 'sources_citation_key_key');
        if (!taken || attempt >= 4) throw error;
      }
    }
  }

  /** A source by its DOI: the one held, else what the DOI service answers, stored when `keep`. */
  async function byDoi(text: string, again: boolean): Promise<{ row: repository.SourceRow | null; fault: ResolvedSource['fault'] }> {
    const doi = normaliseDoi(text);
    if (!doi) return { row: null, fault: { path: 'source.doi', code: 'doi-unreadable', message: `“${text}” is not a DOI. A DOI begins with 10. and a slash follows, such as 10.1000/182.` } };
    const held = await repository.findSourceByDoi(db, doi);
    if (held) return { row: held, fault: null };
    const answer = await ask(doi, again);
    if (answer.kind === 'found') return { row: await store({ ...answer.csl, DOI: doi }, 'doi', answer.notice), fault: null };
    if (answer.kind === 'not-found') return { row: null, fault: { path: 'source.doi', code: 'doi-not-found', message: `The DOI ${doi} is not registered. Check it against the paper, or type the citation.` } };
    return { row: null, fault: { path: 'source.doi', code: 'doi-service-unavailable', message: `The DOI service does not answer (${answer.reason}). Go on with a typed or pasted citation; the DOI is looked up again later.` } };
  }

  /** A citation read from a paste, with its DOI confirmed when the service answers. */
  async function byCitation(csl: Csl, origin: Origin, again: boolean): Promise<repository.SourceRow> {
    const doi = csl.DOI ? normaliseDoi(csl.DOI) : null;
    if (doi) {
      const held = await repository.findSourceByDoi(db, doi);
      if (held) return held;
      const answer = await ask(doi, again);
      if (answer.kind === 'found') return store({ ...answer.csl, DOI: doi }, origin, answer.notice);
    }
    return store(csl, origin, null);
  }

  async function resolve(input: SourceInput | undefined, again: boolean): Promise<{ row: repository.SourceRow | null; fault: ResolvedSource['fault'] }> {
    if (!input) return { row: null, fault: null };
    if (input.id) {
      const row = isSourceId(input.id) ? await repository.findSource(db, input.id) : await repository.findSourceByKey(db, input.id);
      return row ? { row, fault: null } : { row: null, fault: { path: 'source.id', code: 'source-unknown', message: 'This source is not in the store.' } };
    }
    const typed = input.bibtex ?? input.ris;
    if (typed?.trim()) {
      const { entries, problems } = input.bibtex ? await readBibtex(input.bibtex) : await readRis(typed);
      const [first] = entries;
      const path = input.bibtex ? 'source.bibtex' : 'source.ris';
      if (!first) {
        const problem = problems[0];
        return { row: null, fault: { path, code: 'citation-unreadable', message: problem ? `Line ${problem.line}: ${problem.message}` : 'No citation was found in the text.' } };
      }
      return { row: await byCitation(first, input.bibtex ? 'bibtex' : 'ris', again), fault: null };
    }
    if (input.csl && Object.keys(input.csl).length > 0) {
      const reading = readCsl({ type: 'article-journal', ...input.csl, ...(input.doi ? { DOI: input.doi } : {}) });
      if (!reading.ok) return { row: null, fault: { path: `source.csl.${reading.problems[0]?.path ?? ''}`, code: 'citation-incomplete', message: reading.problems[0]?.message ?? 'The citation is not complete.' } };
      if (!reading.csl.title?.trim()) return { row: null, fault: { path: 'source.csl.title', code: 'citation-incomplete', message: 'Type the title of the source.' } };
      if (!reading.csl.author?.length) return { row: null, fault: { path: 'source.csl.author', code: 'citation-incomplete', message: 'Type at least one author.' } };
      if (yearOf(reading.csl) === null) return { row: null, fault: { path: 'source.csl.issued', code: 'citation-incomplete', message: 'Type the year of publication.' } };
      return { row: await byCitation(reading.csl, 'typed', again), fault: null };
    }
    if (input.doi?.trim()) return byDoi(input.doi, again);
    return { row: null, fault: null };
  }

  /** The source held under a DOI, or what the DOI service answers. @throws Refusal when it is no DOI, leads nowhere, or the service does not answer. */
  async function answerFor(text: string): Promise<{ doi: string } & ({ held: repository.SourceRow; found: null } | { held: null; found: { csl: Csl; notice: SourceStanding } })> {
    const doi = normaliseDoi(text);
    if (!doi) throw new Refusal('invalid-input', `“${text}” is not a DOI. A DOI begins with 10. and a slash follows, such as 10.1000/182.`, { errors: [{ path: 'doi', message: 'Not a DOI.' }] });
    const held = await repository.findSourceByDoi(db, doi);
    if (held) return { doi, held, found: null };
    const answer = await doiService.lookup(doi);
    if (answer.kind === 'not-found') throw new Refusal('doi-not-found', `The DOI ${doi} is not registered. Check it against the paper, or type the citation.`);
    if (answer.kind === 'unavailable') throw new Refusal('doi-service-unavailable', `The DOI service does not answer (${answer.reason}). Go on with a typed or pasted citation; the DOI is looked up again later.`);
    return { doi, held: null, found: { csl: { ...answer.csl, DOI: doi }, notice: answer.notice } };
  }

  async function detail(row: repository.SourceRow): Promise<SourceDetail> {
    return presentSourceDetail(row, await repository.countAccepted(db, row.id));
  }

  return {
    /**
     * Finds or stores the source a contributor named. Never inside a transaction: it may ask the DOI service.
     * @param again whether to ask anew about a DOI that was just looked up in vain
     */
    async resolve(input: SourceInput | undefined, again = true): Promise<ResolvedSource> {
      const { row, fault } = await resolve(input, again);
      return { source: row ? presentSource(row) : null, fault };
    },

    /** Looks at what a contributor named without asking anyone outside or storing anything. */
    async peek(input: SourceInput | undefined): Promise<SourceSummary | null> {
      const doi = input?.doi ? normaliseDoi(input.doi) : null;
      const row = input?.id && isSourceId(input.id) ? await repository.findSource(db, input.id) : doi ? await repository.findSourceByDoi(db, doi) : null;
      return row ? presentSource(row) : null;
    },

    async findById(id: string): Promise<SourceSummary | null> {
      const row = await repository.findSource(db, id);
      return row ? presentSource(row) : null;
    },

    async list(_actor: Actor, query: { q?: string | undefined; sort: repository.SourceSort; limit: number; cursor?: string | undefined }) {
      const question = [query.q ?? '', query.sort];
      const [offset] = query.cursor ? readCursor(query.cursor, question, 1) : [0];
      const from = typeof offset === 'number' ? offset : 0;
      const { rows, total } = await repository.listSourceRows(db, { q: query.q, sort: query.sort, limit: query.limit, offset: from });
      const next = from + rows.length;
      return {
        items: rows.map((row) => ({ ...presentSource(row), acceptedEntries: row.acceptedEntries })),
        total, totalIsExact: true, nextCursor: next < total ? writeCursor([next], question) : null,
      };
    },

    async get(_actor: Actor, id: string): Promise<SourceDetail> {
      const row = isSourceId(id) ? await repository.findSource(db, id) : await repository.findSourceByKey(db, id);
      if (!row) throw notFound(`The source ${id}`);
      return detail(row);
    },

    /** What a DOI stands for: the source held, or what the DOI service answers. Stores nothing. */
    async lookUp(text: string) {
      const { doi, held, found } = await answerFor(text);
      if (held) {
        return {
          doi, source: await detail(held), title: held.title, authors: held.authors, year: held.year, container: held.container, citation: held.citation,
          status: presentSource(held).status, notice: held.notice,
        };
      }
      const { csl, notice } = found;
      return {
        doi, source: null, title: titleText(csl), authors: authorsText(csl), year: yearOf(csl), container: containerText(csl), citation: await formatCitation(csl), ...standing(notice),
      };
    },

    /** The citation behind a DOI: of the source held, or what the DOI service answers. Stores nothing. */
    async citationOf(text: string): Promise<Csl> {
      const { held, found } = await answerFor(text);
      return held ? held.csl as unknown as Csl : found.csl;
    },

    /** Asks again about sources whose DOI has not been confirmed; one round of the job. */
    async confirmPending(limit = 20): Promise<number> {
      const triedBefore = new Date(clock().getTime() - retryMinutes * 60_000);
      let confirmed = 0;
      for (const row of await repository.listUnconfirmed(db, triedBefore, limit)) {
        const answer = await doiService.lookup(row.doi ?? '');
        if (answer.kind === 'found') {
          const change = {
            ...(await rendered({ ...answer.csl, ...(row.doi ? { DOI: row.doi } : {}) }, row.citationKey)), ...standing(answer.notice), confirmedAt: clock(), lookedUpAt: clock(),
          };
          await db.transaction(async (tx) => {
            await repository.updateSource(tx, row.id, change);
            await appendEvents(tx, [{ at: clock(), actorId: null, action: 'source.confirmed', subjectType: 'source', subjectId: row.id, payload: { status: change.status } }]);
          });
          confirmed += 1;
        } else {
          await repository.updateSource(db, row.id, { lookedUpAt: clock() });
        }
      }
      return confirmed;
    },
  };
}
export type SourcesService = ReturnType<typeof createSourcesService>;
export { presentSource } from './sources.present.ts';
