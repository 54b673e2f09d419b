import type { ReverseConsistency } from '#shared/contracts/entries.ts';
import { energyTypeWords, type EnergyType, type Scope } from '#shared/domain/kinds.ts';
import { R } from '#shared/kinetics/constants.ts';
import { checkConsistency } from '#shared/kinetics/thermo-consistency.ts';

/** One direction of a step as it is set against the other. */
export interface Direction {
  energyKJPerMol: number | null;
  uEnergyKJPerMol: number | null;
  bound: string | null;
  energyType: EnergyType | null;
  scope: Scope | null;
  /** Temperature exponent of a modified Arrhenius expression; 0 for a plain one. */
  exponent: number;
  /** Key of the step with its isotopes and named sites; null where the equation can no longer be read. */
  variantKey: string | null;
  site: string | null;
  promoters: readonly string[];
}

/** A reaction energy that an entry holds, in the direction of the entry shown. */
export interface HeldReactionEnergy {
  accession: string;
  label: string;
  valueKJPerMol: number;
  uKJPerMol: number | null;
  energyType: EnergyType | null;
  variantKey: string | null;
  promoters: readonly string[];
}

/** The type of reaction energy that the difference of two energies of a type equals. */
const reactionType: Readonly<Record<EnergyType, EnergyType>> = {
  'arrhenius': 'enthalpy', 'enthalpy': 'enthalpy', 'electronic': 'electronic', 'zero-point-corrected': 'zero-point-corrected', 'gibbs': 'gibbs',
};

const exact = (bound: string | null) => bound === '=' || bound === '≈';
const sameList = (a: readonly string[], b: readonly string[]) => a.length === b.length && a.every((one) => b.includes(one));
const capital = (words: string) => words.replace(/^./, (first) => first.toUpperCase());

/** Why two energies are not set against each other; null when they may be. */
function whyNot(own: Direction, reverse: Direction, temperatureK: number | null): string | null {
  if (own.scope !== 'elementary') return `Only values of elementary steps are compared: this one is ${own.scope ?? 'of no stated scope'}.`;
  if (reverse.scope !== 'elementary') return `Only values of elementary steps are compared: the reverse is ${reverse.scope ?? 'of no stated scope'}.`;
  if (own.energyKJPerMol === null || own.energyType === null) return 'This entry holds no energy of the step.';
  if (reverse.energyKJPerMol === null || reverse.energyType === null) return 'The reverse holds no energy of the step.';
  if (!exact(own.bound) || !exact(reverse.bound)) return 'A limit or a range is not compared with a value.';
  if (own.energyType !== reverse.energyType) return `Unlike energies are not compared: ${energyTypeWords[own.energyType]} here, ${energyTypeWords[reverse.energyType]} of the reverse.`;
  if (own.variantKey !== reverse.variantKey) return 'The two name different isotopes or sites in their equations.';
  if (!sameList(own.promoters, reverse.promoters)) return 'Promoted and clean surfaces are not compared.';
  if ((own.exponent !== 0 || reverse.exponent !== 0) && temperatureK === null) return 'The energy of a modified Arrhenius expression depends on temperature: give a temperature.';
  return null;
}

/** E + nRT: the energy that the slope at a temperature shows [kJ mol-1]. */
const localEnergy = ({ energyKJPerMol, exponent }: Direction, temperatureK: number | null) => (energyKJPerMol ?? 0) + (exponent === 0 || temperatureK === null ? 0 : (exponent * R * temperatureK) / 1000);

function assumptionOf(own: Direction, reverse: Direction, type: EnergyType, gasMoleChange: number, temperatureK: number | null): string | null {
  const parts: string[] = [];
  if (own.exponent !== 0 || reverse.exponent !== 0) parts.push(`Local energies E + nRT at ${temperatureK} K.`);
  if (type === 'arrhenius' && gasMoleChange !== 0) {
    const shift = temperatureK === null ? '' : `; −ΔνRT is ${((-gasMoleChange * R * temperatureK) / 1000).toFixed(1).replace('-', '−')} kJ/mol at ${temperatureK} K`;
    parts.push(`A gas takes part: both energies are taken on pressures. On concentrations their difference is ΔH° − ΔνRT${shift}.`);
  }
  if (type === 'gibbs') parts.push('The Gibbs energies are taken to hold at one temperature.');
  if (own.site !== reverse.site) parts.push('One of the two does not state its site.');
  return parts.length > 0 ? parts.join(' ') : null;
}

/**
 * E_f - E_r against a held reaction energy of the same type (an Arrhenius pair against ΔH°), forward being the entry shown.
 * Of several reaction energies the first one counts: the caller puts those of the two entries themselves in front.
 */
export function consistencyWithReverse(
  { own, reverse, held, gasMoleChange, temperatureK }: { own: Direction; reverse: Direction; held: readonly HeldReactionEnergy[]; gasMoleChange: number; temperatureK: number | null },
): ReverseConsistency {
  const reason = whyNot(own, reverse, temperatureK);
  if (reason !== null || own.energyType === null) return { status: 'not-compared', reason: capital(reason ?? '') };
  const { energyType } = own;
  const forward = localEnergy(own, temperatureK);
  const backward = localEnergy(reverse, temperatureK);
  const known = own.uEnergyKJPerMol !== null && reverse.uEnergyKJPerMol !== null;
  const figures = {
    energyType, differenceKJPerMol: forward - backward,
    uDifferenceKJPerMol: known ? Math.hypot(own.uEnergyKJPerMol ?? 0, reverse.uEnergyKJPerMol ?? 0) : null,
    assumption: assumptionOf(own, reverse, energyType, gasMoleChange, temperatureK),
  };
  const energy = held.find((one) => one.energyType === reactionType[energyType] && one.variantKey === own.variantKey && sameList(one.promoters, own.promoters));
  if (!energy) return { status: 'no-reaction-energy', ...figures, reactionEnergy: null, closureErrorKJPerMol: null, normalizedError: null, derivation: [] };
  const { consistent, closureErrorKJPerMol, normalizedError, derivation } = checkConsistency({
    energyForwardKJPerMol: forward, energyReverseKJPerMol: backward, reactionEnthalpyKJPerMol: energy.valueKJPerMol,
    uEnergyForwardKJPerMol: own.uEnergyKJPerMol, uEnergyReverseKJPerMol: reverse.uEnergyKJPerMol, uReactionEnthalpyKJPerMol: energy.uKJPerMol,
  });
  const { accession, label, valueKJPerMol, uKJPerMol } = energy;
  return {
    status: consistent === null ? 'undecided' : consistent ? 'consistent' : 'inconsistent',
    ...figures, reactionEnergy: { accession, label, valueKJPerMol, uKJPerMol }, closureErrorKJPerMol, normalizedError, derivation,
  };
}
