import * as z from 'zod';
import {
  arrangements, bounds, energyTypes, kinds, methodClasses, provenances, sampleTypes, scopes, siteTypes, structures,
} from '../domain/kinds.ts';
import { checkCodes } from '../domain/check-codes.ts';
import { states } from '../domain/states.ts';
import { endpoint } from './endpoint.ts';
import { derivationLine, quantity, quantityInput } from './quantities.ts';
import { sourceSummary } from './sources.ts';

/** What the printed rate counts: one event of the step as written, consumption of a named species, or not known. */
export const rateOf = z.union([z.literal('event'), z.literal('unknown'), z.object({ consumptionOf: z.string().min(1).max(60) })]);

export const temperatureRange = z.object({ min: z.number(), max: z.number() });

/** Conditions under their standard names; what a value needs depends on its method. */
export const conditions = z.object({
  coverage: z.string().max(200).optional(),
  coverageDefinition: z.enum(['per-surface-atom', 'per-adsorption-site', 'relative-to-saturation']).optional(),
  pressures: z.string().max(200).optional(),
  temperatureK: z.number().optional(),
  siteDensityPerM2: z.number().positive().optional(),
  siteDensitySource: z.string().max(200).optional(),
  /** True for a rate of kinetic Monte Carlo, printed per pair of neighbours; the number of nearest neighbours brings it to mean field. */
  perPair: z.boolean().optional(),
  nearestNeighbours: z.number().positive().max(24).optional(),
  promoter: z.string().max(100).optional(),
  heatingRateKPerS: z.number().positive().optional(),
  exposureLangmuir: z.number().positive().optional(),
  functional: z.string().max(60).optional(),
  supercell: z.string().max(60).optional(),
  endStateReference: z.enum(['gas', 'isolated', 'co-adsorbed']).optional(),
  isotopes: z.string().max(100).optional(),
  kieDirection: z.enum(['light/heavy', 'heavy/light']).optional(),
  text: z.string().max(1000).optional(),
});
export type Conditions = z.infer<typeof conditions>;

export const surfaceInput = z.object({
  /** A pure metal by symbol, or an alloy by formula: one of the two. */
  metal: z.string().max(20).optional(),
  formula: z.string().max(60).optional(),
  structure: z.enum(structures).optional(),
  /** A metal on, in or under the first layer of the other, kept apart from its formula, and where it is. */
  guest: z.string().max(20).optional(),
  arrangement: z.enum(arrangements).optional(),
  guestMonolayers: z.number().positive().max(100).optional(),
  facet: z.string().max(40).optional(),
  reconstruction: z.string().max(30).optional(),
  site: z.enum(siteTypes).optional(),
  sampleType: z.enum(sampleTypes).optional(),
  support: z.string().max(60).optional(),
  particleSizeNm: z.number().positive().max(1e6).optional(),
  dispersion: z.number().positive().max(1).optional(),
  strainPercent: z.number().min(-30).max(30).optional(),
  /** Share of the sites that are at step edges. */
  stepFraction: z.number().min(0).max(1).optional(),
});
export type SurfaceInput = z.infer<typeof surfaceInput>;

export const sourceInput = z.object({
  id: z.string().max(60).optional(),
  doi: z.string().max(300).optional(),
  bibtex: z.string().max(20_000).optional(),
  ris: z.string().max(20_000).optional(),
  /** A citation typed by hand, used when there is no DOI or its service does not answer. */
  csl: z.looseObject({
    type: z.string().max(40).optional(),
    title: z.string().max(1000).optional(),
  }).optional(),
});

/** The whole of what a contributor types; everything is optional in a draft. */
export const entryInput = z.object({
  kind: z.enum(kinds).optional(),
  scope: z.enum(scopes).optional(),
  provenance: z.enum(provenances).optional(),
  step: z.object({
    equation: z.string().max(500),
    /** The source leaves the free sites out and they were added to balance: an assumption, shown with the entry. */
    sitesAdded: z.boolean().optional(),
  }).optional(),
  surface: surfaceInput.optional(),
  source: sourceInput.optional(),
  locator: z.string().max(200).optional(),
  method: z.object({
    class: z.enum(methodClasses).optional(), technique: z.string().max(80).optional(), detail: z.string().max(500).optional(),
  }).optional(),
  quantities: z.array(quantityInput).max(12).optional(),
  correlation: z.number().min(-1).max(1).optional(),
  rateOf: rateOf.optional(),
  kineticOrders: z.record(z.string().max(60), z.number().min(-5).max(5)).optional(),
  conditions: conditions.optional(),
  validRange: z.object({ min: z.number().optional(), max: z.number().optional() }).optional(),
  note: z.string().max(4000).optional(),
});
export type EntryInput = z.infer<typeof entryInput>;

