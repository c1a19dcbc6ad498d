import { reductionContextOf } from '../reduction/reduction-context';
import { sweepPointsOf } from '../reduction/sweep-points';
import { Refused } from '../refusal';
import { sweepIdsOf } from './judged-result';
import type { RankingInput, ResultInput, SweepInput } from './ranking-input';

function sweepOf(result: ResultInput, input: RankingInput): readonly SweepInput[] {
  try {
    const points = sweepPointsOf(result, reductionContextOf(input));
    return [{ id: result.id, name: result.name, points }];
  } catch (error) {
    // Its own refusal is said where it stands; who uses it is refused as having no sweep.
    if (error instanceof Refused) return [];
    throw error;
  }
}

/**
 * An input with the sweeps that its results use: each the zero-yaw points of another result, brought to the full-scale drag
 * area one by one. `candidates` are the results that a sweep can be of, more than those that are ranked.
 *
 * @throws {Refused} what refuses the whole ranking, as the operation `rank`
 */
export function withSweeps(input: RankingInput, candidates: readonly ResultInput[]): RankingInput {
  const ids = sweepIdsOf(input.results);
  if (ids.length === 0) return { ...input, sweeps: [] };
  const byId = new Map(candidates.map((result) => [result.id, result]));
  const bare = { ...input, results: [], sweeps: [] };
  const sweeps = ids.flatMap((id) => {
    const result = byId.get(id);
    return result === undefined ? [] : sweepOf(result, bare);
  });
  return { ...input, sweeps };
}
