import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { useApp, type Person } from '#tests/factories/app.ts';
import { okBody, refusalOf, type Body } from '#tests/factories/client.ts';
import { entryInputOf, withEnergy } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';

const app = useApp();
let person: Person;
let lives: Lives;
beforeAll(async () => {
  person = await app.person('contributor');
  lives = new Lives(app.services, person.actor, (await app.person('reviewer')).actor);
});
beforeEach(() => {
  app.doiIsUp = true;
});

const create = async (body: object): Promise<Body> => okBody(await person.client.post('/entries', body), 201);
const typed = (title: string, year = 1998) => ({ title, author: [{ family: 'Example', given: 'Ida' }], issued: { 'date-parts': [[year]] } });
const codesOf = (entry: Body): string[] => (entry.checks as { code: string }[]).map(({ code }) => code);

describe('a DOI service that is down or talks nonsense', () => {
  it.each(['failing', 'slow', 'garbage', 'loop', 'nonsense', 'page', 'busy', 'hang-up', 'huge', 'away', 'inside', 'no-record'])('10.5555/%s: the draft is saved, and the fault says that the service is to blame', async (name) => {
    const started = Date.now();
    const entry = await create(entryInputOf({ source: { doi: `10.5555/${name}` } }));
    expect(Date.now() - started).toBeLessThan(8000);
    expect(entry.source).toBeNull();
    expect(entry.faults).toEqual([{ path: 'source.doi', code: 'doi-service-unavailable', message: expect.stringMatching(/^The DOI service does not answer \(.+\)\. Go on with a typed or pasted citation/) as string }]);
    expect(okBody(await person.client.get(`/entries/${entry.accession as string}/draft`)).input.source).toEqual({ doi: `10.5555/${name}` });
    expect(refusalOf(await person.client.get(`/doi/10.5555/${name}`))).toEqual([503, 'doi-service-unavailable']);
  });

  it('a typed citation goes on, is submitted with its DOI, and is confirmed by the job later, once', async () => {
    app.doiIsUp = false;
    const refused = await create(entryInputOf({ source: { doi: '10.5555/test.4' } }));
    expect((refused.faults as { code: string }[]).map(({ code }) => code)).toEqual(['doi-service-unavailable']);
    const csl = typed('Ammonia decomposition over cobalt, as typed', 2012);
    const answer = await person.client.patch(`/entries/${refused.accession as string}`, { source: { csl } }, { 'If-Match': '"1.1"' });
    expect(okBody(answer).faults).toEqual([]);
    const submitted = okBody(await person.client.post(`/entries/${refused.accession as string}/submit`));
    expect(submitted).toMatchObject({ state: 'submitted', source: { doi: '10.5555/test.4', title: 'Ammonia decomposition over cobalt, as typed' } });
    const id = submitted.source.id as string;
    expect(okBody(await person.client.get(`/sources/${id}`)).confirmed).toBe(false);
    expect(await app.services.sources.confirmPending()).toBe(0);
    app.clock.advance(0.1);
    app.doiIsUp = true;
    expect(await app.services.sources.confirmPending()).toBe(1);
    expect(okBody(await person.client.get(`/sources/${id}`))).toMatchObject({ confirmed: true, title: 'Ammonia decomposition over cobalt foils, an invented study', key: submitted.source.key });
    expect(await app.services.sources.confirmPending()).toBe(0);
    // What was typed is frozen with the revision, whatever the service says of the source.
    expect(await app.sql("select input -> 'source' -> 'csl' ->> 'title' as title from revisions r join entries e on e.id = r.entry_id where accession = $1", [refused.accession])).toEqual([{ title: csl.title }]);
  });

  it('while a draft saves itself, a look-up in vain is not repeated for half a minute; handing in asks anew', async () => {
    app.doiIsUp = false;
    const { accession } = await create(entryInputOf({ source: { doi: '10.5555/test.5' } })) as { accession: string };
    app.doiIsUp = true;
    const soon = okBody(await person.client.patch(`/entries/${accession}`, { note: 'a' }, { 'If-Match': '"1.1"' }));
    expect((soon.faults as { code: string }[]).map(({ code }) => code)).toEqual(['doi-service-unavailable']);
    app.clock.advance(0.01);
    expect(okBody(await person.client.patch(`/entries/${accession}`, { note: 'b' }, { 'If-Match': '"1.2"' }))).toMatchObject({ faults: [], source: { doi: '10.5555/test.5' } });
    app.doiIsUp = false;
    const other = await create({ ...entryInputOf({ source: { doi: '10.5555/corrected' } }) });
    app.doiIsUp = true;
    expect(okBody(await person.client.post(`/entries/${other.accession as string}/submit`)).source).toMatchObject({ doi: '10.5555/corrected', status: 'corrected' });
  });

  it('what is held already needs no service', async () => {
    await create(entryInputOf({ source: { doi: '10.5555/test.2' } }));
    app.doiIsUp = false;
    const entry = await create(entryInputOf({ source: { doi: 'https://doi.org/10.5555/TEST.2' } }));
    expect(entry).toMatchObject({ faults: [], source: { doi: '10.5555/test.2' } });
  });

  it('two people who name one source at once share one record', async () => {
    const made = await Promise.all(Array.from({ length: 6 }, () => app.services.entries.create(person.actor, { source: { doi: '10.5555/test.6' } })));
    expect(new Set(made.map(({ source }) => source?.id)).size).toBe(1);
    expect(made[0]?.source?.key).toBeTruthy();
  });

  it.each<[string, object, object]>([
    ['BibTeX', { bibtex: '@article{a, title={Pasted from a file}, author={Example, Ida}, journal={Invented Journal}, year={1999}}' }, { title: 'Pasted from a file', year: 1999, doi: null }],
    ['RIS', { ris: 'TY  - JOUR\nTI  - Pasted as RIS\nAU  - Example, Ida\nPY  - 2003\nER  - \n' }, { title: 'Pasted as RIS', year: 2003, doi: null }],
    ['BibTeX with a DOI that answers', { bibtex: '@article{a, title={Wrong title}, author={X, Y}, year={1900}, doi={10.5555/test.3}}' }, { title: 'Hydrogen from copper: H$_{2}$ & D$_{2}$, an invented study', doi: '10.5555/test.3', year: 2008 }],
    ['fields', { csl: typed('Typed by hand') }, { title: 'Typed by hand', year: 1998 }],
  ])('takes a citation as %s', async (_form, source, shown) => {
    expect((await create(entryInputOf({ source }))).source).toMatchObject(shown);
  });
});

