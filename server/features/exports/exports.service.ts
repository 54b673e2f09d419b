import { createHash } from 'node:crypto';
import { once } from 'node:events';
import { PassThrough, Readable, type Writable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type pg from 'pg';
import { ZipFile } from 'yazl';
import type { Actor } from '#server/actor.ts';
import type { Context } from '#server/context.ts';
import type { DbOrTx } from '#server/db/pool.ts';
import { presentRecord } from '#server/features/entries/records.service.ts';
import { readExportFilter, type SearchFilter } from '#server/features/search/search.service.ts';
import { Refusal } from '#server/refusal.ts';
import type { EntryFilter } from '#shared/contracts/entry-search.ts';
import { CONSTANTS_VERSION, CORE_VERSION } from '#shared/kinetics/constants.ts';
import { derivationColumns, derivationRows, derivationsHeader } from './derivations-csv.ts';
import { inSnapshot, walkBibtex, walkEntries } from './exports.repository.ts';
import { caution, inventedNotice, readmeText, tableMetadata } from './package-texts.ts';
import { csvHeader, csvRow, parameterColumns } from './parameters-csv.ts';

export interface ExportRequest extends EntryFilter {
  format: 'zip' | 'csv' | 'bib';
  T?: number | undefined;
  accession?: string[] | undefined;
}

interface Tally {
  entries: number;
  sources: Map<string, string>;
}

export function createExportsService({ db, exportPool, clock, publicUrl, version, demonstration }: Context) {
  async function* csvLines(db: DbOrTx, filter: SearchFilter, temperatureK: number | null, tally: Tally): AsyncGenerator<string> {
    yield csvHeader();
    for await (const records of walkEntries(db, filter)) {
      yield records.map((record) => csvRow(presentRecord(record, { temperatureK, actions: [], publicUrl }), temperatureK)).join('');
      tally.entries += records.length;
      for (const { source } of records) tally.sources.set(source.id, source.citationKey);
    }
  }

  async function* derivationLines(db: DbOrTx, filter: SearchFilter): AsyncGenerator<string> {
    yield derivationsHeader();
    for await (const records of walkEntries(db, filter)) yield records.map((record) => derivationRows(presentRecord(record, { temperatureK: null, actions: [], publicUrl }))).join('');
  }

  async function* bibtexLines(db: DbOrTx, tally: Tally): AsyncGenerator<string> {
    if (demonstration) yield `% ${inventedNotice}\n\n`;
    const ids = [...tally.sources].sort(([, a], [, b]) => (a < b ? -1 : 1)).map(([id]) => id);
    for await (const records of walkBibtex(db, ids)) yield records.map((bibtex) => `${bibtex.trim()}\n\n`).join('');
  }

  async function collectSources(db: DbOrTx, filter: SearchFilter): Promise<Tally> {
    const tally: Tally = { entries: 0, sources: new Map() };
    for await (const records of walkEntries(db, filter)) for (const { source } of records) tally.sources.set(source.id, source.citationKey);
    return tally;
  }

  async function writeZip(db: DbOrTx, filter: SearchFilter, request: ExportRequest, out: Writable): Promise<void> {
    const zip = new ZipFile();
    const madeAt = clock();
    const hashes: Record<string, string> = {};
    const tally: Tally = { entries: 0, sources: new Map() };
    // Asked once and before anything is read: who is gone already does not go again.
    if (out.destroyed) throw new Error('The reader went away.');
    const gone = new Promise<never>((_resolve, reject) => out.once('close', () => reject(new Error('The reader went away.'))));
    gone.catch(() => undefined);
    // Files follow one another, because a later one depends on what an earlier one held; each is read only as fast as it is sent.
    const add = async (name: string, lines: AsyncIterable<string> | Iterable<string>): Promise<void> => {
      const hash = createHash('sha256');
      const file = new PassThrough();
      zip.addReadStream(file, name, { mtime: madeAt });
      for await (const line of lines) {
        hash.update(line, 'utf8');
        if (!file.write(line)) await Promise.race([once(file, 'drain'), gone]);
        if (out.destroyed) throw new Error('The reader went away.');
      }
      file.end();
      hashes[name] = hash.digest('hex');
    };
    const sending = pipeline(zip.outputStream as Readable, out);
    sending.catch(() => undefined);
    const temperatureK = request.T ?? null;
    await add('parameters.csv', csvLines(db, filter, temperatureK, tally));
    await add('references.bib', bibtexLines(db, tally));
    await add('derivations.csv', derivationLines(db, filter));
    await add('parameters.csv-metadata.json', [tableMetadata('parameters.csv', parameterColumns, 'accession')]);
    await add('derivations.csv-metadata.json', [tableMetadata('derivations.csv', derivationColumns, ['accession', 'quantity_number', 'line'])]);
    await add('README.txt', [readmeText({ demonstration, entries: tally.entries, sources: tally.sources.size, madeAt: madeAt.toISOString(), publicUrl })]);
    const { format: _format, T: _temperature, ...query } = request;
    const manifest = {
      product: 'Sillstone', version, madeAt: madeAt.toISOString(), from: publicUrl, query, temperatureOfInterestK: temperatureK,
      entries: tally.entries, sources: tally.sources.size, coreVersion: CORE_VERSION, constants: CONSTANTS_VERSION,
      formulaGuard: 'Text cells that begin with = + - @, tab or return and are not plain numbers have a leading apostrophe.',
      ...(demonstration ? { notice: inventedNotice } : {}),
      caution, sha256: hashes,
    };
    zip.addBuffer(Buffer.from(`${JSON.stringify(manifest, null, 2)}\n`, 'utf8'), 'manifest.json', { mtime: madeAt });
    zip.end();
    await sending;
  }

  return {
    /** Streams the filtered set; `begin` is called once the answer is certain to start. */
    async write(actor: Actor, request: ExportRequest, out: Writable, begin: () => void): Promise<void> {
      const { format, T, accession, ...asked } = request;
      const filter = { ...await readExportFilter(db, actor, asked), accession };
      let client: pg.PoolClient;
      try {
        client = await exportPool.connect();
      } catch {
        throw new Refusal('busy', 'Too many exports run at once. Try again in half a minute.', { retryAfterS: 30 });
      }
      let failed: Error | undefined;
      try {
        await inSnapshot(client, async (db) => {
          begin();
          if (format === 'zip') await writeZip(db, filter, request, out);
          else if (format === 'csv') await pipeline(Readable.from(csvLines(db, filter, T ?? null, { entries: 0, sources: new Map() })), out);
          else await pipeline(Readable.from(bibtexLines(db, await collectSources(db, filter))), out);
        });
      } catch (error) {
        failed = error instanceof Error ? error : new Error(String(error));
        throw error;
      } finally {
        client.release(failed);
      }
    },
  };
}
export type ExportsService = ReturnType<typeof createExportsService>;
