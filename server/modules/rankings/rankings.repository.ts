import { and, asc, desc, eq, inArray, isNull, sql } from 'drizzle-orm';
import { unionAll, type AnyPgColumn } from 'drizzle-orm/pg-core';
import type { ReynoldsChoice } from '#shared/contracts/judgements';
import type { EvidenceRule } from '#shared/core/ranking/ranking-input';
import type { Tx } from '../../db/pools';
import { cycles, referenceCycles } from '../../db/tables/cycles';
import { facilities, testSessions } from '../../db/tables/facilities';
import { memberships } from '../../db/tables/organisations';
import { milestones, programmes } from '../../db/tables/programmes';
import {
  adoptions,
  resultJudgements,
  resultPoints,
  results,
  resultWithdrawals,
} from '../../db/tables/results';
import { configurations, frontalAreas, variants } from '../../db/tables/variants';

export type ProgrammeRow = typeof programmes.$inferSelect;
export type VariantRow = typeof variants.$inferSelect;
export type AreaRow = typeof frontalAreas.$inferSelect;
export type ConfigurationRow = typeof configurations.$inferSelect;
export type FacilityRow = typeof facilities.$inferSelect;
/** A result with the name of the session it belongs to. */
export type ResultRow = typeof results.$inferSelect & { readonly sessionName: string | null };
export type PointRow = typeof resultPoints.$inferSelect;

export interface AdoptionRow {
  readonly id: string;
  readonly variantId: string;
  readonly resultIds: readonly string[];
  readonly rule: EvidenceRule;
  readonly at: Date;
  readonly by: string;
}

export interface JudgementRow {
  readonly resultId: string;
  readonly reynolds: ReynoldsChoice;
  readonly includedReason: string | null;
  readonly setAsideReason: string | null;
  readonly at: Date;
  readonly by: string;
}

export async function findProgramme(tx: Tx, programmeId: string): Promise<ProgrammeRow | undefined> {
  const [row] = await tx.select().from(programmes).where(eq(programmes.id, programmeId));
  return row;
}

export async function listMilestones(tx: Tx, programmeId: string) {
  return tx
    .select({ id: milestones.id, name: milestones.name, date: milestones.date })
    .from(milestones)
    .where(eq(milestones.programmeId, programmeId))
    .orderBy(asc(milestones.date), asc(milestones.name));
}

/** Variants that are still in the programme, by name. */
export async function listVariants(tx: Tx, programmeId: string): Promise<readonly VariantRow[]> {
  return tx
    .select()
    .from(variants)
    .where(and(eq(variants.programmeId, programmeId), isNull(variants.retiredAt)))
    .orderBy(asc(variants.name), asc(variants.id));
}

/** The frontal area that counts of each variant: the newest by date, of equal dates the later entry. */
export async function newestAreas(tx: Tx, programmeId: string): Promise<readonly AreaRow[]> {
  const rows = await tx
    .selectDistinctOn([frontalAreas.variantId], { area: frontalAreas })
    .from(frontalAreas)
    .innerJoin(variants, eq(variants.id, frontalAreas.variantId))
    .where(eq(variants.programmeId, programmeId))
    .orderBy(frontalAreas.variantId, desc(frontalAreas.date), desc(frontalAreas.position));
  return rows.map(({ area }) => area);
}

export async function listConfigurations(tx: Tx, programmeId: string): Promise<readonly ConfigurationRow[]> {
  const rows = await tx
    .select({ configuration: configurations })
    .from(configurations)
    .innerJoin(variants, eq(variants.id, configurations.variantId))
    .where(eq(variants.programmeId, programmeId))
    .orderBy(configurations.variantId, asc(configurations.position));
  return rows.map(({ configuration }) => configuration);
}

/** Results that count: not withdrawn, of variants that are still in the programme, in the order of entry. */
export async function listResults(tx: Tx, programmeId: string): Promise<readonly ResultRow[]> {
  const rows = await tx
    .select({ result: results, sessionName: testSessions.name })
    .from(results)
    .innerJoin(variants, eq(variants.id, results.variantId))
    .leftJoin(resultWithdrawals, eq(resultWithdrawals.resultId, results.id))
    .leftJoin(testSessions, eq(testSessions.id, results.testSessionId))
    .where(
      and(eq(results.programmeId, programmeId), isNull(variants.retiredAt), isNull(resultWithdrawals.id)),
    )
    .orderBy(asc(results.entrySequence));
  return rows.map(({ result, sessionName }) => ({ ...result, sessionName }));
}

