import * as z from 'zod';
import { tunnellingFactor, tunnellingModels } from '../kinetics/tunnelling.ts';
import { calculator } from './calculator.ts';

export const tunnellingCalculator = calculator({
  name: 'tunnelling',
  title: 'Tunnelling factor',
  summary: 'Estimates by how much tunnelling raises a rate constant, from the imaginary wavenumber and the barrier.',
  formulas: ['u = hcν^‡/k_BT', 'Wigner: κ = 1 + u^2/24', 'Bell 1935: κ = e^{α}(βe^{−α} − αe^{−β})/(β − α)', 'Bell 1959: κ = (u/2)/sin(u/2) − Σ(−1)^n αe^{α−nβ}/(α − nβ)', 'α = E/RT, β = 2πE/hν^‡'],
  validity: 'Wigner’s formula holds for u well below 2π. Bell’s models take a parabolic barrier of the height given; below the crossover temperature, where u = 2π, every such factor is an order of magnitude.',
  references: ['Wigner, Z. Phys. Chem. B 19 (1932) 203', 'Bell, Proc. R. Soc. A 148 (1935) 241', 'Bell, Trans. Faraday Soc. 55 (1959) 1'],
  input: z.strictObject({ model: z.enum(tunnellingModels), imaginaryPerCm: z.number(), temperatureK: z.number(), energyKJPerMol: z.number().optional() }),
  output: z.object({
    kappa: z.number(), u: z.number(), crossoverTemperatureK: z.number(), alpha: z.number().optional(), beta: z.number().optional(), warnings: z.array(z.string()),
  }),
  calculate: (input) => tunnellingFactor(input),
});
