import { and, asc, eq, inArray, isNull, sql } from 'drizzle-orm';
import type { Tx } from '../../db/pools';
import { programmes } from '../../db/tables/programmes';
import { results } from '../../db/tables/results';

/** Programmes that have results from both facilities; only there can one geometry have been measured in both. */
export async function programmesWithBoth(
  tx: Tx,
  facilityIds: readonly [string, string],
): Promise<readonly { readonly id: string; readonly name: string }[]> {
  return tx
    .select({ id: programmes.id, name: programmes.name })
    .from(programmes)
    .innerJoin(
      results,
      and(eq(results.organisationId, programmes.organisationId), eq(results.programmeId, programmes.id)),
    )
    .where(and(inArray(results.facilityId, [...facilityIds]), isNull(programmes.retiredAt)))
    .groupBy(programmes.id, programmes.name)
    .having(sql`count(distinct ${results.facilityId}) = 2`)
    .orderBy(asc(programmes.name), asc(programmes.id));
}
