import { beforeAll, expect, it } from 'vitest';
import { useApp } from '#tests/factories/app.ts';
import { okBody, refusalOf, type Client } from '#tests/factories/client.ts';

const app = useApp({ limits: { calculators: { perWindow: 3, windowS: 60 } } });
let visitor: Client;
beforeAll(async () => {
  visitor = await app.visitor();
});

it('counts a batch as one call, a refusal as another, and says when to come back', async () => {
  const send = (body: unknown) => visitor.agent.post('/api/v1/calc/energy').set('Content-Type', 'application/json').send(JSON.stringify(body));
  const item = { value: 1, from: 'eV', to: 'kJ/mol' };
  expect(okBody(await send({ items: Array.from({ length: 500 }, () => item) }))).toHaveProperty('items.499.value');
  expect((await send({ value: 1 })).status).toBe(422);
  okBody(await send(item));
  const refused = await send(item);
  expect(refusalOf(refused)).toEqual([429, 'too-many-requests']);
  expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0);
  // Another calculator draws on the same count.
  expect((await visitor.agent.post('/api/v1/calc/parse-step').send({ text: 'H* -> H*' })).status).toBe(429);
});
