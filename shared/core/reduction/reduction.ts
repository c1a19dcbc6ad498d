import type { Air } from '../air/air';
import type { CorrelationFit } from '../correlation/correlation';
import type { ReducedResult } from '../ranking/ranking-output';
import type {
  AdjustmentInput,
  ConditionInput,
  CorrelationInput,
  FacilityInput,
  ModelInput,
  ProgrammeInput,
  ResultInput,
  VariantInput,
} from '../ranking/ranking-input';
import type { FrictionLineMove } from '../similarity/friction-line';
import type { SweepFit, SweepMove, SweepPrediction, SweepVerdict } from '../similarity/reynolds-sweep';
import type { KeyedFigure } from '../uncertainty/budget';
import type { BlockageCorrection } from './blockage';
import type { Wind, YawOutput } from './yaw/yaw-ratio';

/** The policies of a programme, defaults filled in. */
export interface Policies {
  /** What the friction share's amounts are shared by. */
  readonly policyId: string;
  readonly machCaution: number;
  readonly machExcluded: number;
  readonly blockageCaution: number;
  readonly blockageExcluded: number;
  readonly openJetLimit: number;
  readonly minimumReynolds: number;
  readonly frictionLine: 'on' | 'off';
  /** φ ± u(φ), dimensionless. */
  readonly frictionShare: number;
  readonly frictionShareU: number;
  readonly reynoldsToleranceM2: number;
}

/** A sweep of the programme, fitted when the first result asks. */
export interface PreparedSweep {
  readonly id: string;
  readonly name: string | null;
  /** @throws {Refused} the codes of the fit, to every result that asks */
  readonly fit: () => SweepFit;
  /** What it says about lower Reynolds numbers, at the programme's reference and policies. */
  readonly verdict: () => SweepVerdict;
}

/** A correlation to the programme's reference facility, fitted when the first result asks. */
export interface PreparedCorrelation {
  readonly input: CorrelationInput;
  readonly replaces: ReplacedSteps;
  /** @throws {Refused} the codes of the fit, to every result that asks */
  readonly fit: () => CorrelationFit;
}

/** Steps before it that a correlation replaces: they are skipped and take their keys with them. */
export interface ReplacedSteps {
  readonly blockage: boolean;
  readonly reynolds: boolean;
  readonly groundSimulation: boolean;
}

/** What every result of a programme is reduced with; made once. */
export interface ReductionContext {
  readonly programme: ProgrammeInput;
  readonly policies: Policies;
  readonly referenceAir: Air;
  readonly referenceReynolds: number;
  readonly referenceCondition: ConditionInput;
  readonly wind: Wind;
  readonly facilities: ReadonlyMap<string, FacilityInput>;
  readonly models: ReadonlyMap<string, ModelInput>;
  readonly variants: ReadonlyMap<string, VariantInput>;
  readonly sweeps: ReadonlyMap<string, PreparedSweep>;
  /** Of one item in the order in which they are given: the first that fits is used. */
  readonly adjustments: ReadonlyMap<string, readonly AdjustmentInput[]>;
  /** By the facility that is correlated; the first that fits. */
  readonly correlations: ReadonlyMap<string, PreparedCorrelation>;
}

/** A result with the entities that it names, found and checked. */
export interface ResultParts {
  readonly result: ResultInput;
  readonly variant: VariantInput;
  readonly facility: FacilityInput;
  readonly model: ModelInput | null;
  /** Null only where the result states none and its correlation replaces Reynolds. */
  readonly air: Air | null;
  readonly correlation: PreparedCorrelation | null;
  readonly replaced: ReplacedSteps;
  readonly scale: number;
  readonly tunnel: TunnelParts | null;
}

/** Section or nozzle [m²] and blockage ratio; only in tunnels. */
export interface TunnelParts {
  readonly areaM2: number;
  readonly blockageRatio: number;
}

/** Speed and dynamic pressure of one point; null only where they are not stated and the correlation replaces Reynolds. */
export interface PointFlow {
  readonly speedMs: number | null;
  /** Measured, or ½ρU². */
  readonly dynamicPressurePa: number | null;
  readonly dynamicPressureMeasured: boolean;
}

