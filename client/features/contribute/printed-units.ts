import type { QuantitySymbol } from '#shared/domain/kinds.ts';

const energies = ['kJ/mol', 'kcal/mol', 'eV', 'meV', 'K', 'cm-1', 'J/mol', 'cal/mol', 'hartree', 'rydberg'];
const rates = [
  's-1', 'cm3 molecule-1 s-1', 'L mol-1 s-1', 'm3 mol-1 s-1', 'Torr-1 s-1', 'bar-1 s-1', 'Pa-1 s-1', 'cm2 molecule-1 s-1', 'm2 mol-1 s-1', 'cm2 s-1',
  'ML-1 s-1', 'molecules cm-2 s-1', 'mol m-2 s-1', 'mol g-1 s-1',
];

const bySymbol: Partial<Record<QuantitySymbol, readonly string[]>> = {
  energy: energies,
  reactionEnergy: energies,
  adsorptionEnergy: energies,
  coverageSlope: ['kJ/mol', 'kcal/mol', 'eV'],
  preExponential: rates,
  rateConstant: rates,
  turnoverRate: ['s-1', 'min-1', 'h-1', 'molecules site-1 s-1'],
  equilibriumConstant: ['bar-1', 'Pa-1', 'Torr-1', 'atm-1'],
  diffusionCoefficient: ['cm2 s-1', 'm2 s-1'],
  activationEntropy: ['J mol-1 K-1', 'cal mol-1 K-1', 'J/(mol K)'],
  referenceTemperature: ['K'],
};

/** Units that sources print for a quantity, as suggestions; any other may be typed. */
export function unitsFor(symbol: QuantitySymbol): readonly string[] {
  return bySymbol[symbol] ?? [];
}
