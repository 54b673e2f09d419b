import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { migrateDatabase } from '#server/db/migrate.ts';
import { SEARCH_ROW_MAKER, searchRowOf, type TermNames } from '#server/features/entries/search-row.ts';
import type { EntryRecord } from '#server/features/entries/entries.repository.ts';
import { readVocabulary } from '#seeds/vocabulary/read-vocabulary.ts';
import { accessionAlphabetSize, accessionFrom } from '#shared/domain/accession.ts';
import { describeSurface } from '#shared/domain/surface.ts';
import { CONSTANTS_VERSION, CORE_VERSION } from '#shared/kinetics/constants.ts';
import { readStep, STEP_PARSER_VERSION } from '#shared/steps/parse-step.ts';

/*
 * Fills a database with invented accepted entries, as unevenly spread as a real store: a few elementary steps, metals and techniques have most of them.
 *   DATABASE_OWNER_URL=… node generate.mjs 100000 [seed]
 * The same number and seed give the same rows. Made for timing; nothing in it is true. It has no submissions and no log, so that no history can be shown.
 */

const rows = Number(process.argv[2] ?? 100_000);
const seed = Number(process.argv[3] ?? 1);
const ownerUrl = process.env.DATABASE_OWNER_URL;
if (!ownerUrl || !Number.isInteger(rows) || rows < 1) throw new Error('Usage: DATABASE_OWNER_URL=… node generate.mjs <how many entries> [seed]');

let state = seed | 0;
/** Mulberry32: small, seeded, the same everywhere. */
function random(): number {
  state = (state + 0x6d2b79f5) | 0;
  let t = Math.imul(state ^ (state >>> 15), 1 | state);
  t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
  return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
}
const below = (n: number) => Math.floor(random() * n);
/** One of a list, the first ones far more often: by Zipf's law with exponent 1, from memory. */
function skewed<T>(list: readonly T[]): T {
  const at = Math.floor(Math.exp(random() * Math.log(list.length + 1))) - 1;
  return list[Math.min(at, list.length - 1)] as T;
}
const pick = <T>(list: readonly T[]): T => list[below(list.length)] as T;
const normal = (mean: number, sd: number) => mean + sd * Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
const hex = () => below(2 ** 32).toString(16).padStart(8, '0');
const uuid = () => {
  const [a, b, c, d] = [hex(), hex(), hex(), hex()];
  return `${a}-${b.slice(0, 4)}-4${b.slice(5)}-8${c.slice(0, 3)}-${c.slice(4)}${d}`;
};
/** Every number once: steps of a number that has no factor in common with the count of all accessions. */
function accessionAt(index: number): string {
  let rest = (index * 387_420_487 + seed) % accessionAlphabetSize ** 6;
  return accessionFrom(Array.from({ length: 6 }, () => {
    const digit = rest % accessionAlphabetSize;
    rest = Math.floor(rest / accessionAlphabetSize);
    return digit;
  }));
}

const equations = [
  'NH3* + * -> NH2* + H*', 'N* + N* -> N2 + 2*', 'CO + * -> CO*', 'CO* + O* -> CO2 + 2*', 'H* + H* -> H2 + 2*', 'NH2* + * -> NH* + H*', 'NH* + * -> N* + H*', 'N2 + 2* -> 2N*', 'O2 + 2* -> 2O*', 'CO* + * -> C* + O*', 'H2 + 2* -> 2H*',
  'NH3 + * -> NH3*', 'NH3* -> NH3 + *', 'CH4 + 2* -> CH3* + H*', 'CH3* + * -> CH2* + H*', 'CH2* + * -> CH* + H*', 'CH* + * -> C* + H*', 'H2O* + * -> OH* + H*', 'OH* + * -> O* + H*', 'CO* + H* -> HCO* + *', 'HCO* + * -> CH* + O*', 'CO* + OH* -> COOH* + *',
  'COOH* + * -> CO2* + H*', 'NO + * -> NO*', 'NO* + * -> N* + O*', 'N* + NO* -> N2O + 2*', 'N2O* -> N2 + O*', 'H2O + * -> H2O*', 'CO* -> CO + *', 'O* + H* -> OH* + *', 'OH* + H* -> H2O* + *', 'N* + * -> * + N*', 'H* + * -> * + H*', 'CH3OH + * -> CH3OH*', 'N* + H* -> NH* + *', 'NH* + H* -> NH2* + *',
  'NH2* + H* -> NH3* + *', 'C* + O* -> CO* + *', 'C2H4 + * -> C2H4*', 'C2H6 + 2* -> C2H5* + H*', 'N2* + * -> 2N*', 'N2 + * -> N2*', 'S* + H* -> SH* + *', 'CO2 + * -> CO2*', 'CO2* + * -> CO* + O*', 'D* + D* -> D2 + 2*', 'ND3* + * -> ND2* + D*', 'CH3* + H* -> CH4 + 2*', 'HCO* + H* -> H2CO* + *', '2NH3 -> N2 + 3H2',
].flatMap((equation) => {
  try {
    return [{ id: uuid(), ...readStep(equation), equation: readStep(equation).equation }];
  } catch {
    return [];
  }
});

