import type { SourcesService } from '#server/features/sources/sources.service.ts';
import { Refusal } from '#server/refusal.ts';
import { formatCitation, readBibtex, readRis, writeBibtex, writeRis } from '#server/services/citation/citation.ts';
import { runCalculator, type CalculationFault, type Calculator } from '#shared/calculators/calculator.ts';
import { citationKey } from '#shared/citations/citation-key.ts';
import type { Csl } from '#shared/citations/csl.ts';
import type { CiteInput } from '#shared/contracts/citations.ts';

/** Faults of an input as a refusal that names each. */
function refusalFrom(faults: readonly CalculationFault[]): Refusal {
  const [first] = faults;
  return new Refusal('invalid-input', first?.message, { errors: faults.map(({ path, message }) => ({ path, message })), ...(first?.context ? { context: first.context } : {}) });
}

/** Runs a calculator. @throws Refusal naming the part of the input that is not right. */
export function calculate(calculator: Calculator, input: unknown): Record<string, unknown> {
  const calculation = runCalculator(calculator, input);
  if ('faults' in calculation) throw refusalFrom(calculation.faults);
  return calculation.result;
}

async function readCitation(input: CiteInput, sources: SourcesService): Promise<Csl> {
  if (input.doi !== undefined) return sources.citationOf(input.doi);
  const path = input.bibtex !== undefined ? 'bibtex' : 'ris';
  const { entries, problems } = await (path === 'bibtex' ? readBibtex(input.bibtex ?? '') : readRis(input.ris ?? ''));
  const [csl] = entries;
  if (csl) return csl;
  throw refusalFrom([{ path, message: problems[0] ? `Line ${problems[0].line}: ${problems[0].message}` : 'No citation was found in the text.' }]);
}

/** Reads a citation and prints it in other forms. @throws Refusal when there is none, or the DOI leads to none. */
export async function cite(input: CiteInput, sources: SourcesService) {
  const csl = await readCitation(input, sources);
  const key = citationKey(csl);
  const from = input.doi !== undefined ? 'DOI' : input.bibtex !== undefined ? 'BibTeX' : 'RIS';
  return {
    csl, key, bibtex: await writeBibtex(csl, key), ris: await writeRis(csl), formatted: await formatCitation(csl),
    derivation: [{ operation: 'Read the citation', from, to: 'CSL-JSON', reference: 'CSL-JSON 1.0.2' }],
  };
}
