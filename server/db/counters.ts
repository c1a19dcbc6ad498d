import { sql } from 'drizzle-orm';
import { counters } from './tables/work';
import type { Tx } from './pools';

/**
 * Takes `count` running numbers of a series of the transaction's organisation and returns the first of them.
 * Concurrent takers wait for each other until the commit, so the numbers have no gaps and no doubles.
 */
export async function nextNumbers(tx: Tx, series: string, count: number): Promise<number> {
  const [row] = await tx
    .insert(counters)
    .values({ series, value: count })
    .onConflictDoUpdate({
      target: [counters.organisationId, counters.series],
      set: { value: sql`${counters.value} + ${count}` },
    })
    .returning({ value: counters.value });
  if (row === undefined) throw new Error(`the counter ${series} did not answer`);
  return row.value - count + 1;
}
