import { promoterWord } from '#server/features/entries/make-search-rows.service.ts';
import { Refusal } from '#server/refusal.ts';
import { normaliseDoi } from '#shared/citations/doi.ts';
import type { EntryFilter, SearchNote } from '#shared/contracts/entry-search.ts';
import { describeSurface, SurfaceError } from '#shared/domain/surface.ts';
import { facetIsPossible } from '#shared/kinetics/surfaces.ts';
import type { SearchFilter } from './search-engine.ts';
import { readStepText, speciesNamed } from './step-words.ts';
import { spellings, type TermList, type VocabularyNames } from './vocabulary-names.ts';

/** A filter with every word brought to what the store compares, and what there is to say about it. */
export interface FilterReading {
  filter: SearchFilter;
  notes: SearchNote[];
}

function refuse(path: string, message: string, detail: string): never {
  throw new Refusal('invalid-input', detail, { errors: [{ path, message }] });
}

/** Limits that contradict one another, or say nothing without another filter. */
function requireSense({ kind, valueMin, valueMax, validFrom, validTo }: EntryFilter): void {
  if ((valueMin !== undefined || valueMax !== undefined) && kind?.length !== 1) refuse('kind', 'Choose exactly one kind.', 'A value range needs exactly one kind of value, so that its unit is known.');
  if (valueMin !== undefined && valueMax !== undefined && valueMin > valueMax) refuse('valueMax', 'Must not be below valueMin.', 'The value range ends below its beginning.');
  if (validFrom !== undefined && validTo !== undefined && validFrom > validTo) refuse('validTo', 'Must not be below validFrom.', 'The range of temperatures ends below its beginning.');
}

/** Miller indices without brackets and spaces, a bar over a digit as a minus before it. */
const plainFacet = (text: string): string => text.normalize('NFD').replace(/(\d)\u0305/g, '-$1').replace(/[\s,()[\]{}]/g, '').replaceAll('−', '-');

/** Reads a filter as typed: names become symbols and codes, equations keys. What names nothing is kept, finds nothing, and is told. */
export function readFilter(asked: EntryFilter, names: VocabularyNames): FilterReading {
  requireSense(asked);
  const notes: SearchNote[] = [];
  const note = (filter: keyof EntryFilter, value: string, found: boolean, message: string) => {
    notes.push({ filter, value, found, message });
  };
  const each = (values: readonly string[] | undefined, read: (value: string) => readonly string[]) => (values && values.length > 0 ? [...new Set(values.flatMap(read))] : undefined);
  /** Codes of a list that a value names; a value that names none stays as it is. */
  const codes = (filter: keyof EntryFilter, list: TermList, what: string) => (value: string): readonly string[] => {
    if (names.term(list, value)) return [value];
    const found = names.find(list, value);
    if (found.length > 0) return found.map(({ code }) => code);
    if (names.all(list).length > 0) note(filter, value, false, `“${value}” is no ${what} of the vocabulary.`);
    return [value];
  };
  const { step, methodFamily, state: _state, collection: _collection, ...rest } = asked;
  const filter: SearchFilter = {
    ...rest,
    metal: each(asked.metal, codes('metal', 'metal', 'metal')),
    contains: each(asked.contains, codes('contains', 'metal', 'metal')),
    stepClass: each(asked.stepClass, codes('stepClass', 'step-class', 'class of step')),
    formula: each(asked.formula, (value) => {
      try {
        return [describeSurface({ formula: value }).formula];
      } catch (error) {
        if (!(error instanceof SurfaceError)) throw error;
        note('formula', value, false, error.message);
        return [value];
      }
    }),
    facet: each(asked.facet, (value) => {
      const facet = plainFacet(value);
      if (!/^(?:-?\d){3,4}$/.test(facet)) note('facet', value, false, `“${value}” is not a facet. Write Miller indices such as 111 or, on an hcp metal, four such as 0001.`);
      return [facet];
    }),
    support: each(asked.support, (value) => [...new Set([value, ...names.find('support', value).flatMap(spellings)])]),
    promoter: each(asked.promoter, (value) => [/^(?:none|clean)$/i.test(value) ? 'none' : /^any$/i.test(value) ? 'any' : promoterWord(value)]),
    species: each(asked.species, (value) => {
      const formulas = speciesNamed(value, names);
      if (formulas.length === 0) note('species', value, false, `“${value}” is neither a formula nor the name of a species. Write it as NH3 or N2.`);
      return formulas.length > 0 ? formulas : [value];
    }),
    bond: each(asked.bond, (value) => {
      const [a = '', b = ''] = value.split(/\s*[-–—]\s*/);
      return b ? [`${a}-${b}`, `${b}-${a}`] : [value];
    }),
    method: each(asked.method, (value) => [...new Set([value, ...names.find('technique', value).flatMap(spellings)])]),
    source: each(asked.source, (value) => [normaliseDoi(value) ?? value]),
  };
  if (methodFamily && methodFamily.length > 0) {
    filter.methodFamily = methodFamily.flatMap((value) => {
      const techniques = names.all('technique').filter(({ data }) => String(data['family'] ?? '').toLowerCase() === value.toLowerCase());
      if (techniques.length === 0) note('methodFamily', value, false, `“${value}” is no family of techniques of the vocabulary.`);
      return techniques.flatMap((term) => [term.code, ...term.synonyms].map((name) => name.toLowerCase()));
    });
  }
  if (step && step.length > 0) {
    filter.step = step.flatMap((value) => {
      const { pattern, message } = readStepText(value, names);
      if (message !== null) note('step', value, pattern !== null, message);
      return pattern ? [pattern] : [];
    });
  }
  noteImpossibleFacets(filter, names, note);
  return { filter, notes };
}

/** A facet that no metal asked for can have. Structures are those of room temperature. */
function noteImpossibleFacets({ facet, metal }: SearchFilter, names: VocabularyNames, note: (filter: keyof EntryFilter, value: string, found: boolean, message: string) => void): void {
  const structures = (metal ?? []).map((symbol) => ({ symbol, structure: names.term('metal', symbol)?.data['structure'] }));
  if (structures.length === 0) return;
  for (const one of facet ?? []) {
    if (!/^(?:-?\d){3,4}$/.test(one) || !structures.every(({ structure }) => typeof structure === 'string' && !facetIsPossible(structure, one))) continue;
    note('facet', one, false, `${structures.map(({ symbol, structure }) => `${symbol} is ${String(structure)}`).join(', ')}: (${one}) is no facet of that structure.`);
  }
}
