import { beforeAll, describe, expect, it } from 'vitest';
import { checklistPoints, decisionReasons } from '#shared/domain/review.ts';
import { useApp, type Person } from '#tests/factories/app.ts';
import { okBody, problemOf, refusalOf, type Body, type Client } from '#tests/factories/client.ts';
import { answers, entryInputOf } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';

const app = useApp();
let contributor: Person;
let rosa: Person;
let sven: Person;
let visitor: Client;
let lives: Lives;
beforeAll(async () => {
  contributor = await app.person('contributor', 'Ada Contributor');
  [rosa, sven] = [await app.person('reviewer', 'Rosa Reviewer'), await app.person('curator', 'Sven Second')];
  visitor = await app.visitor();
  lives = new Lives(app.services, contributor.actor, rosa.actor);
});

const view = async (id: string, who = rosa): Promise<Body> => okBody(await who.client.get(`/reviews/${id}`));
const seenOf = async (id: string): Promise<string> => (await view(id)).seen as string;
const decide = (who: Person, id: string, body: object) => who.client.post(`/reviews/${id}/decision`, body);
const acceptance = { decision: 'accept', checklist: answers() };
const refusalBody = (decision: 'return' | 'reject') => ({ decision, reason: 'unit-differs-from-source', comment: 'The paper prints eV.' });

describe('what a decision needs', () => {
  it.each(checklistPoints)('accepting without an answer to %s is refused, naming it', async (point) => {
    const { submission, tag } = await lives.submitted();
    const { [point]: _left, ...rest } = answers();
    const answer = await decide(rosa, submission, { ...acceptance, checklist: rest, seen: tag });
    expect(refusalOf(answer)).toEqual([422, 'invalid-input']);
    expect(problemOf(answer).errors?.map(({ path }) => path)).toEqual([`checklist.${point}`]);
    expect((await view(submission)).decision).toBeNull();
  });

  it.each(checklistPoints)('accepting with a “no” to %s is refused', async (point) => {
    const { submission, tag } = await lives.submitted();
    const answer = await decide(rosa, submission, { ...acceptance, checklist: { ...answers(), [point]: 'no' }, seen: tag });
    expect(problemOf(answer).errors).toEqual([{ path: `checklist.${point}`, message: expect.stringContaining('return it instead') as string }]);
  });

  it('“not applicable” is an answer', async () => {
    const { submission, tag } = await lives.submitted();
    expect(okBody(await decide(rosa, submission, { ...acceptance, checklist: answers('not-applicable'), seen: tag }))).toMatchObject({ state: 'accepted', decision: { decision: 'accept', by: 'Rosa Reviewer' } });
  });

  it.each(['return', 'reject'] as const)('to %s needs a reason of the list and a comment', async (decision) => {
    const { submission, tag: seen } = await lives.submitted();
    const paths = async (body: object) => problemOf(await decide(rosa, submission, { decision, seen, ...body })).errors?.map(({ path }) => path);
    expect(await paths({})).toEqual(['reason', 'comment']);
    expect(await paths({ reason: 'other' })).toEqual(['comment']);
    expect(await paths({ reason: 'other', comment: '   ' })).toEqual(['comment']);
    expect(await paths({ comment: 'x' })).toEqual(['reason']);
    expect(await paths({ reason: 'do not like it', comment: 'x' })).toEqual(['reason']);
    const after = okBody(await decide(rosa, submission, { ...refusalBody(decision), checklist: { unit: 'no' }, seen }));
    expect(after).toMatchObject({ state: decision === 'return' ? 'returned' : 'rejected', checklist: { unit: 'no' }, actions: [], decision: { reason: 'unit-differs-from-source', comment: 'The paper prints eV.' } });
    expect((await visitor.get(`/entries/${after.entry.accession as string}`)).status).toBe(404);
  });

  it.each(decisionReasons)('takes the reason %s', async (reason) => {
    const { submission, tag: seen } = await lives.submitted();
    expect(okBody(await decide(rosa, submission, { decision: 'reject', reason, comment: 'x', seen })).decision.reason).toBe(reason);
  });

  it('needs what the reviewer saw: a stale look is told the current one', async () => {
    const { submission } = await lives.submitted();
    const seen = await seenOf(submission);
    await app.services.reviews.claim(rosa.actor, submission);
    const answer = await decide(rosa, submission, { ...acceptance, seen });
    expect(refusalOf(answer)).toEqual([412, 'stale-version']);
    expect(problemOf(answer).context).toEqual({ seen: await seenOf(submission) });
    expect(refusalOf(await decide(rosa, submission, acceptance))).toEqual([422, 'invalid-input']);
  });

  it('nobody decides on their own, whatever their role', async () => {
    for (const role of ['reviewer', 'curator'] as const) {
      const own = await app.person(role);
      const { submission, tag } = await new Lives(app.services, own.actor, rosa.actor).submitted();
      for (const body of [acceptance, refusalBody('return'), refusalBody('reject')]) expect(refusalOf(await decide(own, submission, { ...body, seen: tag }))).toEqual([403, 'own-submission']);
      expect(refusalOf(await own.client.post(`/reviews/${submission}/claim`))).toEqual([403, 'own-submission']);
      expect(await view(submission, own)).toMatchObject({ own: true, actions: ['comment'], whyNot: expect.stringContaining('another reviewer') as string });
    }
  });

  it('nor on a revision by another of what they first contributed', async () => {
    const first = await app.person('reviewer');
    const { accession } = await new Lives(app.services, first.actor, rosa.actor).accepted();
    await app.services.entries.revise(contributor.actor, accession, 'Read again.');
    const { submission, tag } = await lives.submit(accession);
    expect(refusalOf(await decide(first, submission, { ...acceptance, seen: tag }))).toEqual([403, 'own-submission']);
    okBody(await decide(rosa, submission, { ...acceptance, seen: tag }));
  });
});

