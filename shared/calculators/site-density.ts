import * as z from 'zod';
import { crystalStructures, siteDensity } from '../kinetics/surfaces.ts';
import { calculator } from './calculator.ts';

export const siteDensityCalculator = calculator({
  name: 'site-density',
  title: 'Density of surface atoms',
  summary: 'Counts the outermost atoms of an ideal facet from the lattice constant.',
  formulas: ['fcc: (111) 4/(√3 a^2), (100) 2/a^2, (110) √2/a^2', 'bcc: (110) √2/a^2, (100) 1/a^2, (111) 1/(√3 a^2)', 'hcp: (0001) 2/(√3 a^2)'],
  validity: 'Outermost atoms of an ideal, unreconstructed terrace of a pure metal, taken as sites. Open and stepped surfaces, alloys and particles need a stated count.',
  references: ['Geometry of the ideal (1×1) cell', 'CODATA 2022'],
  input: z.strictObject({ structure: z.enum(crystalStructures), facet: z.string().max(40), aAngstrom: z.number() }),
  output: z.object({ perM2: z.number(), perCm2: z.number(), molPerM2: z.number() }),
  calculate: (input) => siteDensity(input),
});
