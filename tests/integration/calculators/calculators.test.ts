import { beforeAll, describe, expect, it } from 'vitest';
import * as z from 'zod';
import { calculators } from '#shared/calculators/registry.ts';
import { useApp } from '#tests/factories/app.ts';
import { okBody, problemOf, refusalOf, type Body, type Client } from '#tests/factories/client.ts';
import { calculatorCases, interfaceTable, partAt } from './calculator-cases.ts';

const app = useApp();
let visitor: Client;
beforeAll(async () => {
  visitor = await app.visitor();
});

/** Sends without the form token, as a program outside the pages does. */
const send = (path: string, body: unknown) => visitor.agent.post(`/api/v1/calc/${path}`).set('Content-Type', 'application/json').send(JSON.stringify(body));

function expectFigures(result: unknown, expected: Record<string, unknown>): void {
  for (const [place, wanted] of Object.entries(expected)) {
    const found = partAt(result, place);
    if (typeof wanted !== 'number') expect(found ?? null, place).toEqual(wanted ?? null);
    else expect(Math.abs(Number(found) - wanted), `${place}: ${String(found)} against ${wanted}`).toBeLessThanOrEqual(1e-12 * Math.max(Math.abs(wanted), 1e-6));
  }
}

describe('POST /calc/<name>', () => {
  it.each(calculatorCases)('$name gives what is known $by', async ({ name, input, expected }) => {
    const result = okBody(await send(name, input));
    expectFigures(result, expected);
    const { derivation } = result as { derivation: Record<string, unknown>[] };
    expect(derivation.length).toBeGreaterThan(0);
    for (const line of derivation) {
      expect(Object.keys(line).filter((key) => !['operation', 'from', 'to', 'constant', 'assumption', 'reference'].includes(key))).toEqual([]);
      for (const part of ['operation', 'from', 'to', 'reference']) expect(line[part], part).toMatch(/\S/);
    }
  });

  it('answers every name of the table, and no calculator is left out of it', () => {
    expect(calculators.map(({ name }) => name).sort()).toEqual(Object.keys(interfaceTable).sort());
  });

  it.each(Object.entries(interfaceTable).flatMap(([name, ways]) => ways.map((way) => ({ name, ...way, way: way.inputs[0] ?? '' }))))('$name, $way, has the inputs and outputs of the table', async ({ name, inputs, outputs }) => {
    const chosen = inputs.flatMap((input) => (input.includes('=') ? [input.split('=') as [string, string]] : []));
    const names = inputs.map((input) => input.replace(/[?=].*$/, ''));
    const schema = z.toJSONSchema(calculators.find((one) => one.name === name)?.input ?? z.never(), { unrepresentable: 'any', io: 'input' }) as JsonSchema;
    const branch = (schema.oneOf ?? schema.anyOf ?? [schema]).find(({ properties = {} }) => chosen.every(([key, value]) => properties[key]?.const === value));
    expect(Object.keys(branch?.properties ?? {})).toEqual(expect.arrayContaining(names));
    expect(branch?.additionalProperties).toBe(false);
    expect([...(branch?.required ?? [])].sort()).toEqual(inputs.filter((input) => !input.endsWith('?')).map((input) => input.replace(/=.*$/, '')).sort());
    const known = calculatorCases.find(({ name: other, input }) => other === name && chosen.every(([key, value]) => input[key] === value));
    const result = okBody(await send(name, known?.input)) as Record<string, unknown>;
    expect(Object.keys(result)).toEqual(expect.arrayContaining(['derivation', ...outputs.filter((output) => !output.endsWith('?'))]));
  });
});

interface JsonSchema {
  properties?: Record<string, { const?: unknown }>;
  required?: string[];
  additionalProperties?: unknown;
  oneOf?: JsonSchema[];
  anyOf?: JsonSchema[];
}

describe('POST /calc/cite', () => {
  // An invented article.
  const bibtex = '@article{arden1998, author = {Arden, Mary T. and Bolton, Karl}, title = {Desorption of carbon monoxide from a nickel crystal}, journal = {Invented Journal of Surface Kinetics}, volume = {12}, number = {3}, pages = {101--118}, year = {1998}, doi = {10.5555/test.0001}}';

  it('prints a citation in other forms, and reads what it prints', async () => {
    const result = okBody(await send('cite', { bibtex })) as Record<string, unknown> & { ris: string; bibtex: string; csl: Record<string, unknown> };
    expect(Object.keys(result)).toEqual(expect.arrayContaining(['csl', 'bibtex', 'ris', 'key', 'formatted', 'derivation']));
    expect(result).toMatchObject({ key: 'arden1998', csl: { DOI: '10.5555/test.0001', volume: '12', page: '101-118' } });
    const again = okBody(await send('cite', { items: [{ bibtex: result.bibtex }, { ris: result.ris }] })) as { items: { csl: Record<string, unknown> }[] };
    for (const { csl } of again.items) expect(csl).toMatchObject({ title: result.csl.title, DOI: '10.5555/test.0001', author: [{ family: 'Arden' }, { family: 'Bolton' }] });
  });

  it.each([[{}], [{ bibtex, ris: 'TY  - JOUR' }], [{ bibtex: 'no citation at all' }], [{ ris: '' }]])('refuses %j', async (input) => {
    expect(refusalOf(await send('cite', input))).toEqual([422, 'invalid-input']);
  });
});

