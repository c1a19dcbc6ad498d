import type { ExclusionRule, ReductionCaution } from '../ranking/ranking-output';
import { machVerdict } from '../similarity/flow';
import { blockageVerdict } from './blockage';
import type { ConditionStep, ReductionContext, ResultParts, ReynoldsStep, WindAverage } from './reduction';
import { isTunnel } from './result-parts';
import { clearsTransition } from './reynolds-step';

/** What is said of a reduced result. */
export interface Verdicts {
  /** Sorted. */
  readonly cautions: readonly ReductionCaution[];
  /** In the order Mach, blockage, comparability. */
  readonly excludedBy: readonly ExclusionRule[];
}

/** What the verdicts go by. */
export interface Judged {
  readonly parts: ResultParts;
  readonly mach: number | null;
  readonly reynolds: number | null;
  readonly reynoldsStep: ReynoldsStep;
  readonly condition: ConditionStep;
  readonly windAverage: WindAverage;
}

/** A scale model below the minimum Reynolds number without trips, unless the sweep that it uses shows otherwise. */
function transitionInDoubt(judged: Judged, { policies }: ReductionContext): boolean {
  const { parts, reynolds, reynoldsStep } = judged;
  return (
    parts.scale < 1 &&
    reynolds !== null &&
    reynolds < policies.minimumReynolds &&
    parts.result.turbulenceGenerationOrTrips !== true &&
    !clearsTransition(reynoldsStep)
  );
}

/** Cautions and exclusions of a result by the policies (method sections 4, 5, 6 and 8). */
export function verdictsOf(judged: Judged, context: ReductionContext): Verdicts {
  const { parts, mach, condition, windAverage } = judged;
  const { facility, tunnel, air } = parts;
  const { policies } = context;
  const cautions: ReductionCaution[] = [...(air?.notes ?? []), ...(windAverage.yaw?.cautions ?? [])];
  const excludedBy: ExclusionRule[] = [];
  const byMach = mach === null ? 'passes' : machVerdict(mach, policies);
  if (byMach === 'caution') cautions.push('mach');
  if (byMach === 'excluded') excludedBy.push('mach');
  if (tunnel !== null && isTunnel(facility.kind)) {
    const byBlockage = blockageVerdict(facility.kind, tunnel.blockageRatio, policies);
    if (byBlockage === 'caution') cautions.push('blockage');
    if (byBlockage === 'excluded') excludedBy.push('blockage');
  }
  if (transitionInDoubt(judged, context)) cautions.push('transition');
  if (condition.notComparable.length > 0) {
    if (condition.includedReason === null) excludedBy.push('not-comparable');
    else cautions.push('included-with-reason');
  }
  return { cautions: cautions.sort(), excludedBy };
}
