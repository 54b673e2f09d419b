import { execFile } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import http from 'node:http';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { PassThrough } from 'node:stream';
import { setTimeout as pause } from 'node:timers/promises';
import { promisify } from 'node:util';
import { parse } from 'csv-parse/sync';
import { beforeAll, describe, expect, it } from 'vitest';
import yauzl from 'yauzl';
import { visitor as anybody } from '#server/actor.ts';
import { parameterColumns } from '#server/features/exports/parameters-csv.ts';
import type { Entry } from '#shared/contracts/entries.ts';
import { useApp } from '#tests/factories/app.ts';
import { okBody, refusalOf, type Client } from '#tests/factories/client.ts';
import { entryInputOf, withEnergy } from '#tests/factories/entry-input.ts';
import type { Lives } from '#tests/factories/lives.ts';
import { populate, populationRecords } from '#tests/factories/population.ts';

const run = promisify(execFile);
const app = useApp({ demonstration: true, doiRecords: populationRecords });
let visitor: Client;
let lives: Lives;

beforeAll(async () => {
  visitor = await app.visitor();
  ({ lives } = await populate(app, 14));
  const formulas = entryInputOf({ locator: '=1+1', note: '-x', conditions: { promoter: '@SUM(A1)', coverage: '+0.1 ML', pressures: '-5', text: 'plain' }, surface: { metal: 'Os' }, validRange: undefined });
  await lives.accepted(formulas);
  await lives.accepted(entryInputOf({ locator: 'p. 1, "second" line\nof the note', note: 'Ø; 氨; NH₃, “quoted”', surface: { metal: 'Re' }, source: { doi: '10.5555/test.3' } }));
}, 120_000);

type Row = Record<string, string>;
const rowsOf = (csv: string): Row[] => parse(csv, { columns: true, record_delimiter: '\r\n' });

async function download(query: string): Promise<Buffer> {
  const answer = await visitor.agent.get(`/api/v1/entries/export?${query}`).buffer(true).parse((res, done) => {
    const chunks: Buffer[] = [];
    res.on('data', (chunk: Buffer) => chunks.push(chunk));
    res.on('end', () => done(null, Buffer.concat(chunks)));
  });
  if (answer.status !== 200) throw new Error(`The export answered ${answer.status}: ${String(answer.body)}`);
  return answer.body as Buffer;
}

/** Every file of a ZIP, read by another library than the one that wrote it. */
async function unzip(bytes: Buffer): Promise<Record<string, Buffer>> {
  const zip = await promisify<Buffer, yauzl.Options, yauzl.ZipFile>(yauzl.fromBuffer)(bytes, { lazyEntries: true });
  const files: Record<string, Buffer> = {};
  await new Promise<void>((resolve, reject) => {
    zip.on('error', reject);
    zip.on('end', resolve);
    zip.on('entry', (entry: yauzl.Entry) => {
      zip.openReadStream(entry, (error, stream) => {
        if (error) return reject(error);
        const chunks: Buffer[] = [];
        stream.on('data', (chunk: Buffer) => chunks.push(chunk));
        stream.on('end', () => {
          files[entry.fileName] = Buffer.concat(chunks);
          zip.readEntry();
        });
      });
    });
    zip.readEntry();
  });
  return files;
}

