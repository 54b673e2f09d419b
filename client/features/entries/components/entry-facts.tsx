import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { sampleTypeWords, type SampleType } from '#shared/domain/kinds.ts';
import { printSearch } from '#shared/contracts/entry-search.ts';
import type { Conditions, Entry } from '#shared/contracts/entries.ts';
import { Equation } from '#client/ui/equation.tsx';
import { Facts } from '#client/ui/facts.tsx';
import { classWords } from '../entry-words.ts';
import { siteWords } from '../filter-words.ts';
import { rangeText } from '../row-figures.ts';
import { SurfaceLabel } from '#client/ui/surface-label.tsx';

/** Conditions and surface, under their names; what a kind of method does not need is left out, what it does need and lacks is said. */
export function EntryFacts({ entry }: { entry: Entry }) {
  const { step, surface, method, conditions } = entry;
  const range = rangeText(entry.validRange);
  const facts: { name: string; value: ReactNode }[] = [
    {
      name: 'Elementary step',
      value: step && (
        <>
          <Link to={`/search?${printSearch({ step: [step.key] })}`}><Equation equation={step.equation} /></Link>
          <span className="text-second">{`, ${classWords(step.class)}`}</span>
        </>
      ),
    },
    { name: 'Surface', value: surface && surfaceWords(surface) },
    { name: 'Method', value: [method.technique, method.detail, methodClassWords(entry)].filter(Boolean).join(', ') || null },
    { name: 'Valid range', value: range ? `${range} K` : null },
    { name: 'Coverage', value: conditions.coverage ? [conditions.coverage, conditions.coverageDefinition?.replaceAll('-', ' ')].filter(Boolean).join(', ') : null },
    ...rateFacts(entry),
    ...conditionFacts(conditions),
    ...(entry.note ? [{ name: 'Note', value: entry.note }] : []),
  ];
  return (
    <section>
      <h2 className="pb-2">Conditions and surface</h2>
      <Facts facts={facts} />
    </section>
  );
}

function methodClassWords(entry: Entry): string | null {
  return entry.method.class && !entry.method.technique?.includes(entry.method.class) ? entry.method.class : null;
}

function surfaceWords(surface: NonNullable<Entry['surface']>): ReactNode {
  const rest = [
    surface.structure === 'other' ? 'another structure' : surface.structure,
    surface.facet && `(${surface.facet.replace(/[()]/g, '')})`,
    surface.site && siteWords(surface.site),
    surface.sampleType && (sampleTypeWords[surface.sampleType as SampleType] ?? surface.sampleType),
    surface.support && `on ${surface.support}`,
  ].filter(Boolean);
  return <><SurfaceLabel label={surface.formula} />{rest.length > 0 && `, ${rest.join(', ')}`}</>;
}

/** What the printed rate counts, and by which orders; only where the entry has a rate. */
function rateFacts({ rateOf, kineticOrders, correlation, quantities }: Entry): { name: string; value: ReactNode }[] {
  const hasRate = quantities.some(({ symbol }) => symbol === 'preExponential' || symbol === 'rateConstant');
  if (!hasRate) return [];
  const counts = rateOf === null || rateOf === 'unknown'
    ? <span className="text-ochre">not known: an event, or consumption of a species (± ln 2 for a pair)</span>
    : rateOf === 'event' ? 'one event of the elementary step as written' : `consumption of ${rateOf.consumptionOf}`;
  const orders = Object.entries(kineticOrders ?? {});
  return [
    { name: 'Rate counts', value: counts },
    ...(orders.length > 0 ? [{ name: 'Orders', value: orders.map(([species, order]) => `${order} in ${species}`).join(', ') }] : []),
    ...(correlation !== null ? [{ name: 'Correlation', value: `${correlation} between ln A and E` }] : []),
  ];
}

/** The further conditions that are given, with their units. */
function conditionFacts(conditions: Conditions): { name: string; value: ReactNode }[] {
  const given: [string, string | number | undefined, string?][] = [
    ['Temperature', conditions.temperatureK, ' K'],
    ['Pressures', conditions.pressures],
    ['Promoter', conditions.promoter],
    ['Heating rate', conditions.heatingRateKPerS, ' K/s'],
    ['Exposure', conditions.exposureLangmuir, ' langmuir'],
    ['Site density', conditions.siteDensityPerM2?.toExponential().replace('e+', 'e'), ` per m2${conditions.siteDensitySource ? `, ${conditions.siteDensitySource}` : ''}`],
    ['Functional', conditions.functional],
    ['Supercell', conditions.supercell],
    ['End states', conditions.endStateReference && `referred to ${conditions.endStateReference === 'gas' ? 'the gas' : `${conditions.endStateReference} species`}`],
    ['Isotopes', conditions.isotopes],
    ['Isotope effect', conditions.kieDirection && `printed as ${conditions.kieDirection.replace('/', ' over ')}`],
    ['Further', conditions.text],
  ];
  return given.filter(([, value]) => value !== undefined).map(([name, value, tail = '']) => ({ name, value: `${value}${tail}` }));
}
