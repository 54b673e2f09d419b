import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { calculators } from '#shared/calculators/registry.ts';
import { quantitySymbols } from '#shared/domain/kinds.ts';
import { useApp, type Person } from '#tests/factories/app.ts';
import type { Client } from '#tests/factories/client.ts';
import { entryInputOf } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';
import { calculatorCases } from '#tests/integration/calculators/calculator-cases.ts';

const app = useApp();
let contributor: Person;
let reviewer: Person;
let visitor: Client;
let accession = '';
let submission = '';

beforeAll(async () => {
  [contributor, reviewer] = [await app.person('contributor'), await app.person('reviewer')];
  visitor = await app.visitor();
  const lives = new Lives(app.services, contributor.actor, reviewer.actor);
  await lives.accepted();
  ({ accession } = await lives.draft());
  ({ submission } = await lives.submitted());
});

/** Half surrogates cannot stand in an address. */
const wellFormed = (half: string): string => Buffer.from(half, 'utf8').toString('utf8');
const runs = { numRuns: 60, seed: 20_260_302 };
const text = fc.oneof(fc.string({ maxLength: 40 }), fc.string({ unit: 'binary', maxLength: 20 }), fc.constantFrom('', ' ', '\u0000', '\ud800', "'", '44.5 ± 1.4', '10^13', '1e400', '-1e-400', '< 5', '5–7', '1.2(3)', '∞', 'NaN', 'kcal/mol', 's-1', 'cm2 molecule-1 s-1', 'N* + * -> N*', '⇌'));
const json = fc.jsonValue({ maxDepth: 3, noUnicodeString: false });
const number = fc.oneof(fc.double(), fc.integer(), fc.constantFrom(0, -0, 1e308, -1e308, 5e-324, 2 ** 53));
const part = fc.oneof({ weight: 5, arbitrary: text }, number, json);

/** An entry as somebody might send it: mostly the right names, with anything in them. */
const quantity = fc.record({
  symbol: fc.oneof(fc.constantFrom(...quantitySymbols), text), asPrinted: text, unitAsPrinted: text, energyType: fc.constantFrom('arrhenius', 'electronic', undefined), multiplier: fc.option(number, { nil: undefined }),
  uncertaintyKind: fc.constantFrom('standard', 'expanded', 'confidence', 'none', undefined), coverageFactor: fc.option(number, { nil: undefined }), level: fc.option(number, { nil: undefined }),
});
const odd = fc.record({
  step: fc.record({ equation: text }), surface: fc.record({ metal: text, formula: text, facet: text, particleSizeNm: number }, { requiredKeys: [] }), locator: part, note: part, rateOf: fc.oneof(text, fc.record({ consumptionOf: text })),
  source: fc.oneof(fc.record({ doi: text }), fc.record({ bibtex: text }), fc.record({ ris: text }), fc.record({ csl: fc.record({ title: part, author: json, issued: json, DOI: text }, { requiredKeys: [] }) }), fc.record({ id: text })),
  quantities: fc.oneof(fc.array(quantity, { maxLength: 3 }), json), conditions: fc.oneof(fc.record({ temperatureK: number, siteDensityPerM2: number, coverage: text }, { requiredKeys: [] }), json),
  validRange: fc.record({ min: number, max: number }, { requiredKeys: [] }), kineticOrders: fc.dictionary(text, number), correlation: number, kind: fc.constantFrom('activation-energy', 'kie', 'x'),
}, { requiredKeys: [] });
/** A good entry with a little of that in it, so that it gets further in. */
const nearly = odd.map((changes) => ({ ...entryInputOf(), ...changes }));
const anything = fc.oneof(odd, nearly, json);

async function never5xx(send: (value: unknown) => Promise<{ status: number; text: string }>, value: unknown): Promise<void> {
  const { status, text: answer } = await send(value);
  if (status >= 500 && !answer.includes('doi-service-unavailable')) throw new Error(`answered ${status}: ${answer.slice(0, 300)}`);
}
const post = (client: () => Client, path: () => string) => (body: unknown) => client().agent.post(`/api/v1${path()}`).set({ 'X-CSRF-Token': client().token, 'Content-Type': 'application/json' }).send(JSON.stringify(body));

