/** One use of a calculator with figures known in another way. */
export interface CalculatorCase {
  name: string;
  input: Record<string, unknown>;
  /** By place in the result, `factors.zeroPoint`; numbers within 1e-12. */
  expected: Record<string, unknown>;
  /** How the figures are known. */
  by: string;
}

const pocket = 'by hand from the formula with CODATA 2022, a second program';

/** Peaks of first-order desorption with E = 130 kJ/mol and ν = 1e13 s-1: β = (ν R T²/E) exp(-E/RT). */
const heatingRates = [480, 490, 500, 510].map((peakTemperatureK) => ({ peakTemperatureK, heatingRateKPerS: ((1e13 * 8.31446261815324 * peakTemperatureK ** 2) / 130_000) * Math.exp(-130_000 / (8.31446261815324 * peakTemperatureK)) }));

/** Every calculator at least once; each way of a calculator that has several. */
export const calculatorCases: readonly CalculatorCase[] = [
  { name: 'parse-value', input: { text: '26.4(12)', unit: 'kJ/mol' }, expected: { value: 26.4, standardUncertainty: 1.2, uncertaintyKind: 'standard', uncertaintyScale: 'linear', significantDigits: 3, bound: '=', unit: 'kJ/mol', low: null, high: null, reportedMinus: null, reportedPlus: null, reportedUncertainty: 1.2 }, by: 'JCGM 100:2008 (GUM) 7.2.2' },
  { name: 'parse-value', input: { text: '24–27' }, expected: { value: null, low: 24, high: 27, bound: 'range' }, by: 'as printed' },
  { name: 'parse-step', input: { text: 'CO* + * -> C* + O*' }, expected: { class: 'dissociation', gasOrder: 0, surfaceOrder: 2, 'reactants.length': 2, 'products.length': 2 }, by: 'as printed' },
  { name: 'energy', input: { value: 1, from: 'eV', to: 'kJ/mol', standardUncertainty: 0.01 }, expected: { value: 96.48533212331, unit: 'kJ/mol', standardUncertainty: 0.9648533212331 }, by: 'CODATA 2022, Faraday constant 96 485.332 12… C mol-1' },
  { name: 'rate-constant', input: { value: 1e-11, from: 'cm3 molecule-1 s-1', to: 'm3 mol-1 s-1' }, expected: { value: 6022140.76, unit: 'm3 mol-1 s-1', standardUncertainty: null }, by: '1e-11 × 1e-6 × N_A' },
  { name: 'rate-constant', input: { value: 2, from: 'cm2 molecule-1 s-1', to: 's-1', siteDensityPerM2: 1e19, standardUncertainty: 0.2 }, expected: { value: 2e15, standardUncertainty: 2e14 }, by: '2 × 1e15 sites per cm2' },
  { name: 'arrhenius', input: { preExponential: 1e13, energyKJPerMol: 72.4, temperatureK: 300, uLnPreExponential: 0.5, uEnergyKJPerMol: 0, correlation: 0 }, expected: { k: 2.479056039812485, lnK: 0.9078778586113759, localEnergyKJPerMol: 72.4, uLnK: 0.5 }, by: 'reference case A000' },
  { name: 'arrhenius', input: { preExponential: 1e13, exponent: 0, referenceTemperatureK: 1, energyKJPerMol: 0, temperatureK: 300, uLnPreExponential: 0.3, uEnergyKJPerMol: 0.2 }, expected: { k: 1e13, uLnK: null, 'uLnKRange.0': 0.3 - 200 / (8.31446261815324 * 300), 'uLnKRange.1': 0.3 + 200 / (8.31446261815324 * 300) }, by: pocket },
  { name: 'change-basis', input: { preExponential: 1e7, exponent: 0.5, referenceTemperatureK: 1, energyKJPerMol: 35, gasOrder: 1, from: 'concentration', to: 'pressure' }, expected: { preExponential: 1202723.5504272606, exponent: -0.5, referenceTemperatureK: 1, energyKJPerMol: 35 }, by: '1e7/R' },
  { name: 'two-temperature', input: { k1: 1e-3, temperature1K: 298.15, k2: 2e-3, temperature2K: 308.15 }, expected: { energyKJPerMol: 52.94886216572006, lnPreExponential: 14.451575089972575, preExponential: Math.exp(14.451575089972575) }, by: 'a rate that doubles over ten kelvin: R ln 2/(1/298.15 - 1/308.15)' },
  { name: 'eyring', input: { direction: 'to-arrhenius', enthalpyKJPerMol: 0, entropyJPerMolK: 0, temperatureK: 298.15, phase: 'surface', molecularity: 1 }, expected: { k: 6212437991620.116, preExponential: 16887157303049.566, energyKJPerMol: 2.478957029602388, gibbsKJPerMol: 0, unit: 's-1' }, by: 'k_B T/h at 298.15 K, e k_B T/h and RT' },
  { name: 'eyring', input: { direction: 'to-eyring', preExponential: 16887157303049.566, energyKJPerMol: 2.478957029602388 + 50, temperatureK: 298.15, phase: 'surface', molecularity: 1, transmission: 1 }, expected: { enthalpyKJPerMol: 50, gibbsKJPerMol: 50 }, by: 'the inverse: 50 kJ/mol more' },
  { name: 'fit', input: { points: [500, 1000].map((temperatureK) => ({ temperatureK, k: Math.exp(20 - 5000 / temperatureK) })), weights: 'none', covariance: 'scaled' }, expected: { lnPreExponential: 20, energyKJPerMol: 5 * 8.31446261815324, n: 2, degreesOfFreedom: 0, uLnPreExponential: null, uEnergyKJPerMol: null, ciEnergyKJPerMol: null, residualSd: null }, by: 'a line through two points: ln k = 20 - 5000/T' },
  { name: 'desorption', input: { method: 'peak', peakTemperatureK: 500, heatingRateKPerS: 2, order: 1, preExponential: 1e13 }, expected: { energyKJPerMol: 132.98839354875386 }, by: 'E/RT² = (ν/β) exp(-E/RT) solved by repeated substitution in a second program' },
  { name: 'desorption', input: { method: 'peak', peakTemperatureK: 500, heatingRateKPerS: 2, order: 2, preExponential: 2e13, initialCoverage: 0.5 }, expected: { energyKJPerMol: 132.98839354875386 }, by: 'the same equation with ν θ0 for ν: half the coverage is left at the peak' },
  { name: 'desorption', input: { method: 'heating-rates', points: heatingRates }, expected: { energyKJPerMol: 130, lnPreExponential: Math.log(1e13) }, by: 'peaks made with E = 130 kJ/mol and ν = 1e13 s-1' },
  { name: 'pool', input: { values: [{ value: 10, u: 1 }, { value: 12, u: 2 }], model: 'fixed', interval: 'normal' }, expected: { mean: 10.4, standardError: 0.8944271909999159, q: 0.8, i2Percent: 0, 'interval.0': 10.4 - 1.959963984540054 * 0.8944271909999159, 'interval.1': 10.4 + 1.959963984540054 * 0.8944271909999159, predictionInterval: null }, by: 'weights 1 and 1/4' },
  { name: 'pool', input: { values: [{ value: 72.4, u: 1 }, { value: 73.1, u: 1.2 }] }, expected: { model: 'reml', intervalKind: 'hartung-knapp', mean: 72.68688524590164, tau2: 0 }, by: 'reference case P-two-agree' },
  { name: 'site-density', input: { structure: 'fcc', facet: '111', aAngstrom: 3.52 }, expected: { perM2: 1.8638632140677485e19, perCm2: 1.8638632140677485e15, molPerM2: 3.0950176828277064e-5 }, by: 'reference case S-Ni-111' },
  { name: 'collision', input: { molarMassGPerMol: 28.014, temperatureK: 300, pressurePa: 1, siteDensityPerM2: 1e19, sticking: 0.5 }, expected: { fluxPerM2S: 2.874059045473965e22, kAdsPerPaS: 1437.0295227369825 }, by: pocket },
  { name: 'kie', input: { method: 'arrhenius-pair', preExponentialLight: 1e13, energyLightKJPerMol: 70, preExponentialHeavy: 1e13, energyHeavyKJPerMol: 75, temperatureK: 300 }, expected: { kie: 7.422673117404362 }, by: 'exp(5000/RT)' },
  { name: 'kie', input: { method: 'zero-point', wavenumberLightPerCm: 2900, wavenumberHeavyPerCm: 2100, temperatureK: 200 }, expected: { kie: 17.770748360947728 }, by: 'reference case K000' },
  { name: 'kie', input: { method: 'bigeleisen-mayer', reactantLightPerCm: [2900, 1200], reactantHeavyPerCm: [2900, 1200], transitionLightPerCm: [800], transitionHeavyPerCm: [800], imaginaryLightPerCm: 1100, imaginaryHeavyPerCm: 1000, temperatureK: 300 }, expected: { kie: 1.1, 'factors.imaginaryRatio': 1.1, 'factors.productRule': 1, 'factors.excitation': 1, 'factors.zeroPoint': 1 }, by: 'equal modes leave the ratio of the imaginary wavenumbers' },
  { name: 'kie', input: { method: 'swain-schaad', kie: 3.3 }, expected: { kie: 5.593673346550954 }, by: 'reference case K063: 3.3^1.442' },
  { name: 'tunnelling', input: { model: 'wigner', imaginaryPerCm: 1000, temperatureK: 300 }, expected: { kappa: 1.958369862611097 }, by: '1 + u²/24 with u = hcν/k_B T' },
  { name: 'tunnelling', input: { model: 'bell-1935', imaginaryPerCm: 1400, temperatureK: 300, energyKJPerMol: 30 }, expected: { kappa: 19.138153183642473 }, by: 'reference case K044' },
  { name: 'tunnelling', input: { model: 'bell-1959', imaginaryPerCm: 1400, temperatureK: 300, energyKJPerMol: 30 }, expected: { kappa: 18.01692095915481 }, by: 'reference case K044, checked by quadrature' },
  { name: 'uncertainty', input: { kind: 'expanded', value: 3, coverageFactor: 2 }, expected: { standardUncertainty: 1.5 }, by: 'GUM 6.2.1' },
  { name: 'uncertainty', input: { kind: 'confidence', halfWidth: 1.959963984540054, level: 0.95 }, expected: { standardUncertainty: 1 }, by: 'normal quantile' },
  { name: 'uncertainty', input: { kind: 'confidence', halfWidth: 4, level: 0.95, degreesOfFreedom: 10 }, expected: { standardUncertainty: 1.7952202558804624 }, by: 'reference case U029' },
  { name: 'uncertainty', input: { kind: 'rectangular', halfWidth: 3 }, expected: { standardUncertainty: Math.sqrt(3) }, by: 'GUM 4.3.7' },
  { name: 'uncertainty', input: { kind: 'triangular', halfWidth: 6 }, expected: { standardUncertainty: Math.sqrt(6) }, by: 'GUM 4.3.9' },
  { name: 'uncertainty', input: { kind: 'factor', factor: 10, level: 0.95 }, expected: { standardUncertainty: Math.LN10 / 1.959963984540054 }, by: 'ln 10 over the normal quantile' },
  { name: 'bond-order', input: { form: 'early', process: 'dissociation', dissociationEnergy: 257, heatA: 171, heatB: 115, from: 'gas', unit: 'kcal/mol' }, expected: { barrier: 39.75874125874125, reactionEnergy: -29, reverseBarrier: 68.75874125874125, unit: 'kcal/mol' }, by: 'CO on Ni(111), 257 - 286 + 171 × 115/286' },
  { name: 'bond-order', input: { form: 'interpolated', interpolation: 0.5, process: 'exchange', dissociationEnergy: 100, formedBondEnergy: 80, heatA: 60, heatB: 20, heatC: 40, heatAB: 30, from: 'adsorbed', unit: 'kJ/mol' }, expected: { reactionEnergy: 10, barrier: 12.5, reverseBarrier: 2.5 }, by: 'ΔH = 20 + 30 + 40 - 60 - 20 = 10, P = 15, (10 + 15)/2' },
  { name: 'reverse', input: { energyForwardKJPerMol: 72.4, reactionEnthalpyKJPerMol: -25, preExponentialForward: 1e13, exponentForward: 0, reactionEntropyJPerMolK: -12.5, gasMoleChange: 0, standardPressurePa: 1e5, temperatureK: 500 }, expected: { energyReverseKJPerMol: 97.4, preExponentialReverse: 44969727043968.766, kReverse: 3004.768737080689 }, by: 'reference case T017' },
  { name: 'reverse', input: { energyForwardKJPerMol: 30, reactionEnthalpyKJPerMol: 30 }, expected: { energyReverseKJPerMol: 0 }, by: '30 - 30' },
  { name: 'profile', input: { steps: [{ barrierKJPerMol: 50, reactionEnergyKJPerMol: 20 }, { barrierKJPerMol: 40, reactionEnergyKJPerMol: -60, times: 1 }], quantity: 'electronic' }, expected: { highestKJPerMol: 60, highestStep: 2, spanKJPerMol: undefined, turnoverPerS: undefined }, by: '20 + 40' },
  { name: 'profile', input: { steps: [{ barrierKJPerMol: 50, reactionEnergyKJPerMol: 20 }, { barrierKJPerMol: 40, reactionEnergyKJPerMol: -60 }], cyclic: true, quantity: 'gibbs', temperatureK: 298.15 }, expected: { spanKJPerMol: 60, turnoverPerS: 6212437991620.116 * Math.exp(-60_000 / (8.31446261815324 * 298.15)) }, by: 'the start and the second transition state; k_B T/h exp(-δE/RT)' },
];

