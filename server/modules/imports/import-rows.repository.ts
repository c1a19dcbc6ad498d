import { and, asc, eq, sql, type SQL } from 'drizzle-orm';
import type { ImportFix, ImportRow, RowFilter, RowReason, Verdict } from '#shared/contracts/imports';
import type { Tx } from '../../db/pools';
import { importRows } from '../../db/tables/import-rows';
import type { RowVerdict } from './checking/check-group';
import type { TableRow } from './reading/table-under-way';

export interface StoredRow extends TableRow {
  readonly groupKey: string;
}

/** One statement and one parameter for a whole batch, whatever its size. */
export async function insertRows(tx: Tx, importId: string, rows: readonly TableRow[]): Promise<void> {
  await tx.execute(sql`
    insert into import_rows (import_id, row_number, cells)
    select ${importId}, (row->>0)::int, row->1
    from jsonb_array_elements(${JSON.stringify(rows.map((row) => [row.rowNumber, row.cells]))}::jsonb) as row`);
}

export async function deleteRows(tx: Tx, importId: string): Promise<void> {
  await tx.delete(importRows).where(eq(importRows.importId, importId));
}

/** Skipped by hand, in contrast to skipped with its variant: such rows stay skipped whatever is checked again. */
const SKIPPED_BY_HAND = sql`(verdict is not distinct from 'skipped' and reasons = '[]'::jsonb)`;

/** Says of every row to which result it belongs (capital letters make no difference in names): by the name's column, or all to one where the name is a constant. */
export async function setGroupKeys(
  tx: Tx,
  importId: string,
  name: { readonly column: number } | { readonly constant: string },
): Promise<void> {
  const key =
    'column' in name ? sql`lower(coalesce(cells->>${name.column}::int, ''))` : sql`lower(${name.constant})`;
  await tx.execute(sql`
    update import_rows set group_key = ${key},
      verdict = case when ${SKIPPED_BY_HAND} then verdict end,
      reasons = '[]'::jsonb
    where import_id = ${importId}`);
}

/** Rows that take part, by result and row, after a place: pages of a fixed size, however large the import is. */
export async function pageOfGroups(
  tx: Tx,
  importId: string,
  after: StoredRow | undefined,
  limit: number,
): Promise<readonly StoredRow[]> {
  const beyond =
    after === undefined ? sql`true` : sql`(group_key, row_number) > (${after.groupKey}, ${after.rowNumber})`;
  const { rows } = await tx.execute<{ row_number: number; cells: string[]; group_key: string }>(sql`
    select row_number, cells, group_key from import_rows
    where import_id = ${importId} and not ${SKIPPED_BY_HAND} and ${beyond}
    order by group_key, row_number limit ${limit}`);
  return rows.map(({ row_number, cells, group_key }) => ({
    rowNumber: row_number,
    cells,
    groupKey: group_key,
  }));
}

/** The rows of some results, whole. */
export async function rowsOfGroups(
  tx: Tx,
  importId: string,
  groupKeys: readonly string[],
): Promise<readonly StoredRow[]> {
  const { rows } = await tx.execute<{ row_number: number; cells: string[]; group_key: string }>(sql`
    select row_number, cells, group_key from import_rows
    where import_id = ${importId} and not ${SKIPPED_BY_HAND}
      and group_key in (select jsonb_array_elements_text(${JSON.stringify(groupKeys)}::jsonb))
    order by group_key, row_number`);
  return rows.map(({ row_number, cells, group_key }) => ({
    rowNumber: row_number,
    cells,
    groupKey: group_key,
  }));
}

export async function writeVerdicts(
  tx: Tx,
  importId: string,
  verdicts: readonly RowVerdict[],
): Promise<void> {
  if (verdicts.length === 0) return;
  const list = JSON.stringify(
    verdicts.map(({ rowNumber, verdict, reasons }) => [rowNumber, verdict, reasons]),
  );
  await tx.execute(sql`
    update import_rows r set verdict = v->>1, reasons = v->2
    from jsonb_array_elements(${list}::jsonb) as v
    where r.import_id = ${importId} and r.row_number = (v->>0)::int`);
}

const like = (text: string): string => `%${text.replace(/[\\%_]/g, '\\$&')}%`;

function matching(importId: string, filter: RowFilter): SQL {
  const { verdict, search, column } = filter;
  const conditions: SQL[] = [sql`import_id = ${importId}`];
  if (verdict !== undefined) conditions.push(sql`verdict = ${verdict}`);
  if (search !== undefined && search !== '')
    conditions.push(
      column === undefined
        ? sql`exists (select from jsonb_array_elements_text(cells) cell where cell ilike ${like(search)})`
        : sql`cells->>${column}::int ilike ${like(search)}`,
    );
  else if (column !== undefined) conditions.push(sql`reasons @> ${JSON.stringify([{ column }])}::jsonb`);
  return sql.join(conditions, sql` and `);
}

export async function findRows(
  tx: Tx,
  importId: string,
  filter: RowFilter,
  offset: number,
  limit: number,
): Promise<{ readonly rows: readonly ImportRow[]; readonly total: number }> {
  const where = matching(importId, filter);
  const rows = await tx
    .select({
      rowNumber: importRows.rowNumber,
      cells: importRows.cells,
      verdict: importRows.verdict,
      reasons: importRows.reasons,
      fixes: importRows.fixes,
    })
    .from(importRows)
    .where(where)
    .orderBy(asc(importRows.rowNumber))
    .offset(offset)
    .limit(limit);
  const counted = await tx.execute<{ total: number }>(
    sql`select count(*)::int as total from import_rows where ${where}`,
  );
  return {
    rows: rows.map(({ verdict, cells, reasons, ...rest }) => ({
      ...rest,
      cells: [...cells],
      ...(verdict === null ? {} : { verdict }),
      reasons: reasons as RowReason[],
    })),
    total: counted.rows[0]?.total ?? 0,
  };
}

