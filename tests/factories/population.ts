import { readDoiRecords } from '#seeds/demo/doi-records.ts';
import { demoFolder, readDemoEntries } from '#seeds/demo/read-demo.ts';
import type { EntryInput } from '#shared/contracts/entries.ts';
import type { TestApp } from './app.ts';
import { Lives } from './lives.ts';

export const populationRecords = () => readDoiRecords(demoFolder);

/** Every so-manyth accepted entry of the invented demonstration data, and whatever kinds that leaves out. */
export function populationInputs(every: number): EntryInput[] {
  const accepted = readDemoEntries(demoFolder).filter(({ script }) => script.outcome === 'accepted' && script.revises === null).map(({ input }) => input);
  const chosen = accepted.filter((_input, index) => index % every === 0);
  for (const input of accepted) if (chosen.filter(({ kind }) => kind === input.kind).length < 2) chosen.push(input);
  // Some without a stated range, by measurement and by computation, and some with one open end.
  return chosen.map((input, index) => (index % 9 === 0 ? { ...input, validRange: undefined } : index % 9 === 1 ? { ...input, validRange: { min: 500 } } : input));
}

/** Brings a population of accepted entries into the store through the services, each at its own time. */
export async function populate(app: TestApp, every = 7): Promise<{ lives: Lives; accessions: string[] }> {
  const [contributor, reviewer] = [await app.person('contributor', 'Population Contributor'), await app.person('reviewer', 'Population Reviewer')];
  const lives = new Lives(app.services, contributor.actor, reviewer.actor);
  const accessions: string[] = [];
  for (const input of populationInputs(every)) {
    app.clock.advance(1);
    accessions.push((await lives.accepted(input)).accession);
  }
  return { lives, accessions };
}
