import { KineticsError, requirePositive } from './kinetics-error.ts';
import type { QuantityContext } from './quantity-symbols.ts';
import { isAmbiguousArea, omissionCandidates, rateBasisOf, unitOfBasis, type RateBasis } from './rate-basis.ts';
import { ambiguousArea } from './rate-constant.ts';
import { dimensionText, type Unit } from './units.ts';

/** Orders a unit is judged against. */
export interface ReportedOrders {
  gas: number;
  surface: number;
  /** True when the source reports them; false when they follow from the stoichiometry. */
  reported: boolean;
}

/**
 * True when a species name stands for something at the surface: `N*`, `CO(ads)`, `*`.
 *
 * @example [isSurfaceSpecies('N*'), isSurfaceSpecies('NH3')] // [true, false]
 */
export function isSurfaceSpecies(name: string): boolean {
  return /\*|_\{?ads?\}?|\((?:a|ad|ads)\)/i.test(name);
}

/**
 * The orders of the rate law: those the source reports, or else the stoichiometry; null when neither is known.
 *
 * @example ordersOf({ kineticOrders: { NH3: 0.8, H2: -0.5, '*': 1 } }) // { gas: 0.3, surface: 1, reported: true }
 */
export function ordersOf(context: QuantityContext): ReportedOrders | null {
  if (context.kineticOrders != null && Object.keys(context.kineticOrders).length > 0) {
    let gas = 0;
    let surface = 0;
    for (const [species, order] of Object.entries(context.kineticOrders)) {
      if (isSurfaceSpecies(species)) surface += order;
      else gas += order;
    }
    return { gas: clean(gas), surface: clean(surface), reported: true };
  }
  if (context.gasOrder == null || context.surfaceOrder == null) return null;
  return { gas: context.gasOrder, surface: context.surfaceOrder, reported: false };
}

function clean(value: number): number {
  const rounded = Number(value.toPrecision(12));
  return Math.abs(rounded) < 1e-9 ? 0 : rounded;
}

function near(a: number, b: number): boolean {
  return Math.abs(a - b) < 1e-6;
}

/**
 * True for a homogeneous gas reaction: its rate is per volume, so the unit has one gas factor less than the order.
 *
 * @example isHomogeneous({ gasConcentration: 1, gasPressure: 0, areal: 0, perMass: 0, coverage: 0, time: -1, omittedMolecule: 0 }, { gas: 2, surface: 0, reported: false }) // true
 */
export function isHomogeneous(basis: RateBasis, orders: ReportedOrders | null): boolean {
  if (orders === null || orders.surface !== 0 || basis.perMass !== 0 || basis.areal !== 0) return false;
  return orders.gas !== 0 && near(basis.gasConcentration + basis.gasPressure, orders.gas - 1);
}

function agrees(basis: RateBasis, orders: ReportedOrders): boolean {
  if (isHomogeneous(basis, orders)) return true;
  if (!near(basis.gasConcentration + basis.gasPressure, orders.gas)) return false;
  const coverageFloor = -Math.max(orders.surface, 0);
  if (basis.perMass === 1) return near(basis.areal, 0) && basis.coverage <= 0 && basis.coverage >= coverageFloor - 1e-6;
  if (near(basis.areal, 0)) return basis.coverage <= 1 + 1e-6 && basis.coverage >= coverageFloor - 1e-6;
  if (basis.coverage > 0 || basis.coverage < coverageFloor - 1e-6) return false;
  const areal = basis.areal + 1;
  return near(areal, 0) || near(areal, orders.surface) || (Number.isInteger(clean(areal)) && areal > 0 && areal < orders.surface);
}

function basis(part: Partial<RateBasis>): RateBasis {
  return { gasConcentration: 0, gasPressure: 0, areal: 0, perMass: 0, coverage: 0, time: -1, omittedMolecule: 0, ...part };
}

