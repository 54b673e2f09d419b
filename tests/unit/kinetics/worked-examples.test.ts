import { describe, expect, it } from 'vitest';
import { fitLine } from '#shared/kinetics/least-squares.ts';
import { findUnit } from '#shared/kinetics/units.ts';
import { run } from './reference-measure.ts';

/**
 * The figure as far as the source prints it, and no further: `1.23` is rounded, `1.23…` cut off, `1.23(4)` known to ± 0.04.
 */
function expectPrinted(actual: unknown, printed: string): void {
  const [, digits = '', decimals = '', mark = '', exponent = '0'] = /^(-?\d+)(?:\.(\d+))?(…|\(\d+\))?(?:e(-?\d+))?$/.exec(printed) ?? [];
  const last = 10 ** (Number(exponent) - decimals.length);
  const wanted = Number(`${digits}.${decimals || '0'}e${exponent}`);
  const allowed = mark === '' ? 0.5 * last : mark === '…' ? last : Number(mark.slice(1, -1)) * last;
  expect(Math.abs(Number(actual) - wanted), `${String(actual)} against ${printed}`).toBeLessThanOrEqual(allowed * (1 + 1e-9));
}

describe('JCGM 100:2008 (GUM)', () => {
  // H.3, calibration of a thermometer: table H.6, reference temperature 20 °C; results in H.3.3 to H.3.4.
  it('H.3, the line of a calibration', () => {
    const t = [21.521, 22.012, 22.512, 23.003, 23.507, 23.999, 24.513, 25.002, 25.503, 26.01, 26.511];
    const b = [-0.171, -0.169, -0.166, -0.159, -0.164, -0.165, -0.156, -0.157, -0.159, -0.161, -0.16];
    const line = fitLine(t.map((one) => one - 20), b);
    const variance = line.rss / (t.length - 2);
    expectPrinted(line.intercept, '-0.1712');
    expectPrinted(line.slope, '0.00218');
    expectPrinted(Math.sqrt(variance), '0.0035');
    expectPrinted(Math.sqrt(variance * (1 / t.length + line.meanX ** 2 / line.spread)), '0.0029');
    expectPrinted(Math.sqrt(variance / line.spread), '0.00067');
    expectPrinted(-line.meanX / Math.sqrt(line.spread * (1 / t.length + line.meanX ** 2 / line.spread)), '-0.930');
    // H.3.4: the correction at 30 °C with its combined standard uncertainty.
    expectPrinted(line.intercept + 10 * line.slope, '-0.1494');
    expectPrinted(Math.sqrt(variance * (1 / t.length + (10 - line.meanX) ** 2 / line.spread)), '0.0041');
  });

  it.each([
    ['4.3.3, a mass certified at three standard deviations [µg]', { kind: 'expanded', value: 240, coverageFactor: 3 }, '80'],
    ['4.3.4, a resistor certified at 99 % [µΩ]', { kind: 'confidence', halfWidth: 129, level: 0.99 }, '50'],
    ['4.3.7, an expansion coefficient with smallest and largest value [1e-6 °C-1]', { kind: 'rectangular', halfWidth: 0.4 }, '0.23'],
  ])('%s', (_what, input, u) => {
    expectPrinted(run('uncertainty', input).standardUncertainty, u);
  });

  it('7.2.2, a mass with its standard uncertainty in parentheses', () => {
    expect(run('parse-value', { text: '100.02147(35)', unit: 'g' })).toMatchObject({ value: 100.02147, standardUncertainty: 0.00035, uncertaintyKind: 'standard', significantDigits: 8 });
  });

  // Annex G, table G.2: coverage factors of Student's distribution.
  it.each([[1, '12.71', '63.66'], [2, '4.30', '9.92'], [5, '2.57', '4.03'], [10, '2.23', '3.17'], [20, '2.09', '2.85'], [50, '2.01', '2.68']])('table G.2, %d degrees of freedom', (degreesOfFreedom, t95, t99) => {
    expectPrinted(1 / Number(run('uncertainty', { kind: 'confidence', halfWidth: 1, level: 0.95, degreesOfFreedom }).standardUncertainty), t95);
    expectPrinted(1 / Number(run('uncertainty', { kind: 'confidence', halfWidth: 1, level: 0.99, degreesOfFreedom }).standardUncertainty), t99);
  });
});

describe('NIST SP 811 (2008), appendix B', () => {
  it.each([
    ['cal', '4.184'], ['kcal', '4.184e3'], ['Btu_IT', '1.055056e3'], ['Btu_th', '1.054350e3'], ['atm', '1.01325e5'], ['Torr', '1.333224e2'], ['mmHg', '1.333224e2'],
    ['psi', '6.894757e3'], ['lb', '4.535924e-1'], ['bar', '1e5'], ['angstrom', '1e-10'], ['h', '3.6e3'], ['d', '8.64e4'], ['L', '1e-3'],
  ])('%s is %s of its SI unit', (unit, factor) => {
    expectPrinted(findUnit(unit)?.toSi, factor);
  });
});

