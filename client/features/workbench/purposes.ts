import { arrheniusSheet } from './calculators/arrhenius.ts';
import { bondOrderSheet } from './calculators/bond-order.ts';
import { changeBasisSheet } from './calculators/change-basis.ts';
import { collisionSheet } from './calculators/collision.ts';
import { energySheet } from './calculators/energy.ts';
import { desorptionSheet } from './calculators/desorption.ts';
import { eyringSheet } from './calculators/eyring.ts';
import { fitSheet } from './calculators/fit.ts';
import { kieSheet } from './calculators/kie.ts';
import { parseStepSheet } from './calculators/parse-step.ts';
import { parseValueSheet } from './calculators/parse-value.ts';
import { poolSheet } from './calculators/pool.ts';
import { profileSheet } from './calculators/profile.ts';
import { rateConstantSheet } from './calculators/rate-constant.ts';
import { reverseSheet } from './calculators/reverse.ts';
import { siteDensitySheet } from './calculators/site-density.ts';
import { tunnellingSheet } from './calculators/tunnelling.ts';
import { twoTemperatureSheet } from './calculators/two-temperature.ts';
import { uncertaintySheet } from './calculators/uncertainty.ts';
import type { Sheet } from './sheet.ts';

export interface Purpose {
  id: string;
  title: string;
  /** What one comes with, in a line. */
  line: string;
  sheets: readonly Sheet[];
}

/** The calculators by what they are for, in the order of the Workbench. */
export const purposes: readonly Purpose[] = [
  { id: 'reading', title: 'Reading', line: 'What the source prints', sheets: [parseValueSheet, parseStepSheet, uncertaintySheet] },
  { id: 'converting', title: 'Converting', line: 'From one unit or basis to another', sheets: [energySheet, rateConstantSheet, changeBasisSheet] },
  { id: 'temperature', title: 'Temperature dependence', line: 'Rate constants against temperature', sheets: [arrheniusSheet, twoTemperatureSheet, fitSheet, eyringSheet] },
  { id: 'surface', title: 'Surface and gas', line: 'Sites, collisions, desorption', sheets: [siteDensitySheet, collisionSheet, desorptionSheet] },
  { id: 'isotopes', title: 'Isotopes', line: 'Light against heavy', sheets: [kieSheet, tunnellingSheet] },
  { id: 'estimating', title: 'Estimating', line: 'What is not reported', sheets: [bondOrderSheet, reverseSheet] },
  { id: 'judging', title: 'Judging', line: 'Several values, several steps', sheets: [poolSheet, profileSheet] },
];

/** Every calculator that has a page. */
export const sheets: readonly Sheet[] = purposes.flatMap((purpose) => purpose.sheets);

/** The page of a calculator by its name in the address; null when there is none. */
export function sheetNamed(name: string): { sheet: Sheet; purpose: Purpose } | null {
  for (const purpose of purposes) {
    const sheet = purpose.sheets.find((one) => one.calculator.name === name);
    if (sheet) return { sheet, purpose };
  }
  return null;
}
