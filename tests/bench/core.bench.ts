import { all, create, type FactoryFunctionMap, type Unit as MathUnit } from 'mathjs';
import { readDemoEntries } from '#seeds/demo/read-demo.ts';
import { assessEntry } from '#shared/assessment/assess-entry.ts';
import { lnRateAt, rateAt, rateEvaluator, uLnRateAt } from '#shared/kinetics/arrhenius.ts';
import { N_A, R } from '#shared/kinetics/constants.ts';
import { convertEnergy, requireEnergyUnit, scaleEnergy } from '#shared/kinetics/energy.ts';
import { fitArrhenius } from '#shared/kinetics/fit.ts';
import { energyToKJPerMol } from '#shared/kinetics/format.ts';
import { poolValues } from '#shared/kinetics/pool.ts';
import { readPrintedValue } from '#shared/kinetics/printed-value.ts';
import { convertQuantity } from '#shared/kinetics/quantity.ts';
import { convertRateConstant } from '#shared/kinetics/rate-constant.ts';
import { findUnit, scaleBetween, type Unit } from '#shared/kinetics/units.ts';
import { machineText, measure, rateText, writeSection, type Subject } from './measure.ts';

// Times the computing core beside mathjs doing the same, and writes the table to RESULTS.md beside this file.

const math = create(all as FactoryFunctionMap);
math.createUnit('molecule', `${1 / N_A} mol`);
math.createUnit('calorie', { definition: '4.184 J', prefixes: 'short', aliases: ['cal'] });

/** 1024 values of each input, so that nothing is computed once and kept. */
const size = 1024;
const mask = size - 1;
const spread = (low: number, high: number): Float64Array => Float64Array.from({ length: size }, (_, i) => low + ((high - low) * ((i * 389) & mask)) / size);
const T = spread(300, 1200);
const E = spread(20, 200);
const lnA = spread(20, 35);
const values = spread(0.1, 300);
const at = (list: ArrayLike<number>, i: number): number => list[i & mask] as number;

interface Group {
  what: string;
  /** What is done in one call, and what was prepared before the clock started. */
  timed: string;
  ours: Subject;
  peer?: Subject;
}

const evaluator = rateEvaluator({ preExponential: 1e13, exponent: 0.5, referenceTemperatureK: 300, energyKJPerMol: 72.4, uLnPreExponential: 0.4, uEnergyKJPerMol: 1.2, correlation: 0.95 });
const constant = { A: 1e13, n: 0.5, T0: 300, E: 72_400, R, uA: 0.4, uE: 1200, r: 0.95 };
const scope = new Map<string, number>(Object.entries(constant));
const kOf = math.compile('A * (T/T0)^n * exp(-E/(R*T))');
const uOf = math.compile('sqrt(uA^2 + (uE/(R*T))^2 - 2*r*uA*uE/(R*T))');
const evaluate = (code: { evaluate(scope: Map<string, number>): unknown }): number => code.evaluate(scope) as number;

const rates: Group[] = [
  {
    what: 'k(T) and u(ln k), one entry at many T', timed: 'parameters checked and expression compiled beforehand',
    ours: { name: 'rateEvaluator: k and uLnK', run: (i) => evaluator.k(at(T, i)) + (evaluator.uLnK(at(T, i)) ?? 0) },
    peer: { name: 'mathjs: compiled expressions', run: (i) => { scope.set('T', at(T, i)); return evaluate(kOf) + evaluate(uOf); } },
  },
  {
    what: 'k(T) and u(ln k), another entry each time', timed: 'ln A, E/R, T in columns',
    ours: { name: 'lnRateAt, exp, uLnRateAt', run: (i) => Math.exp(lnRateAt(at(lnA, i), 0.5, 5.7, (at(E, i) * 1000) / R, at(T, i))) + uLnRateAt(0.4, 144, 0.95, at(T, i)) },
    peer: {
      name: 'mathjs: compiled expressions',
      run: (i) => { scope.set('T', at(T, i)); scope.set('E', at(E, i) * 1000); scope.set('A', Math.exp(at(lnA, i))); return evaluate(kOf) + evaluate(uOf); },
    },
  },
  {
    what: 'k(T) and u(ln k) with derivation', timed: 'input checked, derivation lines written, each time',
    ours: { name: 'rateAt', run: (i) => rateAt({ preExponential: 1e13, exponent: 0.5, referenceTemperatureK: 300, energyKJPerMol: at(E, i), temperatureK: at(T, i), uLnPreExponential: 0.4, uEnergyKJPerMol: 1.2, correlation: 0.95 }).lnK },
  },
];

