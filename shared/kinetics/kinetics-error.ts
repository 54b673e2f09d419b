/** Codes of input that the computing core refuses. */
export const kineticsErrorCodes = [
  'not-finite',
  'out-of-range',
  'missing-input',
  'unreadable-value',
  'unknown-unit',
  'ambiguous-unit',
  'incompatible-units',
  'unit-contradicts-orders',
  'facet-impossible',
  'unsupported',
] as const;

/** One code of `kineticsErrorCodes`. */
export type KineticsErrorCode = (typeof kineticsErrorCodes)[number];

/** Meaningless or insufficient input: says which quantity, what was given and what is needed. */
export class KineticsError extends Error {
  /** Name of the input that is at fault, such as `temperatureK`. */
  readonly path: string;
  readonly code: KineticsErrorCode;
  /** The value that was given. */
  readonly value: unknown;

  constructor(path: string, message: string, code: KineticsErrorCode = 'out-of-range', value?: unknown) {
    super(message);
    this.name = 'KineticsError';
    this.path = path;
    this.code = code;
    this.value = value;
  }

  /** The same as `path`: the quantity at fault. */
  get quantity(): string {
    return this.path;
  }
}

/** Returns a finite number or throws a `KineticsError` that names it. */
export function requireFinite(path: string, value: number): number {
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    throw new KineticsError(path, `${path} must be a finite number, got ${String(value)}`, 'not-finite', value);
  }
  return value;
}

/** Returns a finite number above zero or throws; `label` and `unit` are used in the message ("T must be above 0 K, got -5"). */
export function requirePositive(path: string, value: number, label: string = path, unit = ''): number {
  requireFinite(path, value);
  if (value <= 0) {
    throw new KineticsError(path, `${label} must be above 0${unit ? ` ${unit}` : ''}, got ${value}`, 'out-of-range', value);
  }
  return value;
}

/** Returns a finite number of zero or more, or throws. */
export function requireNonNegative(path: string, value: number, label: string = path, unit = ''): number {
  requireFinite(path, value);
  if (value < 0) {
    throw new KineticsError(path, `${label} must not be below 0${unit ? ` ${unit}` : ''}, got ${value}`, 'out-of-range', value);
  }
  return value;
}

/** Returns a thermodynamic temperature [K] above zero, or throws. */
export function requireTemperature(path: string, value: number, label = 'T'): number {
  return requirePositive(path, value, label, 'K');
}
