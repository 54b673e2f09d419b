import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';

/** The files of the project: tracked ones and those about to be, as paths with forward slashes. */
export function projectFiles(matching: RegExp = /./): string[] {
  // A checkout that belongs to somebody else (a container run by root) is still the one to read.
  const listed = execFileSync('git', ['-c', 'safe.directory=*', 'ls-files', '-co', '--exclude-standard', '-z'], { encoding: 'utf8', maxBuffer: 2 ** 26 });
  return [...new Set(listed.split('\0'))].filter((file) => file !== '' && matching.test(file) && existsSync(file));
}

/** Code files of the product, its seeds and its tests. */
export const codeFile = /^(client|server|shared|seeds|tests)\/.*\.(ts|tsx|mjs|mts|js)$/;

/** A file's text, or null when it is not text. */
export function textOf(file: string): string | null {
  const bytes = readFileSync(file);
  return bytes.includes(0) ? null : bytes.toString('utf8');
}

/** The places of a file that match, as `file:line: text`. */
export function linesMatching(file: string, pattern: RegExp): string[] {
  const lines = (textOf(file) ?? '').split('\n');
  return lines.flatMap((line, at) => (pattern.test(line) ? [`${file}:${at + 1}: ${line.trim().slice(0, 120)}`] : []));
}
