import type { TestDatabase } from '../test-database';

export interface Column {
  readonly name: string;
  readonly type: string;
  readonly notNull: boolean;
  readonly hasDefault: boolean;
}

export interface Reference {
  readonly name: string;
  readonly columns: readonly string[];
  readonly target: string;
  readonly targetColumns: readonly string[];
}

export interface TenantTable {
  readonly name: string;
  readonly columns: readonly Column[];
  readonly references: readonly Reference[];
  /** The bodies of its CHECK constraints. */
  readonly checks: readonly string[];
}

const TABLES = `
  select c.relname as name,
    (select json_agg(json_build_object('name', a.attname, 'type', format_type(a.atttypid, a.atttypmod),
        'notNull', a.attnotnull, 'hasDefault', a.atthasdef) order by a.attnum)
      from pg_attribute a where a.attrelid = c.oid and a.attnum > 0 and not a.attisdropped) as columns,
    coalesce((select json_agg(json_build_object('name', k.conname, 'target', k.confrelid::regclass::text,
        'columns', (select json_agg(a.attname order by n) from unnest(k.conkey) with ordinality u(attnum, n)
          join pg_attribute a on a.attrelid = k.conrelid and a.attnum = u.attnum),
        'targetColumns', (select json_agg(a.attname order by n) from unnest(k.confkey) with ordinality u(attnum, n)
          join pg_attribute a on a.attrelid = k.confrelid and a.attnum = u.attnum)))
      from pg_constraint k where k.conrelid = c.oid and k.contype = 'f'), '[]') as references,
    coalesce((select json_agg(pg_get_constraintdef(k.oid))
      from pg_constraint k where k.conrelid = c.oid and k.contype = 'c'), '[]') as checks
  from pg_class c
  where c.relnamespace = 'public'::regnamespace and c.relkind in ('r', 'p')
    and exists (select from pg_attribute a where a.attrelid = c.oid and a.attname = 'organisation_id' and not a.attisdropped)`;

/**
 * Every table with an organisation, as the catalogue has it (a new one is there by itself), each after the tables that
 * it refers to.
 */
export async function tenantTables(database: TestDatabase): Promise<readonly TenantTable[]> {
  const waiting = [...(await database.query<TenantTable>('superuser', TABLES))];
  const ordered: TenantTable[] = [];
  while (waiting.length > 0) {
    const next = waiting.findIndex((table) =>
      table.references.every(
        ({ target }) => target === table.name || !waiting.some((other) => other.name === target),
      ),
    );
    if (next < 0)
      throw new Error(`tables refer to each other in a circle: ${waiting.map((t) => t.name).join()}`);
    ordered.push(...waiting.splice(next, 1));
  }
  return ordered;
}
