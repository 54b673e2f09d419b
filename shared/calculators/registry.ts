import { arrheniusCalculator } from './arrhenius.ts';
import { bondOrderCalculator } from './bond-order.ts';
import type { Calculator } from './calculator.ts';
import { changeBasisCalculator } from './change-basis.ts';
import { collisionCalculator } from './collision.ts';
import { desorptionCalculator } from './desorption.ts';
import { energyCalculator } from './energy.ts';
import { eyringCalculator } from './eyring.ts';
import { fitCalculator } from './fit.ts';
import { kieCalculator } from './kie.ts';
import { parseStepCalculator } from './parse-step.ts';
import { parseValueCalculator } from './parse-value.ts';
import { profileCalculator } from './profile.ts';
import { poolCalculator } from './pool.ts';
import { rateConstantCalculator } from './rate-constant.ts';
import { reverseCalculator } from './reverse.ts';
import { siteDensityCalculator } from './site-density.ts';
import { twoTemperatureCalculator } from './two-temperature.ts';
import { uncertaintyCalculator } from './uncertainty.ts';
import { tunnellingCalculator } from './tunnelling.ts';

/** Every calculator, in the order of the Workbench. */
export const calculators: readonly Calculator[] = [
  parseValueCalculator,
  parseStepCalculator,
  energyCalculator,
  rateConstantCalculator,
  changeBasisCalculator,
  arrheniusCalculator,
  twoTemperatureCalculator,
  eyringCalculator,
  fitCalculator,
  collisionCalculator,
  kieCalculator,
  tunnellingCalculator,
  siteDensityCalculator,
  uncertaintyCalculator,
  reverseCalculator,
  desorptionCalculator,
  bondOrderCalculator,
  poolCalculator,
  profileCalculator,
];