/** SI units that the orders allow, as examples for the message. */
function expectedUnits(orders: ReportedOrders): string[] {
  const units = [basis({ gasPressure: orders.gas }), basis({ gasPressure: orders.gas, areal: orders.surface - 1 }), basis({ gasPressure: orders.gas, areal: -1 })];
  if (orders.gas !== 0) units.push(basis({ gasConcentration: orders.gas }));
  if (orders.surface === 0 && orders.gas > 1) units.push(basis({ gasConcentration: orders.gas - 1 }));
  return [...new Set(units.map((item) => `${unitOfBasis(item).symbol} (${dimensionText(unitOfBasis(item).dimension)})`))];
}

/**
 * Reads the basis of a rate unit and refuses one that contradicts the orders.
 *
 * @throws KineticsError `unit-contradicts-orders` naming the dimension expected, `ambiguous-unit` for `cm2 s-1`, `incompatible-units` for what is no rate.
 */
export function judgeRateUnit(unit: Unit, orders: ReportedOrders | null, path = 'unitAsPrinted'): RateBasis {
  if (isAmbiguousArea(unit)) throw ambiguousArea(unit, path);
  const readings = omissionCandidates(unit).map((power) => rateBasisOf(unit, power)).filter((reading) => reading !== null);
  const first = readings[0];
  if (first === undefined || first.time !== -1) {
    const expected = orders === null ? 'a unit per time such as s-1' : expectedUnits(orders).join(', ');
    throw new KineticsError(path, `${unit.symbol} is not the unit of a rate: it has dimension ${dimensionText(unit.dimension)}, expected ${expected}`, orders === null ? 'incompatible-units' : 'unit-contradicts-orders', unit.symbol);
  }
  const fitting = readings.find((reading) => (orders === null ? reading.gasConcentration >= 0 && reading.areal >= -1 : agrees(reading, orders)));
  if (fitting) return fitting;
  if (orders === null) return first;
  throw new KineticsError(
    path,
    `${unit.symbol} contradicts the ${orders.reported ? 'reported orders' : 'orders of the elementary step'} (${orders.gas} in gas, ${orders.surface} at the surface): ` +
      `it has dimension ${dimensionText(unit.dimension)}, expected ${expectedUnits(orders).join(', ')}`,
    'unit-contradicts-orders',
    unit.symbol,
  );
}

/** The way from a constant per pair of neighbours to mean field, or what is missing for it. */
export interface PairToMeanField {
  /** Multiplier on the constant; null when something is missing. */
  factor: number | null;
  missing: string[];
  operation: string;
  assumption: string;
  reference: string;
}

/**
 * Brings a kinetic Monte Carlo constant per pair of neighbours to the mean-field constant per site; null where the constant is not per pair.
 *
 * A site with z nearest neighbours belongs to z pairs, each shared by two sites. Unlike neighbours: r = z k θ_A θ_B, either of the two
 * orders of a pair being an event. Like neighbours: r = (z/2) k θ², each pair counted once. Random mixing. Without z nothing is converted.
 * Source: mean field (Bragg–Williams) of a lattice of sites (common practice).
 * @throws KineticsError on a number of neighbours that is not above 0.
 * @example meanFieldOfPairs({ gas: 0, surface: 2, reported: false }, { perPair: true, nearestNeighbours: 6, likePair: true }).factor // 3
 */
export function meanFieldOfPairs(orders: ReportedOrders | null, context: QuantityContext): PairToMeanField | null {
  if (context.perPair !== true) return null;
  const { nearestNeighbours: z = null, likePair: like = null } = context;
  if (z !== null) requirePositive('nearestNeighbours', z, 'the number of nearest neighbours');
  const missing: string[] = [];
  if (z === null) missing.push('number of nearest neighbours');
  if (orders === null || !near(orders.surface, 2)) missing.push('two surface species for a constant per pair');
  else if (like === null) missing.push('whether the pair is of one species');
  return {
    factor: z === null || missing.length > 0 ? null : like ? z / 2 : z,
    missing,
    operation: like ? 'Mean field of a constant per pair of like neighbours: multiply by half the nearest neighbours' : 'Mean field of a constant per pair of unlike neighbours: multiply by the nearest neighbours',
    assumption: `${z} nearest neighbours, given; the species are mixed at random`,
    reference: 'mean field of a lattice of sites (common practice)',
  };
}
