import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { pickEvidence } from '#shared/core/ranking/evidence';
import { reduceResults } from '#shared/core/reduction/reduce';
import type { Reduction, ReductionContext } from '#shared/core/reduction/reduction';
import { Refused } from '#shared/core/refusal';
import { fitSweep, judgeSweep } from '#shared/core/similarity/reynolds-sweep';

/** A result whose zero-yaw points were taken at several speeds, and what it says can be accepted. */
export interface SweptResult {
  readonly resultId: string;
  readonly name: string;
  readonly variantId: string;
  /** From here on the drag area stays within the tolerance of that at the reference. */
  readonly lowestReynolds: number;
  /** Flat within the tolerance at each of its points. */
  readonly flat: boolean;
  readonly toleranceM2: number;
}

/** What the programme's evidence says that planning can use. */
export interface KnownEvidence {
  readonly sweeps: readonly SweptResult[];
  /** Zero-yaw drag area [m²] at the reference, by variant. */
  readonly dragAreas: ReadonlyMap<string, number>;
}

export const NOTHING_KNOWN: KnownEvidence = { sweeps: [], dragAreas: new Map() };

/** Reads sweeps and drag areas from the evidence; what refuses the whole of it leaves nothing known. */
export function knownEvidence(input: RankingInput | null): KnownEvidence {
  if (input === null) return NOTHING_KNOWN;
  try {
    const reduced = reduceResults(input);
    const { chosen } = pickEvidence(input.variants, reduced, 'zero-yaw');
    return {
      sweeps: reduced.reductions.flatMap((reduction) => sweptResult(reduction, reduced.context)),
      dragAreas: new Map(chosen.map(({ variant, zeroYaw }) => [variant.id, zeroYaw.dragAreaM2])),
    };
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return NOTHING_KNOWN;
  }
}

/** Each point was reduced on its own; too few of them, or too close together, are no sweep. */
function sweptResult(reduction: Reduction, context: ReductionContext): readonly SweptResult[] {
  const points = reduction.zeroYawPoints.flatMap(({ reynolds, dragAreaM2 }) =>
    reynolds === null ? [] : [{ reynolds, dragAreaM2 }],
  );
  const { minimumReynolds, reynoldsToleranceM2 } = context.policies;
  try {
    const fit = fitSweep(points);
    const verdict = judgeSweep(fit, context.referenceReynolds, reynoldsToleranceM2, minimumReynolds);
    const { result, variant } = reduction.parts;
    return [
      {
        resultId: result.id,
        name: result.name ?? result.id,
        variantId: variant.id,
        lowestReynolds: verdict.lowestReynoldsWithinTolerance,
        flat: verdict.flatWithinTolerance,
        toleranceM2: reynoldsToleranceM2,
      },
    ];
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return [];
  }
}
