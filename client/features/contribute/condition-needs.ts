import type { ConditionName, EntryForm } from './entry-form.ts';

/** Techniques of which the heating of the surface is part, by what their short names contain. */
const heated = /tpd|tds|tpr|tpsr|programmed|desorption/i;
const beam = /beam/i;
const flow = /steady|reactor|flow|transient|ssitka|batch/i;

const ofOneTemperature = new Set(['rate-constant', 'kie', 'sticking', 'turnover-rate', 'equilibrium-constant', 'reaction-order', 'diffusion']);

/**
 * The conditions a value needs, by its kind, method and quantities: only what the method calls for is asked.
 * One that was typed stays, whatever the method has become.
 */
export function neededConditions(form: Pick<EntryForm, 'kind' | 'method' | 'quantities' | 'conditions'>): ConditionName[] {
  const needed = new Set<ConditionName>(['coverage', 'text']);
  const { technique } = form.method;
  const symbols = new Set(form.quantities.map((row) => row.symbol));
  const add = (...names: ConditionName[]) => names.forEach((name) => needed.add(name));

  if (form.method.class === 'computed') add('functional', 'supercell', 'endStateReference');
  if (form.method.class === 'measured') add('promoter');
  if (heated.test(technique)) add('heatingRateKPerS', 'exposureLangmuir');
  if (beam.test(technique)) add('temperatureK');
  if (flow.test(technique)) add('pressures', 'temperatureK');
  if (ofOneTemperature.has(form.kind)) add('temperatureK');
  if (symbols.has('turnoverRate') || symbols.has('reactionOrder')) add('pressures', 'temperatureK');
  if (symbols.has('rateConstant')) add('temperatureK');
  // A unit per area becomes one per site only by a density that the source, or nobody, gives.
  if (form.quantities.some((row) => /(cm|m)\^?-?2|cm²|m²|g-1|g\^-1/.test(row.unitAsPrinted))) add('siteDensityPerM2');
  if (form.conditions.siteDensityPerM2.trim()) add('siteDensitySource');
  if (form.conditions.coverage.trim()) add('coverageDefinition');
  if (symbols.has('kie')) add('isotopes', 'kieDirection');
  for (const [name, typed] of Object.entries(form.conditions)) if (typed.trim()) needed.add(name as ConditionName);
  return [...needed];
}

/** Whether what the printed rate counts has to be known. */
export function countsMatter(form: Pick<EntryForm, 'quantities' | 'rateOf' | 'kineticOrders'>): boolean {
  return form.rateOf.counts !== '' || form.kineticOrders.length > 0
    || form.quantities.some((row) => row.symbol === 'rateConstant' || row.symbol === 'preExponential' || row.symbol === 'turnoverRate');
}
