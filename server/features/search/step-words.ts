import { readStep, StepError, type ElementaryStep } from '#shared/steps/parse-step.ts';
import type { StepPattern } from './search-engine.ts';
import { foldWords, spellings, type VocabularyNames } from './vocabulary-names.ts';

/** What a text given for an elementary step came to: what it finds, and what the reader should be told. */
export interface StepReading {
  pattern: StepPattern | null;
  message: string | null;
}

/** Words that say nothing of a step. */
const fillers = new Set(['of', 'from', 'on', 'the', 'a', 'an', 'to', 'into', 'and', 'with', 'by', 'in', 'step', 'steps', 'elementary', 'reaction', 'surface', 'adsorbed', 'gas', 'over']);
const mostWords = 12;

function tryStep(text: string): ElementaryStep | StepError {
  try {
    return readStep(text);
  } catch (error) {
    if (error instanceof StepError) return error;
    throw error;
  }
}

/** The one formula a species is kept under, isotopes and sites left out; null when it is none. */
export function speciesFormula(text: string): string | null {
  const core = text.trim().replace(/^\*+/, '').replace(/\*+(?:_\{?[\w-]+\}?)?$/, '').replace(/\s?(?:\((?:g|gas|ads|ad|a)\)|_\{?(?:g|gas|ads|ad|a)\}?)$/i, '');
  if (!/^[A-Z0-9[(]/.test(core) || core.length > 40) return null;
  const step = tryStep(`${core} + * -> ${core}*`);
  if (step instanceof StepError) return null;
  return step.reactants.length === 2 ? (step.reactants.find(({ species, coefficient }) => species.phase === 'gas' && coefficient === 1)?.species.formula ?? null) : null;
}

/** The formulas that a word may stand for: the formula it is, or what the vocabulary calls so. */
export function speciesNamed(word: string, names: VocabularyNames): string[] {
  const named = names.find('species', word).filter(({ code }) => code !== word);
  if (named.length > 0) return [...new Set(named.flatMap(({ code, data }) => [code, ...(Array.isArray(data['also']) ? (data['also'] as string[]) : [])]))];
  const formula = speciesFormula(word);
  return formula === null ? [] : [formula];
}

/** Reads words that name a class of step and species, the longest names first; null when a word is left that names nothing. */
function readWords(text: string, names: VocabularyNames): StepPattern | { unknown: string } {
  const words = text.replace(/[+,;/]|(?<=\S)\*|\*(?=\S)/g, ' ').split(/\s+/).filter(Boolean);
  if (words.length > mostWords) return { unknown: text };
  const classNames = new Map(names.all('step-class').flatMap((term) => spellings(term).map((name) => [foldWords(name), term.code] as const)));
  const classes = new Set<string>();
  const species: string[][] = [];
  for (let at = 0; at < words.length;) {
    let taken = 0;
    for (let length = Math.min(5, words.length - at); length > 0 && taken === 0; length -= 1) {
      const phrase = words.slice(at, at + length).join(' ');
      // In capitals some of these could be formulas: OF.
      if (fillers.has(foldWords(phrase))) break;
      const named = classNames.get(foldWords(phrase));
      const formulas = named === undefined ? speciesNamed(phrase, names) : [];
      if (named !== undefined) classes.add(named);
      else if (formulas.length > 0) species.push(formulas);
      else continue;
      taken = length;
    }
    if (taken === 0 && !fillers.has(foldWords(words[at] ?? ''))) return { unknown: words[at] ?? '' };
    at += taken || 1;
  }
  if (classes.size === 0 && species.length === 0) return { unknown: text };
  return { classes: classes.size > 0 ? [...classes] : undefined, species: species.length > 0 ? species : undefined };
}

const patternWords = ({ classes, species }: StepPattern): string =>
  [classes?.map((one) => one.replaceAll('-', ' ')).join(' or '), species?.map((some) => some.join(' or ')).join(' and ')].filter(Boolean).join(' with ');

/**
 * Reads what was given for an elementary step: its key, its equation in any notation, or words such as "nitrogen recombination".
 * What cannot be read finds nothing and says why.
 */
export function readStepText(text: string, names: VocabularyNames): StepReading {
  const step = tryStep(text);
  if (!(step instanceof StepError)) {
    // A key made by an earlier reader of equations stands in the store as it is.
    return { pattern: { keys: [...new Set([step.key, ...(text.includes(' <=> ') ? [text] : [])])] }, message: null };
  }
  if (step.suggestion !== undefined) {
    const balanced = tryStep(step.suggestion);
    if (!(balanced instanceof StepError)) return { pattern: { keys: [balanced.key] }, message: `“${text}” lacks free sites; read as ${balanced.equation}.` };
  }
  if (step.code === 'no-arrow') {
    const words = readWords(text, names);
    if (!('unknown' in words)) return { pattern: words, message: `“${text}” was read as words: ${patternWords(words)}.` };
    return { pattern: null, message: `“${text}” could not be read as an elementary step: ${step.message}. Nor does “${words.unknown}” name a class of step or a species.` };
  }
  return { pattern: text.includes(' <=> ') ? { keys: [text] } : null, message: `“${text}” could not be read as an elementary step: ${step.message}.` };
}
