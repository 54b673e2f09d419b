import { operationLine, quantityText, type DerivationLine } from './derivation.ts';
import { ratioFromLn, type IsotopeEffect } from './kie.ts';
import { radiationConstantText, reducedWavenumber, requireWavenumber } from './kie-wavenumber.ts';
import { KineticsError, requireTemperature } from './kinetics-error.ts';

/** Harmonic wavenumbers [cm-1] of reactant and transition state, light and heavy. */
export interface BigeleisenMayerInput {
  reactantLightPerCm: readonly number[];
  reactantHeavyPerCm: readonly number[];
  /** The real modes of the transition state. */
  transitionLightPerCm: readonly number[];
  transitionHeavyPerCm: readonly number[];
  /** Modulus of the imaginary wavenumber. */
  imaginaryLightPerCm: number;
  imaginaryHeavyPerCm: number;
  /** [K] */
  temperatureK: number;
}

/** The four factors whose product is the isotope effect. */
export interface BigeleisenMayerFactors {
  /** ν‡_L/ν‡_H of the imaginary modes. */
  imaginaryRatio: number;
  /** Π(ν_H/ν_L) of the reactant over that of the transition state: mass and moments of inertia, by the product rule. */
  productRule: number;
  /** Thermal excitation of the vibrations. */
  excitation: number;
  /** Zero-point energies. */
  zeroPoint: number;
}

/** The isotope effect with its factors. */
export interface BigeleisenMayerEffect extends IsotopeEffect {
  factors: BigeleisenMayerFactors;
}

type ListName = 'reactantLightPerCm' | 'reactantHeavyPerCm' | 'transitionLightPerCm' | 'transitionHeavyPerCm';

function modes(input: BigeleisenMayerInput, name: ListName): readonly number[] {
  const list = input[name];
  if (list.length === 0) throw new KineticsError(name, `${name} is empty: list the harmonic wavenumbers in cm-1`, 'missing-input', list);
  list.forEach((wavenumber, index) => requireWavenumber(`${name}.${index}`, wavenumber));
  return list;
}

interface LnFactors {
  product: number;
  excitation: number;
  zeroPoint: number;
}

/** ln 1 - e^-u, without losing digits for small u. */
const lnThermal = (u: number): number => Math.log(-Math.expm1(-u));

/** ln of Π (u_H/u_L) · (1 - e^-u_L)/(1 - e^-u_H) · e^((u_L - u_H)/2) over the modes of one state, in its three parts. */
function lnFactors(light: readonly number[], heavy: readonly number[], T: number): LnFactors {
  const sum: LnFactors = { product: 0, excitation: 0, zeroPoint: 0 };
  light.forEach((nuLight, index) => {
    const nuHeavy = heavy[index] as number;
    sum.product += Math.log(nuHeavy / nuLight);
    sum.excitation += lnThermal(reducedWavenumber(nuLight, T)) - lnThermal(reducedWavenumber(nuHeavy, T));
    sum.zeroPoint += reducedWavenumber(nuLight - nuHeavy, T) / 2;
  });
  return sum;
}

function pairOfModes(input: BigeleisenMayerInput, state: 'reactant' | 'transition'): [readonly number[], readonly number[]] {
  const light = modes(input, `${state}LightPerCm`);
  const heavy = modes(input, `${state}HeavyPerCm`);
  if (light.length !== heavy.length) {
    throw new KineticsError(`${state}HeavyPerCm`, `${state}HeavyPerCm holds ${heavy.length} wavenumbers and ${state}LightPerCm ${light.length}: an isotope changes no count of modes`, 'out-of-range', heavy.length);
  }
  return [light, heavy];
}

/**
 * Kinetic isotope effect from harmonic wavenumbers, k_light/k_heavy, as the product of four factors.
 *
 * KIE = (ν‡_L/ν‡_H) × Π(u_H/u_L) × Π(1 - e^-u_L)/(1 - e^-u_H) × Π e^((u_L - u_H)/2), the products over the reactant's modes divided by
 * those over the real modes of the transition state, u = hcν/k_BT. The order of the modes does not matter. No tunnelling.
 * Adsorbates on a frozen slab use all their modes, hindered translations and rotations included, and need no factor of mass and moments;
 * for a free gas molecule the product rule stands for that factor.
 * Source: Bigeleisen and Mayer, J. Chem. Phys. 15 (1947) 261.
 * @throws KineticsError on an empty list, a wavenumber or T not above 0, or lists of light and heavy modes of different length.
 * @example bigeleisenMayer({ reactantLightPerCm: [2900], reactantHeavyPerCm: [2100], transitionLightPerCm: [1500], transitionHeavyPerCm: [1500], imaginaryLightPerCm: 1000, imaginaryHeavyPerCm: 1000, temperatureK: 300 }).factors.zeroPoint // 6.8098437112298746
 */
