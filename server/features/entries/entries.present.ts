import type { Actor } from '#server/actor.ts';
import { presentSource } from '#server/features/sources/sources.service.ts';
import { rateAtTemperature } from '#shared/assessment/rate-at-temperature.ts';
import type { Assessment } from '#shared/assessment/assess-entry.ts';
import type { Entry, EntryAction, EntryInput } from '#shared/contracts/entries.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';
import type { SourceSummary } from '#shared/contracts/sources.ts';
import { arrangements } from '#shared/domain/kinds.ts';
import type { State } from '#shared/domain/states.ts';
import type { Surface } from '#shared/domain/surface.ts';
import { entryActions, isOpen } from './entries.policy.ts';
import type { EntryRecord, RevisionRow } from './entries.repository.ts';

export interface View {
  temperatureK: number | null;
  actions: EntryAction[];
  publicUrl: string;
}

/** Tag of what somebody saw of a revision; sent back as If-Match or `seen`. */
export const revisionTag = (revision: Pick<RevisionRow, 'number' | 'lock'>): string => `${revision.number}.${revision.lock}`;

export function presentQuantity({ printed, converted }: EntryRecord['quantities'][number]): Quantity {
  return {
    symbol: printed.symbol as Quantity['symbol'],
    energyType: printed.energyType as Quantity['energyType'],
    asPrinted: printed.asPrinted,
    unitAsPrinted: printed.unitAsPrinted,
    multiplier: printed.multiplier,
    bound: printed.bound as Quantity['bound'],
    value: converted.value,
    low: converted.low,
    high: converted.high,
    unit: converted.unit,
    siteValue: converted.siteValue,
    siteUnit: converted.siteUnit,
    siteExponentChange: converted.siteExponentChange,
    missing: converted.missing.length > 0 ? converted.missing : null,
    reportedUncertainty: printed.reportedUncertainty,
    reportedMinus: printed.reportedMinus,
    reportedPlus: printed.reportedPlus,
    uncertaintyKind: printed.uncertaintyKind as Quantity['uncertaintyKind'],
    uncertaintyScale: printed.uncertaintyScale as Quantity['uncertaintyScale'],
    standardUncertainty: converted.standardUncertainty,
    significantDigits: printed.significantDigits,
    derivation: converted.derivation,
  };
}

/** The converted quantities of an assessment in the form the interface gives them. */
export function presentAssessed(assessment: Assessment): Quantity[] {
  return assessment.quantities.map((quantity) => ({
    symbol: quantity.symbol, energyType: (quantity.energyType ?? null) as Quantity['energyType'], asPrinted: quantity.asPrinted, unitAsPrinted: quantity.unitAsPrinted ?? '',
    multiplier: quantity.multiplier ?? null, bound: quantity.bound, value: quantity.value, low: quantity.low, high: quantity.high, unit: quantity.unit,
    siteValue: quantity.siteValue ?? null, siteUnit: quantity.siteUnit ?? null, siteExponentChange: quantity.siteExponentChange ?? null, missing: quantity.missing?.length ? quantity.missing : null,
    reportedUncertainty: quantity.reportedUncertainty, reportedMinus: quantity.reportedMinus ?? null, reportedPlus: quantity.reportedPlus ?? null,
    uncertaintyKind: quantity.uncertaintyKind, uncertaintyScale: quantity.uncertaintyScale, standardUncertainty: quantity.standardUncertainty,
    significantDigits: quantity.significantDigits, derivation: quantity.derivation,
  }));
}

/** What an entry's typed input says of itself, whether frozen or not. */
function presentInput(input: EntryInput) {
  const { validRange } = input;
  return {
    kind: input.kind ?? null, scope: input.scope ?? null, provenance: input.provenance ?? null, locator: input.locator ?? null,
    method: { class: input.method?.class ?? null, technique: input.method?.technique ?? null, detail: input.method?.detail ?? null },
    correlation: input.correlation ?? null, rateOf: input.rateOf ?? null, kineticOrders: input.kineticOrders ?? null, conditions: input.conditions ?? {},
    validRange: validRange && (validRange.min !== undefined || validRange.max !== undefined) ? { min: validRange.min ?? null, max: validRange.max ?? null } : null,
    note: input.note ?? null,
  };
}