const facets: Record<string, string[]> = { fcc: ['111', '100', '211', '110'], bcc: ['110', '100', '111'], hcp: ['0001', '10-10'] };
const metals = readVocabulary().filter(({ kind }) => kind === 'metal');
const surfaces = [...metals.flatMap(({ code, data }) => (facets[String(data['structure'])] ?? []).flatMap((facet) => [
  { metal: code, facet, sampleType: 'slab-model' }, { metal: code, facet, sampleType: 'single-crystal' }, { metal: code, facet, site: 'step-edge', sampleType: 'slab-model' },
])), ...['MgO', 'Al2O3', 'SiO2', 'CeO2', 'TiO2'].flatMap((support) => metals.slice(0, 8).map(({ code }) => ({ metal: code, support, sampleType: 'supported-particles', particleSizeNm: 2.1 }))),
...['Ni3Fe', 'CoMo', 'RuNi', 'PtRu', 'CuNi', 'PdAg', 'PtSn'].map((formula) => ({ formula, sampleType: 'slab-model' }))]
  .map((input, index) => ({ input, order: (index * 37) % 101 })).sort((a, b) => a.order - b.order)
  .map(({ input }) => ({ id: uuid(), input, ...describeSurface(input as Parameters<typeof describeSurface>[0]) }));
const techniques = readVocabulary().filter(({ kind }) => kind === 'technique').map(({ code, data }) => ({ code, class: String(data['class']) }));
const ordered = ['DFT-PBE', 'DFT-BEEF-vdW', 'TPD', 'DFT-RPBE', 'steady-state kinetics', 'molecular beam', 'DFT-PW91'];
techniques.sort((a, b) => (ordered.indexOf(a.code) + 99) % 99 - (ordered.indexOf(b.code) + 99) % 99);

const syllables = ['ba', 'lin', 'tor', 'mek', 'sa', 'vun', 'der', 'kal', 'ro', 'hen', 'pas', 'zi', 'wol', 'gre', 'tu', 'nor'];
const name = () => Array.from({ length: 2 + below(2) }, () => pick(syllables)).join('').replace(/^./, (first) => first.toUpperCase());
const topics = ['ammonia', 'nitrogen', 'hydrogen', 'carbon monoxide', 'methane', 'oxygen', 'water', 'adsorption', 'desorption', 'dissociation', 'barriers', 'kinetics', 'stepped surfaces', 'terraces', 'coverage', 'promoters', 'isotopes', 'catalysts', 'single crystals', 'density functional theory'];
const containers = ['Invented Journal of Surface Kinetics', 'Imagined Letters on Catalysis', 'Annals of Unreal Chemistry', 'Transactions on Supposed Surfaces'];
const sources = Array.from({ length: Math.max(20, Math.round(rows / 9)) }, (_, index) => {
  const families = Array.from({ length: 1 + below(5) }, name);
  const year = 1965 + Math.floor(60 * Math.sqrt(random()));
  const title = `${pick(topics)} and ${pick(topics)} on ${pick(metals).label}: ${pick(topics)}, an invented study ${index}`.replace(/^./, (first) => first.toUpperCase());
  const label = `${families[0]} ${year}`;
  return {
    id: uuid(), doi: `10.5555/bench.${index}`, citationKey: `bench${index}`, title, authors: families.join(', '), label, year, container: skewed(containers),
    csl: { type: 'article-journal', title, author: families.map((family) => ({ family, given: 'A.' })), issued: { 'date-parts': [[year]] }, DOI: `10.5555/bench.${index}` },
    citation: `${label}. ${title}.`, bibtex: `@article{bench${index}, title = {${title}}, year = ${year}}`, ris: 'TY  - JOUR\nER  - ',
  };
});
const people = Array.from({ length: 40 }, (_, index) => ({ id: uuid(), name: `${name()} ${name()}`, email: `bench.${index}@people.example` }));