describe('CODATA 2022', () => {
  const energy = (value: number, from: string, to: string): unknown => run('energy', { value, from, to }).value;
  // Energy equivalents; Faraday constant, Hartree energy in eV, second radiation constant.
  it.each([
    ['eV', 'kJ/mol', '96.48533212…'], ['eV', 'cm-1', '8065.543937…'], ['eV', 'K', '11604.51812…'], ['hartree', 'eV', '27.211386245981(30)'], ['hartree', 'cm-1', '219474.63136314(24)'],
    ['hartree', 'K', '315775.02480398(34)'], ['K', 'cm-1', '0.6950348004…'], ['K', 'eV', '8.617333262…e-5'], ['cm-1', 'K', '1.438776877…'], ['cm-1', 'eV', '1.239841984…e-4'],
  ])('1 %s is %s of %s', (from, to, printed) => {
    expectPrinted(energy(1, from, to), printed);
  });

  // Molar volume of an ideal gas at 273.15 K: at 100 kPa and at 101.325 kPa.
  it.each([['bar-1 s-1', '22.71095464…e-3'], ['atm-1 s-1', '22.41396954…e-3']])('the molar volume is what lies between %s and m3 mol-1 s-1', (from, printed) => {
    expectPrinted(run('rate-constant', { value: 1, from, to: 'm3 mol-1 s-1', temperatureK: 273.15 }).value, printed);
  });

  it.each([[100_000, '2.651645804…e25'], [101_325, '2.686780111…e25']])('the Loschmidt constant at %d Pa is the number density of a gas', (pressurePa, printed) => {
    expectPrinted(run('collision', { molarMassGPerMol: 28.014, temperatureK: 273.15, pressurePa }).numberDensityPerM3, printed);
  });
});

describe('textbooks of physical chemistry', () => {
  // Atkins, Physical Chemistry, the example of the decomposition of acetaldehyde (data, slope -22.7 × 10³ K and intercept 27.7): from memory.
  it('an Arrhenius plot of the decomposition of acetaldehyde', () => {
    const T = [700, 730, 760, 790, 810, 840, 910, 1000];
    const k = [0.011, 0.035, 0.105, 0.343, 0.789, 2.17, 20, 145];
    const found = run('fit', { points: T.map((temperatureK, i) => ({ temperatureK, k: k[i] })), weights: 'none', covariance: 'scaled' });
    expectPrinted(found.lnPreExponential, '27.7');
    expectPrinted((Number(found.energyKJPerMol) * 1000) / 8.31446261815324 / 1000, '22.7');
    expectPrinted(found.preExponential, '1.1e12');
  });

  // Daniels and Johnston, J. Am. Chem. Soc. 43 (1921) 53, decomposition of dinitrogen pentoxide, as textbooks reprint it: from memory; E is 103 kJ/mol.
  it('an activation energy from the decomposition of dinitrogen pentoxide', () => {
    const points = [[273.15, 7.87e-7], [298.15, 3.46e-5], [308.15, 1.35e-4], [318.15, 4.98e-4], [328.15, 1.5e-3], [338.15, 4.87e-3]].map(([temperatureK, k]) => ({ temperatureK, k }));
    const found = run('fit', { points, weights: 'none', covariance: 'scaled' });
    expectPrinted(found.energyKJPerMol, '103');
  });

  // The rule that a rate doubles over ten degrees at room temperature holds for about 53 kJ/mol: common practice.
  it('a rate that doubles between 25 and 35 °C', () => {
    expectPrinted(run('two-temperature', { k1: 1, temperature1K: 298.15, k2: 2, temperature2K: 308.15 }).energyKJPerMol, '53');
  });

  // Atkins, Physical Chemistry: Z_W = Z_0 (p/Pa)/{(T/K)(M/g mol-1)}^½ with Z_0 = 2.63 × 10²⁴ m-2 s-1, about 3 × 10²⁷ for air; mean speed of N2 at 25 °C 475 m/s.
  it('collisions with a surface, and the mean speed of nitrogen', () => {
    expectPrinted(run('collision', { molarMassGPerMol: 1, temperatureK: 1, pressurePa: 1 }).fluxPerM2S, '2.63e24');
    expectPrinted(run('collision', { molarMassGPerMol: 29, temperatureK: 298.15, pressurePa: 101_325 }).fluxPerM2S, '3e27');
    expectPrinted(run('collision', { molarMassGPerMol: 28.02, temperatureK: 298.15 }).meanSpeedMPerS, '475');
  });

  // The frequency k_B T/h at 298.15 K, 6.21 × 10¹² s-1, and a tenfold rate for every 5.71 kJ/mol (1.36 kcal/mol): common practice.
  it('the universal frequency, and RT ln 10', () => {
    const k = (enthalpyKJPerMol: number): number => Number(run('eyring', { direction: 'to-arrhenius', enthalpyKJPerMol, entropyJPerMolK: 0, temperatureK: 298.15, phase: 'surface', molecularity: 1 }).k);
    expectPrinted(k(0), '6.21e12');
    const perDecade = 10 / Math.log10(k(0) / k(10));
    expectPrinted(perDecade, '5.71');
    expectPrinted(perDecade / 4.184, '1.36');
  });

  // Surface atoms of metals in 10¹⁵ cm-2 as tables of surface science give them: common practice.
  it.each([['fcc', '111', 3.524, '1.86'], ['fcc', '100', 3.524, '1.61'], ['fcc', '110', 3.524, '1.14'], ['fcc', '111', 3.924, '1.50'], ['fcc', '100', 3.615, '1.53'], ['bcc', '110', 3.165, '1.41'], ['bcc', '100', 3.165, '1.00']])('%s(%s) with a = %d Å has %s', (structure, facet, aAngstrom, printed) => {
    expectPrinted(Number(run('site-density', { structure, facet, aAngstrom }).perCm2) / 1e15, printed);
  });
});

