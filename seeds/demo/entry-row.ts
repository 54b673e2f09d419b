import * as z from 'zod';
import { entryInput, type EntryInput } from '#shared/contracts/entries.ts';
import type { QuantityInput } from '#shared/contracts/quantities.ts';
import type { QuantitySymbol } from '#shared/domain/kinds.ts';
import { decisionReasons } from '#shared/domain/review.ts';
import { states } from '#shared/domain/states.ts';

/** A row of entries.csv as text: an empty cell says nothing. */
export type EntryRow = Readonly<Record<string, string>>;

/** What a row is deliberately wrong about, so that a reviewer has something to find. */
export const marks = ['unit-slip', 'duplicate', 'retracted-source', 'quoted', 'unbalanced'] as const;

const email = z.string().regex(/^[a-z.-]+@demo\.sillstone\.example$/);
const moment = z.iso.datetime();

/** What is done with the entry: who submits it, who decides, how and when it ends. */
export const entryScript = z.object({
  contributor: email,
  /** Null for a draft. */
  submittedAt: moment.nullable(),
  /** The state the revision is left in. */
  outcome: z.enum(states),
  /** Who decides; for a submission under review, who holds the claim. */
  reviewer: email.nullable(),
  /** When it was decided, or withdrawn. */
  decidedAt: moment.nullable(),
  reason: z.enum(decisionReasons).nullable(),
  comment: z.string().nullable(),
  /** The row that this one is the next version of; that row's outcome is `superseded`. */
  revises: z.string().nullable(),
  revisionReason: z.string().nullable(),
  retractedAt: moment.nullable(),
  retractedBy: email.nullable(),
  retractionReason: z.string().nullable(),
  mark: z.enum(marks).nullable(),
});
export type EntryScript = z.infer<typeof entryScript>;

/** The columns that hold quantities: the value in `column`, and what belongs to it in `column_unit`, `column_type` and so on. */
const quantityColumns: readonly (readonly [QuantitySymbol, string])[] = [
  ['energy', 'energy'], ['preExponential', 'pre_exponential'], ['exponent', 'exponent'], ['referenceTemperature', 'reference_temperature'],
  ['rateConstant', 'rate_constant'], ['kie', 'kie'], ['stickingCoefficient', 'sticking'], ['activationEntropy', 'activation_entropy'],
  ['reactionEnergy', 'reaction_energy'], ['adsorptionEnergy', 'adsorption_energy'], ['equilibriumConstant', 'equilibrium_constant'],
  ['turnoverRate', 'turnover_rate'], ['reactionOrder', 'reaction_order'], ['diffusionCoefficient', 'diffusion_coefficient'],
  ['coverageSlope', 'coverage_slope'],
];

/** A cell as text, or undefined when it is empty or the column is absent. */
function cell(row: EntryRow, column: string): string | undefined {
  return row[column] === '' ? undefined : row[column];
}

function number(row: EntryRow, column: string): number | undefined {
  const text = cell(row, column);
  if (text === undefined) return undefined;
  const value = Number(text);
  if (!Number.isFinite(value)) throw new Error(`entries.csv, row ${row['row']}, ${column}: "${text}" is not a number`);
  return value;
}

/** Leaves out the members that say nothing, and the object itself when none is left. */
function filled<T extends object>(members: T): T | undefined {
  const kept = Object.entries(members).filter(([, value]) => value !== undefined);
  return kept.length === 0 ? undefined : (Object.fromEntries(kept) as T);
}

function quantitiesOf(row: EntryRow): QuantityInput[] {
  return quantityColumns.flatMap(([symbol, column]) => {
    const asPrinted = cell(row, column);
    if (asPrinted === undefined) return [];
    const unit = symbol === 'referenceTemperature' ? 'K' : cell(row, `${column}_unit`);
    return [filled({
      symbol,
      asPrinted,
      unitAsPrinted: unit ?? '',
      energyType: cell(row, `${column}_type`),
      multiplier: number(row, `${column}_multiplier`),
      uncertaintyKind: cell(row, `${column}_uncertainty_kind`),
      coverageFactor: number(row, `${column}_coverage_factor`),
      level: number(row, `${column}_level`),
      degreesOfFreedom: number(row, `${column}_degrees_of_freedom`),
    }) as QuantityInput];
  });
}

