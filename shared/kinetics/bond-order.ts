import { operationLine, quantityText, type DerivationLine } from './derivation.ts';
import { requireEnergyUnit } from './energy.ts';
import { KineticsError, requireNonNegative, requirePositive } from './kinetics-error.ts';

/** Forms of the estimate. */
export const bondOrderForms = ['early', 'interpolated'] as const;

/** Where the molecule that splits comes from. */
export const bondOrderStarts = ['gas', 'adsorbed'] as const;

interface BondOrderCommon {
  /** `early`: the whole of the product term. `interpolated`: the later form, a share φ of it and of the reaction energy. */
  form: (typeof bondOrderForms)[number];
  /** φ of the interpolated form, 0 to 1; 0.5 when absent. */
  interpolation?: number;
  /** Energy of the bond A–B that breaks, in the gas: of this bond, not of the whole molecule. */
  dissociationEnergy: number;
  /** Q_A, heat of adsorption of A at its site. */
  heatA: number;
  /** Q_AB, heat of adsorption of the molecule that splits; not needed in the early form from the gas. */
  heatAB?: number;
  from: (typeof bondOrderStarts)[number];
  /** Energy unit of all inputs and results, such as kJ/mol, kcal/mol or eV. */
  unit: string;
}

/** AB → A* + B*. */
export interface BondOrderDissociation extends BondOrderCommon {
  process: 'dissociation';
  /** Q_B, heat of adsorption of B at its site. */
  heatB: number;
}

/** AB + C* → A* + BC*: the bond A–B breaks and B–C forms. */
export interface BondOrderExchange extends BondOrderCommon {
  process: 'exchange';
  /** Energy of the bond B–C that forms, in the gas. */
  formedBondEnergy: number;
  /** Q_BC, heat of adsorption of the product BC; `heatB` in its place when absent. */
  heatBC?: number;
  /** Heat of adsorption of the product that holds B, which is BC: read only where `heatBC` is absent. */
  heatB?: number;
  /** Q_C, heat of adsorption of C. */
  heatC: number;
}

/** Input of `bondOrderBarrier`. */
export type BondOrderInput = BondOrderDissociation | BondOrderExchange;

/** An estimated barrier, in the unit of the input. */
export interface BondOrderEstimate {
  /** Not below max(0, reaction energy). */
  barrier: number;
  /** Barrier of the same process backwards, by the cycle: barrier minus reaction energy. */
  reverseBarrier: number;
  /** Of the process as it is started: from the gas or from the adsorbed molecule. */
  reactionEnergy: number;
  /** The barrier before the bound. */
  unboundedBarrier: number;
  /** Its reverse: below 0 where the estimate lies below the reaction energy. */
  unboundedReverseBarrier: number;
  /** Which bound the barrier was raised to: none, 0 (not activated) or the reaction energy. */
  bound: 'none' | 'zero' | 'reaction-energy';
  unit: string;
  derivation: DerivationLine[];
}

const early = 'Shustorovich, Surf. Sci. Rep. 6 (1986) 1; Adv. Catal. 37 (1990) 101';
const later = 'Shustorovich and Sellers, Surf. Sci. Rep. 31 (1998) 1; form recalled from memory, not checked against the text';

interface Read {
  d: number;
  /** Energy of the bond that forms; 0 for dissociation. */
  formed: number;
  qA: number;
  /** Heat of the product that holds B. */
  qProduct: number;
  qC: number;
  /** 0 where the adsorbed molecule does not enter. */
  qAB: number;
  phi: number;
}

function requireHeatAB(input: BondOrderInput): number {
  if (input.heatAB !== undefined) return requireNonNegative('heatAB', input.heatAB, 'Q_AB');
  if (input.form === 'early' && input.from === 'gas') return 0;
  throw new KineticsError('heatAB', `heatAB is missing: the ${input.from === 'adsorbed' ? 'adsorbed molecule is where the process starts' : 'interpolated form passes over the adsorbed molecule'}, so give its heat of adsorption`, 'missing-input');
}

function read(input: BondOrderInput): Read {
  const phi = input.interpolation ?? 0.5;
  if (!(phi >= 0 && phi <= 1)) throw new KineticsError('interpolation', `interpolation must be between 0 and 1, got ${phi}`, 'out-of-range', phi);
  const d = requirePositive('dissociationEnergy', input.dissociationEnergy, 'the dissociation energy');
  const qA = requirePositive('heatA', input.heatA, 'Q_A');
  const common = { d, qA, phi, qAB: requireHeatAB(input) };
  if (input.process === 'dissociation') return { ...common, formed: 0, qProduct: requirePositive('heatB', input.heatB, 'Q_B'), qC: 0 };
  const qProduct = input.heatBC ?? input.heatB;
  if (qProduct === undefined) throw new KineticsError('heatBC', 'heatBC is missing: an exchange needs the heat of adsorption of the molecule that forms', 'missing-input');
  return {
    ...common,
    formed: requirePositive('formedBondEnergy', input.formedBondEnergy, 'the energy of the bond that forms'),
    qProduct: requirePositive(input.heatBC === undefined ? 'heatB' : 'heatBC', qProduct, 'Q_BC'),
    qC: requireNonNegative('heatC', input.heatC, 'Q_C'),
  };
}