export const checkSeverities = ['blocking', 'warning', 'note'] as const;
export const check = z.object({ code: z.enum(checkCodes), severity: z.enum(checkSeverities), message: z.string() });
export type Check = z.infer<typeof check>;

/** What the viewer may do with an entry; the client shows by this only. */
export const entryActions = ['edit', 'submit', 'withdraw', 'revise', 'claim', 'decide', 'retract', 'export'] as const;
export type EntryAction = (typeof entryActions)[number];

/** A fault in a draft: where in the input, and what to do. */
export const fault = z.object({ path: z.string(), message: z.string(), code: z.string().optional(), suggestion: z.string().optional() });
export type Fault = z.infer<typeof fault>;

export const stepView = z.object({
  key: z.string(), variantKey: z.string(), equation: z.string(), class: z.string(), direction: z.union([z.literal(1), z.literal(-1)]),
});

export const surfaceView = z.object({
  id: z.string().nullable(), metal: z.string().nullable(), formula: z.string(), structure: z.string().nullable(), facet: z.string().nullable(),
  site: z.string().nullable(), sampleType: z.string().nullable(), support: z.string().nullable(), label: z.string(),
  /** Of a near-surface or single-atom alloy: the bulk, the second metal and where it is. */
  host: z.string().nullish(), guest: z.string().nullish(), arrangement: z.enum(arrangements).nullish(), guestMonolayers: z.number().nullish(),
  reconstruction: z.string().nullish(), particleSizeNm: z.number().nullish(), dispersion: z.number().nullish(), strainPercent: z.number().nullish(), stepFraction: z.number().nullish(),
});

export const kAtT = z.object({
  temperatureK: z.number(), value: z.number(), unit: z.string(), uLnK: z.number().nullable(),
  uLnKRange: z.tuple([z.number(), z.number()]).nullish(), extrapolated: z.boolean(),
});

/** An entry as the interface gives it; parts that a draft lacks are null. */
export const entry = z.object({
  accession: z.string(),
  version: z.int().nullable(),
  revision: z.int(),
  state: z.enum(states),
  kind: z.enum(kinds).nullable(),
  scope: z.enum(scopes).nullable(),
  provenance: z.enum(provenances).nullable(),
  step: stepView.nullable(),
  surface: surfaceView.nullable(),
  source: sourceSummary.nullable(),
  locator: z.string().nullable(),
  method: z.object({ class: z.enum(methodClasses).nullable(), technique: z.string().nullable(), detail: z.string().nullable() }),
  quantities: z.array(quantity),
  correlation: z.number().nullable(),
  rateOf: rateOf.nullable(),
  kineticOrders: z.record(z.string(), z.number()).nullable(),
  conditions: conditions,
  validRange: z.object({ min: z.number().nullable(), max: z.number().nullable() }).nullable(),
  note: z.string().nullable(),
  /** Public words on why a retracted version was retracted. */
  notice: z.string().nullable(),
  checks: z.array(check),
  kAtT: kAtT.nullable(),
  /** Constants and core versions of the conversion shown. */
  conversion: z.object({ coreVersion: z.string(), constantsVersion: z.string(), at: z.string() }).nullable(),
  contributor: z.string().nullable(),
  acceptedAt: z.string().nullable(),
  actions: z.array(z.enum(entryActions)),
  links: z.object({ self: z.string(), page: z.string() }),
});
export type Entry = z.infer<typeof entry>;

/** A draft as its contributor sees it: the entry so far, what was typed, and what still stands in the way of submitting. */
export const entryForEditing = entry.extend({
  input: entryInput,
  faults: z.array(fault),
  lock: z.int(),
  lastDecision: z.object({ decision: z.string(), reason: z.string().nullable(), comment: z.string(), by: z.string(), at: z.string() }).nullable(),
  submission: z.string().nullable(),
});
export type EntryForEditing = z.infer<typeof entryForEditing>;

const accessionParam = z.object({ accession: z.string().max(20) });

/** One line of an entry's history, in plain words. */
export const historyLine = z.object({ at: z.string(), by: z.string(), what: z.string(), version: z.int().nullable() });

