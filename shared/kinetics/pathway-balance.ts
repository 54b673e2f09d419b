import { KineticsError, requirePositive } from './kinetics-error.ts';

/** A species of a step, by any name that stands for it alone. */
export interface BalanceTerm {
  name: string;
  /** Stoichiometric coefficient, above 0. */
  coefficient: number;
  /** True for adsorbed species and free sites. */
  surface: boolean;
}

/** A step with its stoichiometric number. */
export interface BalanceStep {
  reactants: readonly BalanceTerm[];
  products: readonly BalanceTerm[];
  /** How often it runs in the pathway, 1 when absent. */
  times?: number;
}

/** What a pathway amounts to as a whole. */
export interface PathwayBalance {
  reactants: BalanceTerm[];
  products: BalanceTerm[];
  /** True where no surface species is left over: the steps with these stoichiometric numbers close a cycle. */
  closed: boolean;
  /** Equation of the whole, `2 NH3 -> N2 + 3 H2`. */
  equation: string;
}

function side(terms: readonly BalanceTerm[]): string {
  return terms.map(({ name, coefficient }) => (coefficient === 1 ? name : `${coefficient} ${name}`)).join(' + ') || 'nothing';
}

/**
 * Adds the steps of a pathway with their stoichiometric numbers: Σ σ_i (products - reactants), species that cancel left out.
 *
 * Source: stoichiometric numbers of elementary steps (common practice).
 * @throws KineticsError on no step, or a coefficient or stoichiometric number not above 0.
 * @example pathwayBalance([{ reactants: [{ name: 'A', coefficient: 1, surface: false }, { name: '*', coefficient: 1, surface: true }], products: [{ name: 'A*', coefficient: 1, surface: true }], times: 2 }, { reactants: [{ name: 'A*', coefficient: 2, surface: true }], products: [{ name: 'A2', coefficient: 1, surface: false }, { name: '*', coefficient: 2, surface: true }] }]).equation // '2 A -> A2'
 */
export function pathwayBalance(steps: readonly BalanceStep[]): PathwayBalance {
  if (steps.length === 0) throw new KineticsError('steps', 'a pathway needs at least one step', 'missing-input', 0);
  const net = new Map<string, { coefficient: number; surface: boolean }>();
  const add = (terms: readonly BalanceTerm[], factor: number, path: string): void => terms.forEach(({ name, coefficient, surface }, k) => {
    requirePositive(`${path}.${k}.coefficient`, coefficient, 'coefficient');
    const entry = net.get(name) ?? { coefficient: 0, surface };
    entry.coefficient = Number((entry.coefficient + factor * coefficient).toPrecision(12));
    net.set(name, entry);
  });
  steps.forEach(({ reactants, products, times = 1 }, i) => {
    requirePositive(`steps.${i}.times`, times, 'times');
    add(reactants, -times, `steps.${i}.reactants`);
    add(products, times, `steps.${i}.products`);
  });
  const terms = [...net].filter(([, { coefficient }]) => Math.abs(coefficient) > 1e-9);
  const left = (sign: number): BalanceTerm[] => terms.filter(([, { coefficient }]) => coefficient * sign > 0).map(([name, { coefficient, surface }]) => ({ name, coefficient: Math.abs(coefficient), surface }));
  const reactants = left(-1);
  const products = left(1);
  return { reactants, products, closed: terms.every(([, { surface }]) => !surface), equation: `${side(reactants)} -> ${side(products)}` };
}
