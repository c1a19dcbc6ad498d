import { TENANT_TABLES } from '../grants';
import type { Queryable } from './check-tables';
import { KEYS_OUTSIDE } from './expected';

interface KeyColumn {
  readonly table: string;
  readonly type: string;
  readonly not_null: boolean;
  readonly statistics: number;
}

interface Index {
  readonly table: string;
  readonly name: string;
  readonly is_primary: boolean;
  readonly columns: readonly (string | null)[];
}

interface ForeignKey {
  readonly table: string;
  readonly name: string;
  readonly target: string;
  readonly columns: readonly string[];
  readonly target_columns: readonly string[];
}

const KEY_COLUMNS = `
  select attrelid::regclass::text as table, format_type(atttypid, null) as type, attnotnull as not_null,
    attstattarget as statistics
  from pg_attribute where attname = 'organisation_id' and not attisdropped
    and attrelid in (select oid from pg_class where relnamespace = 'public'::regnamespace and relkind in ('r', 'p'))`;

const UNIQUE_INDEXES = `
  select i.indrelid::regclass::text as table, i.indexrelid::regclass::text as name, i.indisprimary as is_primary,
    array(select a.attname::text from unnest(i.indkey::int[]) with ordinality k(attnum, n)
      left join pg_attribute a on a.attrelid = i.indrelid and a.attnum = k.attnum and k.attnum > 0
      where k.n <= i.indnkeyatts order by k.n) as columns
  from pg_index i join pg_class c on c.oid = i.indrelid
  where c.relnamespace = 'public'::regnamespace and (i.indisunique or i.indisexclusion)`;

const columnNames = (owner: string, numbers: string) => `
  array(select a.attname::text from unnest(${numbers}) with ordinality k(attnum, n)
    join pg_attribute a on a.attrelid = ${owner} and a.attnum = k.attnum order by k.n)`;

const FOREIGN_KEYS = `
  select conrelid::regclass::text as table, conname as name, confrelid::regclass::text as target,
    ${columnNames('conrelid', 'conkey')} as columns, ${columnNames('confrelid', 'confkey')} as target_columns
  from pg_constraint where contype = 'f' and connamespace = 'public'::regnamespace`;

/**
 * The organisation stands in every key: foreign keys and unique indexes look past row-level security, so one without
 * it would tell, or refer to, what belongs to another organisation.
 */
export async function checkKeys(client: Queryable): Promise<readonly string[]> {
  const columns = (await client.query<KeyColumn>(KEY_COLUMNS)).rows;
  const indexes = (await client.query<Index>(UNIQUE_INDEXES)).rows.filter(
    (row) => row.table in TENANT_TABLES,
  );
  const foreign = (await client.query<ForeignKey>(FOREIGN_KEYS)).rows;
  return [
    ...Object.keys(TENANT_TABLES).flatMap((table) => keyComplaints(table, columns, indexes)),
    ...indexes
      .filter((index) => !index.columns.includes('organisation_id'))
      .map((index) => `${index.table}: the unique index ${index.name} leaves the organisation out`),
    ...foreign.flatMap(foreignKeyComplaints),
  ];
}

function keyComplaints(table: string, columns: readonly KeyColumn[], indexes: readonly Index[]): string[] {
  const column = columns.find((row) => row.table === table);
  if (column === undefined) return [`${table}: has no organisation_id`];
  const complaints: string[] = [];
  if (column.type !== 'uuid' || !column.not_null)
    complaints.push(`${table}: organisation_id is not uuid NOT NULL`);
  if (column.statistics !== 0) complaints.push(`${table}: statistics are kept of organisation_id`);
  const primary = indexes.find((index) => index.table === table && index.is_primary);
  if (primary?.columns.join() !== 'organisation_id,id') {
    complaints.push(`${table}: the primary key is not (organisation_id, id)`);
  }
  return complaints;
}

function foreignKeyComplaints(key: ForeignKey): string[] {
  const fromTenant = key.table in TENANT_TABLES;
  const toTenant = key.target in TENANT_TABLES;
  if (!fromTenant)
    return toTenant ? [`${key.table}: ${key.name} points from outside into a tenant’s table`] : [];
  const place = key.columns.indexOf('organisation_id');
  const expected = toTenant ? 'organisation_id' : 'id';
  const carries = place >= 0 && key.target_columns[place] === expected;
  if (carries && (toTenant || key.target === 'organisations')) return [];
  return KEYS_OUTSIDE.includes(key.name)
    ? []
    : [`${key.table}: the foreign key ${key.name} leaves the organisation out`];
}