/** Names of inputs and outputs in the table of the HTTP interface; a name with `?` need not be given, or need not be there. */
export const interfaceTable: Readonly<Record<string, { inputs: readonly string[]; outputs: readonly string[] }[]>> = {
  'parse-value': [{ inputs: ['text', 'unit?'], outputs: ['value', 'low', 'high', 'bound', 'reportedUncertainty', 'reportedMinus', 'reportedPlus', 'uncertaintyKind', 'uncertaintyScale', 'standardUncertainty', 'significantDigits', 'unit'] }],
  energy: [{ inputs: ['value', 'from', 'to', 'standardUncertainty?'], outputs: ['value', 'unit', 'standardUncertainty'] }],
  'rate-constant': [{ inputs: ['value', 'from', 'to', 'temperatureK?', 'siteDensityPerM2?', 'standardUncertainty?'], outputs: ['value', 'unit', 'assumptions'] }],
  arrhenius: [{ inputs: ['preExponential', 'exponent?', 'referenceTemperatureK?', 'energyKJPerMol', 'temperatureK', 'uLnPreExponential?', 'uEnergyKJPerMol?', 'correlation?'], outputs: ['k', 'lnK', 'localEnergyKJPerMol', 'uLnK', 'uLnKRange?'] }],
  'change-basis': [{ inputs: ['preExponential', 'exponent?', 'referenceTemperatureK?', 'energyKJPerMol', 'gasOrder', 'from', 'to'], outputs: ['preExponential', 'exponent', 'referenceTemperatureK', 'energyKJPerMol'] }],
  'two-temperature': [{ inputs: ['k1', 'temperature1K', 'k2', 'temperature2K'], outputs: ['preExponential', 'lnPreExponential', 'energyKJPerMol'] }],
  eyring: [
    { inputs: ['direction=to-arrhenius', 'enthalpyKJPerMol', 'entropyJPerMolK', 'temperatureK', 'phase', 'molecularity', 'transmission?', 'standardState?'], outputs: ['k', 'preExponential', 'energyKJPerMol', 'gibbsKJPerMol', 'unit'] },
    { inputs: ['direction=to-eyring', 'preExponential', 'energyKJPerMol', 'temperatureK', 'phase', 'molecularity', 'transmission?', 'standardState?'], outputs: ['enthalpyKJPerMol', 'entropyJPerMolK', 'gibbsKJPerMol'] },
  ],
  fit: [{ inputs: ['points', 'weights?', 'covariance?'], outputs: ['preExponential', 'lnPreExponential', 'energyKJPerMol', 'uLnPreExponential', 'uEnergyKJPerMol', 'correlation', 'ciLnPreExponential', 'ciEnergyKJPerMol', 'residualSd', 'rSquared', 'n', 'degreesOfFreedom', 'warnings'] }],
  desorption: [
    { inputs: ['method=peak', 'peakTemperatureK', 'heatingRateKPerS', 'order', 'preExponential', 'initialCoverage?'], outputs: ['energyKJPerMol'] },
    { inputs: ['method=heating-rates', 'points'], outputs: ['energyKJPerMol', 'preExponential'] },
  ],
  pool: [{ inputs: ['values', 'model?', 'interval?'], outputs: ['mean', 'standardError', 'tau2', 'q', 'i2Percent', 'interval', 'predictionInterval'] }],
  'site-density': [{ inputs: ['structure', 'facet', 'aAngstrom'], outputs: ['perM2', 'perCm2', 'molPerM2'] }],
  collision: [{ inputs: ['molarMassGPerMol', 'temperatureK', 'pressurePa?', 'siteDensityPerM2?', 'sticking?'], outputs: ['fluxPerM2S?', 'kAdsPerPaS?'] }],
  kie: [
    { inputs: ['method=arrhenius-pair', 'preExponentialLight', 'energyLightKJPerMol', 'preExponentialHeavy', 'energyHeavyKJPerMol', 'temperatureK'], outputs: ['kie'] },
    { inputs: ['method=zero-point', 'wavenumberLightPerCm', 'wavenumberHeavyPerCm', 'temperatureK'], outputs: ['kie'] },
    { inputs: ['method=bigeleisen-mayer', 'reactantLightPerCm', 'reactantHeavyPerCm', 'transitionLightPerCm', 'transitionHeavyPerCm', 'imaginaryLightPerCm', 'imaginaryHeavyPerCm', 'temperatureK'], outputs: ['kie', 'factors'] },
    { inputs: ['method=swain-schaad', 'kie', 'exponent?'], outputs: ['kie'] },
  ],
  tunnelling: [{ inputs: ['model', 'imaginaryPerCm', 'temperatureK', 'energyKJPerMol?'], outputs: ['kappa'] }],
  uncertainty: [
    { inputs: ['kind=expanded', 'value', 'coverageFactor'], outputs: ['standardUncertainty'] },
    { inputs: ['kind=confidence', 'halfWidth', 'level', 'degreesOfFreedom?'], outputs: ['standardUncertainty'] },
    { inputs: ['kind=rectangular', 'halfWidth'], outputs: ['standardUncertainty'] },
    { inputs: ['kind=triangular', 'halfWidth'], outputs: ['standardUncertainty'] },
    { inputs: ['kind=factor', 'factor', 'level'], outputs: ['standardUncertainty'] },
  ],
  'bond-order': [
    { inputs: ['process=dissociation', 'form', 'interpolation?', 'dissociationEnergy', 'heatA', 'heatB', 'heatAB?', 'from', 'unit'], outputs: ['barrier', 'reverseBarrier', 'reactionEnergy', 'unit'] },
    { inputs: ['process=exchange', 'form', 'interpolation?', 'dissociationEnergy', 'formedBondEnergy', 'heatA', 'heatB?', 'heatC', 'heatAB?', 'from', 'unit'], outputs: ['barrier', 'reverseBarrier', 'reactionEnergy', 'unit'] },
  ],
  reverse: [{ inputs: ['energyForwardKJPerMol', 'reactionEnthalpyKJPerMol', 'preExponentialForward?', 'exponentForward?', 'reactionEntropyJPerMolK?', 'gasMoleChange?', 'standardPressurePa?', 'temperatureK?'], outputs: ['energyReverseKJPerMol', 'preExponentialReverse?', 'kReverse?'] }],
  'parse-step': [{ inputs: ['text'], outputs: ['key', 'variantKey', 'equation', 'direction', 'class', 'reactants', 'products', 'gasOrder', 'surfaceOrder'] }],
  profile: [{ inputs: ['steps', 'cyclic?', 'quantity', 'temperatureK?'], outputs: ['states', 'highestKJPerMol', 'highestStep', 'spanKJPerMol?', 'turnoverPerS?'] }],
};

/** What stands at a place of a result, `interval.0`. */
export function partAt(result: unknown, place: string): unknown {
  return place.split('.').reduce<unknown>((value, name) => (value as Record<string, unknown> | null | undefined)?.[name], result);
}
