import { operationLine } from './derivation.ts';
import { ratioFromLn, type IsotopeEffect } from './kie.ts';
import { requirePositive } from './kinetics-error.ts';

/** Exponent of k_H/k_T = (k_H/k_D)^1.442. Source: Swain, Stivers, Reuwer and Schaad, J. Am. Chem. Soc. 80 (1958) 5885. */
export const swainSchaadExponent = 1.442;

/** Exponent of k_H/k_T = (k_D/k_T)^3.26: 1.442/0.442 rounded, as it is quoted. */
export const swainSchaadExponentFromDT = 3.26;

const reference = 'Swain, Stivers, Reuwer and Schaad, J. Am. Chem. Soc. 80 (1958) 5885';

/** The isotope effect of tritium, with the third of the three ratios. */
export interface SwainSchaadEffect extends IsotopeEffect {
  /** k_H/k_D. */
  kieHD: number;
  /** k_D/k_T. */
  kieDT: number;
}

/**
 * k_H/k_T from k_H/k_D by the Swain–Schaad relation.
 *
 * Holds for one primary effect of zero-point energies alone; deviation is read as tunnelling or as a step that is only partly rate-determining.
 * Source: Swain, Stivers, Reuwer and Schaad, J. Am. Chem. Soc. 80 (1958) 5885.
 * @param input `kie` k_H/k_D; `exponent` 1.442 when absent.
 * @throws KineticsError on an isotope effect or exponent not above 0.
 * @example swainSchaad({ kie: 3.3 }).kie // 5.593673346550954
 */
export function swainSchaad({ kie, exponent = swainSchaadExponent }: { kie: number; exponent?: number }): SwainSchaadEffect {
  const kieHD = requirePositive('kie', kie);
  const power = requirePositive('exponent', exponent);
  const lnKie = power * Math.log(kieHD);
  const kieHT = ratioFromLn('kie', lnKie, 'k_H/k_T');
  return {
    kie: kieHT,
    lnKie,
    kieHD,
    kieDT: kieHT / kieHD,
    derivation: [operationLine(`k_H/k_T = (k_H/k_D)^${power}`, { value: kieHD }, { value: kieHT }, reference, { assumption: 'zero-point energies alone, no tunnelling' })],
  };
}

/**
 * k_H/k_T from k_D/k_T by the Swain–Schaad relation.
 *
 * Source: Swain, Stivers, Reuwer and Schaad, J. Am. Chem. Soc. 80 (1958) 5885; the exponent 1.442/0.442 is commonly rounded to 3.26.
 * @param input `kie` k_D/k_T; `exponent` 3.26 when absent.
 * @throws KineticsError on an isotope effect or exponent not above 0.
 * @example swainSchaadFromDT({ kie: 1.37 }).kie // 2.79067363207573
 */
export function swainSchaadFromDT({ kie, exponent = swainSchaadExponentFromDT }: { kie: number; exponent?: number }): SwainSchaadEffect {
  const kieDT = requirePositive('kie', kie);
  const power = requirePositive('exponent', exponent);
  const lnKie = power * Math.log(kieDT);
  const kieHT = ratioFromLn('kie', lnKie, 'k_H/k_T');
  return {
    kie: kieHT,
    lnKie,
    kieHD: kieHT / kieDT,
    kieDT,
    derivation: [operationLine(`k_H/k_T = (k_D/k_T)^${power}`, { value: kieDT }, { value: kieHT }, reference, { assumption: 'zero-point energies alone, no tunnelling' })],
  };
}