export type Counts = Record<Verdict, number>;

export async function countVerdicts(tx: Tx, importId: string): Promise<Counts> {
  const rows = await tx
    .select({ verdict: importRows.verdict, count: sql<number>`count(*)::int` })
    .from(importRows)
    .where(eq(importRows.importId, importId))
    .groupBy(importRows.verdict);
  const counts: Counts = { accepted: 0, cautioned: 0, refused: 0, skipped: 0 };
  for (const { verdict, count } of rows) if (verdict !== null) counts[verdict] = count;
  return counts;
}

/** How many results and points confirming would store. */
export async function countWhatCounts(
  tx: Tx,
  importId: string,
): Promise<{ readonly results: number; readonly points: number }> {
  const { rows } = await tx.execute<{ results: number; points: number }>(sql`
    select count(distinct group_key)::int as results, count(*)::int as points from import_rows
    where import_id = ${importId} and verdict in ('accepted', 'cautioned')`);
  return rows[0] ?? { results: 0, points: 0 };
}

/** The different texts in a column, with their rows; skipped and empty ones aside. */
export async function textsIn(
  tx: Tx,
  importId: string,
  column: number,
  verdicts: 'all' | 'stored',
): Promise<readonly { readonly text: string; readonly rows: number }[]> {
  const { rows } = await tx.execute<{ text: string; rows: number }>(sql`
    select cells->>${column}::int as text, count(*)::int as rows from import_rows
    where import_id = ${importId} and not ${SKIPPED_BY_HAND} and coalesce(cells->>${column}::int, '') <> ''
      ${verdicts === 'stored' ? sql`and verdict in ('accepted', 'cautioned')` : sql``}
    group by 1 order by 1 limit 2000`);
  return rows;
}

export interface Touched {
  readonly changedRows: number;
  /** Results to which the rows belonged before. */
  readonly groupKeys: readonly string[];
  readonly rowNumbers: readonly number[];
}

/** Types over cells, keeping what the file had there; a row that ends early is filled up with empty cells. */
export async function changeCells(
  tx: Tx,
  importId: string,
  fix: Extract<ImportFix, { kind: 'cell' | 'set' | 'replace' }>,
  width: number,
): Promise<Touched> {
  const where =
    fix.kind === 'cell'
      ? sql`import_id = ${importId} and row_number = ${fix.rowNumber}`
      : matching(importId, fix.filter);
  const column = sql`${fix.column}::int`;
  const place = sql`array[${String(fix.column)}]::text[]`;
  const before = sql`coalesce(cells->>${column}, '')`;
  const after =
    fix.kind === 'replace'
      ? sql`btrim(replace(${before}, ${fix.find}, ${fix.text}))`
      : sql`${fix.text.trim()}::text`;
  const padding = sql`coalesce((select jsonb_agg(''::text) from generate_series(jsonb_array_length(cells) + 1, ${width})), '[]'::jsonb)`;
  const { rows } = await tx.execute<{ row_number: number; group_key: string | null }>(sql`
    update import_rows set
      cells = jsonb_set(cells || ${padding}, ${place}, to_jsonb(${after})),
      fixes = jsonb_build_object(${String(fix.column)}::text, ${before}) || fixes
    where ${where} and jsonb_array_length(cells) <= ${width} and ${before} is distinct from ${after}
    returning row_number, group_key`);
  return touched(rows);
}

/** Skips rows by hand, or takes them back in. */
export async function skipRows(
  tx: Tx,
  importId: string,
  fix: Extract<ImportFix, { kind: 'skip' | 'unskip' }>,
): Promise<Touched> {
  const numbers =
    fix.rowNumbers === undefined
      ? sql`true`
      : sql`row_number in (select jsonb_array_elements_text(${JSON.stringify(fix.rowNumbers)}::jsonb)::int)`;
  const change =
    fix.kind === 'skip'
      ? sql`verdict = 'skipped', reasons = '[]'::jsonb where not ${SKIPPED_BY_HAND}`
      : sql`verdict = null where ${SKIPPED_BY_HAND}`;
  const { rows } = await tx.execute<{ row_number: number; group_key: string | null }>(sql`
    update import_rows set ${change} and ${matching(importId, fix.filter)} and ${numbers}
    returning row_number, group_key`);
  return touched(rows);
}

function touched(rows: readonly { row_number: number; group_key: string | null }[]): Touched {
  return {
    changedRows: rows.length,
    groupKeys: [...new Set(rows.flatMap(({ group_key }) => group_key ?? []))],
    rowNumbers: rows.map(({ row_number }) => row_number),
  };
}

/** Gives some rows their results anew after their cells changed; returns the results they belong to now. */
export async function regroupRows(
  tx: Tx,
  importId: string,
  column: number,
  rowNumbers: readonly number[],
): Promise<readonly string[]> {
  const { rows } = await tx.execute<{ group_key: string }>(sql`
    update import_rows set group_key = lower(coalesce(cells->>${column}::int, ''))
    where import_id = ${importId}
      and row_number in (select jsonb_array_elements_text(${JSON.stringify(rowNumbers)}::jsonb)::int)
    returning group_key`);
  return [...new Set(rows.map(({ group_key }) => group_key))];
}

export async function hasRow(tx: Tx, importId: string, rowNumber: number): Promise<boolean> {
  const rows = await tx
    .select({ id: importRows.id })
    .from(importRows)
    .where(and(eq(importRows.importId, importId), eq(importRows.rowNumber, rowNumber)));
  return rows.length > 0;
}
