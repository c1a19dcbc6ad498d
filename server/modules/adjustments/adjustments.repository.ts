import { and, eq, sql } from 'drizzle-orm';
import { adjustmentItem, type Adjustment, type AdjustmentFields } from '#shared/contracts/adjustments';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { present } from '../../db/returned-row';
import { adjustments } from '../../db/tables/judgement';
import { memberships } from '../../db/tables/organisations';
import { withNulls, withoutNulls } from '../../db/without-nulls';

const COLUMNS = [
  'name',
  'item',
  'fromValue',
  'toValue',
  'deltaDragAreaM2',
  'uM2',
  'perUnitDragAreaM2',
  'uPerUnitM2',
  'degreesOfFreedom',
  'evidence',
  'attachmentId',
] as const satisfies readonly (keyof AdjustmentFields)[];

interface AdjustmentRow {
  readonly adjustment: typeof adjustments.$inferSelect;
  readonly by: string;
}

function adjustmentOf({ adjustment, by }: AdjustmentRow): Adjustment {
  const {
    organisationId: _organisation,
    createdBy: _createdBy,
    createdAt,
    retiredAt,
    item,
    ...rest
  } = adjustment;
  return {
    ...withoutNulls(rest),
    item: adjustmentItem.parse(item),
    addedAt: createdAt.toISOString(),
    addedBy: by,
    ...(retiredAt === null ? {} : { retiredAt: retiredAt.toISOString() }),
  };
}

function selectAdjustments(tx: Tx) {
  return tx
    .select({ adjustment: adjustments, by: memberships.displayName })
    .from(adjustments)
    .innerJoin(
      memberships,
      and(
        eq(memberships.organisationId, adjustments.organisationId),
        eq(memberships.userId, adjustments.createdBy),
      ),
    );
}

export async function listAdjustments(tx: Tx): Promise<readonly Adjustment[]> {
  return (await selectAdjustments(tx)).map(adjustmentOf);
}

export async function findAdjustment(tx: Tx, id: string): Promise<Adjustment | undefined> {
  const [row] = await selectAdjustments(tx).where(eq(adjustments.id, id));
  return row && adjustmentOf(row);
}

/** Whoever adds or changes one waits for the others: that no two fit the same difference is a rule over all of them. */
export async function lockAdjustments(tx: Tx): Promise<void> {
  await tx.execute(
    sql`select pg_advisory_xact_lock(hashtext('adjustments ' || current_setting('app.organisation_id')))`,
  );
}

export async function adjustmentOfName(tx: Tx, name: string): Promise<string | undefined> {
  const [row] = await tx
    .select({ id: adjustments.id })
    .from(adjustments)
    .where(sql`lower(${adjustments.name}) = lower(${name})`);
  return row?.id;
}

export async function insertAdjustment({ tx, userId, now }: Work, fields: AdjustmentFields): Promise<string> {
  const [row] = await tx
    .insert(adjustments)
    .values({
      ...withNulls(fields, COLUMNS),
      bodyShapes: [...fields.bodyShapes],
      createdBy: userId,
      createdAt: now,
    })
    .returning({ id: adjustments.id });
  return present(row).id;
}

export async function updateAdjustment(tx: Tx, id: string, fields: AdjustmentFields): Promise<void> {
  await tx
    .update(adjustments)
    .set({
      ...withNulls(fields, COLUMNS),
      bodyShapes: [...fields.bodyShapes],
      version: sql`${adjustments.version} + 1`,
    })
    .where(eq(adjustments.id, id));
}

export async function setAdjustmentRetired(tx: Tx, id: string, retiredAt: Date | null): Promise<void> {
  await tx
    .update(adjustments)
    .set({ retiredAt, version: sql`${adjustments.version} + 1` })
    .where(eq(adjustments.id, id));
}