const names: TermNames = (() => {
  const known = new Map(readVocabulary().map(({ kind, code, label, synonyms }) => [`${kind} ${code.toLowerCase()}`, [label, ...synonyms]]));
  return (list, code) => known.get(`${list} ${code.toLowerCase()}`) ?? [];
})();

type Cell = string | number | boolean | null | Date | object;
/** One line of COPY's text form. */
const line = (cells: readonly Cell[]): string => `${cells.map((cell) => {
  if (cell === null) return '\\N';
  const text = cell instanceof Date ? cell.toISOString() : Array.isArray(cell) ? `{${cell.map((one) => `"${String(one).replace(/["\\]/g, '\\$&')}"`).join(',')}}` : typeof cell === 'object' ? JSON.stringify(cell) : String(cell);
  return text.replace(/\\/g, '\\\\').replace(/\t/g, '\\t').replace(/\n/g, '\\n').replace(/\r/g, '\\r');
}).join('\t')}\n`;
/** JSON lists of a jsonb column, which are no PostgreSQL arrays. */
const json = (value: unknown): string => JSON.stringify(value);

/** An accepted entry as the store would give it back. */
function makeRecord(index: number): EntryRecord {
  const step = skewed(equations);
  const surface = skewed(surfaces);
  const source = sources[Math.min(sources.length - 1, Math.floor(sources.length * random() ** 1.6))] as (typeof sources)[number];
  const technique = skewed(techniques);
  const author = skewed(people);
  const computed = technique.class === 'computed';
  const energy = Math.max(0, Number(normal(95, 45).toFixed(1)));
  const ranged = random() < (computed ? 0.2 : 0.8);
  const min = 200 + 10 * below(50);
  const at = new Date(Date.UTC(2020, 0, 1) + index * 60_000);
  const revisionId = uuid();
  const conversion = { id: uuid(), revisionId, coreVersion: CORE_VERSION, constantsVersion: CONSTANTS_VERSION, createdAt: at };
  const energyType = computed ? skewed(['electronic', 'zero-point-corrected', 'enthalpy', 'gibbs']) : 'arrhenius';
  const kind = computed ? 'barrier' : 'activation-energy';
  const promoter = random() < 0.06 ? skewed(['Cs', 'K', 'Ba 2 %', 'Na']) : undefined;
  const printed = [{ symbol: 'energy', energyType: energyType as string | null, value: energy, unit: 'kJ/mol', u: random() < 0.5 ? Number((1 + 6 * random()).toFixed(1)) : null, bound: random() < 0.96 ? '=' : pick(['<', '>', '≈']) },
    ...(random() < 0.35 ? [{ symbol: 'preExponential', energyType: null, value: 10 ** normal(13, 1), unit: 's-1', u: null, bound: '=' }] : [])];
  const quantities = printed.map(({ symbol, energyType: type, value, unit, u, bound }, position) => {
    const id = uuid();
    const [low, high] = bound === '<' ? [null, value] : bound === '>' ? [value, null] : [null, null];
    const exact = bound === '<' || bound === '>' ? null : value;
    return {
      printed: {
        id, revisionId, position, symbol, energyType: type, asPrinted: `${bound === '=' ? '' : bound}${value}${u === null ? '' : ` ± ${u}`}`, unitAsPrinted: unit, unitId: unit, multiplier: null, bound, value: exact, low, high,
        reportedUncertainty: u, reportedMinus: null, reportedPlus: null, uncertaintyKind: u === null ? 'none' : 'standard', uncertaintyScale: 'linear', standardUncertainty: u, significantDigits: 3,
      },
      converted: {
        id: uuid(), conversionId: conversion.id, quantityId: id, value: exact, low, high, standardUncertainty: u, unit, siteValue: null, siteUnit: null, siteExponentChange: null, missing: [] as string[],
        derivation: [{ operation: 'read', from: String(value), to: `${value} ${unit}`, reference: 'invented' }],
      },
    };
  });
  const input = {
    kind, scope: random() < 0.9 ? 'elementary' : 'apparent', provenance: computed ? 'computed' : skewed(['measured', 'fitted-in-kinetic-model', 'derived-from-measured']), step: { equation: step.equation }, surface: surface.input,
    source: { id: source.id }, locator: `Table ${1 + below(6)}, p. ${1 + below(400)}`, method: { class: technique.class, technique: technique.code }, conditions: { ...(promoter ? { promoter } : {}), coverage: 'below 0.1' },
    quantities: quantities.map(({ printed: one }) => ({ symbol: one.symbol, ...(one.energyType ? { energyType: one.energyType } : {}), asPrinted: one.asPrinted, unitAsPrinted: one.unitAsPrinted })),
    ...(ranged ? { validRange: { min, max: min + 100 + 10 * below(40) } } : {}), note: `Invented for timing, number ${index}: ${pick(topics)}.`,
  };
  return {
    accession: accessionAt(index), contributorId: author.id, step, surface, source, conversion, quantities, checks: [],
    revision: {
      id: revisionId, entryId: uuid(), number: 1, version: 1, state: 'accepted', lock: 3, authorId: author.id, authorName: author.name, input, inputHash: hex(), kind, scope: input.scope, provenance: input.provenance,
      stepId: step.id, surfaceId: surface.id, sourceId: source.id, methodClass: technique.class, technique: technique.code, validMinK: input.validRange?.min ?? null, validMaxK: input.validRange?.max ?? null,
      reviseReason: null, createdAt: at, changedAt: at, acceptedAt: at, endedAt: null, notice: null,
    },
  } as unknown as EntryRecord;
}