describe('a decision stands', () => {
  it('the same again by the same person is a retry', async () => {
    for (const body of [acceptance, refusalBody('return'), refusalBody('reject')]) {
      const { submission, tag: seen } = await lives.submitted();
      const [first, second] = [await decide(rosa, submission, { ...body, seen }), await decide(rosa, submission, { ...body, seen })];
      expect(okBody(second).decision).toEqual(okBody(first).decision);
      expect(await app.sql('select count(*)::int as n from decisions where submission_id = $1', [submission])).toEqual([{ n: 1 }]);
    }
  });

  it('the same twice at the same instant by the same person is one decision, and both are told so', async () => {
    for (let round = 0; round < 8; round += 1) {
      const { submission, tag: seen } = await lives.submitted();
      const both = await Promise.all([1, 2].map(() => decide(rosa, submission, { ...acceptance, seen })));
      expect(both.map(({ status }) => status)).toEqual([200, 200]);
    }
  });

  it.each<[string, () => Person, object]>([
    ['a different one by the same person', () => rosa, refusalBody('reject')], ['the same by another', () => sven, acceptance], ['a different one by another', () => sven, refusalBody('return')],
  ])('%s is told who decided and what', async (_what, who, body) => {
    const { submission, tag: seen } = await lives.submitted();
    okBody(await decide(rosa, submission, { ...acceptance, seen }));
    const answer = await decide(who(), submission, { ...body, seen: await seenOf(submission) });
    expect(refusalOf(answer)).toEqual([409, 'already-decided']);
    expect(problemOf(answer).detail).toContain('Rosa Reviewer');
    expect(problemOf(answer).context).toEqual({ decision: 'accept', by: 'Rosa Reviewer', at: app.clock.now().toISOString() });
  });

  it('what was withdrawn is decided no more', async () => {
    const { accession, submission, tag: seen } = await lives.submitted();
    okBody(await contributor.client.post(`/entries/${accession}/withdraw`));
    const answer = await decide(rosa, submission, { ...acceptance, seen });
    expect(refusalOf(answer)).toEqual([409, 'state-conflict']);
    expect(problemOf(answer).context).toEqual({ state: 'withdrawn' });
  });

  it('two reviewers at once, fifty times: exactly one decision stands and the other is told whose', async () => {
    const outcomes = { rosa: 0, sven: 0 };
    for (let round = 0; round < 50; round += 1) {
      const { accession, submission, tag: seen } = await lives.submitted(entryInputOf({ locator: `p. ${round}` }));
      const bodies = round % 2 === 0 ? [acceptance, refusalBody('reject')] : [refusalBody('return'), acceptance];
      const both = await Promise.all([decide(rosa, submission, { ...bodies[0], seen }), decide(sven, submission, { ...bodies[1], seen })]);
      const winner = both.findIndex(({ status }) => status === 200);
      expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
      const lost = both[1 - winner];
      if (!lost) throw new Error('Nobody lost.');
      const name = winner === 0 ? 'Rosa Reviewer' : 'Sven Second';
      expect(problemOf(lost)).toMatchObject({ code: 'already-decided', context: { by: name, decision: (bodies[winner] as { decision: string }).decision } });
      const [stored] = await app.sql<{ n: number; listed: number; state: string }>(
        `select (select count(*)::int from decisions where submission_id = $1) as n, (select count(*)::int from search_rows where accession = $2 and listed) as listed,
          (select r.state from revisions r join submissions s on s.revision_id = r.id where s.id = $1) as state`, [submission, accession],
      );
      const accepted = (bodies[winner] as { decision: string }).decision === 'accept';
      expect(stored).toEqual({ n: 1, listed: accepted ? 1 : 0, state: accepted ? 'accepted' : bodies[winner] === bodies[0] && round % 2 === 1 ? 'returned' : 'rejected' });
      outcomes[winner === 0 ? 'rosa' : 'sven'] += 1;
    }
    expect(outcomes.rosa + outcomes.sven).toBe(50);
  });

  it('a reviewer and a contributor who withdraws at once, twenty times: one of them has it', async () => {
    for (let round = 0; round < 20; round += 1) {
      const { accession, submission, tag: seen } = await lives.submitted();
      const [decided, withdrawn] = await Promise.all([decide(rosa, submission, { ...acceptance, seen }), contributor.client.post(`/entries/${accession}/withdraw`)]);
      expect([decided.status, withdrawn.status].filter((status) => status === 200)).toHaveLength(1);
      for (const answer of [decided, withdrawn]) if (answer.status !== 200) expect([409, 412]).toContain(problemOf(answer).status);
      const [row] = await app.sql<{ state: string; n: number }>('select r.state, (select count(*)::int from decisions d where d.submission_id = s.id) as n from submissions s join revisions r on r.id = s.revision_id where s.id = $1', [submission]);
      expect(row).toEqual(decided.status === 200 ? { state: 'accepted', n: 1 } : { state: 'withdrawn', n: 0 });
    }
  });
});

