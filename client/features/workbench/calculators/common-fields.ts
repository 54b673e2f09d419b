import type { NumberField, TextField } from '../sheet.ts';

/** Units of rate constants and pre-exponential factors, offered while typing; any other may be typed. */
export const rateUnits = [
  's-1', 'cm3 molecule-1 s-1', 'L mol-1 s-1', 'm3 mol-1 s-1', 'Torr-1 s-1', 'bar-1 s-1', 'Pa-1 s-1', 'cm2 molecule-1 s-1', 'm2 mol-1 s-1', 'ML-1 s-1',
  'molecule cm-2 s-1', 'mol m-2 s-1', 'mol g-1 s-1',
] as const;

export const temperature: NumberField = { kind: 'number', key: 'temperatureK', label: 'Temperature', symbol: 'T', unit: 'K', temperature: true };

export const exponent: NumberField = { kind: 'number', key: 'exponent', label: 'Temperature exponent', symbol: 'n', optional: true, usual: '0' };

export const referenceTemperature: NumberField = { kind: 'number', key: 'referenceTemperatureK', label: 'Reference temperature', symbol: 'T_{0}', unit: 'K', optional: true, usual: '1' };

export const activationEnergy: NumberField = { kind: 'number', key: 'energyKJPerMol', label: 'Activation energy', symbol: 'E', energy: true };

/** The unit of A and of k, which no formula needs and every figure shows. */
export const rateUnit: TextField = { kind: 'text', key: 'rateUnit', label: 'Unit of A and k', own: true, usual: 's-1', suggestions: rateUnits, most: 80, hint: 'Shown with the figures; it changes none of them.' };

export const preExponential: NumberField = { kind: 'number', key: 'preExponential', label: 'Pre-exponential factor', symbol: 'A', unitFrom: 'rateUnit' };
