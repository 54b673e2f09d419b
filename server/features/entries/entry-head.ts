import type { PageHead } from '#server/http/page-head.ts';
import { callName } from '#shared/citations/citation-text.ts';
import { readCsl } from '#shared/citations/csl.ts';
import { doiUrl } from '#shared/citations/doi.ts';
import { plainText } from '#shared/citations/rich-text.ts';
import { energyTypeWords, symbolWords, type EnergyType, type QuantitySymbol } from '#shared/domain/kinds.ts';
import type { State } from '#shared/domain/states.ts';
import type { EntryRecord } from './entries.repository.ts';

interface Where {
  publicUrl: string;
  demonstration: boolean;
}

type Held = EntryRecord['quantities'][number];

const nameOf = ({ printed }: Held): string =>
  (printed.symbol === 'energy' && printed.energyType ? energyTypeWords[printed.energyType as EnergyType] : symbolWords[printed.symbol as QuantitySymbol]);

const printOf = ({ printed }: Held): string => `${printed.asPrinted} ${printed.unitAsPrinted}`.trim();

/** A quantity as schema.org's PropertyValue: a bound gives the end it has and no value. */
function measured(held: Held): object {
  const { value, low, high, unit } = held.converted;
  const exact = held.printed.bound === '=' || held.printed.bound === '≈';
  return {
    '@type': 'PropertyValue', name: nameOf(held), ...(unit && unit !== '1' ? { unitText: unit } : {}),
    ...(exact && value !== null ? { value } : {}), ...(!exact && low !== null ? { minValue: low } : {}), ...(!exact && high !== null ? { maxValue: high } : {}),
    description: `printed as ${printOf(held)}`,
  };
}

/** The source as schema.org's ScholarlyArticle. */
function citation({ source }: EntryRecord): object {
  const read = readCsl(source.csl);
  const authors = read.ok ? read.csl.author ?? [] : [];
  return {
    '@type': 'ScholarlyArticle', name: plainText(source.title),
    author: authors.length > 0
      ? authors.map((name) => ({ '@type': name.literal ? 'Organization' : 'Person', name: [name.given, callName(name)].filter(Boolean).join(' ') }))
      : source.authors,
    ...(source.year === null ? {} : { datePublished: String(source.year) }),
    ...(source.container ? { isPartOf: { '@type': 'Periodical', name: source.container } } : {}),
    ...(source.doi ? { identifier: { '@type': 'PropertyValue', propertyID: 'DOI', value: source.doi }, sameAs: doiUrl(source.doi) } : {}),
  };
}

/** The head of the page of a version that is or was public: only the accepted one is described as data and listed. */
export function headOfEntry(record: EntryRecord, { publicUrl, demonstration }: Where): PageHead {
  const { revision, step, surface, source, accession } = record;
  const accepted = (revision.state as State) === 'accepted';
  const [primary] = record.quantities;
  const subject = `${step.equation} on ${surface.label}`;
  const page = `${publicUrl}/entries/${accession}`;
  const api = `${publicUrl}/api/v1/entries/${accession}`;
  const acceptedOn = revision.acceptedAt?.toISOString().slice(0, 10);
  const description = [
    demonstration ? 'Invented data for demonstration.' : null,
    accepted ? null : `This version is ${revision.state}.`,
    primary ? `${nameOf(primary).replace(/^./, (first) => first.toUpperCase())} of ${subject}, printed as ${printOf(primary)} in ${source.label}${revision.input.locator ? ` (${revision.input.locator})` : ''}.` : `${subject}, ${source.label}.`,
    `Entry ${accession}, version ${revision.version}${acceptedOn ? `, accepted ${acceptedOn}` : ''}.`,
  ].filter(Boolean).join(' ');
  const title = `${subject}${primary ? `: ${printOf(primary)}` : ''}`;
  return {
    title: `${title} · Sillstone`, description, indexed: accepted && !demonstration,
    canonical: accepted ? page : null,
    alternate: accepted ? api : `${api}/versions/${revision.version}`,
    data: accepted ? {
      '@context': 'https://schema.org', '@type': 'Dataset', '@id': `${page}/v/${revision.version}`, name: title, description, url: page, identifier: accession, version: String(revision.version),
      ...(acceptedOn ? { datePublished: acceptedOn } : {}), isAccessibleForFree: true, creator: { '@type': 'Person', name: revision.authorName },
      includedInDataCatalog: { '@type': 'DataCatalog', name: 'Sillstone', url: publicUrl },
      variableMeasured: record.quantities.map(measured), citation: citation(record),
      distribution: { '@type': 'DataDownload', encodingFormat: 'application/json', contentUrl: api },
    } : null,
  };
}

/** The head of a page of what is not public or not there: the page tells the one from the other to those who may know. */
export const hiddenHead: PageHead = { title: 'Sillstone', description: 'This entry is not public, or there is none of this name.', canonical: null, alternate: null, indexed: false, data: null };
