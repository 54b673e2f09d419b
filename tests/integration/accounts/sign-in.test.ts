import { describe, expect, it } from 'vitest';
import { testPassword, useApp } from '#tests/factories/app.ts';
import { Client, okBody, problemOf, refusalOf } from '#tests/factories/client.ts';
import { defaultPreferences } from '#shared/contracts/accounts.ts';
import { demonstrationPassword } from '#server/features/accounts/accounts.service.ts';

const app = useApp();
const strict = useApp({ limits: { signInFailures: { perWindow: 3, windowS: 600 } } });
const demonstration = useApp({ demonstration: true });

const sessionOf = (cookies: unknown): string => /sillstone\.session=([^;]+)/.exec(String(cookies))?.[1] ?? '';

describe('signing in', () => {
  it('answers who is signed in, with the preferences of a new account', async () => {
    const { client, actor } = await app.person('contributor', 'Ida Example');
    expect(okBody(await client.get('/auth/me'))).toEqual({
      user: { id: actor.userId, name: 'Ida Example', roles: ['contributor'] }, preferences: defaultPreferences, reviewsWaiting: null, demonstration: false, version: '0.0.0-test',
    });
  });

  it('minds no capitals in the e-mail', async () => {
    const { email } = await app.person('reader');
    expect((await new Client(app.url, 'again').signIn(email.toUpperCase(), testPassword)).status).toBe(200);
  });

  it('tells a reviewer how many submissions wait', async () => {
    const { client } = await app.person('reviewer');
    expect(okBody(await client.get('/auth/me')).reviewsWaiting).toBe(0);
  });

  it('answers an unknown address and a wrong password alike', async () => {
    const { email } = await app.person('reader');
    const wrong = problemOf(await new Client(app.url, 'a').signIn(email, 'not the password'));
    const unknown = problemOf(await new Client(app.url, 'b').signIn('nobody@people.example', 'not the password'));
    expect(wrong.code).toBe('sign-in-failed');
    expect({ ...unknown, requestId: '' }).toEqual({ ...wrong, requestId: '' });
  });

  it.each([
    ['no body', undefined], ['no password', { email: 'a@people.example' }], ['an empty password', { email: 'a@people.example', password: '' }],
    ['a list', { email: ['a@people.example'], password: 'x' }], ['a long password', { email: 'a@people.example', password: 'x'.repeat(5000) }],
  ])('refuses %s as bad input', async (_what, body) => {
    const client = await app.visitor();
    expect(refusalOf(await client.post('/auth/sign-in', body))).toEqual([422, 'invalid-input']);
  });

  it('lets in nobody whose account is disabled, and shuts out who is already in', async () => {
    const { client, email, actor } = await app.person('reader');
    await app.sql('update users set disabled_at = now() where id = $1', [actor.userId]);
    expect(okBody(await client.get('/auth/me')).user).toBeNull();
    expect(refusalOf(await new Client(app.url, 'c').signIn(email, testPassword))).toEqual([401, 'sign-in-failed']);
  });
});

describe('the session', () => {
  it('gets a new name at sign-in, and the old one is worth nothing', async () => {
    const { email } = await app.person('contributor');
    const client = new Client(app.url, 'rotating');
    const before = await client.get('/auth/csrf');
    client.token = before.body.token as string;
    const signedIn = await client.post('/auth/sign-in', { email, password: testPassword });
    const [old, fresh] = [sessionOf(before.headers['set-cookie']), sessionOf(signedIn.headers['set-cookie'])];
    expect(signedIn.status).toBe(200);
    expect(old).not.toBe('');
    expect(fresh).not.toBe('');
    expect(fresh).not.toBe(old);
    const stolen = await new Client(app.url, 'thief').get('/auth/me', { Cookie: `sillstone.session=${old}` });
    expect(okBody(stolen).user).toBeNull();
  });

  it('is sent in a cookie that scripts cannot read and other sites do not send', async () => {
    const { email } = await app.person('reader');
    const answer = await new Client(app.url, 'cookie').signIn(email, testPassword);
    expect(String(answer.headers['set-cookie'])).toMatch(/sillstone\.session=[^;]+; Path=\/; Expires=[^;]+; HttpOnly; SameSite=Lax/);
  });

  it('ends at sign-out, in the database as well', async () => {
    const { client, actor } = await app.person('contributor');
    const count = async () => Number((await app.sql<{ n: string }>("select count(*) as n from sessions where sess ->> 'userId' = $1", [actor.userId]))[0]?.n);
    expect(await count()).toBe(1);
    expect(okBody(await client.post('/auth/sign-out')).user).toBeNull();
    expect(await count()).toBe(0);
    expect(okBody(await client.get('/auth/me')).user).toBeNull();
  });

  it('asks to sign in again once it has expired', async () => {
    const { client, actor } = await app.person('contributor');
    expect((await client.get('/contributions')).status).toBe(200);
    await app.sql("update sessions set expire = now() - interval '1 second' where sess ->> 'userId' = $1", [actor.userId]);
    expect(refusalOf(await client.get('/contributions'))).toEqual([401, 'sign-in-required']);
    expect(okBody(await client.get('/auth/me')).user).toBeNull();
  });

  it('does not hold with a changed signature', async () => {
    const { email } = await app.person('reader');
    const session = sessionOf((await new Client(app.url, 'x').signIn(email, testPassword)).headers['set-cookie']);
    const forged = session.replace(/.{5}$/, 'AAAAA');
    expect(okBody(await new Client(app.url, 'y').get('/auth/me', { Cookie: `sillstone.session=${forged}` })).user).toBeNull();
  });
});