it('needs no form token, no cookie and no account', async () => {
  const answer = await fetch(`${app.url}/api/v1/calc/energy`, { method: 'POST', headers: { 'Content-Type': 'application/json' }, body: '{"value":1,"from":"kcal/mol","to":"kJ/mol"}' });
  expect([answer.status, ((await answer.json()) as { value: number }).value]).toEqual([200, 4.184]);
});

describe('batches', () => {
  it('are answered in their order, the good beside the bad', async () => {
    const items = [{ value: 1, from: 'kcal/mol', to: 'kJ/mol' }, { value: 1, from: 'furlong', to: 'kJ/mol' }, 'nonsense', { value: 2, from: 'kcal/mol', to: 'kJ/mol' }, {}, null];
    const { items: answers } = okBody(await send('energy', { items })) as { items: Body[] };
    expect(answers.map((answer) => answer.value ?? answer.error.path)).toEqual([4.184, 'from', '', 8.368, 'value', '']);
    for (const answer of answers) if (answer.error) expect(answer.error.message).toMatch(/\S/);
  });

  it('of a thousand are taken, of a thousand and one refused, of none answered with none', async () => {
    const item = { value: 1, from: 'eV', to: 'kJ/mol' };
    expect((okBody(await send('energy', { items: Array.from({ length: 1000 }, () => item) })) as { items: Body[] }).items).toHaveLength(1000);
    const refused = await send('energy', { items: Array.from({ length: 1001 }, () => item) });
    expect(refusalOf(refused)).toEqual([422, 'invalid-input']);
    expect(problemOf(refused).errors?.[0]).toMatchObject({ path: 'items', message: expect.stringContaining('1000') as string });
    expect(okBody(await send('energy', { items: [] }))).toEqual({ items: [] });
  });

  it('run every calculator: each of its cases beside a wrong one', async () => {
    for (const name of Object.keys(interfaceTable)) {
      const own = calculatorCases.filter((one) => one.name === name);
      const { items } = okBody(await send(name, { items: [...own.map(({ input }) => input), { nonsense: true }] })) as { items: Body[] };
      own.forEach(({ expected }, i) => expectFigures(items[i], expected));
      expect(items.at(-1).error, name).toMatchObject({ path: expect.any(String) as string, message: expect.stringMatching(/\S/) as string });
    }
  });
});

describe('refusals', () => {
  it.each<[string, string, unknown, number, string]>([
    ['an unknown name', 'alchemy', {}, 404, 'not-found'],
    ['a unit that is none', 'energy', { value: 1, from: 'furlong', to: 'kJ/mol' }, 422, 'invalid-input'],
    ['a number as text', 'energy', { value: '1', from: 'eV', to: 'kJ/mol' }, 422, 'invalid-input'],
    ['an input of another name', 'energy', { value: 1, from: 'eV', to: 'kJ/mol', temperature: 300 }, 422, 'invalid-input'],
    ['a result beyond double range', 'rate-constant', { value: 1e300, from: 'cm6 molecule-2 s-1', to: 'cm6 mol-2 s-1' }, 422, 'invalid-input'],
    ['an array', 'energy', [], 422, 'invalid-input'],
  ])('%s', async (_what, name, body, status, code) => {
    expect(refusalOf(await send(name, body))).toEqual([status, code]);
  });

  it('name the place of what is wrong in a longer input', async () => {
    const points = [{ temperatureK: 300, k: 1 }, { temperatureK: -5, k: 2 }];
    expect(problemOf(await send('fit', { points, weights: 'none', covariance: 'scaled' })).errors?.[0]?.path).toBe('points.1.temperatureK');
  });

  it.each(['{', '{"value": NaN}', '"text', '{"value":1,}'])('%s is not JSON', async (text) => {
    const answer = await visitor.agent.post('/api/v1/calc/energy').set('Content-Type', 'application/json').send(text);
    expect(refusalOf(answer)[0]).toBe(400);
  });

  it('are asked for with POST alone', async () => {
    expect((await visitor.agent.get('/api/v1/calc/energy')).status).toBeGreaterThanOrEqual(404);
  });
});