const snake = (text: string) => text.replace(/KJPerMol/g, '_kj_per_mol').replace(/MinK$/, 'MinK_').replace(/MaxK$/, 'MaxK_').replace(/([a-z0-9])([A-Z])/g, '$1_$2').toLowerCase().replace(/_$/, '');

await migrateDatabase({ ownerUrl, appRole: process.env.APP_ROLE ?? 'sillstone_app' });
const started = performance.now();
const psql = spawn(process.env.PSQL ?? 'psql', ['--quiet', '--no-psqlrc', '--set=ON_ERROR_STOP=1', ownerUrl], { stdio: ['pipe', 'inherit', 'inherit'] });
const send = async (text: string): Promise<void> => {
  if (!psql.stdin.write(text)) await once(psql.stdin, 'drain');
};
async function copy<T>(table: string, columns: readonly string[], items: Iterable<T>, cells: (item: T) => Iterable<readonly Cell[]>): Promise<void> {
  const from = performance.now();
  await send(`copy ${table} (${columns.map((column) => `"${column}"`).join(', ')}) from stdin;\n`);
  let text = '';
  let count = 0;
  for (const item of items) {
    for (const one of cells(item)) text += line(one);
    count += 1;
    if (text.length > 1_000_000) {
      await send(text);
      text = '';
    }
  }
  await send(`${text}\\.\n`);
  process.stdout.write(`${table}: ${count} sent after ${((performance.now() - from) / 1000).toFixed(1)} s\n`);
}

