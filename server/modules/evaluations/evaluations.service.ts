import type { Evaluation } from '#shared/contracts/adoptions';
import type { EvidenceChoice } from '#shared/core/ranking/evaluation-input';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { readEvidenceDocument } from '../rankings';
import { recordOf, replayOf } from './evaluation-record';
import {
  adoptionsWithoutEvaluation,
  insertEvaluations,
  listEvaluations,
  variantExists,
} from './evaluations.repository';

export interface AdoptionToEvaluate extends EvidenceChoice {
  readonly id: string;
}

/**
 * Keeps what each adoption was computed from and came to, in the transaction of the adoption itself.
 *
 * @throws {Refused} what refuses the whole ranking
 */
export async function storeEvaluations(
  work: Work,
  programmeId: string,
  adoptions: readonly AdoptionToEvaluate[],
): Promise<void> {
  if (adoptions.length === 0) return;
  const { inputs, context } = await readEvidenceDocument(work, programmeId);
  const records = adoptions.map((adoption) => ({
    ...recordOf(inputs, context, adoption),
    programmeId,
    variantId: adoption.variantId,
    adoptionId: adoption.id,
  }));
  await insertEvaluations(work, records);
}

/** Evaluates the adoptions that stand without one: those of a demo, and those from before evaluations were kept. */
export async function storeMissingEvaluations(work: Work, programmeId: string): Promise<number> {
  const adoptions = await adoptionsWithoutEvaluation(work.tx, programmeId);
  await storeEvaluations(work, programmeId, adoptions);
  return adoptions.length;
}

/** The stored evaluations of a variant, each computed again. */
export async function evaluationsOf(
  work: Work,
  programmeId: string,
  variantId: string,
): Promise<readonly Evaluation[]> {
  if (!(await variantExists(work.tx, programmeId, variantId))) fail('not-found');
  const rows = await listEvaluations(work.tx, programmeId, variantId);
  return rows.map((row) => {
    const { differences, refusal } = replayOf(row);
    return {
      ...row,
      methods: [...row.methods],
      recomputed: { differences: [...differences], refusal },
    };
  });
}