const textOf = (files: Record<string, Buffer>, name: string): string => files[name]?.toString('utf8') ?? '';
const keysOf = (bib: string): string[] => [...bib.matchAll(/^@\w+\{([^,]+),/gm)].map((match) => match[1] ?? '');

describe('the package', () => {
  it('holds the table, the bibliography, their description, the manifest and the caution', async () => {
    const files = await unzip(await download('format=zip&T=700'));
    expect(Object.keys(files).sort()).toEqual(['README.txt', 'derivations.csv', 'derivations.csv-metadata.json', 'manifest.json', 'parameters.csv', 'parameters.csv-metadata.json', 'references.bib']);
    expect(textOf(files, 'README.txt')).toMatch(/not design data/);
    expect(textOf(files, 'README.txt')).toMatch(/DEMONSTRATION DATA: every entry, author, journal and DOI in this export is invented/);
    expect(textOf(files, 'references.bib')).toMatch(/^% DEMONSTRATION DATA/);
  });

  it('has a manifest whose hashes, counts and query are right', async () => {
    const files = await unzip(await download('format=zip&metal=Ru&metal=Ni&T=650'));
    const manifest = JSON.parse(textOf(files, 'manifest.json')) as { sha256: Record<string, string>; entries: number; sources: number; query: object; temperatureOfInterestK: number; madeAt: string; notice: string; caution: string; constants: string; coreVersion: string; formulaGuard: string };
    const hashed = Object.fromEntries(Object.entries(files).filter(([name]) => name !== 'manifest.json').map(([name, bytes]) => [name, createHash('sha256').update(bytes).digest('hex')]));
    expect(manifest.sha256).toEqual(hashed);
    const rows = rowsOf(textOf(files, 'parameters.csv'));
    expect(manifest).toMatchObject({ entries: rows.length, sources: new Set(rows.map((row) => row['citation_key'])).size, temperatureOfInterestK: 650, query: { metal: ['Ru', 'Ni'] }, madeAt: app.clock.now().toISOString() });
    expect([manifest.notice, manifest.caution, manifest.constants, manifest.coreVersion, manifest.formulaGuard].every((text) => text.length > 0)).toBe(true);
    expect(rows.length).toBe(okBody(await visitor.get('/entries?metal=Ru&metal=Ni')).total);
  });

  it('describes every column of the table, in order', async () => {
    const files = await unzip(await download('format=zip'));
    const metadata = JSON.parse(textOf(files, 'parameters.csv-metadata.json')) as { tableSchema: { columns: { name: string }[]; primaryKey: string } };
    const [header = []] = parse(textOf(files, 'parameters.csv'), { to_line: 1 }) as string[][];
    expect(metadata.tableSchema.columns.map(({ name }) => name)).toEqual(header);
    expect(header).toEqual(parameterColumns.map(([name]) => name));
  });

  it('holds the derivation of every quantity, line by line, as the entry shows it', async () => {
    const files = await unzip(await download('format=zip&metal=Ru'));
    const metadata = JSON.parse(textOf(files, 'derivations.csv-metadata.json')) as { tableSchema: { columns: { name: string }[] } };
    const lines = rowsOf(textOf(files, 'derivations.csv'));
    expect(metadata.tableSchema.columns.map(({ name }) => name)).toEqual(Object.keys(lines[0] ?? {}));
    const accessions = rowsOf(textOf(files, 'parameters.csv')).map((row) => row['accession'] ?? '');
    expect(new Set(lines.map((line) => line['accession']))).toEqual(new Set(accessions));
    const entry = okBody(await visitor.get(`/entries/${accessions[0] ?? ''}`)) as { quantities: { symbol: string; derivation: Record<string, string>[] }[] };
    const shown = entry.quantities.flatMap(({ symbol, derivation }) => derivation.map(({ operation, from, to, constant = '', assumption = '', reference }) => ({ quantity: symbol, operation, from, to, constant, assumption, reference })));
    const unguarded = (text = '') => text.replace(/^'(?=[=+\-@])/, '');
    const exported = lines.filter((line) => line['accession'] === accessions[0]).map(({ quantity, operation, from, to, constant, assumption, reference }) => ({
      quantity, operation: unguarded(operation), from: unguarded(from), to: unguarded(to), constant: unguarded(constant), assumption: unguarded(assumption), reference,
    }));
    expect(exported).toEqual(shown);
    expect(exported.length).toBeGreaterThan(0);
  });

  it('is the same again: two of one moment differ in nothing', async () => {
    expect((await download('format=zip&T=700')).equals(await download('format=zip&T=700'))).toBe(true);
  });
});

describe('the table, read by another parser', () => {
  it.each(['', 'metal=Ru', 'kind=barrier', 'validAt=700', 'method=computed&kind=activation-energy', 'q=ammonia', 'yearFrom=2200'])('has a row for each entry of the search: %s', async (query) => {
    const found = okBody(await visitor.get(`/entries?limit=200&T=700&${query}`));
    const rows = rowsOf((await download(`format=csv&T=700&${query}`)).toString('utf8'));
    expect(rows.length).toBe(found.total);
    const byAccession = new Map((found.items as Entry[]).map((entry) => [entry.accession, entry]));
    for (const row of rows) {
      const entry = byAccession.get(row['accession'] ?? '');
      expect(entry, row['accession']).toBeDefined();
      expect(Number(row['version'])).toBe(entry?.version);
      expect(row['citation_key']).toBe(entry?.source?.key);
      expect(row['step']).toBe(entry?.step?.equation);
      const primary = entry?.quantities.find(({ symbol }) => symbol === row['quantity']);
      expect(row['value_as_printed']?.replace(/^'/, '')).toBe(primary?.asPrinted);
      expect(row['value'] === '' ? null : Number(row['value'])).toBe(primary?.value);
      expect(row['k_at_T'] === '' ? null : Number(row['k_at_T'])).toBe(entry?.kAtT?.value ?? null);
      expect(row['permalink']).toBe(`http://sillstone.test/entries/${entry?.accession ?? ''}`);
    }
  });

  it('keeps quotes, line ends and letters of every kind', async () => {
    const [row] = rowsOf((await download('format=csv&metal=Re')).toString('utf8'));
    expect(row).toMatchObject({ locator: 'p. 1, "second" line\nof the note', note: 'Ø; 氨; NH₃, “quoted”' });
  });

  it('puts an apostrophe before what a spreadsheet would run, and before nothing else', async () => {
    const [row] = rowsOf((await download('format=csv&metal=Os')).toString('utf8'));
    expect(row).toMatchObject({ locator: "'=1+1", note: "'-x", promoter: "'@SUM(A1)", coverage: "'+0.1 ML", pressures: '-5' });
    expect(row?.['value']).toBe('186.188');
  });

  it('takes chosen rows by their accession', async () => {
    const items = okBody(await visitor.get('/entries?limit=3')).items as Entry[];
    const rows = rowsOf((await download(`format=csv&${items.map(({ accession }) => `accession=${accession}`).join('&')}`)).toString('utf8'));
    expect(rows.map((row) => row['accession']).sort()).toEqual(items.map(({ accession }) => accession).sort());
  });

  it.each(['format=xml', 'valueMin=1', 'format=zip&T=0'])('refuses %s before anything is sent', async (query) => {
    expect(refusalOf(await visitor.get(`/entries/export?${query}`))).toEqual([422, 'invalid-input']);
  });
});

describe('the bibliography', () => {
  it('holds every key of the table, once, and no other', async () => {
    const files = await unzip(await download('format=zip'));
    const keys = keysOf(textOf(files, 'references.bib'));
    expect(new Set(keys).size).toBe(keys.length);
    expect([...keys].sort()).toEqual([...new Set(rowsOf(textOf(files, 'parameters.csv')).map((row) => row['citation_key'] ?? ''))].sort());
    expect(keysOf((await download('format=bib')).toString('utf8'))).toEqual(keys);
  });

  it('is read by BibTeX itself without a warning', async () => {
    // Source: BibTeX 0.99d (Debian texlive-binaries) with plain.bst. A missing program fails the test.
    const folder = await mkdtemp(path.join(tmpdir(), 'sillstone-export-'));
    try {
      const bib = (await download('format=bib')).toString('utf8');
      await writeFile(path.join(folder, 'references.bib'), bib);
      await writeFile(path.join(folder, 'paper.aux'), `\\relax\n${keysOf(bib).map((key) => `\\citation{${key}}`).join('\n')}\n\\bibdata{references}\n\\bibstyle{plain}\n`);
      const { stdout } = await run('bibtex', ['paper'], { cwd: folder });
      expect(stdout.split('\n').filter((line) => /warning|error|line \d+ of file/i.test(line))).toEqual([]);
      expect((await readFile(path.join(folder, 'paper.bbl'), 'utf8')).match(/\\bibitem/g)).toHaveLength(keysOf(bib).length);
    } finally {
      await rm(folder, { recursive: true, force: true });
    }
  }, 60_000);
});

describe('an export under way', () => {
  it('shows one moment, whatever is accepted or retracted meanwhile', async () => {
    const before = okBody(await visitor.get('/entries')).total as number;
    const out = new PassThrough({ highWaterMark: 64 });
    let begun: () => void = () => undefined;
    const started = new Promise<void>((resolve) => { begun = resolve; });
    const written = app.services.exports.write(anybody, { format: 'zip' }, out, begun);
    await started;
    const first = (await once(out)) as Buffer;
    const fresh = await lives.accepted(withEnergy('77', { surface: { metal: 'Ag', facet: '111' }, source: { doi: '10.5555/test.4' } }));
    const chunks = [first];
    out.on('data', (chunk: Buffer) => chunks.push(chunk));
    out.resume();
    await written;
    const files = await unzip(Buffer.concat(chunks));
    const rows = rowsOf(textOf(files, 'parameters.csv'));
    expect(rows.length).toBe(before);
    expect(rows.map((row) => row['accession'])).not.toContain(fresh.accession);
    expect(okBody(await visitor.get('/entries')).total).toBe(before + 1);
  });

  const once = (stream: PassThrough) => new Promise<unknown>((resolve) => stream.once('data', (chunk) => { stream.pause(); resolve(chunk); }));

  it('gives its connection back when the reader goes away, at whatever moment', async () => {
    for (const format of ['zip', 'csv', 'bib'] as const) {
      for (const when of ['before it begins', 'at once', 'after the first bytes'] as const) {
        const out = new PassThrough({ highWaterMark: 16 });
        if (when === 'before it begins') await new Promise((resolve) => out.destroy().once('close', resolve));
        const written = app.services.exports.write(anybody, { format }, out, () => { if (when === 'at once') out.destroy(); });
        if (when === 'after the first bytes') out.once('data', () => out.destroy());
        const outcome = await Promise.race([written.then(() => 'written', () => 'broken off'), pause(5000, 'hangs')]);
        expect(outcome, `${format} ${when}`).toBe('broken off');
      }
    }
    expect(app.pools.exportPool.totalCount - app.pools.exportPool.idleCount).toBe(0);
  });

  it('and so over HTTP, twenty times, with the pool whole afterwards', async () => {
    for (let n = 0; n < 20; n += 1) {
      await new Promise<void>((resolve) => {
        const request = http.get(`${app.url}/api/v1/entries/export?format=${['zip', 'csv', 'bib'][n % 3]}`, { agent: false }, (response) => {
          response.on('error', () => undefined);
          if (n % 2) response.once('data', () => request.destroy());
          else request.destroy();
        });
        request.on('error', () => undefined);
        request.on('close', resolve);
        if (n % 5 === 0) setTimeout(() => request.destroy(), 2);
      });
    }
    await pause(300);
    expect(app.pools.exportPool.waitingCount).toBe(0);
    expect(app.pools.exportPool.totalCount - app.pools.exportPool.idleCount).toBe(0);
    expect(rowsOf((await download('format=csv')).toString('utf8')).length).toBe(okBody(await visitor.get('/entries')).total);
  });

  it('is put off when too many run at once, and says for how long', async () => {
    const held = await Promise.all([1, 2, 3].map(() => app.pools.exportPool.connect()));
    try {
      const answer = await visitor.get('/entries/export?format=csv');
      expect(refusalOf(answer)).toEqual([503, 'busy']);
      expect(answer.headers['retry-after']).toBe('30');
    } finally {
      for (const client of held) client.release();
    }
  }, 30_000);
});
