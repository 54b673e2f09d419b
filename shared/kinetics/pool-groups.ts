import type { UncertainValue } from './heterogeneity.ts';

/** One value that is pooled: a value as given, or all the values of one group. */
export interface PoolMember extends UncertainValue {
  /** Indices of the values as given. */
  indices: number[];
  /** Name of the group, null for a value on its own. */
  group: string | null;
}

function combine(values: readonly UncertainValue[]): UncertainValue {
  const smallest = Math.min(...values.map(({ u }) => u));
  const weights = values.map(({ u }) => (smallest / u) ** 2);
  const sum = weights.reduce((total, w) => total + w, 0);
  const base = (values[0] as UncertainValue).value;
  let offset = 0;
  let common = 0;
  values.forEach(({ value, u }, i) => {
    offset += ((weights[i] as number) / sum) * (value - base);
    common += ((weights[i] as number) / sum) * u;
  });
  let scatter = 0;
  values.forEach(({ value }, i) => {
    scatter += ((weights[i] as number) / sum) * (value - base - offset) ** 2;
  });
  return { value: base + offset, u: Math.hypot(common, Math.sqrt(scatter / (values.length - 1))) };
}

/**
 * Makes one value of all that share a group (one source, say), which are not independent of each other.
 *
 * Mean m with weights w ∝ 1/u², Σw = 1; u² = (Σ w u)² + Σ w (x - m)²/(n - 1): the uncertainties are taken as fully correlated, so a
 * repeated value adds nothing, and the scatter inside the group counts on top. The order of first mention is kept.
 * Sources: JCGM 100:2008 (GUM) 5.2.2, note 1 (full correlation); Birge, Phys. Rev. 40 (1932) 207 (error from scatter); their sum is common practice.
 * @example groupValues([{ value: 70, u: 1, group: 'a' }, { value: 70, u: 1, group: 'a' }])[0].u // 1
 */
export function groupValues(values: readonly (UncertainValue & { group?: string | null })[]): PoolMember[] {
  const members: PoolMember[] = [];
  const byGroup = new Map<string, PoolMember>();
  values.forEach(({ value, u, group = null }, i) => {
    const known = group === null ? undefined : byGroup.get(group);
    if (known) {
      known.indices.push(i);
      return;
    }
    const member: PoolMember = { value, u, indices: [i], group };
    members.push(member);
    if (group !== null) byGroup.set(group, member);
  });
  return members.map((member) => (member.indices.length === 1 ? member : { ...member, ...combine(member.indices.map((i) => values[i] as UncertainValue)) }));
}