/** The formula of an estimate in words, with the figures behind it. */
function formulaOf(input: BondOrderInput, { d, formed, qA, qProduct, qC, qAB, phi }: Read, dH: number, unit: string): { reaction: string; barrier: string } {
  const adsorbed = input.from === 'adsorbed';
  const exchange = input.process === 'exchange';
  const product = exchange ? 'Q_BC' : 'Q_B';
  const figure = (name: string, value: number): string => `${name} = ${quantityText(value, unit)}`;
  const start = adsorbed ? ' + Q_AB' : '';
  const heats = [
    figure('D_AB', d), ...(exchange ? [figure('D_BC', formed)] : []), figure('Q_A', qA), figure(product, qProduct), ...(exchange ? [figure('Q_C', qC)] : []), ...(adsorbed ? [figure('Q_AB', qAB)] : []),
  ];
  const energy = exchange ? `D_AB - D_BC${start} + Q_C - Q_A - Q_BC` : `D_AB${start} - Q_A - Q_B`;
  const term = `Q_A ${product}/(Q_A + ${product})`;
  const terms = [figure('ΔH', dH), figure('Q_A', qA), figure(product, qProduct)];
  if (input.form === 'early') return { reaction: `ΔH = ${energy}: ${heats.join(', ')}`, barrier: `E = ΔH + ${term}: ${terms.join(', ')}` };
  const words = adsorbed ? `E = φ [ΔH + ${term}]` : `E = φ [ΔH + Q_AB + ${term}] - Q_AB`;
  return { reaction: `ΔH = ${energy}: ${heats.join(', ')}`, barrier: `${words}: φ = ${phi}, ${[...terms, ...(adsorbed ? [] : [figure('Q_AB', qAB)])].join(', ')}` };
}

function assumptionOf(input: BondOrderInput): string | undefined {
  if (input.process === 'dissociation') return undefined;
  if (input.heatBC === undefined) return 'heatB is the heat of adsorption of BC, the product that holds B; form for an exchange recalled from memory';
  return `form for an exchange recalled from memory${input.heatB === undefined ? '' : '; heatB, of the atom or group alone, does not enter'}`;
}

/**
 * Estimates a barrier of dissociation or exchange by bond-order conservation (BOC-MP, UBI-QEP); energies in the unit of the input.
 *
 * From the adsorbed state ΔH = D_AB + Q_AB - Q_A - Q_B, or for AB* + C* → A* + BC*: ΔH = (D_AB - D_BC) + Q_AB + Q_C - Q_A - Q_BC, and
 * P = Q_A Q_B/(Q_A + Q_B), in an exchange Q_A Q_BC/(Q_A + Q_BC). Early form: E = ΔH + P. Interpolated: E = φ (ΔH + P), φ = 0.5 unless said.
 * From the gas both ΔH and E are less by Q_AB. Every barrier is raised to max(0, ΔH) of its own process, the reverse follows by the cycle.
 * The interpolated form and the exchange are recalled from memory, not checked against the text. An estimate: shown beside literature values, never stored as one.
 * Sources: Shustorovich, Surf. Sci. Rep. 6 (1986) 1; Adv. Catal. 37 (1990) 101; Shustorovich and Sellers, Surf. Sci. Rep. 31 (1998) 1.
 * @throws KineticsError on a bond energy or heat not above 0 (Q_AB and Q_C may be 0), a missing heat, φ outside 0 to 1, or a unit that is no energy.
 * @example bondOrderBarrier({ form: 'early', process: 'dissociation', dissociationEnergy: 226, heatA: 135, heatB: 135, heatAB: 11, from: 'adsorbed', unit: 'kcal/mol' }).barrier // 34.5
 */
export function bondOrderBarrier(input: BondOrderInput): BondOrderEstimate {
  const unit = requireEnergyUnit(input.unit, 'unit').symbol;
  const heats = read(input);
  const { d, formed, qA, qProduct, qC, qAB, phi } = heats;
  const adsorbed = input.from === 'adsorbed';
  const fromGas = d - formed + qC - qA - qProduct;
  const reactionEnergy = adsorbed ? fromGas + qAB : fromGas;
  const product = qA * (qProduct / (qA + qProduct));
  const overAdsorbed = phi * (fromGas + qAB + product);
  const unboundedBarrier = input.form === 'early' ? reactionEnergy + product : adsorbed ? overAdsorbed : overAdsorbed - qAB;
  const barrier = Math.max(0, reactionEnergy, unboundedBarrier);
  const bound = barrier === unboundedBarrier ? 'none' : barrier === 0 ? 'zero' : 'reaction-energy';
  const formula = formulaOf(input, heats, reactionEnergy, unit);
  const reference = input.form === 'early' ? early : later;
  const reverseBarrier = barrier - reactionEnergy;
  const assumption = assumptionOf(input);
  const cycle = 'thermodynamic cycle';
  return {
    barrier,
    reverseBarrier,
    reactionEnergy,
    unboundedBarrier,
    unboundedReverseBarrier: unboundedBarrier - reactionEnergy,
    bound,
    unit,
    derivation: [
      operationLine(formula.reaction, { value: d, unit }, { value: reactionEnergy, unit }, cycle, { assumption }),
      operationLine(formula.barrier, { value: reactionEnergy, unit }, { value: unboundedBarrier, unit }, reference, { assumption: 'an estimate, never stored as a literature value' }),
      ...(bound === 'none' ? [] : [operationLine(`Raise to max(0, ΔH), ΔH = ${quantityText(reactionEnergy, unit)}`, { value: unboundedBarrier, unit }, { value: barrier, unit }, early)]),
      operationLine(`Reverse: E - ΔH, ΔH = ${quantityText(reactionEnergy, unit)}`, { value: barrier, unit }, { value: reverseBarrier, unit }, cycle),
    ],
  };
}