/** How E_f - E_r stands against a reaction energy of the same type that is held; the figures where one is, the reason where two energies are not compared. */
export const reverseConsistency = z.discriminatedUnion('status', [
  z.object({ status: z.literal('not-compared'), reason: z.string() }),
  z.object({
    /** `undecided`: an uncertainty is not known. `no-reaction-energy`: none of this type is held, so that nothing is checked. */
    status: z.enum(['consistent', 'inconsistent', 'undecided', 'no-reaction-energy']),
    energyType: z.enum(energyTypes),
    /** E_f - E_r, forward being the entry shown [kJ mol-1]. */
    differenceKJPerMol: z.number(),
    uDifferenceKJPerMol: z.number().nullable(),
    /** The reaction energy in the direction of the entry shown, and the entry that holds it. */
    reactionEnergy: z.object({ accession: z.string(), label: z.string(), valueKJPerMol: z.number(), uKJPerMol: z.number().nullable() }).nullable(),
    closureErrorKJPerMol: z.number().nullable(),
    normalizedError: z.number().nullable(),
    derivation: z.array(derivationLine),
    /** Where a gas takes part: what E_f - E_r is on concentrations, and other things taken as given. */
    assumption: z.string().nullable(),
  }),
]);
export type ReverseConsistency = z.infer<typeof reverseConsistency>;

/** An accepted entry beside the one shown. */
export const relatedEntry = z.object({
  accession: z.string(), asPrinted: z.string(), label: z.string(), energyKJPerMol: z.number().nullable(), computed: z.boolean(),
  bound: z.enum(bounds).nullable(), uEnergyKJPerMol: z.number().nullable(), energyType: z.enum(energyTypes).nullable(), scope: z.enum(scopes).nullable(),
  promoters: z.array(z.string()),
  /** Same energy type, scope and promoters as the entry shown, so that both may stand on one scale. */
  alike: z.boolean(),
  validRange: z.object({ min: z.number().nullable(), max: z.number().nullable() }).nullable(),
  /** What k(T) = A (T/T0)^n exp(-E/RT) needs; null where it cannot be had. */
  rate: z.object({ lnPreExponential: z.number(), exponent: z.number(), referenceTemperatureK: z.number(), unit: z.string() }).nullable(),
});
export type RelatedEntry = z.infer<typeof relatedEntry>;

export const entryDetail = entry.extend({
  sourceDetail: z.object({ citation: z.string(), bibtex: z.string(), ris: z.string() }).nullable(),
  history: z.array(historyLine),
  versions: z.array(z.object({ version: z.int(), state: z.enum(states), acceptedAt: z.string() })),
  /** Every revision that the viewer may see, oldest first: what can be compared. */
  revisions: z.array(z.object({ revision: z.int(), version: z.int().nullable(), state: z.enum(states), at: z.string() })),
  /** Accepted entries for the same elementary step on the same surface, and those of the reverse step. */
  sameStepAndSurface: z.array(relatedEntry),
  reverse: z.array(relatedEntry.extend({ consistency: reverseConsistency })),
  submission: z.string().nullable(),
});
export type EntryDetail = z.infer<typeof entryDetail>;

const temperatureQuery = z.object({ T: z.coerce.number().min(1).max(5000).optional() });