// The rules of the store are about how rows come to be, which these do not.
await send('begin;\nalter table revisions disable trigger user;\nalter table quantities disable trigger user;\n');
await copy('vocabulary_terms', ['list', 'code', 'label', 'synonyms', 'data', 'position'], readVocabulary().entries(), ([position, term]) => [[term.kind, term.code, term.label, json(term.synonyms), json(term.data), position]]);
await copy('users', ['id', 'email', 'name', 'password_hash'], people, (person) => [[person.id, person.email, person.name, 'nobody signs in']]);
await copy('sources', ['id', 'doi', 'citation_key', 'csl', 'title', 'authors', 'label', 'year', 'container', 'citation', 'bibtex', 'ris', 'origin'], sources, (one) => [[one.id, one.doi, one.citationKey, json(one.csl), one.title, one.authors, one.label, one.year, one.container, one.citation, one.bibtex, one.ris, 'typed']]);
await copy('elementary_steps', ['id', 'key', 'variant_key', 'direction', 'equation', 'step_class', 'bond', 'gas_order', 'surface_order', 'parser_version'], equations, (step) => [[step.id, step.key, step.variantKey, step.direction, step.equation, step.class, step.bond.broken ?? step.bond.formed, step.gasOrder, step.surfaceOrder, STEP_PARSER_VERSION]]);
await copy('surfaces', ['id', 'key', 'metal', 'formula', 'elements', 'structure', 'facet', 'site', 'sample_type', 'support', 'particle_size_nm', 'label'], surfaces, (one) => [[one.id, one.key, one.metal, one.formula, json(one.elements), one.structure, one.facet, one.site, one.sampleType, one.support, one.particleSizeNm, one.label]]);
for (const step of equations) Object.assign(step, { stepClass: step.class, bond: step.bond.broken ?? step.bond.formed });

/** The same records again for every table, so that they need not be kept. */
const first = state;
function* records(): Generator<EntryRecord> {
  state = first;
  for (let index = 0; index < rows; index += 1) yield makeRecord(index);
}
await copy('entries', ['id', 'accession', 'contributor_id', 'created_at'], records(), ({ revision, accession, contributorId }) => [[revision.entryId, accession, contributorId, revision.createdAt]]);
const revisionColumns = Object.keys(makeRecord(0).revision) as (keyof EntryRecord['revision'])[];
await copy('revisions', revisionColumns.map(snake), records(), ({ revision }) => [revisionColumns.map((column) => revision[column] as Cell)]);
const [sample] = makeRecord(0).quantities;
const printedColumns = Object.keys(sample?.printed ?? {}) as (keyof EntryRecord['quantities'][number]['printed'])[];
const convertedColumns = Object.keys(sample?.converted ?? {}) as (keyof EntryRecord['quantities'][number]['converted'])[];
await copy('quantities', printedColumns.map(snake), records(), ({ quantities }) => quantities.map(({ printed }) => printedColumns.map((column) => printed[column] as Cell)));
await copy('conversions', ['id', 'revision_id', 'core_version', 'constants_version', 'created_at'], records(), ({ conversion, revision }) => [[conversion.id, revision.id, conversion.coreVersion, conversion.constantsVersion, conversion.createdAt]]);
await copy('converted_quantities', convertedColumns.map(snake), records(), ({ quantities }) => quantities.map(({ converted }) => convertedColumns.map((column) => (column === 'missing' || column === 'derivation' ? json(converted[column]) : converted[column] as Cell))));
await copy('accepted_conversions', ['revision_id', 'conversion_id'], records(), ({ conversion, revision }) => [[revision.id, conversion.id]]);
const rowColumns = Object.keys(searchRowOf(makeRecord(0), names)) as (keyof ReturnType<typeof searchRowOf>)[];
await copy('search_rows', [...rowColumns.map(snake), 'document', 'state', 'contributor_key', 'source_label', 'author_keys'], records(), (record) => {
  const row = { ...searchRowOf(record, names), madeBy: SEARCH_ROW_MAKER };
  return [[...rowColumns.map((column) => (column === 'values' ? json(row[column]) : row[column] as Cell)), '', 'draft', '', '', []]];
});
await send('alter table revisions enable trigger user;\nalter table quantities enable trigger user;\ncommit;\nvacuum analyze search_rows, search_words, revisions, entries, sources, quantities, conversions, converted_quantities, accepted_conversions, elementary_steps, surfaces, vocabulary_terms;\n');
psql.stdin.end();
const [code] = await once(psql, 'close') as [number];
if (code !== 0) throw new Error('psql refused: see above.');
process.stdout.write(`${rows} entries, ${sources.length} sources, ${equations.length} elementary steps, ${surfaces.length} surfaces in ${((performance.now() - started) / 1000).toFixed(1)} s\n`);
