import type { ResultInput } from './ranking-input';

/** How a result is brought to the reference Reynolds number, as a person chose it. */
export type ReynoldsJudgement =
  | { readonly kind: 'friction-line' }
  | { readonly kind: 'own-sweep' }
  | { readonly kind: 'sweep-of'; readonly resultId: string };

/** What a person holds of a result, as far as the method reads it. */
export interface ResultJudgement {
  readonly reynolds: ReynoldsJudgement;
  readonly includedReason?: string | undefined;
}

/** Angles closer than this are one (method section 7). */
const SAME_ANGLE_DEG = 1e-9;
const SWEEP_PREFIX = 'sweep:';

/** Whether the zero-yaw points were taken at several speeds: such a result is a Reynolds sweep of its own. */
export function isSweep({ points, speedKmh, dynamicPressurePa }: ResultInput): boolean {
  const speeds = (points ?? [])
    .filter(({ yawDeg }) => Math.abs(yawDeg ?? 0) <= SAME_ANGLE_DEG)
    .map((point) => point.speedKmh ?? speedKmh ?? `q ${point.dynamicPressurePa ?? dynamicPressurePa}`);
  return new Set(speeds).size > 1;
}

/** What holds of a result that nobody judged: a sweep is its own correction, anything else goes by the friction line. */
export function usualReynolds(result: ResultInput): ReynoldsJudgement {
  return { kind: isSweep(result) ? 'own-sweep' : 'friction-line' };
}

/** The choice as the operation `rank` reads it; the sweep of another result has that result's id. */
export function reynoldsMethodOf(choice: ReynoldsJudgement): string {
  return choice.kind === 'sweep-of' ? `${SWEEP_PREFIX}${choice.resultId}` : choice.kind;
}

/** A result with what is held of it. */
export function judgedResult(result: ResultInput, judgement: ResultJudgement | undefined): ResultInput {
  return {
    ...result,
    reynoldsMethod: reynoldsMethodOf(judgement?.reynolds ?? usualReynolds(result)),
    includedWithReason: judgement?.includedReason,
  };
}

/** Ids of the results whose sweeps others use, each once, in the order of the results. */
export function sweepIdsOf(results: readonly ResultInput[]): readonly string[] {
  const ids = results.flatMap(({ reynoldsMethod }) =>
    reynoldsMethod?.startsWith(SWEEP_PREFIX) === true ? [reynoldsMethod.slice(SWEEP_PREFIX.length)] : [],
  );
  return [...new Set(ids)];
}
