import type { ReynoldsChoice } from '#shared/contracts/judgements';
import { isSweep, judgedResult } from '#shared/core/ranking/judged-result';
import type { RankingInput, ResultInput } from '#shared/core/ranking/ranking-input';
import { withSweeps } from '#shared/core/ranking/sweeps';
import { reduceResults } from '#shared/core/reduction/reduce';
import type { Reduction, ReductionContext } from '#shared/core/reduction/reduction';
import { sweepPointsOf } from '#shared/core/reduction/sweep-points';
import { Refused, type Refusal } from '#shared/core/refusal';
import { readSweep, type SweepReading } from './sweep-view';

/** One way to bring a result to the reference Reynolds number, and what it would give before anything is saved. */
export interface ReynoldsOffer {
  readonly choice: ReynoldsChoice;
  /** The result whose sweep is used; null for the friction line. */
  readonly sweepOf: ResultInput | null;
  readonly sweep: SweepReading | null;
  readonly outcome:
    | { readonly kind: 'reduced'; readonly reduction: Reduction }
    | { readonly kind: 'refused'; readonly why: Refusal };
}

/** The reading of a result's own zero-yaw points as a sweep. */
export function sweepReadingOf(result: ResultInput, context: ReductionContext): SweepReading {
  try {
    return readSweep(sweepPointsOf(result, context), context);
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return { kind: 'refused', why: error };
  }
}

function outcomeOf(
  result: ResultInput,
  choice: ReynoldsChoice,
  inputs: RankingInput,
): ReynoldsOffer['outcome'] {
  const includedReason = result.includedWithReason ?? undefined;
  const judged = judgedResult(result, { reynolds: choice, includedReason });
  const { reductions, refused } = reduceResults(withSweeps({ ...inputs, results: [judged] }, inputs.results));
  const [reduction] = reductions;
  if (reduction !== undefined) return { kind: 'reduced', reduction };
  const [why] = refused;
  if (why === undefined) throw new Error('A result is either reduced or refused.');
  return { kind: 'refused', why };
}

/**
 * What a result can be brought to the reference by: the friction line, its own sweep if it is one, and the sweeps of the same
 * variant's other results (a sweep says something about its own shape only).
 */
export function reynoldsOffers(
  resultId: string,
  inputs: RankingInput,
  context: ReductionContext,
): readonly ReynoldsOffer[] {
  const result = inputs.results.find(({ id }) => id === resultId);
  if (result === undefined) return [];
  const offer = (choice: ReynoldsChoice, sweepOf: ResultInput | null): ReynoldsOffer => ({
    choice,
    sweepOf,
    sweep: sweepOf === null ? null : sweepReadingOf(sweepOf, context),
    outcome: outcomeOf(result, choice, inputs),
  });
  const others = inputs.results.filter(
    (other) => other.id !== resultId && other.variantId === result.variantId && isSweep(other),
  );
  return [
    offer({ kind: 'friction-line' }, null),
    ...(isSweep(result) ? [offer({ kind: 'own-sweep' }, result)] : []),
    ...others.map((other) => offer({ kind: 'sweep-of', resultId: other.id }, other)),
  ];
}
