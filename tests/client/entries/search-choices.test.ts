import { describe, expect, it } from 'vitest';
import species from '#seeds/vocabulary/species.json' with { type: 'json' };
import stepClasses from '#seeds/vocabulary/step-classes.json' with { type: 'json' };
import metals from '#seeds/vocabulary/metals.json' with { type: 'json' };
import techniques from '#seeds/vocabulary/techniques.json' with { type: 'json' };
import type { AllFilterCounts, EntryFilter } from '#shared/contracts/entry-search.ts';
import type { Vocabulary } from '#shared/contracts/vocabulary.ts';
import { metalChoices } from '#client/features/entries/metal-choices.ts';
import { methodChoices } from '#client/features/entries/method-choices.ts';
import { namesOfSpecies, speciesOf } from '#client/features/entries/species-names.ts';
import { spokenSentence } from '#client/features/entries/spoken-sentence.ts';
import { stepChoices, typedStep } from '#client/features/entries/step-choices.ts';
import { counts as few } from './search-server.ts';

const desorption = '2N* <=> N2 + 2*';
const vocabulary = {
  metals: metals.terms, facets: [], techniques: techniques.terms, supports: [], stepClasses: stepClasses.terms,
  steps: [{ code: desorption, label: '2N* -> N2 + 2*', synonyms: [], data: { class: 'associative-desorption' } }],
} as unknown as Vocabulary;
const count = (value: string, n: number, label = value) => ({ value, label, count: n });
const counts: AllFilterCounts = {
  ...few,
  step: [count(desorption, 103, '2N* -> N2 + 2*'), count('H* + NH2* <=> NH3* + *', 67, 'NH2* + H* -> NH3* + *')],
  stepClass: [count('dehydrogenation', 149)], species: [count('NH3', 166)], bond: [count('N-H', 175)], cleavage: [count('hydrogen-assisted', 3)],
  metal: [count('Ru', 111), count('Ni', 79), count('Pt', 36), count('Cu', 37)], formula: [count('Ru', 111), count('Ni', 79), count('Ni3Fe', 6)], contains: [count('Ni', 94)],
  methodClass: [count('measured', 207), count('computed', 266)], methodFamily: [count('desorption', 65)], method: [count('TPD', 46, 'temperature-programmed desorption')],
};
const source = (filter: EntryFilter) => ({ filter, counts, vocabulary });

describe('elementary steps', () => {
  it('are offered by equation, class, species, bond and cleavage, each with its count', () => {
    const { options } = stepChoices(source({}));
    expect(options.filter(({ deep }) => !deep).map(({ value, count: n, section }) => [section, value, n])).toEqual([
      ['by equation', `step:${desorption}`, 103], ['by equation', 'step:H* + NH2* <=> NH3* + *', 67], ['by class', 'stepClass:dehydrogenation', 149],
      ['by species', 'species:NH3', 166], ['by bond', 'bond:N-H', 175], ['by bond', 'cleavage:hydrogen-assisted', 3],
    ]);
    expect(options[0]?.also).toMatch(/recombination.*dissociative adsorption.*nitrogen/);
  });

  it('can be asked for by a class that nothing is known of', () => {
    expect(stepChoices(source({})).options.find(({ value }) => value === 'stepClass:isomerisation')).toMatchObject({ count: 0, deep: true });
    expect(metalChoices(source({})).options.find(({ value }) => value === 'metal:Au')).toMatchObject({ count: 0, deep: true });
  });

  it('set the filter that a choice belongs to and leave the others as they are chosen', () => {
    const { chosen, change } = stepChoices(source({ stepClass: ['dehydrogenation'] }));
    expect(chosen).toEqual(['stepClass:dehydrogenation']);
    expect(change([...chosen, 'bond:N-H'], 'bond:N-H')).toEqual({ step: undefined, stepClass: ['dehydrogenation'], species: undefined, bond: ['N-H'], cleavage: undefined });
    expect(change([], undefined)).toEqual({ step: undefined, stepClass: undefined, species: undefined, bond: undefined, cleavage: undefined });
  });

  it.each<[EntryFilter, string | null]>([
    [{}, null],
    [{ step: [desorption] }, '2N* -> N2 + 2*'],
    [{ step: [desorption, 'x'] }, '2 elementary steps'],
    [{ stepClass: ['dehydrogenation'], species: ['NH3'], bond: ['N-H'] }, 'dehydrogenation with NH3 at the N–H bond'],
    [{ cleavage: ['hydrogen-assisted'] }, 'any step by hydrogen assisted cleavage'],
    [{ species: ['N2', 'NH3'] }, 'any step with N2 or NH3'],
  ])('%o in words', (filter, words) => {
    expect(stepChoices(source(filter)).words).toBe(words);
  });

  it.each<[string, string | null, string, boolean]>([
    ['N2 + 2* -> 2N*', desorption, `step:${desorption}`, true],
    ['N2 + 2* -> 2N*', null, 'step:N2 + 2* -> 2N*', true],
    ['nitrogen recombination', null, 'step:nitrogen recombination', false],
  ])('%s typed, read as %s', (typed, key, value, first) => {
    const own = typedStep(typed, stepChoices(source({})).options, key);
    expect([own?.option.value, own?.first]).toEqual([value, first]);
  });

  it('keep what is chosen though nothing counts it, so that it can be taken back', () => {
    expect(stepChoices(source({ step: ['CO* + * -> C* + O*'] })).options.at(-1)).toMatchObject({ value: 'step:CO* + * -> C* + O*', section: 'chosen' });
  });

  it.each([['N* + N* -> N2 + 2*', ['N', 'N2']], ['2ND3(g) <=> N2 + 3D2', ['NH3', 'N2', 'H2']], ['[15N]2 + 2* -> 2[15N]*', ['N2', 'N']]])('species of %s', (equation, formulas) => {
    expect(speciesOf(equation)).toEqual(formulas);
  });

  it('know every species of the vocabulary by its name', () => {
    const missing = species.terms.filter(({ code, label, synonyms }) => ![label, ...synonyms].some((name) => namesOfSpecies(code).split(', ').includes(name)));
    expect(missing.map(({ code }) => code)).toEqual([]);
  });
});

