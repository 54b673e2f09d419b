import { describe, expect, it } from 'vitest';
import { convertQuantity } from '#shared/kinetics/quantity.ts';
import { compareWithFamily } from '#shared/kinetics/outlier.ts';
import { energiesOf, median, readAllEntries } from './demo-energies.ts';

// What is held here is common knowledge of surface science, from memory; the values themselves are invented.
const entries = readAllEntries();
const accepted = entries.filter(({ script }) => script.outcome === 'accepted');
const metals = ['Ru', 'Ni', 'Co', 'Fe', 'Rh', 'Ir', 'Pt', 'Pd', 'Cu'];
const dissociation = 'N2 + 2* -> 2N*';
const recombination = '2N* -> N2 + 2*';

describe('nitrogen', () => {
  it.each(metals)('dissociates far more easily at step edges of %s than on its terraces', (metal) => {
    const terrace = median(energiesOf(entries, { equation: dissociation, metal, site: 'terrace', computed: true }));
    const edge = median(energiesOf(entries, { equation: dissociation, metal, site: 'step-edge', computed: true }));
    expect(terrace - edge).toBeGreaterThan(40);
  });

  it('dissociates on terraces in the order Fe, Ru, Co, Ni, Ir, Pt, Cu', () => {
    const medians = ['Fe', 'Ru', 'Co', 'Ni', 'Ir', 'Pt', 'Cu'].map((metal) => median(energiesOf(entries, { equation: dissociation, metal, site: 'terrace', computed: true })));
    expect(medians).toEqual([...medians].sort((a, b) => a - b));
    expect(medians.every(Number.isFinite)).toBe(true);
  });

  it.each(['Fe', 'Ru', 'Rh', 'Ir', 'Pd', 'Pt', 'Cu', 'Ni', 'Co'])('leaves %s by second order at 90 to 220 kJ/mol', (metal) => {
    const measured = energiesOf(entries, { equation: recombination, metal, computed: false });
    expect(measured.length + energiesOf(entries, { equation: recombination, metal, computed: true }).length).toBeGreaterThan(0);
    for (const energy of measured) {
      expect(energy).toBeGreaterThan(90);
      expect(energy).toBeLessThan(220);
    }
  });

  it.each(['K', 'Cs'])('dissociates more easily on ruthenium with %s', (promoter) => {
    for (const site of ['terrace', 'step-edge']) {
      const clean = median(energiesOf(entries, { equation: dissociation, metal: 'Ru', site, energyType: 'electronic' }));
      const promoted = median(energiesOf(entries, { equation: dissociation, metal: 'Ru', site, energyType: 'electronic', promoter }));
      expect(promoted, site).toBeLessThan(clean - 8);
    }
  });
});

describe('hydrogen', () => {
  it('must climb a barrier to adsorb on copper, and hardly any on nickel, platinum, palladium and ruthenium', () => {
    for (const energy of energiesOf(entries, { equation: 'H2 + 2* -> 2H*', metal: 'Cu' })) expect(energy).toBeGreaterThan(20);
    for (const metal of ['Ni', 'Pt', 'Pd', 'Ru']) {
      const energies = energiesOf(entries, { equation: 'H2 + 2* -> 2H*', metal });
      expect(energies.length, metal).toBeGreaterThan(0);
      for (const energy of energies) expect(energy, metal).toBeLessThan(10);
    }
  });

  it('hops more easily than nitrogen', () => {
    for (const metal of ['Ru', 'Co', 'Rh', 'Pt', 'Pd', 'Cu', 'Ir']) {
      const [hydrogen, nitrogen] = ['H* + * -> * + H*', 'N* + * -> * + N*'].map((equation) => median(energiesOf(entries, { equation, metal })));
      expect(hydrogen, metal).toBeLessThan((nitrogen ?? 0) / 2);
    }
  });
});