export async function listPoints(tx: Tx, programmeId: string): Promise<readonly PointRow[]> {
  const rows = await tx
    .select({ point: resultPoints })
    .from(resultPoints)
    .innerJoin(results, eq(results.id, resultPoints.resultId))
    .where(eq(results.programmeId, programmeId))
    .orderBy(resultPoints.resultId, asc(resultPoints.position));
  return rows.map(({ point }) => point);
}

/** The newest word on each variant's evidence; without results it releases what stood before. */
export async function currentAdoptions(tx: Tx, programmeId: string): Promise<readonly AdoptionRow[]> {
  return tx
    .selectDistinctOn([adoptions.variantId], {
      id: adoptions.id,
      variantId: adoptions.variantId,
      resultIds: sql<string[]>`array(select ar.result_id::text from adoption_results ar
        join results r on r.id = ar.result_id where ar.adoption_id = ${adoptions.id} order by r.entry_sequence)`,
      rule: adoptions.evidence,
      at: adoptions.adoptedAt,
      by: memberships.displayName,
    })
    .from(adoptions)
    .innerJoin(variants, eq(variants.id, adoptions.variantId))
    .innerJoin(memberships, eq(memberships.userId, adoptions.adoptedBy))
    .where(eq(variants.programmeId, programmeId))
    .orderBy(adoptions.variantId, desc(adoptions.adoptedAt), desc(adoptions.id));
}

/** What is held of each result of a programme: the newest judgement; those that nobody judged are missing. */
export async function currentJudgements(tx: Tx, programmeId: string): Promise<readonly JudgementRow[]> {
  return tx
    .selectDistinctOn([resultJudgements.resultId], {
      resultId: resultJudgements.resultId,
      reynolds: resultJudgements.reynolds,
      includedReason: resultJudgements.includedReason,
      setAsideReason: resultJudgements.setAsideReason,
      at: resultJudgements.judgedAt,
      by: memberships.displayName,
    })
    .from(resultJudgements)
    .innerJoin(results, eq(results.id, resultJudgements.resultId))
    .innerJoin(memberships, eq(memberships.userId, resultJudgements.judgedBy))
    .where(eq(results.programmeId, programmeId))
    .orderBy(resultJudgements.resultId, desc(resultJudgements.judgedAt));
}

export async function facilitiesById(tx: Tx, ids: readonly string[]): Promise<readonly FacilityRow[]> {
  if (ids.length === 0) return [];
  return tx
    .select()
    .from(facilities)
    .where(inArray(facilities.id, [...ids]))
    .orderBy(asc(facilities.name), asc(facilities.id));
}

export interface CycleRow {
  readonly key: string;
  readonly name: string;
  readonly source: string;
  readonly timeS: number[];
  readonly speedKmh: number[];
}

/**
 * Every cycle that may be chosen, built-in ones first; a key is a built-in name or the id of an own cycle. The traces are
 * long: those of one cycle only, or of all.
 */
export async function listCycles(tx: Tx, withTraceOf: string | 'all'): Promise<readonly CycleRow[]> {
  const traceOf = (key: AnyPgColumn, column: AnyPgColumn) =>
    withTraceOf === 'all'
      ? sql<number[]>`${column}`
      : sql<number[]>`case when ${key}::text = ${withTraceOf} then ${column} else '{}' end`;
  const builtIn = tx
    .select({
      place: sql<number>`${referenceCycles.position}::integer`.as('place'),
      key: sql<string>`${referenceCycles.key}::text`.as('key'),
      name: referenceCycles.name,
      source: sql<string>`${referenceCycles.source}::text`.as('source'),
      timeS: traceOf(referenceCycles.key, referenceCycles.timeS).as('time_s'),
      speedKmh: traceOf(referenceCycles.key, referenceCycles.speedKmh).as('speed_kmh'),
    })
    .from(referenceCycles);
  const own = tx
    .select({
      place: sql<number>`null::integer`.as('place'),
      key: sql<string>`${cycles.id}::text`.as('key'),
      name: cycles.name,
      source: sql<string>`${cycles.source}::text`.as('source'),
      timeS: traceOf(cycles.id, cycles.timeS).as('time_s'),
      speedKmh: traceOf(cycles.id, cycles.speedKmh).as('speed_kmh'),
    })
    .from(cycles)
    .where(isNull(cycles.retiredAt));
  const rows = await unionAll(builtIn, own).orderBy(sql`place nulls last`, sql`name`);
  return rows.map(({ key, name, source, timeS, speedKmh }) => ({ key, name, source, timeS, speedKmh }));
}