export const getEntry = endpoint({
  method: 'GET', path: '/entries/:accession', access: 'visitor', summary: 'One entry: its public version, or the open revision for those who may see it',
  params: accessionParam, query: temperatureQuery, response: entryDetail,
});
export const getEntryVersion = endpoint({
  method: 'GET', path: '/entries/:accession/versions/:version', access: 'visitor', summary: 'One public version of an entry',
  params: accessionParam.extend({ version: z.coerce.number().int().min(1) }), query: temperatureQuery, response: entryDetail,
});
export const listEntryVersions = endpoint({
  method: 'GET', path: '/entries/:accession/versions', access: 'visitor', summary: 'The public versions of an entry',
  params: accessionParam, response: z.object({ items: entryDetail.shape.versions }),
});
/** A version by its number, or for those who may see it a revision as `r3`. */
const versionOrRevision = z.string().regex(/^r?[1-9]\d{0,5}$/, 'Name a version by its number, such as 2, or a revision as r3.');
const comparedRevision = z.object({ revision: z.int(), version: z.int().nullable(), state: z.enum(states), contributor: z.string(), at: z.string() });
export const entryChanges = z.object({
  accession: z.string(), from: comparedRevision, to: comparedRevision,
  /** What was typed, part by part. */
  changes: z.array(z.object({ field: z.string(), before: z.string(), after: z.string() })),
  /** Quantities whose converted value differs, whether the print changed or only its conversion. */
  quantities: z.array(z.object({ symbol: quantity.shape.symbol, before: quantity.nullable(), after: quantity.nullable() })),
});
export type EntryChanges = z.infer<typeof entryChanges>;
export const getEntryChanges = endpoint({
  method: 'GET', path: '/entries/:accession/changes', access: 'visitor', summary: 'What differs between two versions of an entry (or revisions, for those who may see them)',
  params: accessionParam, query: z.object({ from: versionOrRevision, to: versionOrRevision }), response: entryChanges,
});
export const getDraft = endpoint({
  method: 'GET', path: '/entries/:accession/draft', access: 'contributor', summary: 'The open revision of an entry as its contributor typed it',
  params: accessionParam, response: entryForEditing,
});
export const createEntry = endpoint({
  method: 'POST', path: '/entries', access: 'contributor', summary: 'Make a draft; everything is optional', body: entryInput, response: entryForEditing,
});
export const preview = z.object({
  step: stepView.nullable(), surface: surfaceView.nullable(), quantities: z.array(quantity), kAtT: kAtT.nullable(),
  checks: z.array(check), faults: z.array(fault),
  /** Accepted values for the same step, to set this one among. */
  neighbours: z.array(z.object({
    accession: z.string(), label: z.string(), energyKJPerMol: z.number(), computed: z.boolean(), sameSurface: z.boolean(),
  })),
});
export type Preview = z.infer<typeof preview>;
export const previewEntry = endpoint({
  method: 'POST', path: '/entries/preview', access: 'contributor', csrf: false,
  summary: 'What an entry would become: converted values, derivation, k at the temperature of interest, checks. Stores nothing',
  query: temperatureQuery, body: entryInput, response: preview,
});
export const patchEntry = endpoint({
  method: 'PATCH', path: '/entries/:accession', access: 'contributor', summary: 'Change a draft by JSON Merge Patch (RFC 7396); send If-Match with the ETag you saw',
  params: accessionParam, body: z.record(z.string(), z.unknown()), response: entryForEditing,
});
export const submitEntry = endpoint({
  method: 'POST', path: '/entries/:accession/submit', access: 'contributor', summary: 'Hand a draft in for review: it is frozen', params: accessionParam, response: entryForEditing,
});
export const withdrawEntry = endpoint({
  method: 'POST', path: '/entries/:accession/withdraw', access: 'contributor', summary: 'Withdraw an open revision', params: accessionParam,
  response: z.object({ accession: z.string(), state: z.enum(states) }),
});
export const reviseEntry = endpoint({
  method: 'POST', path: '/entries/:accession/revise', access: 'contributor',
  summary: 'Open a new draft revision of an accepted or returned entry, copied from the last', params: accessionParam,
  body: z.object({ reason: z.string().trim().max(1000).optional() }), response: entryForEditing,
});

export const retractEntry = endpoint({
  method: 'POST', path: '/entries/:accession/retract', access: 'reviewer', summary: 'Retract an accepted entry, with a public reason', params: accessionParam,
  body: z.object({ reason: z.string().trim().min(1).max(1000) }), response: z.object({ accession: z.string(), state: z.enum(states) }),
});

/** One of my own submissions and where it stands. */
export const myEntry = z.object({
  accession: z.string(), revision: z.int(), version: z.int().nullable(), state: z.enum(states), kind: z.enum(kinds).nullable(),
  equation: z.string().nullable(), surface: z.string().nullable(), asPrinted: z.string().nullable(), unitAsPrinted: z.string().nullable(),
  sourceLabel: z.string().nullable(), changedAt: z.string(),
  /** Whose turn it is, in words. */
  standing: z.string(),
  lastComment: z.string().nullable(), actions: z.array(z.enum(entryActions)),
});
export const listMyEntries = endpoint({
  method: 'GET', path: '/contributions', access: 'contributor', summary: 'My entries that are not public yet, and the latest that are',
  query: z.object({ state: z.enum(states).optional(), limit: z.coerce.number().int().min(1).max(200).default(50), cursor: z.string().max(500).optional() }),
  response: z.object({ items: z.array(myEntry), total: z.int(), totalIsExact: z.boolean(), nextCursor: z.string().nullable(), counts: z.record(z.string(), z.int()) }),
});
