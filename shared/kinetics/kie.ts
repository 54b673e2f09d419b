import { c, h, N_A, R } from './constants.ts';
import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import { KineticsError, requireFinite, requirePositive, requireTemperature } from './kinetics-error.ts';
import { radiationConstantText, reducedWavenumber, requireWavenumber } from './kie-wavenumber.ts';

/** A kinetic isotope effect k_light/k_heavy. */
export interface IsotopeEffect {
  /** k_light/k_heavy [1]. */
  kie: number;
  /** Its natural logarithm. */
  lnKie: number;
  derivation: DerivationLine[];
}

const gasConstant = `R = ${R} J mol-1 K-1`;
const reference = 'Bigeleisen and Mayer, J. Chem. Phys. 15 (1947) 261';

/**
 * A ratio from its natural logarithm, refused where it leaves the range of double precision.
 *
 * @throws KineticsError naming `path`, with ln of the ratio, where the ratio is 0 or infinite as a double.
 * @example ratioFromLn('temperatureK', 0, 'the isotope effect') // 1
 */
export function ratioFromLn(path: string, ln: number, what: string): number {
  const ratio = Math.exp(ln);
  if (!(ratio > 0 && ratio < Infinity)) throw new KineticsError(path, `${what} leaves the range of double precision: its natural logarithm is ${ln}`, 'out-of-range', ln);
  return ratio;
}

/** Arrhenius parameters of the two isotopologues, with A in one unit. */
export interface ArrheniusPair {
  preExponentialLight: number;
  /** [kJ mol-1] */
  energyLightKJPerMol: number;
  preExponentialHeavy: number;
  /** [kJ mol-1] */
  energyHeavyKJPerMol: number;
  /** [K] */
  temperatureK: number;
}

/** An isotope effect from Arrhenius parameters: its two factors too. */
export interface ArrheniusPairEffect extends IsotopeEffect {
  /** A_L/A_H. */
  preExponentialRatio: number;
  /** E_H - E_L [kJ mol-1]. */
  energyDifferenceKJPerMol: number;
}

/**
 * Kinetic isotope effect from two sets of Arrhenius parameters: (A_L/A_H) exp[(E_H - E_L)/RT].
 *
 * Source: IUPAC glossary of terms used in chemical kinetics, Pure Appl. Chem. 68 (1996) 149 (Arrhenius equation, isotope effect).
 * @throws KineticsError on A or T not above 0, or an energy that is not finite.
 * @example kieFromArrheniusPair({ preExponentialLight: 1e13, energyLightKJPerMol: 72.4, preExponentialHeavy: 1e13, energyHeavyKJPerMol: 77.2, temperatureK: 200 }).kie // 17.931097948627542
 */
export function kieFromArrheniusPair(input: ArrheniusPair): ArrheniusPairEffect {
  const AL = requirePositive('preExponentialLight', input.preExponentialLight);
  const EL = requireFinite('energyLightKJPerMol', input.energyLightKJPerMol);
  const AH = requirePositive('preExponentialHeavy', input.preExponentialHeavy);
  const EH = requireFinite('energyHeavyKJPerMol', input.energyHeavyKJPerMol);
  const T = requireTemperature('temperatureK', input.temperatureK);
  const energyDifferenceKJPerMol = EH - EL;
  const lnRatio = Math.log(AL / AH);
  const lnKie = (Number.isFinite(lnRatio) ? lnRatio : Math.log(AL) - Math.log(AH)) + (energyDifferenceKJPerMol * 1000) / (R * T);
  const kie = ratioFromLn('temperatureK', lnKie, 'the isotope effect');
  return {
    kie,
    lnKie,
    preExponentialRatio: AL / AH,
    energyDifferenceKJPerMol,
    derivation: [
      operationLine(`A_L/A_H, A_H = ${quantityText(AH)}`, { value: AL }, { value: AL / AH }, references.glossary),
      operationLine(`E_H - E_L, E_L = ${quantityText(EL)} kJ/mol`, { value: EH, unit: 'kJ/mol' }, { value: energyDifferenceKJPerMol, unit: 'kJ/mol' }, references.glossary),
      kieLine(AL / AH, energyDifferenceKJPerMol, T, kie),
    ],
  };
}

/** The line of a derivation that evaluates (A_L/A_H) exp[(E_H - E_L)/RT]. */
function kieLine(ratio: number, energyDifferenceKJPerMol: number, T: number, kie: number): DerivationLine {
  return operationLine(`KIE = (A_L/A_H) exp[(E_H - E_L)/RT], E_H - E_L = ${quantityText(energyDifferenceKJPerMol)} kJ/mol, T = ${quantityText(T)} K`, { value: ratio }, { value: kie }, references.glossary, { constant: gasConstant });
}

/** The Arrhenius pair behind an isotope effect that changes with temperature. */
export interface KieLine {
  /** A_L/A_H. */
  preExponentialRatio: number;
  lnPreExponentialRatio: number;
  /** E_H - E_L [kJ mol-1]. */
  energyDifferenceKJPerMol: number;
  derivation: DerivationLine[];
}

/**
 * A_L/A_H and E_H - E_L from the isotope effect at two temperatures.
 *
 * Source: inversion of KIE = (A_L/A_H) exp[(E_H - E_L)/RT]; IUPAC glossary, Pure Appl. Chem. 68 (1996) 149.
 * @throws KineticsError on an isotope effect or temperature not above 0, or equal temperatures.
 * @example kieLineFromTwoTemperatures({ kie1: 6.8, temperature1K: 298.15, kie2: 3.1, temperature2K: 450 }).preExponentialRatio // 0.6630341887269909
 */
