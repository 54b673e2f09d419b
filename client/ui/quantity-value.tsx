import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';
import { energyTypeWords, symbolWords } from '#shared/domain/kinds.ts';
import { energyIn } from '#client/lib/numbers.ts';
import { Value, valueText, type ValueProps } from './value.tsx';

/** What a quantity is, in words: its energy type where it has one. */
export function quantityWords({ symbol, energyType }: Pick<Quantity, 'symbol' | 'energyType'>): string {
  return symbol === 'energy' && energyType ? energyTypeWords[energyType] : symbolWords[symbol];
}

/** The converted value of a quantity as it is set: energies in the reader's unit, everything else in its own. */
export function shownQuantity(quantity: Quantity, energyUnit: EnergyUnit): ValueProps {
  const { value, low, high, bound, standardUncertainty: u, uncertaintyScale: uScale, significantDigits, unit } = quantity;
  const inUnit = (number: number | null) => (number === null || unit !== 'kJ/mol' ? number : energyIn(energyUnit, number));
  return {
    value: inUnit(value), low: inUnit(low), high: inUnit(high), bound, uScale, significantDigits,
    u: uScale === 'ln' ? u : inUnit(u), unit: unit === 'kJ/mol' ? energyUnit : unit === '1' ? '' : unit,
  };
}

interface QuantityValueProps {
  quantity: Quantity;
  energyUnit: EnergyUnit;
  large?: boolean;
}

/** The converted value of a quantity; where it could not be converted, that is said. */
export function QuantityValue({ quantity, energyUnit, large = false }: QuantityValueProps) {
  return <Value {...shownQuantity(quantity, energyUnit)} large={large} absent="not converted" />;
}

/** The same as text. */
export function quantityText(quantity: Quantity, energyUnit: EnergyUnit): string {
  return valueText(shownQuantity(quantity, energyUnit));
}

/** The value string and unit as printed, together. */
export function printedText({ asPrinted, unitAsPrinted }: Pick<Quantity, 'asPrinted' | 'unitAsPrinted'>): string {
  return [asPrinted, unitAsPrinted].filter(Boolean).join(' ');
}
