import { cpus } from 'node:os';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';

/** One thing to time: `run(i)` does it once and returns a number that depends on what it computed. */
export interface Subject {
  name: string;
  run: (i: number) => number;
}

/** Median rate of a subject with its spread. */
export interface Measured {
  name: string;
  perSecond: number;
  /** Slowest and fastest round. */
  from: number;
  to: number;
  /** How many times as fast as the last subject: the median of the rounds. */
  ratio: number;
}

/** What the subjects computed, so that no work can be left out by the compiler. */
let sink = 0;

/** Processor time in seconds: what other programs take of a shared machine does not count, collecting one's own garbage does. */
function once(subject: Subject, count: number): number {
  const start = process.cpuUsage();
  let sum = 0;
  for (let i = 0; i < count; i += 1) sum += subject.run(i);
  const { user, system } = process.cpuUsage(start);
  sink += sum;
  return Math.max((user + system) / 1e6, 1e-6);
}

const median = (values: readonly number[]): number => [...values].sort((a, b) => a - b)[values.length >> 1] as number;

/** How many calls last about `seconds`. */
function calibrate(subject: Subject, seconds: number): number {
  let count = 16;
  while (true) {
    const elapsed = once(subject, count);
    if (elapsed > seconds / 4) return Math.max(1, Math.round((count * seconds) / elapsed));
    count *= 4;
  }
}

/**
 * Times subjects against each other: in every round each of them runs once, so that a busy machine slows all alike.
 *
 * @param rounds an odd number: the median of the rounds is reported
 */
export function measure(subjects: readonly Subject[], { rounds = 9, seconds = 0.25 } = {}): Measured[] {
  const counts = subjects.map((subject) => calibrate(subject, seconds));
  const rates = subjects.map(() => [] as number[]);
  for (let round = 0; round < rounds; round += 1) {
    subjects.forEach((subject, i) => rates[i]?.push((counts[i] as number) / once(subject, counts[i] as number)));
  }
  if (!Number.isFinite(sink)) throw new Error('a subject computed something that is not finite');
  return subjects.map(({ name }, i) => {
    const own = rates[i] as number[];
    const last = rates.at(-1) as number[];
    return { name, perSecond: median(own), from: Math.min(...own), to: Math.max(...own), ratio: median(own.map((rate, round) => rate / (last[round] as number))) };
  });
}

/** A rate in three digits with thousands set apart: `2 480 000`. */
export function rateText(perSecond: number): string {
  const digits = Number(perSecond.toPrecision(3));
  return digits < 1000 ? String(digits) : String(Math.round(digits)).replace(/\B(?=(\d{3})+$)/g, ' ');
}

/** What the figures were measured on: no name of a machine or a folder. */
export function machineText(): string {
  const cores = cpus();
  return `${new Date().toISOString().slice(0, 10)}, ${cores.length} cores (${cores[0]?.model.replace(/\s+/g, ' ').trim() ?? 'unknown'}), Node ${process.versions.node}`;
}

/** Replaces one section of a Markdown file, found by its heading, or adds it at the end. */
export function writeSection(file: string, heading: string, body: string): void {
  const text = existsSync(file) ? readFileSync(file, 'utf8') : '# Last measured\n';
  const start = text.indexOf(`\n## ${heading}\n`);
  const section = `\n## ${heading}\n\n${body.trim()}\n`;
  if (start < 0) {
    writeFileSync(file, `${text.trimEnd()}\n${section}`);
    return;
  }
  const next = text.indexOf('\n## ', start + 4);
  writeFileSync(file, `${text.slice(0, start)}${section}${next < 0 ? '' : text.slice(next)}`);
}
