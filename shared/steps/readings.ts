import { StepError } from './step-error.ts';

/** The decisions on what can be read in more than one way, made in the same way throughout one reading of an equation. */
export class Choices {
  /** How many ways there are for each kind of doubt that came up. */
  readonly met = new Map<string, number>();
  readonly made: ReadonlyMap<string, number>;

  constructor(made: ReadonlyMap<string, number> = new Map()) {
    this.made = made;
  }

  /** The way that this reading takes; the first one where nothing is decided. */
  pick<T extends string>(kind: string, ways: readonly [T, ...T[]]): T {
    this.met.set(kind, ways.length);
    return ways[this.made.get(kind) ?? 0] ?? ways[0];
  }
}

/** One way to read a text: what it gave, or why it can't be read so. */
export type Reading<T> = { value: T } | { error: StepError };

const mostReadings = 64;

/** Reads a text in every way that its doubts allow, the likeliest first; what is without doubt is read once. */
export function everyReading<T>(read: (choices: Choices) => T): Reading<T>[] {
  const results: Reading<T>[] = [];
  const waiting: ReadonlyMap<string, number>[] = [new Map()];
  for (let made = waiting.shift(); made !== undefined; made = waiting.shift()) {
    if (results.length >= mostReadings) throw new StepError('ambiguous', 'this can be read in too many ways: write adsorbed species as CO*, isotopes as [13C], charges as ^2-', { position: 0 });
    const choices = new Choices(made);
    try {
      results.push({ value: read(choices) });
    } catch (error) {
      if (!(error instanceof StepError)) throw error;
      results.push({ error });
    }
    const fixed = new Map(made);
    for (const [kind, ways] of choices.met) {
      if (fixed.has(kind)) continue;
      for (let way = 1; way < ways; way += 1) waiting.push(new Map([...fixed, [kind, way]]));
      fixed.set(kind, 0);
    }
  }
  return results;
}