/** `event`, `unknown`, or `consumption of N`. */
function rateOfRow(row: EntryRow): EntryInput['rateOf'] {
  const text = cell(row, 'rate_of');
  if (text === undefined || text === 'event' || text === 'unknown') return text;
  const species = /^consumption of (\S+)$/.exec(text)?.[1];
  if (species === undefined) throw new Error(`entries.csv, row ${row['row']}, rate_of: "${text}"; write event, unknown, or "consumption of N"`);
  return { consumptionOf: species };
}

/** `NH3=0.6;H2=-0.5` as a record. */
function kineticOrdersOf(row: EntryRow): EntryInput['kineticOrders'] {
  const text = cell(row, 'kinetic_orders');
  if (text === undefined) return undefined;
  return Object.fromEntries(text.split(';').map((part) => {
    const [species, order] = part.split('=');
    if (!species || order === undefined || !Number.isFinite(Number(order))) {
      throw new Error(`entries.csv, row ${row['row']}, kinetic_orders: "${part}"; write species=order, for instance NH3=0.6`);
    }
    return [species, Number(order)];
  }));
}

function conditionsOf(row: EntryRow): EntryInput['conditions'] {
  return filled({
    coverage: cell(row, 'coverage'), coverageDefinition: cell(row, 'coverage_definition'), pressures: cell(row, 'pressures'),
    temperatureK: number(row, 'temperature_K'), siteDensityPerM2: number(row, 'site_density_per_m2'), siteDensitySource: cell(row, 'site_density_source'),
    promoter: cell(row, 'promoter'), heatingRateKPerS: number(row, 'heating_rate_K_per_s'), exposureLangmuir: number(row, 'exposure_langmuir'),
    functional: cell(row, 'functional'), supercell: cell(row, 'supercell'), endStateReference: cell(row, 'end_state_reference'),
    isotopes: cell(row, 'isotopes'), kieDirection: cell(row, 'kie_direction'), text: cell(row, 'conditions_text'),
  }) as EntryInput['conditions'];
}

/**
 * Turns a row into what its contributor would have typed.
 *
 * @param doi the DOI of the row's source
 * @throws ZodError when the row is not valid by the contract of entries; Error naming row and column when a cell cannot be read
 */
export function inputOfRow(row: EntryRow, doi: string): EntryInput {
  const equation = cell(row, 'equation');
  return entryInput.parse(filled({
    kind: cell(row, 'kind'), scope: cell(row, 'scope'), provenance: cell(row, 'provenance'),
    step: equation === undefined ? undefined : { equation },
    surface: filled({
      metal: cell(row, 'metal'), formula: cell(row, 'formula'), structure: cell(row, 'structure'), facet: cell(row, 'facet'), site: cell(row, 'site'),
      sampleType: cell(row, 'sample_type'), support: cell(row, 'support'), particleSizeNm: number(row, 'particle_size_nm'),
    }),
    source: { doi },
    locator: cell(row, 'locator'),
    method: filled({ class: cell(row, 'method_class'), technique: cell(row, 'technique'), detail: cell(row, 'method_detail') }),
    quantities: quantitiesOf(row),
    correlation: number(row, 'correlation'),
    rateOf: rateOfRow(row),
    kineticOrders: kineticOrdersOf(row),
    conditions: conditionsOf(row),
    validRange: filled({ min: number(row, 'valid_from_K'), max: number(row, 'valid_to_K') }),
    note: cell(row, 'note'),
  }));
}

/**
 * Reads what is to be done with a row's entry.
 *
 * @throws ZodError naming the column that is not right
 */
export function scriptOfRow(row: EntryRow): EntryScript {
  const text = (column: string): string | null => cell(row, column) ?? null;
  return entryScript.parse({
    contributor: row['contributor'], submittedAt: text('submitted_at'), outcome: row['outcome'], reviewer: text('reviewer'), decidedAt: text('decided_at'),
    reason: text('reason'), comment: text('comment'), revises: text('revises'), revisionReason: text('revision_reason'),
    retractedAt: text('retracted_at'), retractedBy: text('retracted_by'), retractionReason: text('retraction_reason'), mark: text('marks'),
  });
}
