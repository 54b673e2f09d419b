import { describe, expect, it } from 'vitest';
import type { DerivationLine } from '#shared/kinetics/derivation.ts';
import { calculatorCases } from '#tests/integration/calculators/calculator-cases.ts';
import { readFigure, replay } from './derivation-replay.ts';
import { run } from './reference-measure.ts';
import { expectClose } from './reference.ts';

// A second program for the formulas that the lines of calculators name: it has the line and nothing else.

const gas = 6.02214076e23 * 1.380649e-23;
const frequency = 1.380649e-23 / 6.62607015e-34;
const second = (6.62607015e-34 * 299792458 * 100) / 1.380649e-23;

/** `name = number` wherever a line says it. */
class Said {
  private readonly text: string;
  constructor({ operation, constant, assumption }: DerivationLine) {
    this.text = `${operation}, ${constant ?? ''}, ${assumption ?? ''}`;
  }
  get(name: string): number {
    const escaped = name.replace(/[.*+?^${}()|[\]\\/]/g, '\\$&');
    const found = new RegExp(`(?:^|[\\s(:,])${escaped} = (-?[\\d.]+(?:e-?\\d+)?)(?=[\\s,:;)]|$)`).exec(this.text)?.[1];
    if (found === undefined) throw new Error(`"${this.text}" does not say ${name}`);
    return Number(found);
  }
  /** 0 where the line leaves it out. */
  maybe(name: string, otherwise = 0): number {
    try {
      return this.get(name);
    } catch {
      return otherwise;
    }
  }
  /** g of `(R T0)^g`. */
  gasOrder(): number {
    return Number(/\(R T0\)\^(-?[\d.]+)/.exec(this.text)?.[1] ?? NaN);
  }
  /** `10 (u 1), 12 (u 2)`. */
  values(): { value: number; u: number }[] {
    return [...this.text.matchAll(/(-?[\d.]+(?:e-?\d+)?) \(u ([\d.]+(?:e-?\d+)?)\)/g)].map(([, value, u]) => ({ value: Number(value), u: Number(u) }));
  }
}

type Formula = (from: number, said: Said) => number;
const rt = (said: Said): number => gas * said.get('T');
const root = Math.sqrt;

/** x of x e^x = N T, by putting it in again and again; E of a desorption peak from it. */
function peakEnergy(frequencyPerS: number, said: Said): number {
  const ln = Math.log((frequencyPerS * said.get('T_p')) / said.get('β'));
  let x = ln;
  for (let i = 0; i < 200; i += 1) x = ln - Math.log(x);
  return (x * gas * said.get('T_p')) / 1000;
}

