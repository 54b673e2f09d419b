import { beforeAll, describe, expect, it } from 'vitest';
import type { EntryDetail, EntryInput } from '#shared/contracts/entries.ts';
import { consistencyWithReverse, type Direction, type HeldReactionEnergy } from '#server/features/entries/reverse-consistency.ts';
import { useApp, type Person } from '#tests/factories/app.ts';
import { okBody, type Client } from '#tests/factories/client.ts';
import { entryInputOf } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';

const app = useApp();
let contributor: Person;
let reviewer: Person;
let visitor: Client;
let lives: Lives;
let page = 0;
beforeAll(async () => {
  [contributor, reviewer] = [await app.person('contributor'), await app.person('reviewer')];
  visitor = await app.visitor();
  lives = new Lives(app.services, contributor.actor, reviewer.actor);
});

/** An accepted, invented computed entry on a facet of its own; energies in kJ/mol. */
async function accepted(equation: string, facet: string, asPrinted: string, changes: Partial<EntryInput> = {}, symbol: 'energy' | 'reactionEnergy' = 'energy'): Promise<string> {
  page += 1;
  const life = await lives.accepted(entryInputOf({
    kind: symbol === 'energy' ? 'barrier' : 'reaction-energy', provenance: 'computed', step: { equation }, surface: { metal: 'Ni', facet, site: 'terrace' }, locator: `p. ${page}`,
    method: { class: 'computed', technique: 'DFT' }, quantities: [{ symbol, energyType: 'electronic', asPrinted, unitAsPrinted: 'kJ/mol', uncertaintyKind: asPrinted.includes('±') ? 'standard' : 'none' }],
    conditions: { endStateReference: 'isolated' }, ...changes,
  }));
  return life.accession;
}

const detail = async (accession: string) => okBody(await visitor.get(`/entries/${accession}?T=700`)) as EntryDetail;
const forward = 'NH* + * -> N* + H*';
const reverse = 'N* + H* -> NH* + *';

describe('the reverse of an elementary step on the same surface', () => {
  it('is set against a reaction energy of the same type, seen from either end', async () => {
    const there = await accepted(forward, '111', '120 ± 3');
    const back = await accepted(reverse, '111', '90 ± 4');
    const alone = (await detail(there)).reverse;
    expect(alone.map(({ accession }) => accession)).toEqual([back]);
    expect(alone[0]?.consistency).toMatchObject({ status: 'no-reaction-energy', energyType: 'electronic', differenceKJPerMol: 30, uDifferenceKJPerMol: 5, reactionEnergy: null, assumption: null });
    // A reaction enthalpy is no partner of electronic barriers.
    await accepted(forward, '111', '55 ± 1', { quantities: [{ symbol: 'reactionEnergy', energyType: 'enthalpy', asPrinted: '55 ± 1', unitAsPrinted: 'kJ/mol', uncertaintyKind: 'standard' }] }, 'reactionEnergy');
    expect((await detail(there)).reverse.find(({ accession }) => accession === back)?.consistency.status).toBe('no-reaction-energy');
    // Printed for the reverse: −60 there is +60 here. E_n = |120 − 90 − 60| / (2 √(3² + 4² + 0.5²)) = 30 / 10.0499 = 2.98511.
    const energy = await accepted(reverse, '111', '-60 ± 0.5', {}, 'reactionEnergy');
    const checked = (await detail(there)).reverse.find(({ accession }) => accession === back)?.consistency;
    expect(checked).toMatchObject({ status: 'inconsistent', reactionEnergy: { accession: energy, valueKJPerMol: 60, uKJPerMol: 0.5 }, closureErrorKJPerMol: -30 });
    expect(checked?.status === 'inconsistent' && checked.normalizedError).toBeCloseTo(30 / (2 * Math.sqrt(25.25)), 12);
    const mirrored = (await detail(back)).reverse.find(({ accession }) => accession === there)?.consistency;
    expect(mirrored).toMatchObject({ status: 'inconsistent', differenceKJPerMol: -30, reactionEnergy: { valueKJPerMol: -60 }, closureErrorKJPerMol: 30 });
  });

  it('a reaction energy that the entry itself holds goes first', async () => {
    const there = await accepted(forward, '100', '100 ± 1', { quantities: [
      { symbol: 'energy', energyType: 'electronic', asPrinted: '100 ± 1', unitAsPrinted: 'kJ/mol', uncertaintyKind: 'standard' },
      { symbol: 'reactionEnergy', energyType: 'electronic', asPrinted: '21 ± 1', unitAsPrinted: 'kJ/mol', uncertaintyKind: 'standard' },
    ] });
    await accepted(reverse, '100', '80 ± 1');
    await accepted(forward, '100', '50 ± 1', {}, 'reactionEnergy');
    const [first] = (await detail(there)).reverse.filter(({ consistency }) => consistency.status !== 'not-compared');
    expect(first?.consistency).toMatchObject({ status: 'consistent', reactionEnergy: { accession: there, valueKJPerMol: 21 } });
  });

  it('lists entries of the same step and surface with what may stand on one scale', async () => {
    const own = await accepted(forward, '110', '100');
    const alike = await accepted(forward, '110', '< 95');
    const unlike = await accepted(forward, '110', '85', { scope: 'apparent' });
    const shown = (await detail(own)).sameStepAndSurface;
    expect(shown.map(({ accession, alike: same, bound, scope }) => [accession, same, bound, scope])).toEqual([[unlike, false, '=', 'apparent'], [alike, true, '<', 'elementary']]);
  });
});

