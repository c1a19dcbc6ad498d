import type { Air } from '../air/air';
import type { ReducedResult } from '../ranking/ranking-output';
import type {
  ConditionInput,
  FacilityInput,
  ModelInput,
  ProgrammeInput,
  ResultInput,
  VariantInput,
} from '../ranking/ranking-input';
import type { Amount, KeyedFigure } from '../uncertainty/budget';
import type { BlockageCorrection } from './blockage';
import type { YawOutput } from './yaw/yaw-ratio';

/** The policies of a programme, defaults filled in. */
export interface Policies {
  readonly machCaution: number;
  readonly machExcluded: number;
  readonly blockageCaution: number;
  readonly blockageExcluded: number;
  readonly openJetLimit: number;
  readonly minimumReynolds: number;
}

/** What every result of a programme is reduced with; made once. */
export interface ReductionContext {
  readonly programme: ProgrammeInput;
  readonly policies: Policies;
  readonly referenceAir: Air;
  readonly referenceReynolds: number;
  readonly referenceCondition: ConditionInput;
  readonly facilities: ReadonlyMap<string, FacilityInput>;
  readonly models: ReadonlyMap<string, ModelInput>;
  readonly variants: ReadonlyMap<string, VariantInput>;
}

/** A result with the entities that it names, found and checked. */
export interface ResultParts {
  readonly result: ResultInput;
  readonly variant: VariantInput;
  readonly facility: FacilityInput;
  readonly model: ModelInput | null;
  readonly air: Air;
  readonly scale: number;
  readonly tunnel: TunnelParts | null;
}

/** Section or nozzle [m²] and blockage ratio; only in tunnels. */
export interface TunnelParts {
  readonly areaM2: number;
  readonly blockageRatio: number;
}

/** Speed and dynamic pressure of one point. */
export interface PointFlow {
  readonly speedMs: number;
  /** Measured, or ½ρU². */
  readonly dynamicPressurePa: number;
  readonly dynamicPressureMeasured: boolean;
}

/** One point brought to a drag area at full scale; areas in m². */
export interface ReducedPoint {
  readonly yawDeg: number;
  readonly value: number;
  /** Force only: after tare [N]. */
  readonly netForceN: number | null;
  readonly flow: PointFlow;
  readonly mach: number;
  readonly reynolds: number;
  readonly modelDragAreaM2: number;
  readonly blockage: BlockageCorrection;
  readonly uncorrectedDragAreaM2: number;
  readonly dragAreaM2: number;
  /** d(full-scale drag area)/d(value), corrections included. */
  readonly perValue: number;
  /** All but repeatability, whose amounts the zero-yaw points do not share. */
  readonly amounts: readonly Amount[];
  /** Null: a gap, allowed only beside a stated uncertainty. */
  readonly repeatability: { readonly amountM2: number; readonly degreesOfFreedom: number } | null;
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
  readonly zeroYaw: KeyedFigure;
  readonly windAverage: WindAverage;
  readonly output: ReducedResult;
}
