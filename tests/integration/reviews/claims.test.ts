import { beforeAll, describe, expect, it } from 'vitest';
import { useApp, type Person } from '#tests/factories/app.ts';
import { okBody, problemOf, refusalOf, type Body } from '#tests/factories/client.ts';
import { answers, entryInputOf } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';
import { claimHours } from '#shared/domain/review.ts';
import { states, transitions, type State } from '#shared/domain/states.ts';

const app = useApp();
let contributor: Person;
let rosa: Person;
let sven: Person;
let lives: Lives;
beforeAll(async () => {
  contributor = await app.person('contributor', 'Ada Contributor');
  [rosa, sven] = [await app.person('reviewer', 'Rosa Reviewer'), await app.person('reviewer', 'Sven Second')];
  lives = new Lives(app.services, contributor.actor, rosa.actor);
});

const act = (who: Person, id: string, action: string, body?: object) => who.client.post(`/reviews/${id}/${action}`, body);
const view = async (id: string, who = rosa): Promise<Body> => okBody(await who.client.get(`/reviews/${id}`));
const inHours = (hours: number): string => new Date(app.clock.now().getTime() + hours * 3_600_000).toISOString();

describe('claims', () => {
  it('are taken for three days and shown to everybody with their end', async () => {
    const { submission } = await lives.submitted();
    expect(okBody(await act(rosa, submission, 'claim'))).toMatchObject({ state: 'under-review', claim: { by: 'Rosa Reviewer', mine: true, until: inHours(claimHours) }, actions: ['comment', 'claim', 'checklist', 'decide', 'release'] });
    expect(await view(submission, sven)).toMatchObject({ claim: { by: 'Rosa Reviewer', mine: false }, actions: ['comment'], whyNot: 'Rosa Reviewer holds this submission.' });
  });

  it.each<[string, (id: string, seen: string) => Promise<unknown>]>([
    ['claim', (id) => act(sven, id, 'claim')],
    ['release', (id) => act(sven, id, 'release')],
    ['save the checklist', (id) => sven.client.patch(`/reviews/${id}/checklist`, { checklist: {} })],
    ['decide', (id, seen) => act(sven, id, 'decision', { decision: 'accept', checklist: answers(), seen })],
  ])('of one reviewer keep another from trying to %s, who is told the name and the end', async (_what, attempt) => {
    const { submission, tag } = await lives.claimed();
    const answer = await attempt(submission, tag) as Parameters<typeof problemOf>[0];
    expect(refusalOf(answer)).toEqual([409, 'claimed-by-another']);
    expect(problemOf(answer).context).toEqual({ by: 'Rosa Reviewer', until: inHours(claimHours) });
    expect(problemOf(answer).detail).toMatch(/^Rosa Reviewer holds this submission until \d{4}-\d{2}-\d{2} \d{2}:\d{2} UTC\.$/);
  });

  it.each<[string, (id: string) => Promise<unknown>, boolean]>([
    ['claiming again', (id) => act(rosa, id, 'claim'), true],
    ['a comment', (id) => act(rosa, id, 'comments', { body: 'Which column?' }), true],
    ['a saved checklist', (id) => rosa.client.patch(`/reviews/${id}/checklist`, { checklist: { value: 'yes' } }), true],
    ['looking', (id) => rosa.client.get(`/reviews/${id}`), false],
    ["the contributor's comment", (id) => act(contributor, id, 'comments', { body: 'The third.' }), false],
    ["another reviewer's comment", (id) => act(sven, id, 'comments', { body: 'I have the paper.' }), false],
  ])('%s renews them: %s', async (_what, attempt, renews) => {
    const { submission } = await lives.claimed();
    const until = (await view(submission)).claim.until as string;
    app.clock.advance(10);
    await attempt(submission);
    expect((await view(submission)).claim.until).toBe(renews ? inHours(claimHours) : until);
  });

  it('go back to the queue when released, by their holder', async () => {
    const { submission } = await lives.claimed();
    expect(okBody(await act(rosa, submission, 'release'))).toMatchObject({ state: 'submitted', claim: null });
    expect(okBody(await act(sven, submission, 'claim')).claim.by).toBe('Sven Second');
  });

  it('last to the last second and no longer', async () => {
    const { submission } = await lives.claimed();
    app.clock.advance(claimHours - 1 / 3600);
    expect(refusalOf(await act(sven, submission, 'claim'))).toEqual([409, 'claimed-by-another']);
    app.clock.advance(2 / 3600);
    expect(await view(submission, sven)).toMatchObject({ claim: null, whyNot: null, actions: ['comment', 'claim', 'checklist', 'decide'] });
    expect(okBody(await act(sven, submission, 'claim')).claim).toMatchObject({ by: 'Sven Second', mine: true });
  });

  it('that ran out do not stand in the way of a decision by another, and are forgotten by the sweep', async () => {
    const [decided, swept, live] = [await lives.claimed(), await lives.claimed(), await lives.submitted()];
    app.clock.advance(claimHours + 0.01);
    await app.services.reviews.claim(rosa.actor, live.submission);
    okBody(await act(sven, decided.submission, 'decision', { decision: 'accept', checklist: answers(), seen: decided.tag }));
    expect(await app.services.reviews.releaseExpired()).toBeGreaterThanOrEqual(1);
    expect(await view(swept.submission)).toMatchObject({ state: 'submitted', claim: null });
    expect(await view(live.submission)).toMatchObject({ state: 'under-review', claim: { mine: true } });
    expect(await app.services.reviews.releaseExpired()).toBe(0);
    const events = await app.sql<{ payload: object }>("select payload from events where subject_id = $1 and action = 'submission.released'", [swept.submission]);
    expect(events).toEqual([{ payload: { expired: true } }]);
  });

  it('their former holder, too late, is not let in over the new one', async () => {
    const { submission, tag } = await lives.claimed();
    app.clock.advance(claimHours + 1);
    okBody(await act(sven, submission, 'claim'));
    expect(refusalOf(await act(rosa, submission, 'decision', { decision: 'accept', checklist: answers(), seen: tag }))).toEqual([409, 'claimed-by-another']);
  });

  it('two at once, twenty times: one has it', async () => {
    for (let round = 0; round < 20; round += 1) {
      const { submission } = await lives.submitted();
      const both = await Promise.all([act(rosa, submission, 'claim'), act(sven, submission, 'claim')]);
      expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
    }
  });

  it('the checklist so far is kept, and wrong answers are named', async () => {
    const { submission } = await lives.claimed();
    okBody(await rosa.client.patch(`/reviews/${submission}/checklist`, { checklist: { value: 'yes', unit: 'no' } }));
    expect((await view(submission)).checklist).toEqual({ value: 'yes', unit: 'no' });
    const answer = await rosa.client.patch(`/reviews/${submission}/checklist`, { checklist: { value: 'perhaps' } });
    expect(problemOf(answer).errors?.map(({ path }) => path)).toEqual(['checklist.value']);
    expect(refusalOf(await rosa.client.patch(`/reviews/${submission}/checklist`, { checklist: { taste: 'yes' } }))).toEqual([422, 'invalid-input']);
  });
});

