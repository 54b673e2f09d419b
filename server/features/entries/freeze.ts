import type { Tx } from '#server/db/pool.ts';
import type { Assessment } from '#shared/assessment/assess-entry.ts';
import type { Check } from '#shared/contracts/entries.ts';
import { CONSTANTS_VERSION, CORE_VERSION } from '#shared/kinetics/constants.ts';
import { STEP_PARSER_VERSION } from '#shared/steps/parse-step.ts';
import * as repository from './entries.repository.ts';

/** Writes what a submission freezes: step, surface, quantities, conversion and checks. The revision is still a draft while this runs. */
export async function freezeRevision(tx: Tx, revision: repository.RevisionRow, assessment: Assessment, checks: readonly Check[], at: Date) {
  const { step, surface } = assessment;
  if (!step || !surface) throw new Error('Only what can be read is frozen.');
  const stepId = await repository.ensureStep(tx, {
    key: step.key, variantKey: step.variantKey, direction: step.direction, equation: step.equation, stepClass: step.class, bond: step.bond.broken ?? step.bond.formed,
    gasOrder: step.gasOrder, surfaceOrder: step.surfaceOrder, parserVersion: STEP_PARSER_VERSION,
  });
  const surfaceId = await repository.ensureSurface(tx, { ...surface, createdAt: at });
  const rows = await repository.insertQuantities(tx, assessment.quantities.map((quantity) => ({
    revisionId: revision.id, position: quantity.position, symbol: quantity.symbol, energyType: quantity.energyType ?? null, asPrinted: quantity.asPrinted,
    unitAsPrinted: quantity.unitAsPrinted ?? '', unitId: quantity.unitId, multiplier: quantity.multiplier ?? null, bound: quantity.bound, value: quantity.printed.value,
    low: quantity.printed.low, high: quantity.printed.high, reportedUncertainty: quantity.reportedUncertainty, reportedMinus: quantity.reportedMinus ?? null,
    reportedPlus: quantity.reportedPlus ?? null, uncertaintyKind: quantity.uncertaintyKind, uncertaintyScale: quantity.uncertaintyScale,
    standardUncertainty: quantity.printed.standardUncertainty, significantDigits: quantity.significantDigits,
  })));
  const idAt = new Map(rows.map((row) => [row.position, row.id]));
  await repository.insertConversion(
    tx, { revisionId: revision.id, coreVersion: CORE_VERSION, constantsVersion: CONSTANTS_VERSION, createdAt: at },
    assessment.quantities.map((quantity) => ({
      quantityId: idAt.get(quantity.position) ?? '', value: quantity.value, low: quantity.low, high: quantity.high, standardUncertainty: quantity.standardUncertainty,
      unit: quantity.unit, siteValue: quantity.siteValue ?? null, siteUnit: quantity.siteUnit ?? null, siteExponentChange: quantity.siteExponentChange ?? null, missing: quantity.missing ?? [], derivation: quantity.derivation,
    })),
    checks.map((check, position) => ({ ...check, position })),
  );
  return { stepId, surfaceId };
}
