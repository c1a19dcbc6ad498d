import { OUTSIDE_TENANTS, PLATFORM_COLUMN_UPDATES, PLATFORM_GRANTS, TENANT_TABLES } from '../grants';
import { ROLE_NAMES } from '../roles';
import type { Queryable } from './check-tables';

interface Grant {
  readonly grantee: string;
  readonly object: string;
  readonly verb: string;
}

const GRANTS = `
  with holders as (
    select oid, rolname from pg_roles where rolname in ('${ROLE_NAMES.tenant}', '${ROLE_NAMES.platform}')
    union all select 0, 'PUBLIC'
  )
  select h.rolname as grantee, c.oid::regclass::text as object, acl.privilege_type as verb
  from pg_class c cross join aclexplode(c.relacl) acl join holders h on h.oid = acl.grantee
  where c.relnamespace = 'public'::regnamespace
  union all
  select h.rolname, c.oid::regclass::text || '.' || a.attname, acl.privilege_type
  from pg_attribute a join pg_class c on c.oid = a.attrelid cross join aclexplode(a.attacl) acl
    join holders h on h.oid = acl.grantee
  where c.relnamespace = 'public'::regnamespace`;

const PRIVILEGED = `
  select 'function ' || p.oid::regprocedure::text || ' runs with its owner’s rights' as complaint
  from pg_proc p where p.pronamespace = 'public'::regnamespace and p.prosecdef
  union all
  select 'role ' || rolname || ' is superuser, bypasses row-level security or may create roles or databases'
  from pg_roles where rolname in ('${ROLE_NAMES.tenant}', '${ROLE_NAMES.platform}')
    and (rolsuper or rolbypassrls or rolcreaterole or rolcreatedb or rolreplication)
  union all
  select 'role ' || rolname || ' is superuser or bypasses row-level security'
  from pg_roles where rolname = '${ROLE_NAMES.owner}' and (rolsuper or rolbypassrls)
  union all
  select 'role ' || m.member::regrole || ' is a member of ' || m.roleid::regrole
  from pg_auth_members m where m.member::regrole::text in ('${ROLE_NAMES.tenant}', '${ROLE_NAMES.platform}')`;

/** The request roles hold exactly what grants.ts says; PUBLIC holds nothing; nothing lends greater powers. */
export async function checkGrants(client: Queryable): Promise<readonly string[]> {
  const found = new Set((await client.query<Grant>(GRANTS)).rows.map(describe));
  const expected = new Set([
    ...grantsOf(ROLE_NAMES.tenant, { ...TENANT_TABLES, ...OUTSIDE_TENANTS }),
    ...grantsOf(ROLE_NAMES.platform, PLATFORM_GRANTS),
    ...Object.entries(PLATFORM_COLUMN_UPDATES).flatMap(([table, columns]) =>
      columns.map((column) =>
        describe({ grantee: ROLE_NAMES.platform, object: `${table}.${column}`, verb: 'UPDATE' }),
      ),
    ),
  ]);
  const privileged = (await client.query<{ complaint: string }>(PRIVILEGED)).rows.map((row) => row.complaint);
  return [
    ...[...found]
      .filter((grant) => !expected.has(grant))
      .map((grant) => `granted, but not in grants.ts: ${grant}`),
    ...[...expected]
      .filter((grant) => !found.has(grant))
      .map((grant) => `in grants.ts, but not granted: ${grant}`),
    ...privileged,
  ];
}

const describe = (grant: Grant) => `${grant.verb} on ${grant.object} to ${grant.grantee}`;

function grantsOf(grantee: string, verbs: Readonly<Record<string, readonly string[]>>): string[] {
  return Object.entries(verbs).flatMap(([object, list]) =>
    list.map((verb) => describe({ grantee, object, verb })),
  );
}
