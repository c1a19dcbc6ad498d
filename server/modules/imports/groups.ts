import type { StoredRow } from './import-rows.repository';

/** Rows of one key that follow each other, as lists. Rows without a name are no result together: each stands alone. */
export function groupsOf(rows: readonly StoredRow[]): readonly (readonly StoredRow[])[] {
  const groups: StoredRow[][] = [];
  for (const row of rows) {
    const last = groups.at(-1);
    if (last !== undefined && row.groupKey !== '' && last[0]?.groupKey === row.groupKey) last.push(row);
    else groups.push([row]);
  }
  return groups;
}

const PAGE_ROWS = 1000;

/**
 * All results of an import, a page at a time: a result is never cut in two, and memory holds a page (and the longest
 * result) however large the import is.
 */
export async function* groupPages(
  read: (after: StoredRow | undefined, limit: number) => Promise<readonly StoredRow[]>,
): AsyncGenerator<readonly (readonly StoredRow[])[]> {
  let carried: readonly StoredRow[] = [];
  let after: StoredRow | undefined;
  for (;;) {
    const page = await read(after, PAGE_ROWS);
    const groups = groupsOf([...carried, ...page]);
    if (page.length < PAGE_ROWS) {
      if (groups.length > 0) yield groups;
      return;
    }
    after = page.at(-1);
    carried = groups.at(-1) ?? [];
    yield groups.slice(0, -1);
  }
}
