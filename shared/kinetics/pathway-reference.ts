import type { EnergyType } from './quantity-symbols.ts';

/** What the end states of a step are referred to: gas, adsorbates far apart, or both in one cell. */
export type EndStateReference = 'gas' | 'isolated' | 'co-adsorbed';

/** What must be known of a step before its energies are chained with those of the next. */
export interface ChainedStep {
  endStateReference?: EndStateReference | null;
  energyType?: EnergyType | null;
  /** A change without a transition state, such as a pairing energy: it may join two references. */
  joins?: boolean;
}

/** A place in a pathway where the energies do not chain as they stand. */
export interface ChainFault {
  code: 'mixed-energy-types' | 'energy-type-unknown' | 'reference-unknown' | 'pairing-energy-missing' | 'reference-differs';
  /** Number of the step, from 1, after which the fault stands; 0 where it is of the whole pathway. */
  afterStep: number;
  message: string;
}

const words: Record<EndStateReference, string> = { gas: 'the gas', isolated: 'isolated adsorbates', 'co-adsorbed': 'adsorbates together in one cell' };

function jointFault(before: ChainedStep, after: ChainedStep, afterStep: number): ChainFault | null {
  if (before.joins || after.joins) return null;
  const [from, to] = [before.endStateReference ?? null, after.endStateReference ?? null];
  const place = `between steps ${afterStep} and ${afterStep + 1}`;
  if (from === null || to === null) return { code: 'reference-unknown', afterStep, message: `${place} the reference of the end states is not known: the energies may not chain` };
  if (from === 'co-adsorbed' || to === 'co-adsorbed') {
    return { code: 'pairing-energy-missing', afterStep, message: `${place} end states are ${words['co-adsorbed']}: add the pairing energy as a step of its own, without a barrier` };
  }
  if (from !== to) return { code: 'reference-differs', afterStep, message: `${place} the reference changes from ${words[from]} to ${words[to]}: add the energy between them as a step of its own, without a barrier` };
  return null;
}

/**
 * Finds where the energies of a pathway do not chain: types that differ, end states on different references, pairing energies left out.
 *
 * Computed end states taken together in one cell are lower or higher than separated ones by their pairing energy, which no sum of step
 * energies holds. A step that joins two references (no transition state) settles the joints on both of its sides.
 * Source: thermodynamic cycles (common practice).
 * @returns the faults in the order of the pathway, those of the whole first; empty where everything chains.
 * @example chainFaults([{ energyType: 'gibbs', endStateReference: 'isolated' }, { energyType: 'electronic', endStateReference: 'isolated' }]).map(({ code }) => code) // ['mixed-energy-types']
 */
export function chainFaults(steps: readonly ChainedStep[]): ChainFault[] {
  const faults: ChainFault[] = [];
  const types = new Set(steps.map(({ energyType }) => energyType ?? null));
  const named = [...types].filter((type) => type !== null);
  if (named.length > 1) faults.push({ code: 'mixed-energy-types', afterStep: 0, message: `the energies are of different types, ${named.join(', ')}: they are different quantities and have no common scale` });
  if (types.has(null)) faults.push({ code: 'energy-type-unknown', afterStep: 0, message: 'the type of some energies is not known: they may not be on one scale' });
  for (let i = 1; i < steps.length; i += 1) {
    const fault = jointFault(steps[i - 1] as ChainedStep, steps[i] as ChainedStep, i);
    if (fault) faults.push(fault);
  }
  return faults;
}
