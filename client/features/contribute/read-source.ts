import { normaliseDoi } from '#shared/citations/doi.ts';

/** What was put in the one box for a source. */
export type ReadSource =
  | { form: 'empty' }
  | { form: 'doi'; doi: string }
  | { form: 'bibtex'; text: string }
  | { form: 'ris'; text: string }
  | { form: 'unknown'; message: string };

/**
 * Tells a DOI in any form, a BibTeX entry and a RIS record apart.
 * @example readSource('https://doi.org/10.5555/AISK.1994.0412').doi // '10.5555/aisk.1994.0412'
 */
export function readSource(typed: string): ReadSource {
  const text = typed.trim();
  if (!text) return { form: 'empty' };
  if (/^(?:%.*\n|\s)*@\s*[a-z]+\s*[{(]/i.test(text)) return { form: 'bibtex', text };
  if (/^TY {2}- /m.test(text)) return { form: 'ris', text };
  const doi = normaliseDoi(text) ?? normaliseDoi(/10\.\d{4,9}\/\S+/.exec(text)?.[0] ?? '');
  if (doi) return { form: 'doi', doi };
  return {
    form: 'unknown',
    message: 'This is no DOI, BibTeX entry or RIS record. A DOI starts with "10." and has a slash; BibTeX starts with "@article{"; RIS starts with "TY  - ". Without any of them, type the citation.',
  };
}
