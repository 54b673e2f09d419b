import { ESLint } from 'eslint';
import { beforeAll, describe, expect, it } from 'vitest';

let eslint: ESLint;
beforeAll(() => {
  eslint = new ESLint();
});

/** What the linter says about one import in a file of that name. */
async function complaints(file: string, specifier: string): Promise<string[]> {
  const results = await eslint.lintText(`import { x } from '${specifier}';\nexport const y = x;\n`, { filePath: file });
  return results.flatMap(({ messages }) => messages.filter(({ ruleId }) => ruleId === 'own/import-zones' || ruleId === null).map(({ message }) => message));
}

describe('the linter refuses', () => {
  it.each([
    ['shared/kinetics/fit.ts', '#server/env.ts'],
    ['shared/kinetics/fit.ts', '#client/lib/numbers.ts'],
    ['shared/kinetics/fit.ts', 'node:fs'],
    ['shared/kinetics/fit.ts', 'd3-array'],
    ['shared/kinetics/fit.ts', '#shared/contracts/entries.ts'],
    ['shared/kinetics/fit.ts', '../domain/states.ts'],
    ['shared/steps/equation.ts', '#shared/domain/states.ts'],
    ['client/features/entries/api.ts', '#server/env.ts'],
    ['client/features/entries/api.ts', '../../../server/env.ts'],
    ['client/features/entries/api.ts', '#client/features/reviews/api.ts'],
    ['client/features/entries/components/table.tsx', '../../reviews/api.ts'],
    ['client/features/entries/api.ts', '#client/routes/search/page.tsx'],
    ['client/features/entries/api.ts', 'node:path'],
    ['client/ui/table.tsx', '#client/features/entries/api.ts'],
    ['client/ui/table.tsx', '@tanstack/react-query'],
    ['client/lib/numbers.ts', '#client/app/session.ts'],
    ['client/main.tsx', 'express'],
    ['client/main.tsx', '#tests/setup/database.ts'],
    ['server/features/entries/entries.service.ts', '../reviews/reviews.repository.ts'],
    ['server/features/entries/entries.service.ts', '#server/features/reviews/reviews.policy.ts'],
    ['server/features/entries/entries.service.ts', 'drizzle-orm'],
    ['server/features/entries/entries.service.ts', 'drizzle-orm/pg-core'],
    ['server/features/entries/entries.service.ts', '#server/db/schema/entries.ts'],
    ['server/features/entries/entries.service.ts', 'express'],
    ['server/features/entries/entries.repository.ts', 'express'],
    ['server/jobs/outbox.ts', 'drizzle-orm'],
    ['server/app.ts', '#client/lib/numbers.ts'],
    ['server/app.ts', '#seeds/run.ts'],
    ['server/app.ts', '#server/bootstrap/say.mjs'],
    ['server/bootstrap/start.mjs', 'pg'],
    ['server/bootstrap/start.mjs', '../env.ts'],
    ['seeds/run.ts', '#client/lib/numbers.ts'],
  ])('%s importing %s', async (file, specifier) => {
    expect(await complaints(file, specifier)).toHaveLength(1);
  });
});

describe('the linter allows', () => {
  it.each([
    ['shared/kinetics/fit.ts', './constants.ts'],
    ['shared/contracts/entries.ts', 'zod'],
    ['shared/contracts/entries.ts', '#shared/kinetics/constants.ts'],
    ['client/features/entries/api.ts', '#shared/contracts/entries.ts'],
    ['client/features/entries/components/table.tsx', '../api.ts'],
    ['client/features/entries/api.ts', '#client/ui/table.tsx'],
    ['client/routes/search/page.tsx', '#client/features/entries/api.ts'],
    ['server/features/entries/entries.service.ts', '#server/features/reviews/reviews.service.ts'],
    ['server/features/entries/entries.service.ts', './entries.repository.ts'],
    ['server/features/entries/entries.repository.ts', 'drizzle-orm'],
    ['server/features/entries/entries.repository.ts', '#server/db/schema/entries.ts'],
    ['server/features/entries/entries.routes.ts', 'express'],
    ['server/http/session.ts', 'express'],
    ['server/commands/seed.ts', '#seeds/run.ts'],
    ['seeds/run.ts', 'drizzle-orm'],
    ['server/bootstrap/start.mjs', 'node:fs'],
    ['tests/integration/entries/search.test.ts', '#server/features/entries/entries.repository.ts'],
  ])('%s importing %s', async (file, specifier) => {
    expect(await complaints(file, specifier)).toEqual([]);
  });
});

it('gives the reason with the refusal', async () => {
  const [message] = await complaints('client/features/entries/api.ts', '#client/features/reviews/api.ts');
  expect(message).toContain('compose them in client/routes');
});

it('looks at every way to import', async () => {
  const code = ["export * from '#server/env.ts';", "export { readEnvironment } from '#server/env.ts';", "export const late = import('#server/env.ts');", "export type E = import('#server/env.ts').Environment;"];
  for (const line of code) {
    const [result] = await eslint.lintText(`${line}\n`, { filePath: 'client/main.tsx' });
    expect(result?.messages.map(({ ruleId }) => ruleId), line).toContain('own/import-zones');
  }
});

it('refuses the environment outside its one reader', async () => {
  const code = 'export const port = process.env.PORT;\n';
  const [service] = await eslint.lintText(code, { filePath: 'server/app.ts' });
  const [reader] = await eslint.lintText(code, { filePath: 'server/env.ts' });
  expect(service?.messages.map(({ ruleId }) => ruleId)).toEqual(['no-restricted-syntax']);
  expect(reader?.messages).toEqual([]);
});