export function kieLineFromTwoTemperatures(input: { kie1: number; temperature1K: number; kie2: number; temperature2K: number }): KieLine {
  const ln1 = Math.log(requirePositive('kie1', input.kie1));
  const ln2 = Math.log(requirePositive('kie2', input.kie2));
  const T1 = requireTemperature('temperature1K', input.temperature1K, 'T1');
  const T2 = requireTemperature('temperature2K', input.temperature2K, 'T2');
  if (T1 === T2) throw new KineticsError('temperature2K', `the two temperatures must differ, both are ${T1} K`, 'out-of-range', T2);
  const energyDifferenceKJPerMol = ((R * (ln1 - ln2) * T1) * (T2 / (T2 - T1))) / 1000;
  const lnPreExponentialRatio = (T2 * ln2 - T1 * ln1) / (T2 - T1);
  const preExponentialRatio = ratioFromLn('temperature2K', lnPreExponentialRatio, 'A_L/A_H');
  return {
    preExponentialRatio,
    lnPreExponentialRatio,
    energyDifferenceKJPerMol,
    derivation: [
      operationLine(`E_H - E_L = R ln(KIE1/KIE2)/(1/T1 - 1/T2), T1 = ${quantityText(T1)} K, T2 = ${quantityText(T2)} K, from ln(KIE1/KIE2)`, { value: ln1 - ln2 }, { value: energyDifferenceKJPerMol, unit: 'kJ/mol' }, references.glossary, { constant: gasConstant }),
      operationLine(`A_L/A_H = KIE1 exp[-(E_H - E_L)/RT1], E_H - E_L = ${quantityText(energyDifferenceKJPerMol)} kJ/mol, T1 = ${quantityText(T1)} K`, { value: input.kie1 }, { value: preExponentialRatio }, references.glossary, { constant: gasConstant }),
    ],
  };
}

/**
 * The isotope effect at a third temperature, from the line through two.
 *
 * Source: as for `kieLineFromTwoTemperatures`; outside the two temperatures it is an extrapolation.
 * @throws KineticsError on an isotope effect or temperature not above 0, or equal temperatures.
 * @example kieAtThirdTemperature({ kie1: 6.8, temperature1K: 298.15, kie2: 3.1, temperature2K: 450, temperatureK: 450 }).kie // 3.1
 */
export function kieAtThirdTemperature(input: { kie1: number; temperature1K: number; kie2: number; temperature2K: number; temperatureK: number }): ArrheniusPairEffect {
  const T = requireTemperature('temperatureK', input.temperatureK);
  const { preExponentialRatio, lnPreExponentialRatio, energyDifferenceKJPerMol, derivation } = kieLineFromTwoTemperatures(input);
  const lnKie = lnPreExponentialRatio + (energyDifferenceKJPerMol * 1000) / (R * T);
  const kie = ratioFromLn('temperatureK', lnKie, 'the isotope effect');
  return { kie, lnKie, preExponentialRatio, energyDifferenceKJPerMol, derivation: [...derivation, kieLine(preExponentialRatio, energyDifferenceKJPerMol, T, kie)] };
}

/** An isotope effect from one stretch that is lost in the transition state. */
export interface ZeroPointEffect extends IsotopeEffect {
  /** Difference of the zero-point energies, light minus heavy [kJ mol-1]. */
  zeroPointDifferenceKJPerMol: number;
}

/**
 * Estimate of a kinetic isotope effect from the zero-point energy of one vibration: exp[hc(ν_L - ν_H)/2k_BT].
 *
 * The vibration is taken as lost in the transition state and every other one as unchanged; no tunnelling.
 * Source: Bigeleisen and Mayer, J. Chem. Phys. 15 (1947) 261, the zero-point factor alone.
 * @throws KineticsError on a wavenumber or T not above 0.
 * @example kieFromZeroPoint({ wavenumberLightPerCm: 2900, wavenumberHeavyPerCm: 2100, temperatureK: 200 }).kie // 17.770748360947728
 */
export function kieFromZeroPoint(input: { wavenumberLightPerCm: number; wavenumberHeavyPerCm: number; temperatureK: number }): ZeroPointEffect {
  const light = requireWavenumber('wavenumberLightPerCm', input.wavenumberLightPerCm);
  const heavy = requireWavenumber('wavenumberHeavyPerCm', input.wavenumberHeavyPerCm);
  const T = requireTemperature('temperatureK', input.temperatureK);
  const difference = light - heavy;
  const zeroPointDifferenceKJPerMol = (difference * N_A * h * c * 100) / 2 / 1000;
  const lnKie = reducedWavenumber(difference, T) / 2;
  const kie = ratioFromLn('temperatureK', lnKie, 'the isotope effect');
  return {
    kie,
    lnKie,
    zeroPointDifferenceKJPerMol,
    derivation: [
      operationLine(`ν_L - ν_H, ν_H = ${quantityText(heavy)} cm-1`, { value: light, unit: 'cm-1' }, { value: difference, unit: 'cm-1' }, reference),
      operationLine(`KIE = exp[hc(ν_L - ν_H)/2k_BT], T = ${quantityText(T)} K`, { value: difference, unit: 'cm-1' }, { value: kie }, reference, {
        constant: radiationConstantText,
        assumption: 'this vibration is lost in the transition state, all others are unchanged; no tunnelling',
      }),
    ],
  };
}
