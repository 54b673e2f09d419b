import type { AllFilterCounts } from '#shared/contracts/entry-search.ts';
import {
  energyTypeWords, kindWords, provenanceWords, sampleTypeWords, type EnergyType, type Kind, type Provenance, type SampleType, type SiteType,
} from '#shared/domain/kinds.ts';
import { stateWords, type State } from '#shared/domain/states.ts';
import { siteLabel } from '#shared/domain/surface.ts';
import { countedFilters, type Counted, type CountedFilter, type Counts } from './search-engine.ts';

/** Words for the values of filters that the store keeps as codes. */
const words: Partial<Record<CountedFilter, (value: string) => string>> = {
  kind: (value) => kindWords[value as Kind],
  stepClass: (value) => value.replaceAll('-', ' ').replace('eley rideal', 'Eley–Rideal'),
  site: (value) => siteLabel(value as SiteType),
  provenance: (value) => provenanceWords[value as Provenance],
  energyType: (value) => energyTypeWords[value as EnergyType],
  sampleType: (value) => sampleTypeWords[value as SampleType],
  cleavage: (value) => value.replaceAll('-', ' '),
  promoter: (value) => (value === 'none' ? 'clean, no promoter' : value === 'any' ? 'any promoter' : value),
  hasUncertainty: (value) => (value === 'true' ? 'standard uncertainty known' : 'standard uncertainty not known'),
};

/** Counts as the contract gives them, each value with its words. */
export function labelCounts(counts: Counts): AllFilterCounts {
  return Object.fromEntries(countedFilters.map((filter) => [
    filter, counts[filter].map(({ value, label, count }) => ({ value, label: label ?? words[filter]?.(value) ?? value, count })),
  ])) as unknown as AllFilterCounts;
}

export function labelStates(counted: readonly Counted[]): { value: string; label: string; count: number }[] {
  return counted.map(({ value, count }) => ({ value, label: stateWords[value as State] ?? value, count }));
}
