import { and, asc, eq, gte, inArray, notInArray, sql } from 'drizzle-orm';
import type { Milestone, Programme, ProgrammeFields } from '#shared/contracts/programmes';
import type { Tx } from '../../db/pools';
import { present } from '../../db/returned-row';
import { milestones, programmes } from '../../db/tables/programmes';
import { variants } from '../../db/tables/variants';
import { withNulls, withoutNulls } from '../../db/without-nulls';

const COLUMNS = [
  'name',
  'referenceSpeedKmh',
  'referenceAir',
  'referenceCondition',
  'characteristicLengthM',
  'characteristicLengthName',
  'commonArea',
  'confidence',
  'windSpeedMs',
  'referenceFacilityId',
  'remark',
] as const satisfies readonly (keyof ProgrammeFields)[];

/** The columns of what a person types; the friction line is on unless it is switched off. */
const columnsOf = (fields: ProgrammeFields) => ({
  ...withNulls(fields, COLUMNS),
  frictionLine: fields.frictionLine ?? 'on',
});

const MILESTONE = { id: milestones.id, name: milestones.name, date: milestones.date };

function programmeOf(row: typeof programmes.$inferSelect, its: readonly Milestone[]): Programme {
  const { organisationId: _organisationId, createdAt: _createdAt, retiredAt, ...rest } = row;
  return {
    ...withoutNulls(rest),
    milestones: [...its],
    ...(retiredAt === null ? {} : { retiredAt: retiredAt.toISOString() }),
  };
}

async function milestonesOf(tx: Tx, programmeId: string): Promise<readonly Milestone[]> {
  return tx
    .select(MILESTONE)
    .from(milestones)
    .where(eq(milestones.programmeId, programmeId))
    .orderBy(asc(milestones.date), asc(milestones.name));
}

export async function findProgramme(tx: Tx, id: string): Promise<Programme | undefined> {
  const [row] = await tx.select().from(programmes).where(eq(programmes.id, id));
  return row && programmeOf(row, await milestonesOf(tx, id));
}

/** As `findProgramme`, and nobody else changes it until the transaction ends. */
export async function lockProgramme(tx: Tx, id: string): Promise<Programme | undefined> {
  const [row] = await tx.select().from(programmes).where(eq(programmes.id, id)).for('no key update');
  return row && programmeOf(row, await milestonesOf(tx, id));
}

export async function programmeExists(tx: Tx, id: string): Promise<boolean> {
  const rows = await tx.select({ id: programmes.id }).from(programmes).where(eq(programmes.id, id));
  return rows.length > 0;
}

export async function programmeOfName(tx: Tx, name: string): Promise<string | undefined> {
  const [row] = await tx
    .select({ id: programmes.id })
    .from(programmes)
    .where(sql`lower(${programmes.name}) = lower(${name})`);
  return row?.id;
}

export async function insertProgramme(tx: Tx, fields: ProgrammeFields): Promise<Programme> {
  const [inserted] = await tx.insert(programmes).values(columnsOf(fields)).returning();
  const row = present(inserted);
  await writeMilestones(tx, row.id, fields.milestones);
  return programmeOf(row, await milestonesOf(tx, row.id));
}

export async function updateProgramme(tx: Tx, id: string, fields: ProgrammeFields): Promise<Programme> {
  const [row] = await tx
    .update(programmes)
    .set({ ...columnsOf(fields), version: sql`${programmes.version} + 1` })
    .where(eq(programmes.id, id))
    .returning();
  await writeMilestones(tx, id, fields.milestones);
  return programmeOf(present(row), await milestonesOf(tx, id));
}

/** A milestone keeps its id through every change: later, targets and sealed records point to it. */
async function writeMilestones(
  tx: Tx,
  programmeId: string,
  wanted: ProgrammeFields['milestones'],
): Promise<void> {
  const kept = wanted.flatMap((milestone) => (milestone.id === undefined ? [] : [milestone.id]));
  await tx
    .delete(milestones)
    .where(
      and(
        eq(milestones.programmeId, programmeId),
        kept.length === 0 ? undefined : notInArray(milestones.id, kept),
      ),
    );
  for (const { id, name, date } of wanted) {
    if (id === undefined) await tx.insert(milestones).values({ programmeId, name, date });
    else await tx.update(milestones).set({ name, date }).where(eq(milestones.id, id));
  }
}

export async function setProgrammeRetired(tx: Tx, id: string, retiredAt: Date | null): Promise<Programme> {
  const [row] = await tx
    .update(programmes)
    .set({ retiredAt, version: sql`${programmes.version} + 1` })
    .where(eq(programmes.id, id))
    .returning();
  return programmeOf(present(row), await milestonesOf(tx, id));
}

export async function variantIdsOf(tx: Tx, programmeId: string): Promise<ReadonlySet<string>> {
  const rows = await tx
    .select({ id: variants.id })
    .from(variants)
    .where(eq(variants.programmeId, programmeId));
  return new Set(rows.map((row) => row.id));
}

/** The next milestone of each of these programmes, from this day on. */
export async function nextMilestones(
  tx: Tx,
  programmeIds: readonly string[],
  from: string,
): Promise<ReadonlyMap<string, Milestone>> {
  if (programmeIds.length === 0) return new Map();
  const rows = await tx
    .selectDistinctOn([milestones.programmeId], { programmeId: milestones.programmeId, ...MILESTONE })
    .from(milestones)
    .where(and(inArray(milestones.programmeId, [...programmeIds]), gte(milestones.date, from)))
    .orderBy(milestones.programmeId, asc(milestones.date), asc(milestones.name));
  return new Map(rows.map(({ programmeId, ...milestone }) => [programmeId, milestone]));
}