describe('what a browser keeps of an entry', () => {
  it('is asked for anew once a neighbour is accepted', async () => {
    const own = await accepted(forward, '211', '100');
    const tag = String((await visitor.get(`/entries/${own}`)).headers['etag']);
    expect((await visitor.get(`/entries/${own}`, { 'If-None-Match': tag })).status).toBe(304);
    const other = await accepted(forward, '211', '104');
    const again = await visitor.get(`/entries/${own}`, { 'If-None-Match': tag });
    expect((okBody(again) as EntryDetail).sameStepAndSurface.map(({ accession }) => accession)).toEqual([other]);
  });
});

describe('what is compared, and what is not', () => {
  const own: Direction = { energyKJPerMol: 100, uEnergyKJPerMol: 3, bound: '=', energyType: 'arrhenius', scope: 'elementary', exponent: 0, variantKey: 'k', site: 'terrace', promoters: [] };
  const back: Direction = { ...own, energyKJPerMol: 80, uEnergyKJPerMol: 4 };
  const held: HeldReactionEnergy[] = [{ accession: '222-222-2', label: 'Invented 2001', valueKJPerMol: 24, uKJPerMol: 0, energyType: 'enthalpy', variantKey: 'k', promoters: [] }];
  const compare = (change: Partial<Direction>, rest: { own?: Partial<Direction>; gasMoleChange?: number; temperatureK?: number | null; held?: HeldReactionEnergy[] } = {}) => consistencyWithReverse({
    own: { ...own, ...rest.own }, reverse: { ...back, ...change }, held: rest.held ?? held, gasMoleChange: rest.gasMoleChange ?? 0, temperatureK: rest.temperatureK === undefined ? 700 : rest.temperatureK,
  });

  it.each<[string, ReturnType<typeof compare>, RegExp]>([
    ['an apparent reverse', compare({ scope: 'apparent' }), /^Only values of elementary steps are compared: the reverse is apparent/],
    ['an apparent value', compare({}, { own: { scope: 'apparent' } }), /this one is apparent/],
    ['unlike energies', compare({ energyType: 'electronic' }), /^Unlike energies are not compared: Arrhenius activation energy here, electronic energy barrier of the reverse/],
    ['a limit', compare({ bound: '<' }), /^A limit or a range/],
    ['no energy', compare({ energyKJPerMol: null }), /^The reverse holds no energy/],
    ['another isotope', compare({ variantKey: 'other' }), /different isotopes or sites/],
    ['a promoted surface', compare({ promoters: ['Cs'] }), /^Promoted and clean surfaces/],
    ['a modified Arrhenius expression without a temperature', compare({ exponent: 1 }, { temperatureK: null }), /give a temperature/],
  ])('%s is not compared, and why is said', (_, answer, words) => {
    expect(answer.status).toBe('not-compared');
    expect(answer.status === 'not-compared' && answer.reason).toMatch(words);
  });

  it.each<[string, ReturnType<typeof compare>, string]>([
    // |100 − 80 − 24| / (2 × 5) = 0.4
    ['within the uncertainties', compare({}), 'consistent'],
    // |100 − 60 − 24| / 10 = 1.6
    ['beyond the uncertainties', compare({ energyKJPerMol: 60 }), 'inconsistent'],
    ['an uncertainty that is not known', compare({ uEnergyKJPerMol: null }), 'undecided'],
    ['no reaction energy', compare({}, { held: [] }), 'no-reaction-energy'],
    ['only one of another type', compare({}, { held: held.map((one) => ({ ...one, energyType: 'electronic' as const })) }), 'no-reaction-energy'],
    ['only one for a promoted surface', compare({}, { held: held.map((one) => ({ ...one, promoters: ['K'] })) }), 'no-reaction-energy'],
  ])('%s', (_, answer, status) => expect(answer.status).toBe(status));

  it('takes local energies of a modified Arrhenius expression', () => {
    // 100 + 1 × 8.31446261815324e-3 × 700 = 105.82012; less 80.
    const answer = compare({}, { own: { exponent: 1 } });
    expect(answer.status !== 'not-compared' && answer.differenceKJPerMol).toBeCloseTo(25.820123832707, 9);
    expect(answer.status !== 'not-compared' && answer.assumption).toBe('Local energies E + nRT at 700 K.');
  });

  it('says what a gas changes', () => {
    // −ΔνRT for one molecule set free at 700 K: −5.82 kJ/mol.
    const answer = compare({}, { gasMoleChange: 1 });
    expect(answer.status !== 'not-compared' && answer.assumption).toMatch(/^A gas takes part: both energies are taken on pressures\..*ΔH° − ΔνRT; −ΔνRT is −5\.8 kJ\/mol at 700 K\.$/);
  });
});
