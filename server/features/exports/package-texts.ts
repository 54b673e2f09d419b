/** The caution every export carries. */
export const caution = 'The values are literature reports, checked against their sources by a second person. They are not design data. Work on relief, runaway and reactor safety '
  + 'follows local codes and is done by licensed or otherwise competent people. Values marked as extrapolated lie outside the temperature range their source supports.';

export const inventedNotice = 'DEMONSTRATION DATA: every entry, author, journal and DOI in this export is invented. Not for use.';

type Columns = readonly (readonly [name: string, datatype: string, description: string])[];

/** Metadata of a table by CSV on the Web (W3C Recommendation, 17 December 2015). */
export function tableMetadata(url: string, columns: Columns, primaryKey: string | readonly string[]): string {
  return JSON.stringify({
    '@context': 'http://www.w3.org/ns/csvw',
    url,
    dialect: { encoding: 'utf-8', lineTerminators: ['\r\n'], header: true },
    tableSchema: {
      columns: columns.map(([name, datatype, description]) => ({ name, titles: name, datatype, 'dc:description': description })),
      primaryKey,
    },
  }, null, 2);
}

export function readmeText({ demonstration, entries, sources, madeAt, publicUrl }: { demonstration: boolean; entries: number; sources: number; madeAt: string; publicUrl: string }): string {
  return [
    'Kinetic parameters exported from Sillstone',
    ...(demonstration ? ['', inventedNotice] : []),
    '',
    `Made ${madeAt} at ${publicUrl}`,
    `${entries} ${entries === 1 ? 'entry' : 'entries'} from ${sources} ${sources === 1 ? 'source' : 'sources'}`,
    '',
    'parameters.csv                one row an entry: as printed, converted, conditions, citation key (RFC 4180, UTF-8)',
    'derivations.csv               one row a line of a derivation: from as printed to converted',
    '*.csv-metadata.json           what each column holds (CSV on the Web)',
    'references.bib                the sources, BibTeX; every citation_key of the table is in it',
    'manifest.json                 query, time, versions, constants, SHA-256 of each file',
    '',
    'A text cell that begins with = + - @, a tab or a return and is not a plain number has an apostrophe put before it, so that a spreadsheet does not run it.',
    '',
    'Caution',
    caution,
    '',
  ].join('\r\n');
}
