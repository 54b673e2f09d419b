import { printSpecies } from './print-step.ts';
import type { Term } from './species.ts';

function exact(value: number): number {
  return Number(value.toPrecision(12));
}

/** What every coefficient is multiplied by so that they are the smallest whole numbers; 1 where there are none. */
function toSmallest(coefficients: readonly number[]): number {
  for (let times = 1; times <= 12; times += 1) {
    const counts = coefficients.map((coefficient) => coefficient * times);
    if (counts.some((count) => Math.abs(count - Math.round(count)) > 1e-6)) continue;
    const divisor = counts.map(Math.round).reduce((a, b) => {
      let [x, y] = [a, b];
      while (y > 0) [x, y] = [y, x % y];
      return x;
    });
    return times / divisor;
  }
  return 1;
}

/**
 * One event of a step: each species once, without what stands on both sides, in the smallest whole numbers.
 *
 * ½N2 + * -> N* and 2N2 + 4* -> 4N* both happen as N2 + 2* -> 2N*. Where nothing is left, as in a hop, the species stay.
 */
export function netSides(reactants: readonly Term[], products: readonly Term[]): [Term[], Term[]] {
  const net = new Map<string, Term>();
  const [left, right] = [new Map<string, Term>(), new Map<string, Term>()];
  const put = (side: Map<string, Term>, { coefficient, species }: Term, sign: 1 | -1): void => {
    const name = printSpecies(species);
    side.set(name, { species, coefficient: (side.get(name)?.coefficient ?? 0) + sign * coefficient });
  };
  for (const term of reactants) {
    put(net, term, -1);
    put(left, term, 1);
  }
  for (const term of products) {
    put(net, term, 1);
    put(right, term, 1);
  }
  const changes = [...net.values()].filter(({ coefficient }) => Math.abs(coefficient) > 1e-9);
  const sides: [Term[], Term[]] =
    changes.length === 0
      ? [[...left.values()], [...right.values()]]
      : [changes.filter(({ coefficient }) => coefficient < 0).map((term) => ({ ...term, coefficient: -term.coefficient })), changes.filter(({ coefficient }) => coefficient > 0)];
  const factor = toSmallest(sides.flat().map(({ coefficient }) => coefficient));
  return sides.map((side) => side.map((term) => ({ ...term, coefficient: exact(term.coefficient * factor) }))) as [Term[], Term[]];
}
