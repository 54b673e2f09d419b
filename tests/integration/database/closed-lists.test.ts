import pg from 'pg';
import { describe, expect, it } from 'vitest';
import { sourceStatuses } from '#shared/contracts/sources.ts';
import { arrangements, bounds, energyTypes, kinds, methodClasses, provenances, quantitySymbols, sampleTypes, scopes, siteTypes, structures, uncertaintyKinds } from '#shared/domain/kinds.ts';
import { decisionReasons, decisions } from '#shared/domain/review.ts';
import { grantableRoles } from '#shared/domain/roles.ts';
import { states } from '#shared/domain/states.ts';
import { useDatabase } from '#tests/setup/database.ts';

const database = useDatabase();

async function listsInDatabase(): Promise<Record<string, string[]>> {
  const client = new pg.Client({ connectionString: database.ownerUrl });
  await client.connect();
  try {
    const { rows } = await client.query<{ name: string; definition: string }>(
      "select conname as name, pg_get_constraintdef(oid) as definition from pg_constraint where contype = 'c' and connamespace = 'public'::regnamespace",
    );
    const lists = rows.filter(({ definition }) => /^CHECK \(\(\(?[a-z_]+\)?(::text)? = ANY \(+ARRAY\[/.test(definition));
    return Object.fromEntries(lists.map(({ name, definition }) => [name, [...definition.matchAll(/'((?:[^']|'')*)'/g)].map((match) => (match[1] ?? '').replaceAll("''", "'"))]));
  } finally {
    await client.end();
  }
}

const wanted: Record<string, readonly string[]> = {
  revisions_state_check: states, revisions_kind_check: kinds, revisions_scope_check: scopes, revisions_provenance_check: provenances, revisions_method_class_check: methodClasses,
  quantities_symbol_check: quantitySymbols, quantities_energy_type_check: energyTypes, quantities_bound_check: bounds, quantities_uncertainty_kind_check: uncertaintyKinds,
  surfaces_structure_check: structures, surfaces_site_check: siteTypes, surfaces_arrangement_check: arrangements, surfaces_sample_type_check: sampleTypes,
  decisions_decision_check: decisions, decisions_reason_check: decisionReasons, sources_status_check: sourceStatuses, user_roles_role_check: grantableRoles,
};

describe('closed lists', () => {
  it.each(Object.keys(wanted))('%s is the list of the domain', async (name) => {
    expect((await listsInDatabase())[name]).toEqual(wanted[name]);
  });
});
