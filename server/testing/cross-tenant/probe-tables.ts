import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { databaseCode } from '../../db/database-errors';
import type { TestDatabase } from '../test-database';
import type { TenantTable } from './catalogue';
import type { RowsByTable } from './one-row-each';

export interface Tenants {
  readonly tables: readonly TenantTable[];
  /** Whose rows must stay unseen. */
  readonly victim: { readonly id: string; readonly rows: RowsByTable };
  /** Who looks. */
  readonly intruder: { readonly id: string; readonly rows: RowsByTable };
}

/**
 * Speaks to the database as the request roles themselves and tries, table by table, whatever SQL offers. Returns
 * what succeeded that must not; empty is good.
 */
export async function probeTables(database: TestDatabase, tenants: Tenants): Promise<readonly string[]> {
  const leaks: string[] = [];
  const tenant = new pg.Client({ connectionString: database.url('tenant') });
  const platform = new pg.Client({ connectionString: database.url('platform') });
  await tenant.connect();
  await platform.connect();
  try {
    for (const table of tenants.tables) {
      const complain = (what: string) => leaks.push(`${table.name}: ${what}`);
      await probeReading(tenant, table, tenants, complain);
      await probeWriting(tenant, table, tenants, complain);
      await probePlanner(tenant, table, tenants, complain);
      await probePlatform(platform, table, complain);
      await probeReferences(database, table, tenants, complain);
    }
  } finally {
    await tenant.end();
    await platform.end();
  }
  return leaks;
}

type Complain = (what: string) => void;

/** Runs one statement inside the organisation and rolls it back: its rows, or the SQLSTATE that refused it. */
async function attempt(
  client: pg.Client,
  organisationId: string | undefined,
  text: string,
  values: readonly unknown[] = [],
): Promise<{
  readonly rows: readonly Record<string, unknown>[];
  readonly count: number;
  readonly refused?: string;
}> {
  await client.query('begin');
  try {
    if (organisationId !== undefined) {
      await client.query(`select set_config('app.organisation_id', $1, true)`, [organisationId]);
    }
    const result = await client.query<Record<string, unknown>>(text, [...values]);
    return { rows: result.rows, count: result.rowCount ?? 0 };
  } catch (error) {
    return { rows: [], count: 0, refused: databaseCode(error) ?? 'unknown' };
  } finally {
    await client.query('rollback');
  }
}

async function probeReading(client: pg.Client, table: TenantTable, tenants: Tenants, complain: Complain) {
  const { victim, intruder } = tenants;
  const all = await attempt(client, intruder.id, `select organisation_id from ${table.name}`);
  if (all.rows.some((row) => row['organisation_id'] !== intruder.id)) complain('rows of another are read');
  const own = all.rows.length > 0;
  if (!own && all.refused === undefined) complain('not even the own row is seen: the probe proves nothing');
  const counted = await attempt(
    client,
    intruder.id,
    `select count(*)::int as n from ${table.name} where organisation_id = $1`,
    [victim.id],
  );
  if (counted.rows[0]?.['n'] !== 0 && counted.refused === undefined) complain('rows of another are counted');
  const nowhere = await attempt(client, undefined, `select 1 from ${table.name}`);
  if (nowhere.count > 0) complain('rows are read outside any organisation');
}

async function probeWriting(client: pg.Client, table: TenantTable, tenants: Tenants, complain: Complain) {
  const { victim, intruder } = tenants;
  const victimRow = victim.rows.get(table.name) ?? {};
  const changed = await attempt(
    client,
    intruder.id,
    `update ${table.name} set id = id where organisation_id = $1`,
    [victim.id],
  );
  if (changed.count > 0) complain('rows of another are changed');
  const deleted = await attempt(client, intruder.id, `delete from ${table.name} where organisation_id = $1`, [
    victim.id,
  ]);
  if (deleted.count > 0) complain('rows of another are deleted');
  const locked = await attempt(
    client,
    intruder.id,
    `select 1 from ${table.name} where organisation_id = $1 for update`,
    [victim.id],
  );
  if (locked.count > 0) complain('rows of another are locked');
  const given = await attempt(client, intruder.id, `update ${table.name} set organisation_id = $1`, [
    victim.id,
  ]);
  if (given.refused !== '42501') complain(`an own row is given to another (${given.refused ?? 'accepted'})`);
  const names = table.columns.map((column) => column.name);
  const holes = names.map((_name, index) => `$${index + 1}`).join(', ');
  const smuggled = await attempt(
    client,
    intruder.id,
    `insert into ${table.name} (${names.join(', ')}) values (${holes})`,
    names.map((name) => (name === 'id' ? randomUUID() : jsonText(victimRow[name], table, name))),
  );
  if (smuggled.refused !== '42501')
    complain(`a row is put into another’s (${smuggled.refused ?? 'accepted'})`);
  const inferred = await attempt(
    client,
    intruder.id,
    `insert into ${table.name} (${names.join(', ')}) values (${holes}) on conflict do nothing`,
    names.map((name) => jsonText(victimRow[name], table, name)),
  );
  if (inferred.refused !== '42501')
    complain(`ON CONFLICT tells of another’s row (${inferred.refused ?? 'accepted'})`);
}

/** EXPLAIN must estimate the same for another's organisation as for one that does not exist. */
async function probePlanner(client: pg.Client, table: TenantTable, tenants: Tenants, complain: Complain) {
  const plan = async (id: string) => {
    const text = `explain (verbose) select * from ${table.name} where organisation_id = '${id}'`;
    const { rows } = await attempt(client, tenants.intruder.id, text);
    return JSON.stringify(rows).replaceAll(id, 'ID');
  };
  if ((await plan(tenants.victim.id)) !== (await plan(randomUUID())))
    complain('EXPLAIN tells of another’s rows');
}

async function probePlatform(client: pg.Client, table: TenantTable, complain: Complain) {
  const { count } = await attempt(client, undefined, `select 1 from ${table.name}`);
  if (count > 0) complain('the platform role reads it without a person');
}

/** A foreign key checks past row-level security, so it must not be able to find another's row at all. */
async function probeReferences(
  database: TestDatabase,
  table: TenantTable,
  tenants: Tenants,
  complain: Complain,
) {
  const client = new pg.Client({ connectionString: database.url('maintenance') });
  await client.connect();
  try {
    for (const reference of table.references) {
      const column = reference.columns.at(-1);
      const targetColumn = reference.targetColumns.at(-1);
      const target = tenants.victim.rows.get(reference.target);
      if (column === undefined || column === 'organisation_id' || targetColumn === undefined || !target)
        continue;
      const { count, refused } = await attempt(
        client,
        undefined,
        `update ${table.name} set ${column} = $1 where organisation_id = $2`,
        [target[targetColumn], tenants.intruder.id],
      );
      if (count === 0 && refused === undefined)
        complain(`${reference.name}: no own row, the probe proves nothing`);
      if (refused === undefined && count > 0) complain(`${reference.name} refers to another’s row`);
    }
  } finally {
    await client.end();
  }
}

function jsonText(value: unknown, table: TenantTable, name: string): unknown {
  const type = table.columns.find((column) => column.name === name)?.type;
  return type === 'jsonb' && value !== null ? JSON.stringify(value) : value;
}
