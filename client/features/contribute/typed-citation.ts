/** A citation typed by hand: what identifies a publication where no DOI does. */
export interface TypedCitation {
  title: string;
  /** "Family, Given; Family, Given", or names in their usual order. */
  authors: string;
  year: string;
  journal: string;
  volume: string;
  pages: string;
  doi: string;
}

export const emptyCitation: TypedCitation = { title: '', authors: '', year: '', journal: '', volume: '', pages: '', doi: '' };

interface CslName {
  family?: string;
  given?: string;
  literal?: string;
}

/**
 * Reads a line of authors. Semicolons, "and" and "&" part them; a comma within one parts the family name from the given one.
 * @example readAuthors('Vantongeren, L.; Osei-Brandt, K.')[1].family // 'Osei-Brandt'
 */
export function readAuthors(line: string): CslName[] {
  return line.split(/;|\n|\s+and\s+|\s*&\s*/i).map((part) => part.trim().replace(/,$/, '')).filter(Boolean).map((name) => {
    const [family, ...given] = name.split(/\s*,\s*/);
    if (given.length > 0) return { family, given: given.join(' ') };
    const words = name.split(/\s+/);
    const last = words.at(-1);
    return words.length > 1 ? { family: last, given: words.slice(0, -1).join(' ') } : { family: name };
  });
}

/** The typed citation as CSL-JSON; parts not typed are left out. */
export function cslOf(typed: TypedCitation): Record<string, unknown> | undefined {
  const entered = Object.values(typed).some((value) => value.trim() !== '');
  if (!entered) return undefined;
  const authors = readAuthors(typed.authors);
  const year = /^\d{4}$/.test(typed.year.trim()) ? Number(typed.year.trim()) : null;
  const parts: [string, unknown][] = [
    ['title', typed.title.trim()],
    ['author', authors.length > 0 ? authors : ''],
    ['issued', year === null ? '' : { 'date-parts': [[year]] }],
    ['container-title', typed.journal.trim()],
    ['volume', typed.volume.trim()],
    ['page', typed.pages.trim()],
    ['DOI', typed.doi.trim()],
  ];
  return { type: 'article-journal', ...Object.fromEntries(parts.filter(([, value]) => value !== '')) };
}

/** The typed citation back from CSL-JSON. */
export function typedFromCsl(csl: Record<string, unknown>): TypedCitation {
  const text = (name: string) => (typeof csl[name] === 'string' || typeof csl[name] === 'number' ? String(csl[name]) : '');
  const names = Array.isArray(csl.author) ? (csl.author as CslName[]) : [];
  const issued = csl.issued as { 'date-parts'?: unknown[][] } | undefined;
  return {
    title: text('title'),
    authors: names.map(({ family, given, literal }) => (given ? `${family ?? ''}, ${given}` : family ?? literal ?? '')).join('; '),
    year: String(issued?.['date-parts']?.[0]?.[0] ?? ''),
    journal: text('container-title'),
    volume: text('volume'),
    pages: text('page'),
    doi: text('DOI'),
  };
}

/** What is missing or wrong in a typed citation, by field. */
export function citationFaults(typed: TypedCitation): { path: keyof TypedCitation; message: string }[] {
  const faults: { path: keyof TypedCitation; message: string }[] = [];
  if (typed.year.trim() && !/^(1[89]|20|21)\d\d$/.test(typed.year.trim())) faults.push({ path: 'year', message: 'A year has four digits, such as 1994.' });
  return faults;
}
