import { readFileSync } from 'node:fs';
import type { Csl } from '#shared/citations/csl.ts';

/** One invented citation with a hard feature, and what independent programs read from its BibTeX. */
export type ReferenceCase = {
  id: string;
  feature: string;
  input: { csl: Csl };
  expected: { entry_type: string; key: string; bibtex: string; ris: string };
  source: string;
};

/** Read at run time: the file is large and its shape is ours to name. */
export const referenceCases = (JSON.parse(readFileSync(new URL('../../reference/bibtex_cases.json', import.meta.url), 'utf8')) as { cases: ReferenceCase[] }).cases;