describe('rounds', () => {
  it('returned, revised, handed in again, accepted: the second round knows the first', async () => {
    const first = await lives.submitted(entryInputOf({ locator: 'Table 9' }));
    okBody(await decide(rosa, first.submission, { ...refusalBody('return'), seen: first.tag }));
    const own = okBody(await contributor.client.get(`/entries/${first.accession}/draft`));
    expect(own.lastDecision).toMatchObject({ decision: 'return', reason: 'unit-differs-from-source', comment: 'The paper prints eV.', by: 'Rosa Reviewer' });
    const revised = okBody(await contributor.client.post(`/entries/${first.accession}/revise`, {}), 201);
    expect(revised).toMatchObject({ revision: 2, state: 'draft', lastDecision: { decision: 'return' } });
    okBody(await contributor.client.patch(`/entries/${first.accession}`, { locator: 'Table 8' }, { 'If-Match': '"2.1"' }));
    const submitted = okBody(await contributor.client.post(`/entries/${first.accession}/submit`));
    const second = await view(submitted.submission as string);
    expect(second).toMatchObject({ round: 2, state: 'submitted', earlier: [{ round: 1, decision: 'return', by: 'Rosa Reviewer', comment: 'The paper prints eV.' }] });
    expect(second.changes).toEqual([{ field: expect.any(String) as string, before: 'Table 9', after: 'Table 8' }]);
    okBody(await decide(sven, submitted.submission as string, { ...acceptance, seen: second.seen }));
    expect(okBody(await visitor.get(`/entries/${first.accession}`))).toMatchObject({ version: 1, revision: 2, state: 'accepted', locator: 'Table 8' });
    expect(await app.sql('select round, previous_id is not null as linked from submissions where entry_id = (select id from entries where accession = $1) order by round', [first.accession]))
      .toEqual([{ round: 1, linked: false }, { round: 2, linked: true }]);
  });

  it('what was rejected is not revised', async () => {
    const { accession } = await lives.inState('rejected');
    expect(refusalOf(await contributor.client.post(`/entries/${accession}/revise`, {}))).toEqual([409, 'state-conflict']);
  });
});

describe('retracting', () => {
  it('takes the entry out of search and exports; its page goes on answering, with the reason', async () => {
    const { accession } = await lives.accepted(entryInputOf({ surface: { metal: 'Pd', facet: '111' } }));
    expect(okBody(await visitor.get('/entries?metal=Pd')).total).toBe(1);
    expect(refusalOf(await rosa.client.post(`/entries/${accession}/retract`, { reason: ' ' }))).toEqual([422, 'invalid-input']);
    expect(okBody(await rosa.client.post(`/entries/${accession}/retract`, { reason: 'The source withdrew its calibration.' }))).toEqual({ accession, state: 'retracted' });
    expect(okBody(await visitor.get('/entries?metal=Pd')).total).toBe(0);
    expect((await visitor.get('/entries/export?format=csv&metal=Pd')).text.trim().split('\r\n')).toHaveLength(1);
    expect(okBody(await visitor.get(`/entries/${accession}`))).toMatchObject({ state: 'retracted', version: 1, notice: 'The source withdrew its calibration.', quantities: [{ asPrinted: '44.5 ± 1.4' }, {}], actions: [] });
    expect(refusalOf(await rosa.client.post(`/entries/${accession}/retract`, { reason: 'Again.' }))).toEqual([409, 'state-conflict']);
    expect(refusalOf(await contributor.client.post(`/entries/${accession}/retract`, { reason: 'Again.' }))).toEqual([403, 'forbidden']);
  });

  it.each(['draft', 'submitted', 'under-review', 'returned', 'rejected', 'withdrawn', 'superseded'] as const)('what is %s cannot be retracted', async (state) => {
    const { accession } = await lives.inState(state);
    const answer = await rosa.client.post(`/entries/${accession}/retract`, { reason: 'x' });
    if (state === 'superseded') okBody(answer);
    else expect(refusalOf(answer)).toEqual([409, 'state-conflict']);
  });
});
