import { expect, it } from 'vitest';
import { checkNodeVersion } from '#server/bootstrap/node-version.mjs';
import { countReport, type TestReport } from '#server/bootstrap/test-report.mjs';

const file = (status: string, ...tests: string[]): TestReport['testResults'][number] => ({
  status,
  name: 'some.test.ts',
  assertionResults: tests.map((each) => ({ status: each })),
});

it.each([
  ['every test passed', [file('passed', 'passed', 'passed'), file('passed', 'passed')], 0, { passed: 3, failed: 0 }],
  ['one test failed', [file('failed', 'passed', 'failed')], 1, { passed: 1, failed: 1 }],
  ['a skipped test is no success', [file('passed', 'passed', 'skipped')], 0, { passed: 1, failed: 1 }],
  ['a file that could not be loaded is one failure', [file('failed'), file('passed', 'passed')], 1, { passed: 1, failed: 1 }],
  ['a file without tests is one failure', [file('passed')], 0, { passed: 0, failed: 1 }],
  ['a file whose hook failed after its tests passed', [file('failed', 'passed')], 1, { passed: 1, failed: 1 }],
  ['an error outside every test', [file('passed', 'passed')], 1, { passed: 1, failed: 1 }],
  ['nothing ran', [], 1, { passed: 0, failed: 1 }],
])('counts: %s', (_what, testResults, exitCode, counts) => {
  expect(countReport({ testResults }, exitCode)).toEqual(counts);
});

it.each([
  ['20.19.0', true],
  ['20.20.2', true],
  ['22.1.0', true],
  ['20.18.3', false],
  ['18.20.4', false],
])('Node.js %s is new enough: %s', (version, fits) => {
  if (fits) expect(() => checkNodeVersion(version)).not.toThrow();
  else expect(() => checkNodeVersion(version)).toThrow('too old');
});
