import type { Csl } from '#shared/citations/csl.ts';
import { citationFormatter } from './formatted-citation.ts';

export { readBibtex } from './bibtex-read.ts';
export { writeBibtex } from './bibtex-write.ts';
export { readRis, writeRis } from './ris.ts';

/** Prints one citation as plain text in the style of the American Psychological Association; never asks the network. */
export async function formatCitation(csl: Csl): Promise<string> {
  return (await citationFormatter()).format(csl).text;
}

/** The same with the marks of `richText`, for places that show italics and scripts. */
export async function formatRichCitation(csl: Csl): Promise<string> {
  return (await citationFormatter()).format(csl).rich;
}
