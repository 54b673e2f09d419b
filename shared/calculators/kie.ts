import * as z from 'zod';
import { bigeleisenMayer } from '../kinetics/bigeleisen-mayer.ts';
import { kieAtThirdTemperature, kieFromArrheniusPair, kieFromZeroPoint } from '../kinetics/kie.ts';
import { swainSchaad, swainSchaadExponent, swainSchaadExponentFromDT, swainSchaadFromDT } from '../kinetics/kie-swain-schaad.ts';
import { tunnellingKie, tunnellingModels } from '../kinetics/tunnelling.ts';
import { calculator } from './calculator.ts';

/** More modes than a slab calculation lists. */
const wavenumbers = z.array(z.number()).max(300);

const input = z.discriminatedUnion('method', [
  z.strictObject({
    method: z.literal('arrhenius-pair'), preExponentialLight: z.number(), energyLightKJPerMol: z.number(), preExponentialHeavy: z.number(), energyHeavyKJPerMol: z.number(),
    temperatureK: z.number(),
  }),
  z.strictObject({ method: z.literal('two-temperatures'), kie1: z.number(), temperature1K: z.number(), kie2: z.number(), temperature2K: z.number(), temperatureK: z.number() }),
  z.strictObject({ method: z.literal('zero-point'), wavenumberLightPerCm: z.number(), wavenumberHeavyPerCm: z.number(), temperatureK: z.number() }),
  z.strictObject({
    method: z.literal('bigeleisen-mayer'), reactantLightPerCm: wavenumbers, reactantHeavyPerCm: wavenumbers, transitionLightPerCm: wavenumbers, transitionHeavyPerCm: wavenumbers,
    imaginaryLightPerCm: z.number(), imaginaryHeavyPerCm: z.number(), temperatureK: z.number(),
  }),
  z.strictObject({
    method: z.literal('tunnelling-ratio'), model: z.enum(tunnellingModels), imaginaryLightPerCm: z.number(), imaginaryHeavyPerCm: z.number(), temperatureK: z.number(),
    energyLightKJPerMol: z.number().optional(), energyHeavyKJPerMol: z.number().optional(),
  }),
  z.strictObject({ method: z.literal('swain-schaad'), kie: z.number(), exponent: z.number().default(swainSchaadExponent) }),
  z.strictObject({ method: z.literal('swain-schaad-from-dt'), kie: z.number(), exponent: z.number().default(swainSchaadExponentFromDT) }),
]);

export const kieCalculator = calculator({
  name: 'kie',
  title: 'Kinetic isotope effect',
  summary: 'Finds k_light/k_heavy from Arrhenius parameters, zero-point energies or harmonic wavenumbers, and tritium effects from deuterium effects.',
  formulas: [
    'KIE = (A_L/A_H) exp[(E_H − E_L)/RT]',
    'KIE = exp[hc(ν_L − ν_H)/2k_BT]',
    'KIE = (ν^‡_L/ν^‡_H) × product rule × excitation × zero point',
    'k_H/k_T = (k_H/k_D)^{1.442}',
  ],
  validity: 'Light over heavy: above 1 normal, below 1 inverse. Harmonic and without tunnelling, save for the ratio of tunnelling factors, which multiplies the others. Adsorbates on a frozen slab enter with all their modes; reactant and transition state may differ in their number, light and heavy may not. The Swain–Schaad relation holds for one primary effect of zero-point energies alone.',
  references: [
    'Bigeleisen and Mayer, J. Chem. Phys. 15 (1947) 261',
    'Swain, Stivers, Reuwer and Schaad, J. Am. Chem. Soc. 80 (1958) 5885',
    'IUPAC glossary of terms used in chemical kinetics, Pure Appl. Chem. 68 (1996) 149',
  ],
  input,
  output: z.object({
    kie: z.number(), lnKie: z.number(),
    preExponentialRatio: z.number().optional(), energyDifferenceKJPerMol: z.number().optional(), zeroPointDifferenceKJPerMol: z.number().optional(),
    factors: z.object({ imaginaryRatio: z.number(), productRule: z.number(), excitation: z.number(), zeroPoint: z.number() }).optional(),
    kappaLight: z.number().optional(), kappaHeavy: z.number().optional(), kieHD: z.number().optional(), kieDT: z.number().optional(),
    warnings: z.array(z.string()).optional(),
  }),
  calculate: (given) => {
    switch (given.method) {
      case 'arrhenius-pair': return kieFromArrheniusPair(given);
      case 'two-temperatures': return kieAtThirdTemperature(given);
      case 'zero-point': return kieFromZeroPoint(given);
      case 'bigeleisen-mayer': return bigeleisenMayer(given);
      case 'tunnelling-ratio': return tunnellingKie(given);
      case 'swain-schaad': return swainSchaad(given);
      case 'swain-schaad-from-dt': return swainSchaadFromDT(given);
    }
  },
});
