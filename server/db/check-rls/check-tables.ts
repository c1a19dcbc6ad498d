import type pg from 'pg';
import { OUTSIDE_TENANTS, TENANT_TABLES } from '../grants';
import { type ExpectedPolicy, FURTHER_POLICIES, tenantPolicy } from './expected';

export type Queryable = Pick<pg.ClientBase, 'query'>;

interface Relation {
  readonly name: string;
  readonly kind: string;
  readonly enabled: boolean;
  readonly forced: boolean;
  readonly has_organisation: boolean;
  readonly options: readonly string[] | null;
}

const RELATIONS = `
  select c.oid::regclass::text as name, c.relkind as kind, c.relrowsecurity as enabled, c.relforcerowsecurity as forced,
    c.reloptions as options,
    exists (select from pg_attribute a where a.attrelid = c.oid and a.attname like '%organisation_id' and not a.attisdropped)
      as has_organisation
  from pg_class c join pg_namespace n on n.oid = c.relnamespace
  where c.relkind in ('r', 'p', 'v', 'm', 'f')
    and n.nspname not like 'pg\\_%' and n.nspname not in ('information_schema', 'drizzle')
  order by 1`;

/** Every table is accounted for, and every tenant's table carries forced row-level security. */
export async function checkTables(client: Queryable): Promise<readonly string[]> {
  const { rows } = await client.query<Relation>(RELATIONS);
  const complaints: string[] = [];
  const names = new Set(rows.map((row) => row.name));
  for (const table of [...Object.keys(TENANT_TABLES), ...Object.keys(OUTSIDE_TENANTS)]) {
    if (!names.has(table)) complaints.push(`${table}: listed in grants.ts, but not in the database`);
  }
  for (const row of rows) {
    const complain = (what: string) => complaints.push(`${row.name}: ${what}`);
    if (row.kind === 'v') {
      if (!row.options?.includes('security_invoker=true')) complain('a view without security_invoker');
    } else if (row.kind === 'm' || row.kind === 'f') {
      complain('materialised views and foreign tables know no row-level security');
    } else if (row.name in TENANT_TABLES || row.name === 'organisations') {
      if (!row.enabled) complain('row-level security is not enabled');
      if (!row.forced) complain('row-level security is not forced');
    } else if (!(row.name in OUTSIDE_TENANTS)) {
      complain('no entry in grants.ts says whose rows these are');
    } else if (row.has_organisation) complain('carries an organisation, yet is listed outside tenants');
  }
  return complaints;
}

interface Policy {
  readonly table: string;
  readonly name: string;
  readonly permissive: string;
  readonly command: string;
  readonly roles: string;
  readonly using: string | null;
  readonly with_check: string | null;
}

const POLICIES = `
  select tablename as table, policyname as name, permissive, cmd as command, roles::text as roles,
    qual as using, with_check
  from pg_policies where schemaname = 'public'`;

/** Exactly the expected policies, word for word: both clauses compare the row's own column. */
export async function checkPolicies(client: Queryable): Promise<readonly string[]> {
  const { rows } = await client.query<Policy>(POLICIES);
  const expected = [...Object.keys(TENANT_TABLES).map(tenantPolicy), ...FURTHER_POLICIES];
  const missing = expected
    .filter((policy) => !rows.some((row) => isSame(row, policy)))
    .map((policy) => `${policy.table}: the policy for ${policy.role} is missing or is not ${policy.using}`);
  const surplus = rows
    .filter((row) => !expected.some((policy) => isSame(row, policy)))
    .map((row) => `${row.table}: the policy ${row.name} is not one of those expected`);
  return [...missing, ...surplus];
}

function isSame(row: Policy, policy: ExpectedPolicy): boolean {
  return (
    row.table === policy.table &&
    row.permissive === 'PERMISSIVE' &&
    row.command === policy.command &&
    row.roles === `{${policy.role}}` &&
    row.using === policy.using &&
    row.with_check === policy.withCheck
  );
}
