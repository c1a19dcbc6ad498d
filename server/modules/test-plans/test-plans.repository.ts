import { and, eq, sql, type SQL } from 'drizzle-orm';
import type { TestPlan, TestPlanFields } from '#shared/contracts/test-plans';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { present } from '../../db/returned-row';
import { memberships } from '../../db/tables/organisations';
import { results } from '../../db/tables/results';
import { testPlans } from '../../db/tables/test-plans';

/** Where a plan stands: in which programme, under which id. */
export interface PlanPlace {
  readonly programmeId: string;
  readonly testPlanId: string;
}

async function select(tx: Tx, where: SQL | undefined): Promise<readonly TestPlan[]> {
  const rows = await tx
    .select({ plan: testPlans, createdBy: memberships.displayName })
    .from(testPlans)
    .innerJoin(
      memberships,
      and(
        eq(memberships.organisationId, testPlans.organisationId),
        eq(memberships.userId, testPlans.createdBy),
      ),
    )
    .where(where)
    .orderBy(sql`${testPlans.retiredAt} is not null`, sql`lower(${testPlans.name})`, testPlans.id);
  return rows.map(({ plan, createdBy }) => planOf(plan, createdBy));
}

function planOf(row: typeof testPlans.$inferSelect, createdBy: string): TestPlan {
  const { id, programmeId, variantId, facilityId, name, inputs, version } = row;
  return {
    id,
    programmeId,
    variantId,
    facilityId,
    name,
    inputs,
    version,
    createdAt: row.createdAt.toISOString(),
    createdBy,
    ...(row.expectedSince === null ? {} : { expectedSince: row.expectedSince.toISOString() }),
    ...(row.retiredAt === null ? {} : { retiredAt: row.retiredAt.toISOString() }),
  };
}

const theOne = ({ programmeId, testPlanId }: PlanPlace): SQL | undefined =>
  and(eq(testPlans.programmeId, programmeId), eq(testPlans.id, testPlanId));

/** All plans of a programme by name, retired ones last. */
export async function listPlans(tx: Tx, programmeId: string): Promise<readonly TestPlan[]> {
  return select(tx, eq(testPlans.programmeId, programmeId));
}

export async function findPlan(tx: Tx, place: PlanPlace): Promise<TestPlan | undefined> {
  const [plan] = await select(tx, theOne(place));
  return plan;
}

/** As `findPlan`, and nobody else changes it until the transaction ends. */
export async function lockPlan(tx: Tx, place: PlanPlace): Promise<TestPlan | undefined> {
  await tx.select({ id: testPlans.id }).from(testPlans).where(theOne(place)).for('no key update');
  return findPlan(tx, place);
}

export async function planOfName(tx: Tx, programmeId: string, name: string): Promise<string | undefined> {
  const [row] = await tx
    .select({ id: testPlans.id })
    .from(testPlans)
    .where(and(eq(testPlans.programmeId, programmeId), sql`lower(${testPlans.name}) = lower(${name})`));
  return row?.id;
}

/** Whether a result that a plan's target rests on is one of the programme. */
export async function isResultOf(tx: Tx, programmeId: string, resultId: string): Promise<boolean> {
  const rows = await tx
    .select({ id: results.id })
    .from(results)
    .where(and(eq(results.programmeId, programmeId), eq(results.id, resultId)));
  return rows.length > 0;
}

export async function insertPlan(
  { tx, userId, now }: Work,
  programmeId: string,
  fields: TestPlanFields,
): Promise<string> {
  const [row] = await tx
    .insert(testPlans)
    .values({ ...fields, programmeId, createdBy: userId, createdAt: now })
    .returning({ id: testPlans.id });
  return present(row).id;
}

/** Writes what changed of a plan and raises its version. */
export async function updatePlan(
  tx: Tx,
  id: string,
  change: Partial<TestPlanFields> & {
    readonly expectedSince?: Date | null;
    readonly retiredAt?: Date | null;
  },
): Promise<void> {
  await tx
    .update(testPlans)
    .set({ ...change, version: sql`${testPlans.version} + 1` })
    .where(eq(testPlans.id, id));
}
