import type { EntryInput } from '#shared/contracts/entries.ts';
import type { State } from '#shared/domain/states.ts';
import type { Services } from '#server/services.ts';
import type { Actor } from '#server/actor.ts';
import { answers, entryInputOf } from './entry-input.ts';

/** An entry somewhere in its life. */
export interface Life {
  accession: string;
  submission: string;
  /** Tag of the newest revision, as If-Match and `seen` take it. */
  tag: string;
}

/** Brings entries to where a test needs them, through the services themselves. */
export class Lives {
  private readonly services: Services;
  private readonly contributor: Actor;
  private readonly reviewer: Actor;

  constructor(services: Services, contributor: Actor, reviewer: Actor) {
    this.services = services;
    this.contributor = contributor;
    this.reviewer = reviewer;
  }

  async draft(input: EntryInput = entryInputOf()): Promise<Life> {
    const { accession, revision, lock } = await this.services.entries.create(this.contributor, input);
    return { accession, submission: '', tag: `${revision}.${lock}` };
  }

  async submitted(input: EntryInput = entryInputOf()): Promise<Life> {
    return this.submit((await this.draft(input)).accession);
  }

  async submit(accession: string): Promise<Life> {
    const { revision, lock, submission } = await this.services.entries.submit(this.contributor, accession, null);
    return { accession, submission: submission ?? '', tag: `${revision}.${lock}` };
  }

  async claimed(input: EntryInput = entryInputOf()): Promise<Life> {
    const life = await this.submitted(input);
    await this.services.reviews.claim(this.reviewer, life.submission);
    return { ...life, tag: (await this.services.reviews.get(this.reviewer, life.submission)).seen };
  }

  async decide(life: Life, decision: 'accept' | 'return' | 'reject'): Promise<Life> {
    const { seen } = await this.services.reviews.get(this.reviewer, life.submission);
    await this.services.reviews.decide(this.reviewer, life.submission, {
      decision, seen, comment: decision === 'accept' ? '' : 'Held against the paper.', reason: decision === 'accept' ? undefined : 'other', checklist: answers(),
    });
    return { ...life, tag: (await this.services.reviews.get(this.reviewer, life.submission)).seen };
  }

  async accepted(input: EntryInput = entryInputOf()): Promise<Life> {
    return this.decide(await this.submitted(input), 'accept');
  }

  /** An entry whose first revision stands in the state named. */
  async inState(state: State, input: EntryInput = entryInputOf()): Promise<Life> {
    const { services, contributor, reviewer } = this;
    switch (state) {
      case 'draft': return this.draft(input);
      case 'submitted': return this.submitted(input);
      case 'under-review': return this.claimed(input);
      case 'returned': return this.decide(await this.submitted(input), 'return');
      case 'rejected': return this.decide(await this.submitted(input), 'reject');
      case 'accepted': return this.accepted(input);
      case 'withdrawn': {
        const life = await this.submitted(input);
        await services.entries.withdraw(contributor, life.accession);
        return life;
      }
      case 'retracted': {
        const life = await this.accepted(input);
        await services.entries.retract(reviewer, life.accession, 'The source was withdrawn by its authors.');
        return life;
      }
      case 'superseded': {
        const life = await this.accepted(input);
        await services.entries.revise(contributor, life.accession, 'A misprint.');
        await this.decide(await this.submit(life.accession), 'accept');
        return life;
      }
    }
  }
}
