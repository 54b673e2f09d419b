import { and, arrayContains, asc, eq, isNotNull, ne, notInArray, sql } from 'drizzle-orm';
import type { DbOrTx } from '#server/db/pool.ts';
import { revisions } from '#server/db/schema/entries.ts';
import { searchRows } from '#server/db/schema/search.ts';
import type { Bound, EnergyType, Scope } from '#shared/domain/kinds.ts';

export interface Neighbour {
  accession: string;
  label: string;
  energyKJPerMol: number;
  bound: string;
  computed: boolean;
  sameSurface: boolean;
  metal: string | null;
  facet: string | null;
  site: string | null;
}

interface Family {
  stepKey: string;
  direction: number;
  energyType: string | null;
  scope: string | null;
  exceptEntryId: string | null;
}

/** Accepted energies of the same elementary step and direction, of one scope and energy type: those on the same surface first. */
export async function listNeighbours(db: DbOrTx, family: Family, surfaceLabel: string): Promise<Neighbour[]> {
  const rows = await db.select({
    accession: searchRows.accession, source: searchRows.sourceLabel, surface: searchRows.surfaceLabel, energyKJPerMol: searchRows.energyKJPerMol, bound: searchRows.energyBound,
    methodClass: searchRows.methodClass, metal: searchRows.metal, facet: searchRows.facet, site: searchRows.site,
  }).from(searchRows)
    .where(and(
      searchRows.listed, eq(searchRows.stepKey, family.stepKey), eq(searchRows.stepDirection, family.direction), isNotNull(searchRows.energyKJPerMol),
      family.energyType ? eq(searchRows.energyType, family.energyType) : undefined,
      family.scope ? eq(searchRows.scope, family.scope) : undefined,
      family.exceptEntryId
        ? notInArray(searchRows.revisionId, db.select({ id: revisions.id }).from(revisions).where(eq(revisions.entryId, family.exceptEntryId)))
        : undefined,
    ))
    .orderBy(sql`(${searchRows.surfaceLabel} = ${surfaceLabel}) desc`, asc(searchRows.surfaceLabel), asc(searchRows.accession)).limit(60);
  return rows.map((row) => ({
    accession: row.accession, label: `${row.source}, ${row.surface}`, energyKJPerMol: row.energyKJPerMol ?? 0, bound: row.bound ?? '=', computed: row.methodClass === 'computed',
    sameSurface: row.surface === surfaceLabel, metal: row.metal, facet: row.facet, site: row.site,
  }));
}

/** Other accepted entries of the step on the surface (or of its reverse), whatever their scope. */
export async function listRelated(db: DbOrTx, { stepKey, direction, surfaceLabel, accession }: { stepKey: string; direction: number; surfaceLabel: string; accession: string }) {
  const rows = await db.select({ row: searchRows, input: revisions.input })
    .from(searchRows).innerJoin(revisions, eq(revisions.id, searchRows.revisionId))
    .where(and(searchRows.listed, eq(searchRows.stepKey, stepKey), eq(searchRows.stepDirection, direction), eq(searchRows.surfaceLabel, surfaceLabel), ne(searchRows.accession, accession)))
    .orderBy(asc(searchRows.energyKJPerMol), asc(searchRows.accession)).limit(50);
  return rows.map(({ row, input }) => {
    const primary = input.quantities?.[0];
    const { lnPreExponential, referenceTemperatureK, exponent, rateUnit } = row;
    return {
      accession: row.accession, label: row.sourceLabel, energyKJPerMol: row.energyKJPerMol, computed: row.methodClass === 'computed',
      asPrinted: primary ? `${primary.asPrinted} ${primary.unitAsPrinted}`.trim() : '',
      bound: row.energyBound as Bound | null, uEnergyKJPerMol: row.uEnergyKJPerMol, energyType: row.energyType as EnergyType | null, scope: (row.scope || null) as Scope | null,
      promoters: row.promoters, site: row.site, equation: row.equation,
      validRange: row.validMinK === null && row.validMaxK === null ? null : { min: row.validMinK, max: row.validMaxK },
      rate: lnPreExponential === null || rateUnit === null ? null : { lnPreExponential, exponent: exponent ?? 0, referenceTemperatureK: referenceTemperatureK ?? 1, unit: rateUnit },
    };
  });
}
export type Related = Awaited<ReturnType<typeof listRelated>>[number];

/** Accepted revisions that hold a reaction energy of the step on the surface, in either direction. */
export async function listReactionEnergyHolders(db: DbOrTx, { stepKey, surfaceLabel }: { stepKey: string; surfaceLabel: string }): Promise<string[]> {
  const rows = await db.select({ id: searchRows.revisionId }).from(searchRows)
    .where(and(searchRows.listed, eq(searchRows.stepKey, stepKey), eq(searchRows.surfaceLabel, surfaceLabel), arrayContains(searchRows.kindsHeld, ['reaction-energy'])))
    .orderBy(asc(searchRows.accession)).limit(20);
  return rows.map(({ id }) => id);
}
