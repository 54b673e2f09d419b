import { arrheniusCalculator } from './arrhenius.ts';
import type { Calculator } from './calculator.ts';
import { energyCalculator } from './energy.ts';
import { parseStepCalculator } from './parse-step.ts';
import { parseValueCalculator } from './parse-value.ts';
import { rateConstantCalculator } from './rate-constant.ts';

/** Every calculator, in the order of the Workbench. */
export const calculators: readonly Calculator[] = [
  parseValueCalculator,
  parseStepCalculator,
  energyCalculator,
  rateConstantCalculator,
  arrheniusCalculator,
];