describe('anything at all as a body: refused or taken, never a failure of ours', () => {
  it.each<[string, (body: unknown) => Promise<{ status: number; text: string }>]>([
    ['POST /entries', post(() => contributor.client, () => '/entries')],
    ['POST /entries/preview', post(() => contributor.client, () => '/entries/preview?T=700')],
    ['PATCH /entries/:accession', (body) => contributor.client.patch(`/entries/${accession}`, body, { 'If-Match': '"1.1"' })],
    ['POST /entries/:accession/submit', post(() => contributor.client, () => `/entries/${accession}/withdrawn`)],
    ['POST /entries/:accession/revise', post(() => contributor.client, () => `/entries/${accession}/revise`)],
    ['POST /entries/:accession/retract', post(() => reviewer.client, () => `/entries/${accession}/retract`)],
    ['POST /reviews/:submission/decision', post(() => reviewer.client, () => `/reviews/${submission}/decision`)],
    ['POST /reviews/:submission/comments', post(() => reviewer.client, () => `/reviews/${submission}/comments`)],
    ['PATCH /reviews/:submission/checklist', (body) => reviewer.client.patch(`/reviews/${submission}/checklist`, body)],
    ['POST /auth/sign-in', post(() => visitor, () => '/auth/sign-in')],
    ['PATCH /auth/preferences', (body) => contributor.client.patch('/auth/preferences', body)],
  ])('%s', async (_name, send) => {
    await fc.assert(fc.asyncProperty(anything, (body) => never5xx(send, body)), runs);
  });

  /** A case of a calculator with some of its inputs replaced: it gets past the names and types as often as not. */
  const nearlyRight = (inputs: readonly Record<string, unknown>[]): fc.Arbitrary<unknown> => inputs.length === 0 ? json : fc.tuple(fc.constantFrom(...inputs), fc.array(fc.tuple(fc.nat(12), part), { maxLength: 2 }))
    .map(([input, changes]) => {
      const names = Object.keys(input);
      return { ...input, ...Object.fromEntries(changes.map(([place, value]) => [names[place % names.length] ?? 'text', value])) };
    });
  const own: Record<string, fc.Arbitrary<unknown>> = {
    'parse-value': fc.record({ text, unit: text }, { requiredKeys: ['text'] }),
    'parse-step': fc.record({ text }),
    cite: fc.record({ bibtex: text, ris: text, doi: text }, { requiredKeys: [] }),
  };
  it.each([...calculators.map(({ name }) => name), 'cite'])('POST /calc/%s, one or many', async (name) => {
    const input = fc.oneof(nearlyRight(calculatorCases.filter((one) => one.name === name).map((one) => one.input)), own[name] ?? json);
    const body = fc.oneof(input, fc.record({ items: fc.array(fc.oneof(input, json), { maxLength: 4 }) }), json);
    // What the calculators do with it is tested in larger numbers without HTTP.
    await fc.assert(fc.asyncProperty(body, (value) => never5xx(post(() => visitor, () => `/calc/${name}`), value)), { ...runs, numRuns: 30 });
  });
});

describe('anything at all as a query', () => {
  const names = ['q', 'kind', 'metal', 'contains', 'facet', 'site', 'step', 'stepClass', 'bond', 'method', 'source', 'yearFrom', 'valueMin', 'valueMax', 'validAt', 'T', 'sort', 'counts', 'limit', 'cursor', 'format', 'accession', 'state'];
  const query = fc.array(fc.tuple(fc.oneof(fc.constantFrom(...names), text), fc.oneof(text, number.map(String), fc.constantFrom('energy', '-k', 'true', 'kie', 'Ru', '700'))), { maxLength: 6 })
    .map((pairs) => pairs.map(([name, value]) => `${encodeURIComponent(wellFormed(name))}=${encodeURIComponent(wellFormed(value))}`).join('&'));
  it.each(['/entries', '/entries/summary', '/entries/export', '/sources', '/vocabulary', '/contributions', '/reviews', '/auth/me'])('GET %s', async (path) => {
    await fc.assert(fc.asyncProperty(query, (asked) => never5xx(() => reviewer.client.get(`${path}?${asked}`), null)), runs);
  });

  it.each(['/entries/', '/sources/', '/reviews/', '/doi/', '/entries/222-222-2/versions/'])('GET %s…', async (path) => {
    await fc.assert(fc.asyncProperty(text, (name) => never5xx(() => reviewer.client.get(path + encodeURIComponent(wellFormed(name))), null)), runs);
  });
});

it('all this has left the event log whole', async () => {
  expect(await app.sql('select * from broken_event()')).toEqual([]);
});