describe('the form token', () => {
  it.each<[string, (own: string, foreign: string) => Record<string, string>]>([
    ['missing', () => ({ 'X-CSRF-Token': '' })],
    ['wrong', () => ({ 'X-CSRF-Token': 'a'.repeat(64) })],
    ["another session's", (_own, foreign) => ({ 'X-CSRF-Token': foreign })],
    ['cut short', (own) => ({ 'X-CSRF-Token': own.slice(0, -1) })],
  ])('when %s: nothing is changed', async (_what, headers) => {
    const [mine, other] = [await app.person('contributor'), await app.person('contributor')];
    const before = await app.sql('select count(*) from entries');
    expect(refusalOf(await mine.client.post('/entries', {}, headers(mine.client.token, other.client.token)))).toEqual([403, 'csrf-invalid']);
    expect(await app.sql('select count(*) from entries')).toEqual(before);
  });

  it('is needed to sign in, and one of the time before sign-in no longer counts after it', async () => {
    const { email } = await app.person('contributor');
    const client = new Client(app.url, 'token');
    expect(refusalOf(await client.post('/auth/sign-in', { email, password: testPassword }))).toEqual([403, 'csrf-invalid']);
    await client.fetchToken();
    const early = client.token;
    await client.signIn(email, testPassword);
    expect(refusalOf(await client.post('/entries', {}, { 'X-CSRF-Token': early }))).toEqual([403, 'csrf-invalid']);
    expect((await client.post('/entries', {})).status).toBe(201);
  });

  it('is not needed by calculators', async () => {
    const answer = await new Client(app.url, 'calc').post('/calc/energy', { value: 1, from: 'kcal/mol', to: 'kJ/mol' });
    expect(okBody(answer).value).toBeCloseTo(4.184, 12);
  });
});

describe('limits and modes', () => {
  it('stops guessing after the allowed failures, for right passwords too, and says when to come back', async () => {
    const { email } = await strict.person('reader');
    const statuses: number[] = [];
    for (let attempt = 0; attempt < 5; attempt += 1) statuses.push((await new Client(strict.url, 'g').signIn(email, 'wrong')).status);
    expect(statuses).toEqual([401, 401, 401, 429, 429]);
    const refused = await new Client(strict.url, 'g').signIn(email, testPassword);
    expect(problemOf(refused).code).toBe('too-many-requests');
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0);
  });

  it('knows the demonstration accounts in demonstration mode only', async () => {
    for (const where of [app, demonstration]) {
      await where.services.accounts.create({ email: 'reader@demo.sillstone.example', name: 'Demo Reader', password: demonstrationPassword, role: 'reader' });
    }
    const signIn = (url: string) => new Client(url, 'demo').signIn('reader@demo.sillstone.example', demonstrationPassword);
    expect((await signIn(demonstration.url)).status).toBe(200);
    expect((await signIn(app.url)).status).toBe(401);
    expect(okBody(await (await demonstration.visitor()).get('/auth/demo-accounts'))).toEqual({ accounts: [{ email: 'reader@demo.sillstone.example', name: 'Demo Reader', role: 'reader' }], password: demonstrationPassword });
    expect(okBody(await (await app.visitor()).get('/auth/demo-accounts'))).toEqual({ accounts: [], password: null });
    expect(okBody(await (await demonstration.visitor()).get('/auth/me')).demonstration).toBe(true);
  });
});

describe('preferences', () => {
  it('are kept, changed one at a time, and private', async () => {
    const [one, other] = [await app.person('reader'), await app.person('reader')];
    expect(okBody(await one.client.patch('/auth/preferences', { energyUnit: 'eV' }))).toEqual({ ...defaultPreferences, energyUnit: 'eV' });
    expect(okBody(await one.client.patch('/auth/preferences', { temperatureK: 673.15, theme: 'dark' }))).toEqual({ ...defaultPreferences, energyUnit: 'eV', temperatureK: 673.15, theme: 'dark' });
    const all = { energyUnit: 'eV', temperatureK: 673.15, theme: 'dark', hiddenColumns: ['barrier', 'rate'], rows: 'dense' };
    expect(okBody(await one.client.patch('/auth/preferences', { hiddenColumns: ['barrier', 'rate'], rows: 'dense' }))).toEqual(all);
    expect(okBody(await one.client.get('/auth/me')).preferences).toEqual(all);
    expect(okBody(await other.client.get('/auth/me')).preferences).toEqual(defaultPreferences);
  });

  it.each([
    ['an unknown unit', { energyUnit: 'furlong' }, 'energyUnit'], ['a temperature of zero', { temperatureK: 0 }, 'temperatureK'], ['text for a number', { temperatureK: '700' }, 'temperatureK'],
    ['a temperature beyond reason', { temperatureK: 1e9 }, 'temperatureK'], ['null', { theme: null }, 'theme'],
  ])('refuse %s and name the field', async (_what, change, path) => {
    const { client } = await app.person('reader');
    const answer = await client.patch('/auth/preferences', change);
    expect(refusalOf(answer)).toEqual([422, 'invalid-input']);
    expect(problemOf(answer).errors?.map((error) => error.path)).toEqual([path]);
  });
});