const kcal = requireEnergyUnit('kcal/mol', 'from');
const kJ = requireEnergyUnit('kJ/mol', 'to');
const mathKcal = math.unit('kcal/mol');
const mathKJ = math.unit('kJ/mol');
const cm3 = findUnit('cm3 molecule-1 s-1') as Unit;
const m3 = findUnit('m3 mol-1 s-1') as Unit;
const mathCm3 = math.unit('cm^3 / (molecule s)');
const mathM3 = math.unit('m^3 / (mol s)');
const scaled = (factor: number, unit: MathUnit): MathUnit => math.multiply(factor, unit) as unknown as MathUnit;

const conversions: Group[] = [
  {
    what: 'kcal/mol to kJ/mol, units prepared', timed: 'number in, number out; both unit objects made beforehand',
    ours: { name: 'scaleEnergy', run: (i) => scaleEnergy(at(values, i), kcal, kJ) },
    peer: { name: 'mathjs: value × unit, toNumber(unit)', run: (i) => scaled(at(values, i), mathKcal).toNumber(mathKJ as never) },
  },
  {
    what: 'cm3 molecule-1 s-1 to m3 mol-1 s-1, units prepared', timed: 'number in, number out; both unit objects made beforehand',
    ours: { name: 'scaleBetween', run: (i) => scaleBetween(at(values, i), cm3, m3) },
    peer: { name: 'mathjs: value × unit, toNumber(unit)', run: (i) => scaled(at(values, i), mathCm3).toNumber(mathM3 as never) },
  },
  {
    what: 'kcal/mol to kJ/mol, unit as text', timed: 'number and text in, number out, nothing else; ours keeps the units it has read before, mathjs reads the text each time',
    ours: { name: 'energyToKJPerMol', run: (i) => energyToKJPerMol(at(values, i), 'kcal/mol') },
    peer: { name: "mathjs: unit(value, 'kcal/mol').toNumber('kJ/mol')", run: (i) => math.unit(at(values, i), 'kcal/mol').toNumber('kJ/mol') },
  },
  {
    what: 'kcal/mol to kJ/mol with derivation', timed: 'units named by text; ours checks the input, converts an uncertainty and writes the derivation as well',
    ours: { name: 'convertEnergy', run: (i) => convertEnergy({ value: at(values, i), from: 'kcal/mol', to: 'kJ/mol', standardUncertainty: 1 }).value },
    peer: { name: "mathjs: unit(value, 'kcal/mol').toNumber('kJ/mol')", run: (i) => math.unit(at(values, i), 'kcal/mol').toNumber('kJ/mol') },
  },
  {
    what: 'cm3 molecule-1 s-1 to Pa-1 s-1 at T', timed: 'units named by text; with derivation; no peer knows the rate law',
    ours: { name: 'convertRateConstant', run: (i) => convertRateConstant({ value: at(values, i), from: 'cm3 molecule-1 s-1', to: 'Pa-1 s-1', temperatureK: at(T, i) }).value },
  },
];

const printed = [
  '26.4', '26.4 ± 1.2', '26.4(12)', '1.0e13', '1.0×10¹³', '10^13.5±0.4', 'log A = 13.2 ± 0.3', '≈ 25', '< 0.1', '24–27', '−3.5', '25 +2/-3', '(1.1 ± 0.2) × 10^13', 'ca. 25', '1 200', '≥ 30',
];
const plain = Array.from({ length: size }, (_, i) => `${at(values, i).toFixed(2)} kcal/mol`);

