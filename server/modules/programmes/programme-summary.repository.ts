import { sql } from 'drizzle-orm';
import type { Tx } from '../../db/pools';
import { programmes } from '../../db/tables/programmes';
import { results, resultWithdrawals } from '../../db/tables/results';
import { variants } from '../../db/tables/variants';

/** A programme in figures: retired variants and withdrawn results do not count. */
export interface ProgrammeCounts {
  readonly id: string;
  readonly name: string;
  readonly retiredAt: Date | null;
  readonly variantCount: number;
  readonly variantsWithoutResult: number;
  readonly resultCount: number;
  readonly latestResultDate: string | null;
}

/** Every programme with its counts, those in work first, each group by name. */
export async function countProgrammes(tx: Tx): Promise<readonly ProgrammeCounts[]> {
  const standing = tx
    .select({
      programmeId: results.programmeId,
      variantId: results.variantId,
      resultCount: sql<number>`count(*)`.as('result_count'),
      latest: sql<string>`max(${results.testDate})`.as('latest'),
    })
    .from(results)
    .where(
      sql`not exists (select from ${resultWithdrawals} where ${resultWithdrawals.resultId} = ${results.id})`,
    )
    .groupBy(results.programmeId, results.variantId)
    .as('standing');
  const active = sql`${variants.id} is not null and ${variants.retiredAt} is null`;
  return tx
    .select({
      id: programmes.id,
      name: programmes.name,
      retiredAt: programmes.retiredAt,
      variantCount: sql`count(*) filter (where ${active})`.mapWith(Number),
      variantsWithoutResult: sql`count(*) filter (where ${active} and ${standing.variantId} is null)`.mapWith(
        Number,
      ),
      resultCount: sql`coalesce(sum(${standing.resultCount}), 0)`.mapWith(Number),
      latestResultDate: sql<string | null>`max(${standing.latest})::text`,
    })
    .from(programmes)
    .leftJoin(variants, sql`${variants.programmeId} = ${programmes.id}`)
    .leftJoin(standing, sql`${standing.variantId} = ${variants.id}`)
    .groupBy(programmes.organisationId, programmes.id)
    .orderBy(sql`${programmes.retiredAt} is not null`, sql`lower(${programmes.name})`);
}
