import type { ReductionContext } from '#shared/core/reduction/reduction';
import { Refused, type Refusal } from '#shared/core/refusal';
import { fitSweep, type SweepPoint } from '#shared/core/similarity/reynolds-sweep';
import {
  evaluateReynoldsSweep,
  type ReynoldsSweepOutput,
} from '#shared/core/similarity/reynolds-sweep-operation';
import { skinFriction } from '#shared/core/similarity/skin-friction';

/** The fitted line at one Reynolds number, with what a mean there would be uncertain by (95 %); m². */
export interface CurvePoint {
  readonly reynolds: number;
  readonly dragAreaM2: number;
  readonly expandedUncertaintyM2: number;
}

/** Everything that is said of a sweep on screen; areas in m² at full scale. */
export interface SweepView {
  readonly points: readonly SweepPoint[];
  readonly outcome: ReynoldsSweepOutput;
  readonly curve: readonly CurvePoint[];
  readonly referenceReynolds: number;
  readonly toleranceM2: number;
  readonly minimumReynolds: number;
}

export type SweepReading =
  { readonly kind: 'fitted'; readonly view: SweepView } | { readonly kind: 'refused'; readonly why: Refusal };

type Reference = Pick<ReductionContext, 'referenceReynolds' | 'policies'>;

const CURVE_STEPS = 48;

/**
 * Line and band over all that the chart shows, evenly spaced in log Re: the band is t·s·√(1/n + (c_f − c̄)²/S_xx), that of the
 * fitted mean.
 */
function curveOf(
  points: readonly SweepPoint[],
  outcome: ReynoldsSweepOutput,
  from: number,
  to: number,
): readonly CurvePoint[] {
  const fit = fitSweep(points);
  return Array.from({ length: CURVE_STEPS + 1 }, (_, step) => {
    const reynolds = from * (to / from) ** (step / CURVE_STEPS);
    const distance = skinFriction(reynolds, 'reynolds') - fit.meanFriction;
    const u = Math.hypot(fit.levelUncertaintyM2, fit.slopeUncertaintyM2 * distance);
    return {
      reynolds,
      dragAreaM2: fit.meanDragAreaM2 + fit.slopeM2 * distance,
      expandedUncertaintyM2: outcome.coverageFactor * u,
    };
  });
}

/** The sweep as the method reads it, or why it does not: the same words stand in the preview and on the result's page. */
export function readSweep(
  points: readonly SweepPoint[],
  { referenceReynolds, policies }: Reference,
): SweepReading {
  try {
    const { minimumReynolds, reynoldsToleranceM2: toleranceM2 } = policies;
    const outcome = evaluateReynoldsSweep({ points, referenceReynolds, toleranceM2, minimumReynolds });
    const all = [...points.map(({ reynolds }) => reynolds), referenceReynolds];
    const curve = curveOf(points, outcome, Math.min(...all) / 1.1, Math.max(...all) * 1.1);
    return {
      kind: 'fitted',
      view: { points, outcome, curve, referenceReynolds, toleranceM2, minimumReynolds },
    };
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return { kind: 'refused', why: error };
  }
}