const readings: Group[] = [
  {
    what: 'read a plain value with its unit', timed: '1024 different texts such as "44.50 kcal/mol"',
    ours: { name: 'readPrintedValue', run: (i) => readPrintedValue(plain[i & mask] as string).value as number },
    peer: { name: 'mathjs: unit(text).toNumber', run: (i) => math.unit(plain[i & mask] as string).toNumber('kcal/mol') },
  },
  {
    what: 'read a printed value', timed: 'sixteen forms: ±, concise, powers of ten, logarithms, bounds, ranges; no peer reads them',
    ours: { name: 'readPrintedValue', run: (i) => readPrintedValue(printed[i & 15] as string).significantDigits },
  },
  {
    what: 'convert an energy as printed', timed: 'reading, uncertainty, unit, derivation',
    ours: { name: 'convertQuantity', run: (i) => convertQuantity({ symbol: 'energy', asPrinted: '44.5 ± 1.4', unitAsPrinted: 'kcal/mol', uncertaintyKind: 'expanded', coverageFactor: 1 + (i & 1) }, {}).standardUncertainty as number },
  },
];

const points = Array.from({ length: 64 }, (_, set) => Array.from({ length: 12 }, (_point, i) => {
  const temperatureK = 400 + 20 * i + set / 64;
  return { temperatureK, k: Math.exp(28 - 9000 / temperatureK + 0.05 * Math.sin(7 * i + set)) };
}));
const columns = points.map((set) => ({ X: set.map(({ temperatureK }) => [1, 1 / temperatureK]), y: set.map(({ k }) => [Math.log(k)]) }));

const fits: Group[] = [
  {
    what: 'fit ln k on 1/T, 12 points', timed: 'ours with standard errors, correlation, intervals, leverage and warnings; mathjs the two parameters only, by the normal equations',
    ours: { name: 'fitArrhenius', run: (i) => fitArrhenius({ points: points[i & 63] as (typeof points)[number], weights: 'none', covariance: 'scaled' }).energyKJPerMol },
    peer: {
      name: 'mathjs: lusolve(XᵀX, Xᵀy)',
      run: (i) => {
        const { X, y } = columns[i & 63] as (typeof columns)[number];
        const transposed = math.transpose(X);
        const solved = math.lusolve(math.multiply(transposed, X), math.multiply(transposed, y)) as number[][];
        return solved[1]?.[0] as number;
      },
    },
  },
];

const pools = Array.from({ length: 64 }, (_, set) => Array.from({ length: 12 }, (_value, i) => ({ value: 80 + 3 * Math.sin(5 * i + set), u: 1 + 0.2 * (i % 4) })));
const entry = readDemoEntries('seeds/demo')[0]?.input ?? {};

const whole: Group[] = [
  { what: 'pool 12 values', timed: 'restricted maximum likelihood, Hartung–Knapp, prediction interval, each value left out in turn; no peer', ours: { name: 'poolValues', run: (i) => poolValues(pools[i & 63] as (typeof pools)[number]).mean } },
  { what: 'assess a whole entry', timed: 'equation, surface, two quantities, checks; no peer', ours: { name: 'assessEntry', run: () => assessEntry(entry).quantities.length } },
];

const header = '| what | timed | ours, per second of processor time | mathjs | ratio |\n| --- | --- | --- | --- | --- |';
const rows: string[] = [];
for (const { what, timed, ours, peer } of [...rates, ...conversions, ...readings, ...fits, ...whole]) {
  const measured = measure(peer ? [ours, peer] : [ours]);
  const [own, other] = measured;
  if (!own) continue;
  rows.push(`| ${what} | ${timed} | ${rateText(own.perSecond)} (${own.name}) | ${other ? `${rateText(other.perSecond)} (${other.name})` : ''} | ${other ? own.ratio.toPrecision(3) : ''} |`);
  for (const one of measured) console.log(`${what.padEnd(52)} ${one.name.padEnd(52)} ${rateText(one.perSecond).padStart(12)} /s   (${rateText(one.from)} to ${rateText(one.to)})`);
}

const table = `Measured ${machineText()}, mathjs ${math.version}, one thread. Medians of nine rounds of a quarter of a second of processor time; ours and mathjs take turns, and the ratio is the median of the rounds' ratios, since the machine had other work as well. By \`npm run bench:core\`.

${header}
${rows.join('\n')}

To be reached: k(T) with its uncertainty at least 2 million times a second; a conversion of units at least 20 times as often as mathjs doing the same. With its derivation written out as text a conversion does more than mathjs does, and is reported as it is.`;
writeSection('tests/bench/RESULTS.md', 'Computing core', table);