function links(accession: string, publicUrl: string) {
  return { self: `${publicUrl}/api/v1/entries/${accession}`, page: `${publicUrl}/entries/${accession}` };
}

function presentSurface(id: string | null, surface: EntryRecord['surface'] | Surface): NonNullable<Entry['surface']> {
  const { metal, formula, structure, facet, site, sampleType, support, label, host, guest, guestMonolayers, reconstruction, particleSizeNm, dispersion, strainPercent, stepFraction } = surface;
  const arrangement = arrangements.find((one) => one === surface.arrangement) ?? null;
  return { id, metal, formula, structure, facet, site, sampleType, support, label, host, guest, arrangement, guestMonolayers, reconstruction, particleSizeNm, dispersion, strainPercent, stepFraction };
}

/** A frozen revision as the interface gives it. */
export function presentRecord(record: EntryRecord, view: View): Entry {
  const { revision, step, surface, conversion } = record;
  const input = presentInput(revision.input);
  const quantities = record.quantities.map(presentQuantity);
  return {
    ...input,
    accession: record.accession, version: revision.version, revision: revision.number, state: revision.state as State,
    step: { key: step.key, variantKey: step.variantKey, equation: step.equation, class: step.stepClass, direction: step.direction as 1 | -1 },
    surface: presentSurface(surface.id, surface),
    source: presentSource(record.source),
    quantities,
    checks: record.checks as Entry['checks'],
    kAtT: view.temperatureK === null ? null : rateAtTemperature(quantities, {
      temperatureK: view.temperatureK, correlation: input.correlation, validRange: input.validRange, measured: revision.methodClass === 'measured',
    }),
    conversion: { coreVersion: conversion.coreVersion, constantsVersion: conversion.constantsVersion, at: conversion.createdAt.toISOString() },
    notice: revision.notice, contributor: revision.authorName, acceptedAt: revision.acceptedAt?.toISOString() ?? null,
    actions: view.actions, links: links(record.accession, view.publicUrl),
  };
}

/** A revision that is still typed at, shown from its assessment. */
export function presentDraft(
  head: { accession: string; revision: RevisionRow }, assessment: Assessment, source: SourceSummary | null, checks: Entry['checks'], view: View,
): Entry {
  const { step, surface } = assessment;
  const input = presentInput(head.revision.input);
  const quantities = presentAssessed(assessment);
  return {
    ...input,
    accession: head.accession, version: null, revision: head.revision.number, state: head.revision.state as State,
    step: presentStep(assessment),
    surface: surface ? presentSurface(null, surface) : null,
    source, quantities, checks,
    kAtT: view.temperatureK === null || !step ? null : rateAtTemperature(quantities, {
      temperatureK: view.temperatureK, correlation: input.correlation, validRange: input.validRange, measured: input.method.class === 'measured',
    }),
    conversion: null, notice: null, contributor: head.revision.authorName, acceptedAt: null, actions: view.actions, links: links(head.accession, view.publicUrl),
  };
}

export function presentStep({ step }: Assessment): Entry['step'] {
  return step ? { key: step.key, variantKey: step.variantKey, equation: step.equation, class: step.class, direction: step.direction } : null;
}

/** What the viewer may do with one revision among all of its entry. */
export function actionsFor(actor: Actor, contributorId: string, revision: RevisionRow, all: readonly RevisionRow[]): EntryAction[] {
  return entryActions(actor, {
    state: revision.state as State, authorId: revision.authorId, contributorId,
    newest: all.every(({ number }) => number <= revision.number), entryHasOpenRevision: all.some(({ state }) => isOpen(state as State)),
  });
}
