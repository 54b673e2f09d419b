import { readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { kinds } from './reference-kinds.ts';
import { surfaceKinds } from './reference-kinds-surface.ts';
import { relativeError, type Kind } from './reference-measure.ts';
import { referenceCases } from './reference.ts';

/** Largest relative error of any figure of a file, as its README states. */
const tolerances: Record<string, number> = {
  energy_units: 1e-13, rate_units: 1e-13, arrhenius: 1e-12, arrhenius_fit: 1e-9, uncertainty: 1e-11, site_density: 1e-12, gas_surface: 1e-12, kie: 1e-11, pooled: 1e-10, bocmp: 1e-12, thermo_consistency: 1e-12,
};

/** Held elsewhere, through the programs that read and write citations. */
const notNumbers = ['bibtex_cases'];
const mapping: Record<string, Record<string, Kind>> = { ...kinds, ...surfaceKinds };
const files = readdirSync(new URL('../../reference/', import.meta.url)).filter((name) => name.endsWith('.json')).map((name) => name.replace('.json', '')).filter((name) => !notNumbers.includes(name));

function kindOf(file: string, kind: string): Kind {
  const found = mapping[file]?.[kind] ?? mapping[file]?.['*'];
  if (!found) throw new Error(`${file}.json has a kind of case that is neither asked of the product nor said not to be offered: ${kind}`);
  return found;
}

function rowOf(file: string) {
  const cases = referenceCases(file);
  const asked = cases.flatMap((item) => {
    const kind = kindOf(file, item.kind);
    const found = 'notOffered' in kind ? [] : kind(item);
    return found.length === 0 ? [] : [found.map((measure) => ({ label: `${item.id}, ${measure.what}: ${measure.actual} against ${measure.expected}`, error: relativeError(measure) }))];
  });
  const figures = asked.flat();
  const worst = figures.reduce((most, figure) => (figure.error > most.error ? figure : most), { label: 'none', error: 0 });
  return { file, cases: cases.length, asked: asked.length, figures: figures.length, worst };
}

describe('every reference file through the calculators', () => {
  const rows: ReturnType<typeof rowOf>[] = [];

  it.each(files)('%s', (file) => {
    const row = rowOf(file);
    rows.push(row);
    expect(tolerances[file], 'a tolerance').toBeDefined();
    expect(row.asked).toBeGreaterThan(0);
    expect(row.worst.error, row.worst.label).toBeLessThanOrEqual(tolerances[file] as number);
  });

  it('make one table', () => {
    process.stdout.write(`${tableOf(rows)}\n`);
    expect(rows.map(({ file }) => file)).toEqual(files);
    expect(rows.reduce((sum, { asked }) => sum + asked, 0)).toBeGreaterThan(300);
  });
});

function tableOf(rows: readonly ReturnType<typeof rowOf>[]): string {
  return [
    '| file | cases | asked of the product | figures compared | worst relative error | tolerance |',
    '| --- | --- | --- | --- | --- | --- |',
    ...rows.map(({ file, cases, asked, figures, worst }) => `| ${file} | ${cases} | ${asked} | ${figures} | ${worst.error === 0 ? '0' : worst.error.toExponential(1)} | ${tolerances[file]?.toExponential() ?? ''} |`),
  ].join('\n');
}