describe('the queue', () => {
  it('is oldest first, page by page whole, and counts what it shows', async () => {
    const waiting = okBody(await rosa.client.get('/reviews?limit=200'));
    const items = waiting.items as { submission: string; submittedAt: string; own: boolean }[];
    expect(items.length).toBe(waiting.total);
    expect(items.map(({ submittedAt }) => submittedAt)).toEqual(items.map(({ submittedAt }) => submittedAt).sort());
    const paged: string[] = [];
    for (let cursor = ''; ;) {
      const page = okBody(await rosa.client.get(`/reviews?limit=3${cursor && `&cursor=${encodeURIComponent(cursor)}`}`));
      paged.push(...(page.items as typeof items).map(({ submission }) => submission));
      if (page.nextCursor === null) break;
      cursor = page.nextCursor as string;
    }
    expect(paged).toEqual(items.map(({ submission }) => submission));
    for (const state of ['submitted', 'under-review', 'mine', 'decided'] as const) {
      const part = okBody(await rosa.client.get(`/reviews?limit=200&state=${state}`));
      expect((part.items as unknown[]).length, state).toBe(part.total);
      expect(part.total).toBe(part.counts[state === 'under-review' ? 'underReview' : state]);
    }
    expect(waiting.total).toBe(waiting.counts.submitted + waiting.counts.underReview);
    expect(refusalOf(await rosa.client.get('/reviews?state=waiting&cursor=abc'))).toEqual([400, 'cursor-invalid']);
  });

  it('leads to the next that the reviewer may decide on', async () => {
    const own = new Lives(app.services, sven.actor, rosa.actor);
    const { submission } = await own.submitted(entryInputOf({ locator: 'p. 77' }));
    const { next } = await view(submission, sven) as { next: string | null };
    expect(next).not.toBe(submission);
    if (next) expect((await view(next, sven)).own).toBe(false);
  });
});

describe('every state, every action, by a reviewer who had no part in it', () => {
  const actions = ['claim', 'release', 'accept', 'return', 'reject'] as const;
  it.each(states.filter((state) => state !== 'draft').flatMap((state) => actions.map((action) => [state, action] as const)))('%s: %s', async (state: State, action) => {
    const { submission } = await lives.inState(state);
    const { seen } = await view(submission);
    const answer = action === 'claim' || action === 'release' ? await act(rosa, submission, action)
      : await act(rosa, submission, 'decision', { decision: action, checklist: answers(), reason: 'other', comment: 'x', seen });
    const [first] = await app.sql<{ state: State; decided: string | null }>('select r.state, d.decision as decided from submissions s join revisions r on r.id = s.revision_id left join decisions d on d.submission_id = s.id where s.id = $1', [submission]);
    const next = transitions[state][action];
    // Releasing what nobody holds changes nothing; the same decision by the same person is a retry.
    const retry = { accepted: 'accept', superseded: 'accept', retracted: 'accept', returned: 'return', rejected: 'reject' }[state as string] === action;
    if (next) {
      okBody(answer);
      expect(first?.state).toBe(next);
    } else if (retry || (state === 'submitted' && action === 'release')) {
      okBody(answer);
      expect(first?.state).toBe(state);
    } else {
      expect(refusalOf(answer)).toEqual([409, ['withdrawn'].includes(state) ? 'state-conflict' : 'already-decided']);
      expect(first?.state).toBe(state);
    }
  });
});
