import { and, desc, eq, sql } from 'drizzle-orm';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { evaluations } from '../../db/tables/judgement';
import { memberships } from '../../db/tables/organisations';
import { variants } from '../../db/tables/variants';
import type { StoredEvaluation } from './evaluation-record';

export interface EvaluationRow extends StoredEvaluation {
  readonly id: string;
  readonly adoptionId: string;
  readonly variantId: string;
  readonly at: string;
  readonly by: string;
}

/** The stored evaluations of a variant, the newest first. */
export async function listEvaluations(
  tx: Tx,
  programmeId: string,
  variantId: string,
): Promise<readonly EvaluationRow[]> {
  const rows = await tx
    .select({ evaluation: evaluations, by: memberships.displayName })
    .from(evaluations)
    .innerJoin(memberships, eq(memberships.userId, evaluations.createdBy))
    .where(and(eq(evaluations.programmeId, programmeId), eq(evaluations.variantId, variantId)))
    .orderBy(desc(evaluations.createdAt), desc(evaluations.id));
  return rows.map(({ evaluation, by }) => ({
    id: evaluation.id,
    adoptionId: evaluation.adoptionId,
    variantId: evaluation.variantId,
    at: evaluation.createdAt.toISOString(),
    by,
    inputs: evaluation.inputs,
    inputsHash: evaluation.inputsHash,
    methods: evaluation.methods,
    parameters: evaluation.parameters,
    output: evaluation.output,
  }));
}

export async function variantExists(tx: Tx, programmeId: string, variantId: string): Promise<boolean> {
  const rows = await tx
    .select({ id: variants.id })
    .from(variants)
    .where(and(eq(variants.programmeId, programmeId), eq(variants.id, variantId)));
  return rows.length > 0;
}

export interface EvaluationToStore extends StoredEvaluation {
  readonly programmeId: string;
  readonly variantId: string;
  readonly adoptionId: string;
}

export async function insertEvaluations(work: Work, records: readonly EvaluationToStore[]): Promise<void> {
  if (records.length === 0) return;
  await work.tx.insert(evaluations).values(
    records.map(({ methods, ...record }) => ({
      ...record,
      methods: [...methods],
      createdBy: work.userId,
    })),
  );
}

/** Adoptions of a programme that stand and have no evaluation yet. */
export async function adoptionsWithoutEvaluation(
  tx: Tx,
  programmeId: string,
): Promise<
  readonly {
    readonly id: string;
    readonly variantId: string;
    readonly resultIds: readonly string[];
    readonly rule: 'newest' | 'weighted-mean';
  }[]
> {
  const { rows } = await tx.execute<{
    id: string;
    variant_id: string;
    evidence: 'newest' | 'weighted-mean';
    result_ids: string[];
  }>(sql`
    select a.id, a.variant_id, a.evidence, array_agg(ar.result_id::text order by ar.result_id) as result_ids
    from adoptions a
    join variants v on v.id = a.variant_id
    join adoption_results ar on ar.adoption_id = a.id
    where v.programme_id = ${programmeId}
      and not exists (select from evaluations e where e.adoption_id = a.id)
      and not exists (select from adoptions later where later.variant_id = a.variant_id
        and (later.adopted_at, later.id) > (a.adopted_at, a.id))
    group by a.id, a.variant_id, a.evidence order by a.id`);
  return rows.map(({ id, variant_id, evidence, result_ids }) => ({
    id,
    variantId: variant_id,
    resultIds: result_ids,
    rule: evidence,
  }));
}
