import type { Conditions, Entry } from '#shared/contracts/entries.ts';

const names: readonly [keyof Conditions, string, string?][] = [
  ['coverage', 'Coverage'], ['coverageDefinition', 'Coverage is'], ['pressures', 'Pressures'], ['temperatureK', 'Temperature', 'K'],
  ['heatingRateKPerS', 'Heating rate', 'K/s'], ['exposureLangmuir', 'Exposure', 'langmuir'], ['promoter', 'Promoter'],
  ['siteDensityPerM2', 'Site density', 'm-2'], ['siteDensitySource', 'Site density from'], ['functional', 'Functional'], ['supercell', 'Supercell'],
  ['endStateReference', 'End states'], ['isotopes', 'Isotopes'], ['kieDirection', 'Ratio'], ['text', 'Other conditions'],
];

/** The conditions that were reported, named, with what the rate counts; those not reported are left out of this list. */
export function conditionFacts({ conditions, rateOf, kineticOrders }: Pick<Entry, 'conditions' | 'rateOf' | 'kineticOrders'>): { name: string; value: string }[] {
  const facts = names.flatMap(([name, label, unit]) => {
    const value = conditions[name];
    return value === undefined ? [] : [{ name: label, value: `${String(value).replaceAll('-', name === 'coverageDefinition' ? ' ' : '-')}${unit ? ` ${unit}` : ''}` }];
  });
  if (rateOf) facts.push({ name: 'Rate counts', value: rateOf === 'event' ? 'events of the step' : rateOf === 'unknown' ? 'not known' : `consumption of ${rateOf.consumptionOf}` });
  if (kineticOrders && Object.keys(kineticOrders).length > 0) {
    facts.push({ name: 'Orders', value: Object.entries(kineticOrders).map(([species, order]) => `${species}: ${order}`).join(', ') });
  }
  return facts;
}
