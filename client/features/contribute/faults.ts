import type { Fault } from '#shared/contracts/entries.ts';
import type { LocalFault } from './read-form.ts';

/** A fault with the path of its field in the form. */
export interface FormFault {
  path: string;
  message: string;
}

/**
 * All that stands in the way of submitting: what the page found in the fields, then what the server found in the input.
 * The server counts the quantities that were sent; `rows` tells in which row of the form each was typed.
 */
export function formFaults(local: readonly LocalFault[], server: readonly Fault[], rows: readonly number[]): FormFault[] {
  const moved = server.map(({ path, message }) => ({
    path: path.replace(/^\//, '').replaceAll('/', '.').replace(/\[(\d+)\]/g, '.$1')
      .replace(/^quantities\.(\d+)/, (_, index: string) => `quantities.${rows[Number(index)] ?? index}`),
    message,
  }));
  const unreadable = new Set(local.map((fault) => fault.path));
  // A field that could not be read was not sent: the server finds it missing, which would be said twice.
  return [...local, ...moved.filter((fault) => !unreadable.has(fault.path))];
}

/**
 * Faults of the source. The preview stores nothing and so looks no source up; they come with the saved draft, and that
 * there is none at all is seen here.
 */
export function sourceFaults(hasSource: boolean, preview: readonly Fault[], draft: readonly Fault[]): Fault[] {
  const ofSource = ({ path }: Fault) => path.startsWith('source');
  if (preview.some(ofSource)) return [];
  if (!hasSource) return [{ path: 'source', message: 'Name the source: a DOI, a pasted BibTeX or RIS record, or a typed citation.' }];
  return draft.filter(ofSource).slice(0, 1);
}

const names: readonly [RegExp, string][] = [
  [/^source/, 'Source'], [/^locator/, 'Where in the source'], [/^step/, 'Elementary step'], [/^surface/, 'Surface'], [/^kind/, 'Kind'],
  [/^scope/, 'Stands for'], [/^provenance/, 'How the source came by it'], [/^method\.technique/, 'Technique'], [/^method/, 'Method'],
  [/^correlation/, 'Correlation'], [/^rateOf/, 'What the rate counts'], [/^kineticOrders/, 'Orders'], [/^conditions/, 'Conditions'],
  [/^validRange/, 'Valid range'], [/^note/, 'Note'],
];

/** The words for where a fault lies. */
export function placeName(path: string): string {
  const quantity = /^quantities\.(\d+)/.exec(path);
  if (quantity) return `Quantity ${Number(quantity[1]) + 1}`;
  if (path.startsWith('quantities')) return 'Quantities';
  return names.find(([pattern]) => pattern.test(path))?.[1] ?? 'The entry';
}

/** Faults of a part as a whole are shown at the field that stands for it. */
const standIns: Readonly<Record<string, string>> = {
  'source.doi': 'source', 'source.id': 'source', 'source.bibtex': 'source', 'source.ris': 'source', 'source.csl': 'source.typed.title',
  'source.csl.title': 'source.typed.title', 'step': 'step.equation', 'surface': 'surface.metal', 'method': 'method.class', 'validRange': 'validRange.min',
};

/** The path of the field at which a fault is shown. */
export function fieldOfFault(path: string): string {
  return /^quantities\.\d+$/.test(path) ? `${path}.asPrinted` : standIns[path] ?? path;
}