/** What a point was measured in: the same for all points that state nothing of their own. */
export interface PointConditions {
  readonly flow: PointFlow;
  readonly mach: number | null;
  readonly reynolds: number | null;
}

/** One point brought to a drag area at full scale; areas in m². */
export interface ReducedPoint {
  readonly yawDeg: number;
  readonly value: number;
  /** Force only: after tare [N]. */
  readonly netForceN: number | null;
  readonly flow: PointFlow;
  readonly mach: number | null;
  readonly reynolds: number | null;
  readonly modelDragAreaM2: number;
  readonly blockage: BlockageCorrection;
  readonly uncorrectedDragAreaM2: number;
  readonly dragAreaM2: number;
  /** d(full-scale drag area)/d(value), corrections included. */
  readonly perValue: number;
  /** Null: a gap, allowed only beside a stated uncertainty. */
  readonly repeatability: { readonly amountM2: number; readonly degreesOfFreedom: number } | null;
}

/** How a result came to the reference Reynolds number (method section 6). */
export type ReynoldsStep =
  /** Skipped: the result's correlation stands for it. */
  | { readonly kind: 'replaced' }
  /** The line is off with a share of 0 ± 0: nothing enters. */
  | { readonly kind: 'none' }
  /** Not applied: the line is off, the drag area stays and the whole correction is an amount. */
  | {
      readonly kind: 'friction-line';
      readonly applied: boolean;
      readonly testReynolds: number;
      readonly move: FrictionLineMove;
    }
  /** Moved along a sweep that is not the result's own. */
  | {
      readonly kind: 'sweep';
      readonly sweep: PreparedSweep;
      readonly fit: SweepFit;
      readonly testReynolds: number;
      readonly move: SweepMove;
      readonly verdict: SweepVerdict;
    }
  /** The result's own zero-yaw points are the sweep. */
  | {
      readonly kind: 'own-sweep';
      readonly fit: SweepFit;
      readonly prediction: SweepPrediction;
      readonly verdict: SweepVerdict;
    };

/** One adjustment to the reference condition. */
export interface AppliedAdjustment {
  readonly adjustment: AdjustmentInput;
  readonly item: string;
  /** Backwards: a categorical one from the reference to what was tested. */
  readonly direction: 'forwards' | 'backwards' | 'per-unit';
  readonly stated: string | number | boolean;
  readonly reference: string | number | boolean;
  /** What is added [m²], and its signed uncertainty. */
  readonly deltaM2: number;
  readonly amountM2: number;
}

/** How the test condition compares with the programme's reference (method section 8). */
export interface ConditionStep {
  readonly applied: readonly AppliedAdjustment[];
  /** Items that differ and have no adjustment: the result is not comparable. */
  readonly notComparable: readonly string[];
  /** Written reason for which it counts nevertheless; null where there is none or none is needed. */
  readonly includedReason: string | null;
}

/** A figure carried to the reference facility. */
export interface CorrelationStep {
  readonly correlation: PreparedCorrelation;
  readonly fit: CorrelationFit;
  /** Drag area before and after [m²]. */
  readonly fromM2: number;
  readonly dragAreaM2: number;
  /** The key of the facility's own bias, which the reference facility's takes the place of. */
  readonly droppedKey: string;
}

/** The wind average of a result, or why there is none. */
export type WindAverage =
  | { readonly yaw: YawOutput; readonly figure: KeyedFigure; readonly refusal: null }
  | { readonly yaw: null; readonly figure: null; readonly refusal: string };

/** A reduced result with everything that its derivation shows. */
export interface Reduction {
  readonly parts: ResultParts;
  readonly points: readonly ReducedPoint[];
  readonly zeroYawPoints: readonly ReducedPoint[];
  /** Mean of the zero-yaw points [m²]; null where they are a Reynolds sweep. */
  readonly fullScaleM2: number | null;
  readonly reynolds: ReynoldsStep;
  readonly condition: ConditionStep;
  readonly correlation: CorrelationStep | null;
  /** At the reference: after every step but the yaw ratio. */
  readonly zeroYaw: KeyedFigure;
  readonly windAverage: WindAverage;
  readonly output: ReducedResult;
}