describe('checks that need the store', () => {
  it('a retracted source is noticed at once, a corrected one noted, and neither stands in the way', async () => {
    const retracted = await create(entryInputOf({ source: { doi: '10.5555/retracted' } }));
    expect(retracted.source).toMatchObject({ status: 'retracted', notice: expect.stringContaining('2019') as string });
    expect(codesOf(retracted)).toContain('source-retracted');
    expect(retracted.faults).toEqual([]);
    expect(codesOf(await create(entryInputOf({ source: { doi: '10.5555/corrected' } })))).toContain('source-corrected');
    expect(okBody(await person.client.get('/doi/10.5555/retracted'))).toMatchObject({ status: 'retracted' });
  });

  it('the same value from the same source twice is said, and names the other', async () => {
    const input = entryInputOf({ source: { doi: '10.5555/test.5' }, surface: { metal: 'Co', facet: '0001' } });
    const { accession } = await lives.submitted(input);
    const again = await create(input);
    expect(codesOf(again)).toContain('same-source-same-value');
    expect((again.checks as { message: string }[]).map(({ message }) => message).join()).toContain(accession);
    for (const other of [{ surface: { metal: 'Ni', facet: '111' } }, { step: { equation: 'NH3 + * -> NH3*' } }, { source: { doi: '10.5555/test.6' } }]) {
      expect(codesOf(await create({ ...input, ...other }))).not.toContain('same-source-same-value');
    }
  });

  it('a slip of units among five accepted neighbours is named', async () => {
    const surface = { metal: 'Pt', facet: '111', site: 'terrace' as const };
    for (const [index, value] of ['101', '104', '106', '108', '110'].entries()) {
      const before = await create(withEnergy('25.3', { surface }));
      expect(codesOf(before)).not.toContain('outlier');
      await lives.accepted(withEnergy(value, { surface, locator: `p. ${index + 1}`, source: { doi: `10.5555/test.${index + 1}` } }));
    }
    const slipped = await create(withEnergy('25.3', { surface }));
    const message = (slipped.checks as { code: string; message: string }[]).find(({ code }) => code === 'outlier')?.message;
    // 25.3 × 4.184 = 105.9 kJ/mol, the middle of the family: kilocalories were read as kilojoules.
    expect(message).toContain('calorie for joule');
    expect(codesOf(await create(withEnergy('107', { surface })))).not.toContain('outlier');
    // Another family: a different facet is another physics.
    expect(codesOf(await create(withEnergy('25.3', { surface: { ...surface, facet: '100' } })))).not.toContain('outlier');
  });
});

describe('preview', () => {
  it('converts and checks without storing anything', async () => {
    const before = await app.sql('select (select count(*) from entries) as entries, (select count(*) from sources) as sources, (select count(*) from events) as events');
    const shown = okBody(await person.client.post('/entries/preview?T=700', entryInputOf({ source: { doi: '10.5555/never.stored' } })));
    expect(shown.quantities[0].value).toBeCloseTo(186.188, 10);
    expect(shown.kAtT).toMatchObject({ temperatureK: 700, unit: 's-1', extrapolated: false });
    expect(await app.sql('select (select count(*) from entries) as entries, (select count(*) from sources) as sources, (select count(*) from events) as events')).toEqual(before);
  });
});