const formulas: readonly [start: string, formula: Formula][] = [
  ['k = A (T/T0)^n exp(-E/RT)', (A, s) => A * (s.get('T') / s.maybe('T0', 1)) ** s.get('n') * Math.exp((-1000 * s.get('E')) / rt(s))],
  ['k_r = A_r (T/T0)^n exp(-E_r/RT)', (A, s) => A * (s.get('T') / s.maybe('T0', 1)) ** s.get('n') * Math.exp((-1000 * s.get('E')) / rt(s))],
  ['u²(ln k) = u²(ln A)', (u, s) => root(u ** 2 + ((1000 * s.get('u(E)')) / rt(s)) ** 2 - (2 * s.get('r') * u * 1000 * s.get('u(E)')) / rt(s))],
  ['A_p = A_c/(R T0)^', (A, s) => A / (gas * s.get('T0')) ** s.gasOrder()],
  ['n_p = n_c - 1', (n) => n - 1],
  ['E = R ln(k2/k1)', (ratio, s) => (gas * ratio) / (1 / s.get('T1') - 1 / s.get('T2')) / 1000],
  ['A = k1 exp(E/RT1)', (k, s) => k * Math.exp((1000 * s.get('E')) / (gas * s.get('T1')))],
  ['ΔG‡ = ΔH‡ - TΔS‡', (H, s) => H - (s.get('T') * s.get('ΔS‡')) / 1000],
  ['k = κ (k_B T/h) exp(-ΔG‡/RT)', (G, s) => s.get('κ') * frequency * s.get('T') * Math.exp((-1000 * G) / rt(s))],
  ['E = ΔH‡ + RT', (H, s) => H + rt(s) / 1000],
  ['A = k exp(E/RT)', (k, s) => k * Math.exp((1000 * s.get('E')) / rt(s))],
  ['ΔH‡ = E - RT', (E, s) => E - rt(s) / 1000],
  ['ΔG‡ = -RT ln[k/(κ (k_B T/h))] with k = A exp(-E/RT)', (A, s) => (-rt(s) * (Math.log(A / (s.get('κ') * frequency * s.get('T'))) - (1000 * s.get('E')) / rt(s))) / 1000],
  ['ΔS‡ = (ΔH‡ - ΔG‡)/T', (G, s) => (1000 * (s.get('ΔH‡') - G)) / s.get('T')],
  ['E = -R × slope', (slope) => (-gas * slope) / 1000],
  ['A = exp(intercept)', (intercept) => Math.exp(intercept)],
  ['Mean with weights 1/(u² + τ²)', (_n, s) => {
    const weighted = s.values().map(({ value, u }) => ({ value, w: 1 / (u * u + s.get('τ²')) }));
    return weighted.reduce((sum, { value, w }) => sum + value * w, 0) / weighted.reduce((sum, { w }) => sum + w, 0);
  }],
  ['Mean speed √(8RT/πM)', (M, s) => root((8 * rt(s)) / (Math.PI * M * 1e-3))],
  ['Collision flux p N_A/√(2π M R T)', (p, s) => (p * 6.02214076e23) / root(2 * Math.PI * s.get('M') * 1e-3 * rt(s))],
  ['Divide by the site density', (flux, s) => flux / s.get('Γ')],
  ['Time per molecule and site: 1/(s × rate)', (rate, s) => 1 / (s.get('s') * rate)],
  ['k = s0 N_A/(Γ √(2π M R T))', (s0, s) => (s0 * 6.02214076e23) / (s.get('Γ') * root(2 * Math.PI * s.get('M') * 1e-3 * rt(s)))],
  ['k_c = k_p RT', (k, s) => k * rt(s)],
  ['A_L/A_H', (A, s) => A / s.get('A_H')],
  ['E_H - E_L', (E, s) => E - s.get('E_L')],
  ['KIE = (A_L/A_H) exp[(E_H - E_L)/RT]', (ratio, s) => ratio * Math.exp((1000 * s.get('E_H - E_L')) / rt(s))],
  ['ν_L - ν_H', (light, s) => light - s.get('ν_H')],
  ['KIE = exp[hc(ν_L - ν_H)/2k_BT]', (difference, s) => Math.exp((second * difference) / (2 * s.get('T')))],
  ['Imaginary wavenumbers: ν‡_L/ν‡_H', (light, s) => light / s.get('ν‡_H')],
  ['k_H/k_T = (k_H/k_D)^1.442', (kie) => kie ** 1.442],
  ['u = hcν/k_BT', (wavenumber, s) => (second * wavenumber) / s.get('T')],
  ['κ = 1 + u²/24', (u) => 1 + (u * u) / 24],
  ['κ = e^α/(β - α) [β e^-α - α e^-β]', (_u, s) => (Math.exp(s.get('α')) / (s.get('β') - s.get('α'))) * (s.get('β') * Math.exp(-s.get('α')) - s.get('α') * Math.exp(-s.get('β')))],
  ['κ = (u/2)/sin(u/2) - Σ', (u, s) => {
    const [alpha, beta] = [s.get('α'), s.get('β')];
    const term = (n: number): number => ((-1) ** n * alpha * Math.exp(alpha - n * beta)) / (alpha - n * beta);
    return u / 2 / Math.sin(u / 2) - Array.from({ length: 60 }, (_, i) => term(i + 1)).reduce((sum, one) => sum + one, 0);
  }],
  ['ΔH = D_AB - Q_A - Q_B', (_d, s) => s.get('D_AB') - s.get('Q_A') - s.get('Q_B')],
  ['ΔH = D_AB - D_BC + Q_AB + Q_C - Q_A - Q_BC', (_d, s) => s.get('D_AB') - s.get('D_BC') + s.get('Q_AB') + s.get('Q_C') - s.get('Q_A') - s.get('Q_BC')],
  ['E = ΔH + Q_A Q_B/(Q_A + Q_B)', (dH, s) => dH + (s.get('Q_A') * s.get('Q_B')) / (s.get('Q_A') + s.get('Q_B'))],
  ['E = φ [ΔH + Q_A Q_BC/(Q_A + Q_BC)]', (dH, s) => s.get('φ') * (dH + (s.get('Q_A') * s.get('Q_BC')) / (s.get('Q_A') + s.get('Q_BC')))],
  ['Reverse: E - ΔH', (E, s) => E - s.get('ΔH')],
  ['E_r = E_f - ΔH°', (E, s) => E - s.get('ΔH°')],
  ['A_r = A_f exp(-ΔS°/R)/(p°)^Δν', (A, s) => (A * Math.exp(-s.get('ΔS°') / gas)) / s.maybe('p°', 1) ** s.get('Δν')],
  ['Solve E/(RT_p²) = (ν/β) exp(-E/RT_p)', (factor, s) => peakEnergy(factor, s)],
  ['Solve E/(RT_p²) = (νθ0/β) exp(-E/RT_p)', (factor, s) => peakEnergy(factor * s.get('θ0'), s)],
  ['E = R × slope', (slope) => (gas * slope) / 1000],
  ['ν = (E/R) exp(-intercept)', (intercept, s) => ((1000 * s.get('E')) / gas) * Math.exp(-intercept)],
  ['Turnover = (k_B T/h) exp(-δE/RT)', (span, s) => frequency * s.get('T') * Math.exp((-1000 * span) / rt(s))],
];