describe('ammonia', () => {
  it('is desorbed most easily from copper', () => {
    const copper = median(energiesOf(entries, { equation: 'NH3* -> NH3 + *', metal: 'Cu' }));
    for (const metal of metals.filter((symbol) => symbol !== 'Cu')) {
      expect(median([...energiesOf(entries, { equation: 'NH3* -> NH3 + *', metal })]) > copper, metal).toBe(true);
    }
  });

  it.each(['NH3* + * -> NH2* + H*', 'NH2* + * -> NH* + H*', 'NH* + * -> N* + H*'])('loses hydrogen by %s more easily on Ru than on Pt than on Cu', (equation) => {
    const [ru, pt, cu] = ['Ru', 'Pt', 'Cu'].map((metal) => median(energiesOf(entries, { equation, metal, site: 'terrace', energyType: 'electronic' })));
    expect(ru).toBeLessThan(pt ?? Number.NaN);
    expect(pt).toBeLessThan(cu ?? Number.NaN);
  });

  it('is cracked on promoted ruthenium with lower apparent energies than on plain', () => {
    const overall = '2NH3 -> N2 + 3H2';
    const plain = median(energiesOf(entries, { equation: overall, metal: 'Ru', scope: 'apparent', support: 'MgO' }));
    for (const promoter of ['K', 'Cs', 'Ba']) {
      expect(median(energiesOf(entries, { equation: overall, metal: 'Ru', scope: 'apparent', support: 'MgO', promoter })), promoter).toBeLessThan(plain - 5);
    }
  });

  it('shows isotope effects of 1.3 to 3 for NH3 over ND3', () => {
    const effects = accepted.flatMap(({ row, input, quantities }) => quantities.filter(({ symbol }) => symbol === 'kie').map(({ value, low, high }) => {
      const inverted = input.conditions?.kieDirection === 'heavy/light';
      const size = value ?? ((low ?? 0) + (high ?? 0)) / 2;
      return { row, size: inverted ? 1 / size : size };
    }));
    expect(effects.length).toBeGreaterThanOrEqual(20);
    for (const { row, size } of effects) {
      expect(size, row).toBeGreaterThan(1.3);
      expect(size, row).toBeLessThan(3);
    }
  });
});

describe('accepted values as a whole', () => {
  it('have no negative energy, and no computed barrier below its reaction energy', () => {
    let pairs = 0;
    for (const { row, quantities } of accepted) {
      const energy = quantities.find(({ symbol }) => symbol === 'energy')?.value;
      const reaction = quantities.find(({ symbol }) => symbol === 'reactionEnergy')?.value;
      if (energy != null) expect(energy, row).toBeGreaterThanOrEqual(0);
      if (energy == null || reaction == null) continue;
      pairs += 1;
      expect(energy, row).toBeGreaterThan(reaction);
    }
    expect(pairs).toBeGreaterThan(100);
  });

  it('have first-order factors of 1e11 to 1e16 s-1', () => {
    for (const { row, quantities } of accepted) {
      for (const { symbol, unit, value } of quantities) {
        if (symbol !== 'preExponential' || unit !== 's-1' || value === null) continue;
        expect(value, row).toBeGreaterThan(1e11);
        expect(value, row).toBeLessThan(1e16);
      }
    }
  });

  it('hold no outlier of its family', () => {
    const families = new Map<string, { row: string; energy: number }[]>();
    for (const { row, input, step, quantities } of accepted) {
      const energy = quantities.find(({ symbol }) => symbol === 'energy');
      if (energy?.bound !== '=' || energy.value === null) continue;
      const { metal, formula, facet, site } = input.surface ?? {};
      const family = [step.key, step.direction, metal ?? formula, facet, site, energy.energyType, input.scope, input.conditions?.promoter].join('|');
      families.set(family, [...(families.get(family) ?? []), { row, energy: energy.value }]);
    }
    let compared = 0;
    for (const [family, members] of families) {
      for (const { row, energy } of members) {
        const result = compareWithFamily(energy, members.filter((other) => other.row !== row).map((other) => other.energy));
        if (result !== null) compared += 1;
        expect(result?.outlier ?? false, `${row} in ${family}`).toBe(false);
      }
    }
    expect(compared).toBeGreaterThan(0);
  });

  it('show the unit slip for what it is', () => {
    const slip = entries.find(({ script }) => script.mark === 'unit-slip');
    const [printed] = slip?.input.quantities ?? [];
    const energy = printed ? (convertQuantity(printed, {}).value ?? 0) : 0;
    const neighbours = energiesOf(entries, { equation: dissociation, metal: 'Co', site: 'terrace', energyType: 'electronic' });
    expect(neighbours.length).toBeGreaterThanOrEqual(5);
    expect(Math.round(Math.min(...neighbours))).toBe(121);
    expect(Math.round(Math.max(...neighbours))).toBe(152);
    expect(compareWithFamily(energy, neighbours)).toMatchObject({ outlier: true, hint: { name: expect.stringContaining('calorie for joule') } });
  });

  it('show the quoted value as another source prints it', () => {
    const quoted = entries.find(({ script }) => script.mark === 'quoted');
    const printed = quoted?.input.quantities?.[0]?.asPrinted;
    const twins = accepted.filter(({ input, sourceKey }) => sourceKey !== quoted?.sourceKey && input.quantities?.[0]?.asPrinted === printed && input.step?.equation === quoted?.input.step?.equation);
    expect(twins.map(({ sourceKey }) => sourceKey)).toEqual(['sorlie1999']);
  });
});