describe('Redhead, Vacuum 12 (1962) 203', () => {
  // For first order E/RT_p = ln(ν T_p/β) - 3.64, a straight line for ν/β of 10⁸ to 10¹³ K-1, from memory; it lies within 3.5 % of the equation it stands for, and meets it where E/RT_p = e^3.64.
  const grid = [8, 9, 10, 11, 12, 13].flatMap((decades) => [150, 300, 600, 1000].map((peakTemperatureK) => ({ decades, peakTemperatureK })));
  it.each(grid)('the linear formula for ν/β = 10^$decades at $peakTemperatureK K', ({ decades, peakTemperatureK }) => {
    const heatingRateKPerS = 2;
    const preExponential = heatingRateKPerS * 10 ** decades;
    const exact = Number(run('desorption', { method: 'peak', peakTemperatureK, heatingRateKPerS, order: 1, preExponential }).energyKJPerMol);
    const linear = (8.31446261815324 * peakTemperatureK * (Math.log((preExponential * peakTemperatureK) / heatingRateKPerS) - 3.64)) / 1000;
    expect(Math.abs(linear / exact - 1)).toBeLessThanOrEqual(0.035);
  });

  it('the linear formula and the equation meet at E/RT_p = e^3.64', () => {
    const reduced = Math.exp(3.64);
    const peakTemperatureK = 500;
    const found = run('desorption', { method: 'peak', peakTemperatureK, heatingRateKPerS: 1, order: 1, preExponential: (reduced * Math.exp(reduced)) / peakTemperatureK });
    expect((Number(found.energyKJPerMol) * 1000) / (8.31446261815324 * peakTemperatureK)).toBeCloseTo(reduced, 10);
  });
});

describe('a published meta-analysis', () => {
  // Thirteen trials of the BCG vaccine, Colditz et al., JAMA 271 (1994) 698; results for the log risk ratio by Viechtbauer, J. Stat. Softw. 36(3) (2010) and the documentation of metafor: data and results from memory.
  const trials = [
    [4, 119, 11, 128], [6, 300, 29, 274], [3, 228, 11, 209], [62, 13536, 248, 12619], [33, 5036, 47, 5761], [180, 1361, 372, 1079], [8, 2537, 10, 619], [505, 87886, 499, 87892],
    [29, 7470, 45, 7232], [17, 1699, 65, 1600], [186, 50448, 141, 27197], [5, 2493, 3, 2338], [27, 16886, 29, 17825],
  ] as const;
  const values = trials.map(([a, b, c, d]) => ({ value: Math.log(a / (a + b) / (c / (c + d))), u: Math.sqrt(1 / a - 1 / (a + b) + 1 / c - 1 / (c + d)) }));

  it.each([
    ['fixed', 'normal', '-0.4303', '0.0405', null, ['-0.5097', '-0.3509']],
    ['dersimonian-laird', 'normal', '-0.7141', '0.1787', '0.3088', ['-1.0644', '-0.3638']],
    ['reml', 'normal', '-0.7145', '0.1798', '0.3132', ['-1.0669', '-0.3622']],
  ] as const)('%s with a %s interval', (model, interval, mean, standardError, tau2, ends) => {
    const found = run('pool', { values, model, interval });
    expectPrinted(found.mean, mean);
    expectPrinted(found.standardError, standardError);
    if (tau2 !== null) expectPrinted(found.tau2, tau2);
    expectPrinted(found.q, '152.2330');
    ends.forEach((end, i) => expectPrinted((found.interval as number[])[i], end));
  });
});

describe('bond-order conservation', () => {
  // Shustorovich, Surf. Sci. Rep. 6 (1986) 1: for A2 from the gas the barrier is D - (3/2) Q_A, and recombination takes Q_A/2.
  it.each([[226, 135], [119, 80], [104, 63], [104, 46]])('A2 with D = %d and Q_A = %d kcal/mol', (dissociationEnergy, heatA) => {
    const found = run('bond-order', { form: 'early', process: 'dissociation', dissociationEnergy, heatA, heatB: heatA, from: 'gas', unit: 'kcal/mol' });
    expect(found.unboundedBarrier).toBeCloseTo(dissociationEnergy - 1.5 * heatA, 10);
    expect(found.unboundedReverseBarrier).toBeCloseTo(heatA / 2, 10);
  });
});