/** What a line states without being a product of its figures: reading, searching, quantiles of a distribution. */
const stated = /^(Read the |Least squares of ln|τ² (=|by) |Standard error |95 % interval|Highest transition state|Energetic span|Outermost atoms|Solve E\/\(RT_p²\) = \(2νθ_p)/;

function runLine(line: DerivationLine): { given: number[]; stated: number[] } | null {
  if (stated.test(line.operation)) return null;
  const from = readFigure(line.from).numbers[0] as number;
  const to = readFigure(line.to).numbers;
  const said = new Said(line);
  const times = /: times .* = (-?[\d.]+(?:e-?\d+)?)$/.exec(line.operation)?.[1];
  if (times !== undefined) return { given: [from * Number(times)], stated: to };
  const divisor = /^divisor ([\d.]+(?:e-?\d+)?)$/.exec(line.constant ?? '')?.[1];
  if (divisor !== undefined) return { given: [from / Number(divisor)], stated: to };
  // The longest start first: `ΔH = D_AB - Q_A` is no exchange.
  const formula = [...formulas].sort((a, b) => b[0].length - a[0].length).find(([start]) => line.operation.startsWith(start));
  return formula ? { given: [formula[1](from, said)], stated: to } : replay(line);
}

/** Every number of a result, wherever it stands. */
function numbersOf(value: unknown): number[] {
  if (typeof value === 'number') return [value];
  return value !== null && typeof value === 'object' ? Object.values(value).flatMap(numbersOf) : [];
}

describe('the lines of every calculator', () => {
  let ran = 0;
  it.each(calculatorCases.map((one, i) => ({ ...one, i })))('$name, case $i', ({ name, input }) => {
    const { derivation, ...result } = run(name, input) as { derivation: DerivationLine[] };
    for (const line of derivation) {
      const again = runLine(line);
      if (again === null) continue;
      ran += 1;
      again.given.forEach((value, i) => {
        const figure = again.stated[i] as number;
        if (value === 0 || figure === 0) expect(Math.abs(figure - value), line.operation).toBeLessThan(1e-9);
        else expectClose(figure, value, 1e-11, line.operation);
      });
    }
    // The way ends in what is given: the last figure is one of the result, or half of its interval.
    if (name === 'parse-step') return;
    const last = readFigure(derivation.at(-1)?.to ?? '').numbers.at(-1) as number;
    const { interval, mean } = result as { interval?: [number, number] | null; mean?: number };
    const figures = [...numbersOf(result), ...(interval && mean !== undefined ? [interval[1] - mean] : [])];
    expect(Math.min(...figures.map((figure) => Math.abs(figure - last))), derivation.at(-1)?.operation).toBeLessThanOrEqual(1e-13 * Math.abs(last));
  });

  it('were run again for all but what is read or searched for', () => {
    expect(ran).toBeGreaterThan(55);
  });
});
