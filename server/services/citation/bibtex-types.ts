/** CSL type of each BibTeX and biblatex entry type we read; anything else is a "document". */
export const cslTypeOfBibtex: Readonly<Record<string, string>> = {
  article: 'article-journal', inproceedings: 'paper-conference', conference: 'paper-conference', proceedings: 'book', mvproceedings: 'book',
  book: 'book', mvbook: 'book', collection: 'book', booklet: 'pamphlet', incollection: 'chapter', inbook: 'chapter', inreference: 'entry-encyclopedia',
  phdthesis: 'thesis', mastersthesis: 'thesis', thesis: 'thesis', techreport: 'report', report: 'report', manual: 'report',
  unpublished: 'manuscript', online: 'webpage', electronic: 'webpage', www: 'webpage', dataset: 'dataset', software: 'software', patent: 'patent', misc: 'document',
};

/** Entry type, and the fields the standard styles demand of it, for each CSL type we write (btxdoc and the biblatex manual, from memory). */
export const bibtexTypeOfCsl: Readonly<Record<string, { type: string; needs: readonly string[] }>> = {
  'article-journal': { type: 'article', needs: ['title', 'journal', 'year'] },
  'article-magazine': { type: 'article', needs: ['title', 'journal', 'year'] },
  'article-newspaper': { type: 'article', needs: ['title', 'journal', 'year'] },
  'paper-conference': { type: 'inproceedings', needs: ['title', 'booktitle', 'year'] },
  chapter: { type: 'incollection', needs: ['title', 'booktitle', 'publisher', 'year'] },
  'entry-encyclopedia': { type: 'incollection', needs: ['title', 'booktitle', 'publisher', 'year'] },
  book: { type: 'book', needs: ['title', 'publisher', 'year'] },
  thesis: { type: 'phdthesis', needs: ['title', 'school', 'year'] },
  report: { type: 'techreport', needs: ['title', 'institution', 'year'] },
};

/** Stands in for a missing author in a file, since the standard styles refuse an article without one; read back as no author. */
export const anonymous = 'Anonymous';
