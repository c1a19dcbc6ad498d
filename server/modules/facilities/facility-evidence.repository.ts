import { asc, count, eq, sql } from 'drizzle-orm';
import type { FacilityEvidence, TestedModel } from '#shared/contracts/facilities';
import type { Tx } from '../../db/pools';
import { programmes } from '../../db/tables/programmes';
import { results, resultWithdrawals } from '../../db/tables/results';
import { frontalAreas, variants } from '../../db/tables/variants';

/** As many results as a warning can name and a person can read. */
const LARGEST = 50;

export async function hasResults(tx: Tx, facilityId: string): Promise<boolean> {
  const rows = await tx
    .select({ id: results.id })
    .from(results)
    .where(eq(results.facilityId, facilityId))
    .limit(1);
  return rows.length > 0;
}

export async function resultsByProgramme(tx: Tx, facilityId: string): Promise<readonly FacilityEvidence[]> {
  return tx
    .select({ programmeId: programmes.id, programmeName: programmes.name, results: count() })
    .from(results)
    .innerJoin(programmes, eq(programmes.id, results.programmeId))
    .where(eq(results.facilityId, facilityId))
    .groupBy(programmes.id, programmes.name)
    .orderBy(asc(programmes.name), asc(programmes.id));
}

/** Results that count, by the frontal area of the model that was tested: the variant's newest one at the scale of the test. */
export async function largestModels(tx: Tx, facilityId: string): Promise<readonly TestedModel[]> {
  const newest = sql`(
    select ${frontalAreas.areaM2} from ${frontalAreas}
    where ${frontalAreas.variantId} = ${results.variantId}
    order by ${frontalAreas.date} desc, ${frontalAreas.position} desc
    limit 1
  )`;
  const modelArea = sql<number>`${results.scale} * ${results.scale} * ${newest}`;
  return tx
    .select({
      programmeId: results.programmeId,
      resultId: results.id,
      resultName: results.name,
      variantName: variants.name,
      modelAreaM2: modelArea,
    })
    .from(results)
    .innerJoin(variants, eq(variants.id, results.variantId))
    .where(
      sql`${results.facilityId} = ${facilityId} and ${newest} is not null and not exists (
        select 1 from ${resultWithdrawals} where ${resultWithdrawals.resultId} = ${results.id})`,
    )
    .orderBy(sql`${modelArea} desc`, asc(results.name), asc(results.id))
    .limit(LARGEST);
}
