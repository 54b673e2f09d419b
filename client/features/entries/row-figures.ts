import { kindsHeld, primarySymbol, type Kind, type QuantitySymbol } from '#shared/domain/kinds.ts';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import type { Entry } from '#shared/contracts/entries.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';
import { decimalsOf, energyIn, setNumber, type SetNumber } from '#client/lib/numbers.ts';

/** A quantity in the unit it is shown in. */
export interface ShownQuantity {
  quantity: Quantity;
  unit: string;
  value: number | null;
  low: number | null;
  high: number | null;
  u: number | null;
  /** Digits that conversion adds to those printed. */
  guard: number;
}

const energySymbols: ReadonlySet<QuantitySymbol> = new Set(['energy', 'reactionEnergy', 'adsorptionEnergy', 'coverageSlope']);

/** Whether the quantity is an energy that is shown in the reader's unit. */
export function isEnergy(quantity: Quantity): boolean {
  return energySymbols.has(quantity.symbol) && quantity.unit === 'kJ/mol';
}

/** A quantity with its figures in the reader's unit, or in its own where it is no energy. */
export function shown(quantity: Quantity, unit: EnergyUnit): ShownQuantity {
  const energy = isEnergy(quantity);
  const convert = (value: number | null) => (value === null || !energy ? value : energyIn(unit, value));
  const own = energy ? unit : quantity.unit;
  return {
    quantity,
    unit: own,
    value: convert(quantity.value),
    low: convert(quantity.low),
    high: convert(quantity.high),
    u: quantity.uncertaintyScale === 'ln' ? quantity.standardUncertainty : convert(quantity.standardUncertainty),
    guard: quantity.unitAsPrinted === own ? 0 : 1,
  };
}

/** The quantity of an entry that a search for these kinds is about: the first of them it holds, else its primary one. */
export function quantityFor(entry: Entry, kinds: readonly Kind[] | undefined): Quantity | null {
  const asked = kinds?.length ? entry.quantities.find((one) => kindsHeld([one]).some((kind) => kinds.includes(kind))) : undefined;
  const primary = entry.kind ? primarySymbol[entry.kind] : undefined;
  return asked ?? entry.quantities.find((one) => one.symbol === primary) ?? entry.quantities[0] ?? null;
}

/** The quantity drawn as a barrier; null when the entry holds none. */
export function barrierOf(entry: Entry): Quantity | null {
  return entry.quantities.find((one) => one.symbol === 'energy') ?? null;
}

/** The pre-exponential factor of an entry; null when it holds none. */
export function factorOf(entry: Entry): Quantity | null {
  return entry.quantities.find((one) => one.symbol === 'preExponential') ?? null;
}

/** The figures of a row, set to the digits they deserve. */
export interface RowFigure {
  shown: ShownQuantity;
  number: SetNumber | null;
  low: SetNumber | null;
  high: SetNumber | null;
  /** Decimals of the uncertainty, the same as the value's. */
  decimals: number;
}

/**
 * The half-width as reported, in the unit of the value: an uncertainty of unknown kind still tells how many digits deserve to be shown.
 * The printed central value gives the factor between the two.
 */
function reportedInUnit({ value }: ShownQuantity, { asPrinted: text, reportedUncertainty, uncertaintyScale }: Quantity): number | null {
  const central = Number.parseFloat(text.replace('\u2212', '-'));
  if (value === null || reportedUncertainty === null || uncertaintyScale !== 'linear' || !Number.isFinite(central) || central === 0) return null;
  return Math.abs(reportedUncertainty * (value / central));
}

/** Digits that a dense table shows at most of a value without uncertainty. */
const mostDigits = 4;

/** Digits of a print that can be trusted: the zeros at the end of a whole number ("7100 J/mol") may be there for its size alone. */
function trustedDigits({ asPrinted: text, significantDigits }: Quantity): number {
  if (significantDigits === null) return mostDigits;
  const zeros = /^[^.,]*[1-9](0+)$/.exec(text.trim())?.[1]?.length ?? 0;
  return Math.max(1, significantDigits - zeros);
}

/** Sets the value of a row as a dense table does: to one digit of its uncertainty, else as printed. */
export function rowFigure(quantity: Quantity, unit: EnergyUnit): RowFigure {
  const figure = shown(quantity, unit);
  const central = figure.value ?? figure.high ?? figure.low ?? 0;
  const linearU = quantity.uncertaintyScale === 'linear' ? figure.u ?? reportedInUnit(figure, quantity) : null;
  const printedDigits = Math.min(mostDigits, trustedDigits(quantity) + figure.guard);
  const decimals = decimalsOf(central, { u: linearU, uDigits: 1, significantDigits: printedDigits, guard: 0 });
  const digits = Math.max(1, quantity.significantDigits ?? 3);
  const set = (value: number | null) => (value === null ? null : setNumber(value, { decimals, digits }));
  const limit = figure.value ?? (quantity.bound === 'range' ? null : figure.high ?? figure.low);
  return { shown: figure, number: set(limit), low: set(figure.low), high: set(figure.high), decimals };
}

/** The unit that all figures of a column share, or null when they differ and each must name its own. */
export function commonUnit(figures: readonly (RowFigure | null)[]): string | null {
  const units = new Set(figures.flatMap((figure) => (figure ? [figure.shown.unit] : [])));
  return units.size === 1 ? [...units][0] ?? null : null;
}

/** The value exactly as the source prints it, with the factor that the heading of its column gives. */
export function asPrinted({ asPrinted: text, unitAsPrinted, multiplier }: Quantity): string {
  const printed = unitAsPrinted && !text.includes(unitAsPrinted) ? `${text} ${unitAsPrinted}` : text;
  return multiplier == null || multiplier === 1 ? printed : `${printed} (× ${multiplier.toExponential().replace('e+', 'e')} by its heading)`;
}

/** What is said in the place of a standard uncertainty that is not known. */
export function uncertaintyWords({ uncertaintyKind, standardUncertainty }: Quantity): string | null {
  if (standardUncertainty !== null) return null;
  return uncertaintyKind === 'none' ? 'not reported' : 'kind unknown';
}

/** The valid range in a column headed "K"; null when the source states none. */
export function rangeText(range: Entry['validRange']): string | null {
  if (!range) return null;
  const { min, max } = range;
  if (min !== null && max !== null) return `${min}–${max}`;
  if (min !== null) return `from ${min}`;
  return max === null ? null : `to ${max}`;
}
