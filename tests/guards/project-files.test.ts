import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { codeFile, linesMatching, projectFiles, textOf } from './tracked-files.ts';

/** Written in parts, so that this file does not hold what it looks for. */
const pattern = (...parts: string[]): RegExp => new RegExp(parts.join(''));
const text = /\.(ts|tsx|mjs|mts|js|json|css|html|md|sql|svg|yml|yaml|csv|txt)$|^\.ci\/|^\.[a-z]+$/;

describe('no file names', () => {
  it.each([
    ['a folder of one machine', pattern('(^|[^\\w.])/(wo', 'rk|fa', 'rm|ho', 'me/[a-z]+|Us', 'ers/[A-Za-z]+)/')],
    ['the folder of jobs of one machine', pattern('bash', '_jobs')],
    ['the host of a package registry', pattern('https?://(regis', 'try|de', 'b|py', 'pi)\\.[a-z]+\\.(org|com)')],
  ])('%s', (_what, machine) => {
    const hits = projectFiles(text).flatMap((file) => linesMatching(file, machine));
    expect(hits).toEqual([]);
  });
});

it('keeps download addresses out of the lock file, and pins every package exactly', () => {
  const lock = JSON.parse(textOf('package-lock.json') ?? '{}') as { packages: Record<string, { resolved?: string; link?: boolean }> };
  const addresses = Object.entries(lock.packages).filter(([, { resolved }]) => resolved !== undefined && /^\w+:/.test(resolved));
  expect(addresses).toEqual([]);
  const manifest = JSON.parse(textOf('package.json') ?? '{}') as { dependencies: Record<string, string>; devDependencies: Record<string, string> };
  const loose = Object.entries({ ...manifest.dependencies, ...manifest.devDependencies }).filter(([, version]) => !/^\d+\.\d+\.\d+(-[\w.]+)?$/.test(version));
  expect(loose).toEqual([]);
});

it('skips no test and runs none alone', () => {
  const marks = pattern('\\b(it|test|describe|suite)(\\.\\w+)*\\.(sk', 'ip|on', 'ly|to', 'do|fa', 'ils)\\b|\\b(x', 'it|x', 'describe|f', 'describe)\\(');
  const hits = projectFiles(/^(tests|client|server|shared)\/.*\.(ts|tsx)$/).flatMap((file) => linesMatching(file, marks));
  expect(hits).toEqual([]);
});

describe('file names', () => {
  const files = projectFiles(codeFile);

  it('are lower case with hyphens, and a role after a dot', () => {
    const odd = files.filter((file) => !file.split('/').every((part) => /^[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9-]+)*$/.test(part)));
    expect(odd).toEqual([]);
  });

  it('say what is inside', () => {
    const vague = /^(utils?|helpers?|misc|common|shared|types|lib|stuff|temp|new|old)$/;
    const odd = files.filter((file) => vague.test(path.posix.basename(file).split('.')[0] ?? ''));
    expect(odd).toEqual([]);
  });

  it('hold no barrel: a file that only passes on what others export', () => {
    const barrels = files.filter((file) => {
      const lines = (textOf(file) ?? '').replace(/\/\*[\s\S]*?\*\//g, '').split('\n').map((line) => line.trim());
      const statements = lines.filter((line) => line !== '' && !line.startsWith('//'));
      return statements.length > 0 && statements.every((line) => /^export (\*|\{[^}]*\}|type \{[^}]*\}).* from /.test(line));
    });
    expect(barrels).toEqual([]);
  });
});

it('has the fixed folders at the top and nothing else', () => {
  const allowed = new Set(['client', 'server', 'shared', 'drizzle', 'tests', 'seeds', '.ci']);
  const folders = new Set(projectFiles(/\//).map((file) => file.split('/')[0] ?? ''));
  expect([...folders].filter((folder) => !allowed.has(folder))).toEqual([]);
});

it('keeps the role names of the server: routes, service, repository, policy, present', () => {
  const odd = projectFiles(/^server\/features\//).filter((file) => !/^server\/features\/([a-z-]+)\/(\1|[a-z-]+)(\.(routes|service|repository|policy|present))?\.ts$/.test(file));
  expect(odd).toEqual([]);
});
