import * as z from 'zod';
import { desorptionFromHeatingRates } from '../kinetics/desorption-heating.ts';
import { desorptionEnergyFromPeak } from '../kinetics/desorption-peak.ts';
import { calculator } from './calculator.ts';

const order = z.union([z.literal(1), z.literal(2)]);
const interval = z.tuple([z.number(), z.number()]).nullish();
const figure = z.number().nullish();

export const desorptionCalculator = calculator({
  name: 'desorption',
  title: 'Desorption peak',
  summary: 'Finds the energy of desorption from the temperature of a peak, or energy and pre-exponential factor from its shift with the heating rate.',
  formulas: [
    'E/(RT_{p}^{2}) = (ν/β) exp(−E/RT_{p}), first order',
    'E/(RT_{p}^{2}) = (νθ_{0}/β) exp(−E/RT_{p}), second order with θ_{p} = θ_{0}/2',
    'ln(T_{p}^{2}/β) = E/(RT_{p}) + ln(E/Rν)',
  ],
  validity: 'Linear heating, one site, ν and E that do not change with coverage, no readsorption, pumping fast against desorption. From one peak E is as good as the ν that is taken for it. For second order ν is that of −dθ/dt, twice the one per event of 2A* → A_{2}; half the coverage is taken as left at the peak, and the energy with the coverage of the integrated rate equation is given beside.',
  references: ['Redhead, Vacuum 12 (1962) 203', 'JCGM 100:2008 (GUM) 5.2.2 and H.3'],
  input: z.discriminatedUnion('method', [
    z.strictObject({ method: z.literal('peak'), peakTemperatureK: z.number(), heatingRateKPerS: z.number(), order, preExponential: z.number(), initialCoverage: z.number().optional() }),
    z.strictObject({
      method: z.literal('heating-rates'), points: z.array(z.strictObject({ heatingRateKPerS: z.number(), peakTemperatureK: z.number() })).max(200),
      order: order.default(1), initialCoverage: z.number().optional(),
    }),
  ]),
  output: z.object({
    energyKJPerMol: z.number(), energyIntegratedKJPerMol: z.number().optional(), reducedEnergy: z.number().optional(), coverageLeftAtPeak: z.number().optional(), energyPerDecadeKJPerMol: z.number().optional(),
    preExponential: figure, lnPreExponential: figure, uEnergyKJPerMol: figure, uLnPreExponential: figure, correlation: figure, ciEnergyKJPerMol: interval, ciLnPreExponential: interval,
    residualSd: figure, rSquared: figure, n: z.int().optional(), degreesOfFreedom: z.int().optional(), residuals: z.array(z.number()).optional(), leverage: z.array(z.number()).optional(),
    warnings: z.array(z.object({ code: z.string(), message: z.string() })).optional(),
  }),
  calculate: (input) => {
    if (input.method === 'peak') return desorptionEnergyFromPeak(input);
    const result = desorptionFromHeatingRates(input);
    const { preExponential } = result;
    // Outside double precision only ln ν can be given.
    return { ...result, preExponential: preExponential !== null && Number.isFinite(preExponential) && preExponential > 0 ? preExponential : null };
  },
});