describe('materials', () => {
  it('come one by one, in groups, as alloys and with all their alloys', () => {
    const { options } = metalChoices(source({}));
    const find = (value: string) => options.find((option) => option.value === value);
    expect(find('metal:Ru')).toMatchObject({ count: 111, group: 'ruthenium' });
    expect(find('group:noble')).toMatchObject({ count: 147, label: 'noble metals' });
    expect(find('group:coinage')).toMatchObject({ count: 37, group: 'Cu, Ag, Au' });
    expect(find('formula:Ni3Fe')).toMatchObject({ count: 6 });
    expect(find('contains:Ni')).toMatchObject({ count: 94, label: 'Ni and its alloys' });
  });

  const change = (filter: EntryFilter, toggled: string) => {
    const { chosen, change: changed } = metalChoices(source(filter));
    return changed(chosen.includes(toggled) ? chosen.filter((one) => one !== toggled) : [...chosen, toggled], toggled);
  };

  it.each<[string, EntryFilter, string, Partial<EntryFilter>]>([
    ['a second metal is OR', { metal: ['Ru'] }, 'metal:Ni', { metal: ['Ru', 'Ni'], formula: undefined, contains: undefined }],
    ['a group adds all of it', { metal: ['Ru'] }, 'group:coinage', { metal: ['Ru', 'Cu', 'Ag', 'Au'], formula: undefined, contains: undefined }],
    ['a chosen group is taken back whole', { metal: ['Cu', 'Ag', 'Au', 'Ru'] }, 'group:coinage', { metal: ['Ru'], formula: undefined, contains: undefined }],
    ['an alloy beside metals makes all of them formulas, since filters are AND', { metal: ['Ru'] }, 'formula:Ni3Fe', { metal: undefined, formula: ['Ru', 'Ni3Fe'], contains: undefined }],
    ['without the alloy they are metals again', { formula: ['Ru', 'Ni3Fe'] }, 'formula:Ni3Fe', { metal: ['Ru'], formula: undefined, contains: undefined }],
    ['a metal and its alloys stands alone', { metal: ['Ru'] }, 'contains:Ni', { metal: undefined, formula: undefined, contains: ['Ni'] }],
    ['and gives way to a metal', { contains: ['Ni'] }, 'metal:Ru', { metal: ['Ru'], formula: undefined, contains: undefined }],
  ])('%s', (_, filter, toggled, expected) => {
    expect(change(filter, toggled)).toEqual(expected);
  });

  it.each<[EntryFilter, string]>([
    [{ metal: ['Ru', 'Ni'] }, 'Ru, Ni'],
    [{ metal: ['Cu', 'Ag', 'Au'] }, 'coinage metals'],
    [{ metal: ['Ru', 'Ni', 'Co', 'Fe', 'Pt', 'Pd'] }, '6 metals'],
    [{ formula: ['Ru', 'Ni3Fe'] }, 'Ru, Ni3Fe'],
    [{ contains: ['Ni'] }, 'Ni and its alloys'],
    [{ metal: ['Ru'], contains: ['Ni'] }, 'Ru, among Ni and its alloys'],
  ])('%o in words', (filter, words) => {
    expect(metalChoices(source(filter)).words).toBe(words);
  });
});

describe('methods', () => {
  it.each<[string, EntryFilter, string, Partial<EntryFilter>]>([
    ['measured', {}, 'method:measured', { method: ['measured'], methodFamily: undefined, methodClass: undefined }],
    ['a family in the place of a technique', { method: ['TPD'] }, 'methodFamily:desorption', { method: undefined, methodFamily: ['desorption'], methodClass: undefined }],
    ['a technique in the place of a family', { methodFamily: ['desorption'] }, 'method:TPD', { method: ['TPD'], methodFamily: undefined, methodClass: undefined }],
  ])('%s', (_, filter, toggled, expected) => {
    const { chosen, change } = methodChoices(source(filter));
    expect(change([...chosen, toggled], toggled)).toEqual(expected);
  });

  it('say a class that came by a link of its own', () => {
    expect(methodChoices(source({ methodClass: ['computed'] })).words).toBe('any computed method');
    expect(methodChoices(source({ methodFamily: ['desorption'] })).words).toBe('desorption methods');
  });
});

describe('the whole sentence', () => {
  it.each<[EntryFilter, string]>([
    [
      { kind: ['activation-energy'], stepClass: ['dehydrogenation'], bond: ['N-H'], metal: ['Ni'], site: ['step-edge'], method: ['measured'], validAt: 700 },
      'Show activation energies for dehydrogenation at the N–H bond on Ni by any measured method, valid at 700 K, at sites step edge.',
    ],
    [
      { validFrom: 500, validTo: 700, promoter: ['none'], support: ['MgO'], hasUncertainty: true, author: ['Vantongeren'], collection: ['c1'] },
      'Show all entries for any elementary step on any surface by any method, valid over 500 to 700 K, supported on MgO, with no promoter, with a known standard uncertainty, kept in My list, written by Vantongeren.',
    ],
  ])('%o', (filter, sentence) => {
    expect(spokenSentence(filter, vocabulary, counts, [{ id: 'c1', name: 'My list' }])).toBe(sentence);
  });
});
