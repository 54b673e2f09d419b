import type { Check, EntryInput } from '../contracts/entries.ts';
import { symbolWords } from '../domain/kinds.ts';
import {
  checkAgainstReactionEnergy, checkEnergy, checkNotNegative, checkPreExponential, checkRateConstant, checkStickingCoefficient, checkTemperature,
  checkUncertainty, checkValidRange, factorKindOf, type Check as CoreCheck,
} from '../kinetics/plausibility.ts';
import type { ConvertedQuantity } from '../kinetics/quantity.ts';
import type { ElementaryStep } from '../steps/parse-step.ts';

/** A check with the part of the input it is about. */
export interface PlacedCheck extends Check {
  path: string;
}

const sentence = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1) + (/[.?]$/.test(text) ? '' : '.');

function ofQuantity(quantity: ConvertedQuantity, input: EntryInput, step: ElementaryStep | null): CoreCheck[] {
  const { symbol, value, unit } = quantity;
  const checks = checkUncertainty(quantity);
  const least = quantity.low ?? value;
  if (symbol === 'preExponential' || symbol === 'rateConstant' || symbol === 'kie') {
    if (least !== null) checks.push(...checkNotNegative(`the ${symbolWords[symbol]}`, least));
  }
  if (symbol === 'stickingCoefficient') for (const part of [value, quantity.low, quantity.high]) if (part !== null) checks.push(...checkStickingCoefficient(part));
  if (value === null) return checks;
  if (symbol === 'energy' && input.scope && step && step.gasOrder === 0) checks.push(...checkEnergy(value, input.scope));
  if (symbol === 'preExponential' && step && (input.scope ?? 'elementary') === 'elementary') {
    const perArea = unit === 'm2 molecule-1 s-1' || unit === 'm2 s-1';
    const kind = factorKindOf(step.class, perArea ? 'cm2 molecule-1 s-1' : unit);
    if (kind) checks.push(...checkPreExponential(kind, perArea ? value * 1e4 : value));
  }
  if (symbol === 'rateConstant') checks.push(...checkRateConstant(value, unit));
  return checks;
}

/** The checks an entry raises by itself, each with the part of the input it is about: blocking ones stand in the way of submitting. */
export function recordChecks(input: EntryInput, step: ElementaryStep | null, quantities: readonly (ConvertedQuantity & { position: number })[]): PlacedCheck[] {
  const found: PlacedCheck[] = [];
  const put = (path: string, checks: readonly CoreCheck[]): void => {
    for (const check of checks) found.push({ ...check, message: sentence(check.message), path });
  };
  for (const quantity of quantities) put(`quantities.${quantity.position}.asPrinted`, ofQuantity(quantity, input, step));
  const energy = quantities.find(({ symbol }) => symbol === 'energy');
  const fitted = energy !== undefined && input.provenance !== 'computed' && input.method?.class === 'measured';
  if (input.validRange) put('validRange.min', checkValidRange(input.validRange, fitted));
  if (input.conditions?.temperatureK !== undefined) put('conditions.temperatureK', checkTemperature(input.conditions.temperatureK));
  const reaction = quantities.find(({ symbol }) => symbol === 'reactionEnergy');
  if (energy?.value != null && reaction?.value != null && energy.energyType === reaction.energyType) {
    put('quantities', checkAgainstReactionEnergy(energy.value, reaction.value, input.conditions?.temperatureK, (energy.standardUncertainty ?? 0) + (reaction.standardUncertainty ?? 0)));
  }
  if (input.method?.class === 'computed' && energy && !input.conditions?.endStateReference) {
    put('conditions.endStateReference', [{ code: 'end-state-reference-missing', severity: 'note', message: 'The end states of the computed barrier are not said: isolated, co-adsorbed or gas' }]);
  }
  return found;
}