export function bigeleisenMayer(input: BigeleisenMayerInput): BigeleisenMayerEffect {
  const T = requireTemperature('temperatureK', input.temperatureK);
  const [reactantLight, reactantHeavy] = pairOfModes(input, 'reactant');
  const [transitionLight, transitionHeavy] = pairOfModes(input, 'transition');
  const imaginaryLight = requireWavenumber('imaginaryLightPerCm', input.imaginaryLightPerCm);
  const imaginaryHeavy = requireWavenumber('imaginaryHeavyPerCm', input.imaginaryHeavyPerCm);
  const reactant = lnFactors(reactantLight, reactantHeavy, T);
  const transition = lnFactors(transitionLight, transitionHeavy, T);
  const ln: Record<keyof BigeleisenMayerFactors, number> = {
    imaginaryRatio: Math.log(imaginaryLight / imaginaryHeavy),
    productRule: reactant.product - transition.product,
    excitation: reactant.excitation - transition.excitation,
    zeroPoint: reactant.zeroPoint - transition.zeroPoint,
  };
  const lnKie = ln.imaginaryRatio + ln.productRule + ln.excitation + ln.zeroPoint;
  const factors: BigeleisenMayerFactors = {
    imaginaryRatio: imaginaryLight / imaginaryHeavy,
    productRule: ratioFromLn('temperatureK', ln.productRule, 'the product-rule factor'),
    excitation: ratioFromLn('temperatureK', ln.excitation, 'the excitation factor'),
    zeroPoint: ratioFromLn('temperatureK', ln.zeroPoint, 'the zero-point factor'),
  };
  const kie = ratioFromLn('temperatureK', lnKie, 'the isotope effect');
  return { kie, lnKie, factors, derivation: linesOf(input, factors, kie) };
}

const listText = (light: readonly number[], heavy: readonly number[]): string => light.map((nu, index) => `${quantityText(nu)}/${quantityText(heavy[index] as number)}`).join(', ');

function linesOf(input: BigeleisenMayerInput, factors: BigeleisenMayerFactors, kie: number): DerivationLine[] {
  const reference = 'Bigeleisen and Mayer, J. Chem. Phys. 15 (1947) 261';
  const T = `T = ${quantityText(input.temperatureK)} K`;
  const assumption = `light/heavy in cm-1, harmonic: reactant ${listText(input.reactantLightPerCm, input.reactantHeavyPerCm)}; transition state, real modes ${listText(input.transitionLightPerCm, input.transitionHeavyPerCm)}`;
  const constant = radiationConstantText;
  const times = (operation: string, before: number, factor: number, extra: { constant?: string; assumption?: string }): DerivationLine =>
    operationLine(`${operation} = ${quantityText(factor)}`, { value: before }, { value: before * factor }, reference, extra);
  const { imaginaryRatio, productRule, excitation } = factors;
  return [
    operationLine(`Imaginary wavenumbers: ν‡_L/ν‡_H, ν‡_H = ${quantityText(input.imaginaryHeavyPerCm)} cm-1`, { value: input.imaginaryLightPerCm, unit: 'cm-1' }, { value: imaginaryRatio }, reference),
    times('Product rule: times Π(ν_H/ν_L), reactant over transition state,', imaginaryRatio, productRule, { assumption }),
    times(`Excitation: times Π(1 - e^-u_L)/(1 - e^-u_H), u = hcν/k_BT, reactant over transition state, ${T},`, imaginaryRatio * productRule, excitation, { constant }),
    { ...times(`Zero-point energies: times Π exp[(u_L - u_H)/2], reactant over transition state, ${T},`, imaginaryRatio * productRule * excitation, factors.zeroPoint, { constant, assumption: 'no tunnelling' }), to: quantityText(kie) },
  ];
}
