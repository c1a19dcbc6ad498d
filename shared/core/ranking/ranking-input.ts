import type { AirInput } from '../air/air-input';
import type { CycleInput } from '../cycles/cycle-input';
import type { RoadLoadReference } from '../road-load/road-load';

/** A field that may be absent: null is the same as absent. */
type Maybe<T> = T | null | undefined;

export type Basis = 'zero-yaw' | 'wind-averaged';
export type ConditionValue = string | number | boolean;
/** A test condition, item by item (method section 8). */
export type ConditionInput = { readonly [item: string]: Maybe<ConditionValue> };

export interface PoliciesInput {
  readonly policyId?: Maybe<string>;
  readonly machCaution?: Maybe<number>;
  readonly machExcluded?: Maybe<number>;
  readonly blockageCaution?: Maybe<number>;
  readonly blockageExcluded?: Maybe<number>;
  readonly openJetLimit?: Maybe<number>;
  readonly minimumReynolds?: Maybe<number>;
  readonly frictionLine?: Maybe<'on' | 'off'>;
  readonly frictionShare?: Maybe<number>;
  readonly frictionShareU?: Maybe<number>;
  readonly reynoldsToleranceM2?: Maybe<number>;
}

/** What every figure of a programme is brought to. */
export interface ProgrammeInput {
  readonly name?: Maybe<string>;
  readonly referenceSpeedKmh: number;
  readonly referenceAir: AirInput;
  readonly characteristicLengthM: number;
  readonly commonAreaM2: number;
  /** 0.5 ≤ c < 1; 0.95 where it is not given. */
  readonly confidence?: Maybe<number>;
  readonly referenceFacilityId?: Maybe<string>;
  readonly referenceCondition?: Maybe<ConditionInput>;
  /** Wind of the wind average [m/s]; 3.12928 (7 mph). */
  readonly windSpeedMs?: Maybe<number>;
  /** Rotating masses in cycle energy; 1.03. */
  readonly rotatingFactor?: Maybe<number>;
  readonly policies?: Maybe<PoliciesInput>;
}

/** How a facility corrects for blockage. The method is open text: an unknown one refuses the results that need it. */
export interface BlockageMethodInput {
  readonly method: string;
  /** Maskell's factor, typed for the facility. */
  readonly theta?: Maybe<number>;
  /** q_c/q from the facility's own calibration. */
  readonly factor?: Maybe<number>;
  /** Standard uncertainty as a fraction of the correction (area-ratio, maskell, factor). */
  readonly uFractionOfCorrection?: Maybe<number>;
  /** Standard uncertainty as a fraction of the drag area (none). */
  readonly uRelative?: Maybe<number>;
}

export const TUNNEL_KINDS = ['closed', 'open-jet', 'slotted'] as const;
export type TunnelKind = (typeof TUNNEL_KINDS)[number];
export type FacilityKind = TunnelKind | 'road' | 'simulation';

/** A tunnel, proving ground or simulation set-up. Relative (of the full-scale drag area) and absolute [m²] parts add. */
export interface FacilityInput {
  readonly id: string;
  readonly name?: Maybe<string>;
  readonly kind: FacilityKind;
  /** Test section (closed, slotted) or nozzle (open jet) [m²]. */
  readonly areaM2?: Maybe<number>;
  readonly blockage?: Maybe<BlockageMethodInput>;
  readonly biasURelative?: Maybe<number>;
  readonly biasUM2?: Maybe<number>;
  readonly sessionURelative?: Maybe<number>;
  readonly sessionUM2?: Maybe<number>;
  readonly sessionDegreesOfFreedom?: Maybe<number>;
  readonly installationURelative?: Maybe<number>;
  readonly installationUM2?: Maybe<number>;
  readonly installationDegreesOfFreedom?: Maybe<number>;
  /** Of a single reading. */
  readonly repeatabilityURelative?: Maybe<number>;
  readonly repeatabilityDegreesOfFreedom?: Maybe<number>;
}

/** A scale model as built. */
export interface ModelInput {
  readonly id: string;
  readonly name?: Maybe<string>;
  /** Standard uncertainty of its scale, in the unit of the scale itself. */
  readonly scaleU?: Maybe<number>;
}

export type EvidenceRule = 'newest' | 'weighted-mean';

export interface VariantInput {
  readonly id: string;
  readonly name?: Maybe<string>;
  readonly frontalAreaM2: number;
  readonly frontalAreaUM2?: Maybe<number>;
  readonly massKg?: Maybe<number>;
  readonly rollingResistance?: Maybe<number>;
  readonly roadLoadReference?: Maybe<RoadLoadReference>;
  readonly evidence?: Maybe<EvidenceRule>;
}

export const QUANTITIES = ['force', 'coefficient', 'drag-area', 'coastdown-f2'] as const;
export type Quantity = (typeof QUANTITIES)[number];

/** A source's own expanded uncertainty, in the unit of the value. */
export interface StatedUncertaintyInput {
  readonly expandedU?: Maybe<number>;
  readonly k?: Maybe<number>;
  readonly degreesOfFreedom?: Maybe<number>;
  readonly includesFacilityBias?: Maybe<boolean>;
}

/** One point of a result: the mean of n readings at one yaw angle. Own speed, q and tare go before the result's. */
export interface PointInput {
  readonly yawDeg?: Maybe<number>;
  readonly value?: Maybe<number>;
  /** Standard deviation of one reading. */
  readonly s?: Maybe<number>;
  readonly n?: Maybe<number>;
  readonly speedKmh?: Maybe<number>;
  readonly dynamicPressurePa?: Maybe<number>;
  readonly tareN?: Maybe<number>;
  readonly frontLift?: Maybe<number>;
  readonly rearLift?: Maybe<number>;
  readonly sideForce?: Maybe<number>;
}

/**
 * A result as it was measured. Only its three ids are demanded here: whatever else is missing or out of range refuses
 * this result by itself, and the rest is ranked.
 */
export interface ResultInput {
  readonly id: string;
  readonly name?: Maybe<string>;
  readonly variantId: string;
  readonly facilityId: string;
  readonly sessionId?: Maybe<string>;
  readonly installationId?: Maybe<string>;
  readonly modelId?: Maybe<string>;
  /** `YYYY-MM-DD`, compared as text. */
  readonly testDate?: Maybe<string>;
  readonly entrySequence?: Maybe<number>;
  readonly quantity?: Maybe<string>;
  readonly scale?: Maybe<number>;
  readonly quotedAreaM2?: Maybe<number>;
  readonly quotedAreaUM2?: Maybe<number>;
  readonly quotedAreaScale?: Maybe<'model' | 'full'>;
  readonly speedKmh?: Maybe<number>;
  readonly dynamicPressurePa?: Maybe<number>;
  readonly air?: Maybe<AirInput>;
  readonly tareAlreadySubtracted?: Maybe<boolean>;
  readonly tareN?: Maybe<number>;
  readonly condition?: Maybe<ConditionInput>;
  readonly blockageAlreadyCorrectedBy?: Maybe<string>;
  readonly turbulenceGenerationOrTrips?: Maybe<boolean>;
  readonly reynoldsMethod?: Maybe<string>;
  readonly includedWithReason?: Maybe<string>;
  readonly stated?: Maybe<StatedUncertaintyInput>;
  readonly points?: Maybe<readonly PointInput[]>;
}

export interface SweepInput {
  readonly id: string;
  readonly name?: Maybe<string>;
  readonly points: readonly { readonly reynolds: number; readonly dragAreaM2: number }[];
}

export interface AdjustmentInput {
  readonly id: string;
  readonly name?: Maybe<string>;
  readonly item: string;
  readonly fromValue?: Maybe<ConditionValue>;
  readonly toValue?: Maybe<ConditionValue>;
  readonly deltaDragAreaM2?: Maybe<number>;
  readonly uM2?: Maybe<number>;
  readonly perUnitDragAreaM2?: Maybe<number>;
  readonly uPerUnitM2?: Maybe<number>;
  readonly degreesOfFreedom?: Maybe<number>;
  /** The variants that it holds for, by their body class; absent: every variant. An extension of our own. */
  readonly variantIds?: Maybe<readonly string[]>;
}

export interface CorrelationPairInput {
  readonly dragAreaM2: number;
  readonly uM2: number;
  readonly referenceDragAreaM2: number;
  readonly referenceUM2: number;
}

export interface CorrelationInput {
  readonly id: string;
  readonly name?: Maybe<string>;
  readonly facilityId: string;
  readonly referenceFacilityId: string;
  readonly replaces?: Maybe<readonly ('blockage' | 'reynolds' | 'ground-simulation')[]>;
  readonly pairs: readonly CorrelationPairInput[];
}

export interface RankRequest {
  readonly basis?: Maybe<Basis>;
  readonly cycle?: Maybe<CycleInput>;
  readonly seed?: Maybe<number>;
}

/** Everything that a ranking depends on: the input of the operations `rank` and `reduce`, and of the screen. */
export interface RankingInput {
  readonly programme: ProgrammeInput;
  readonly facilities: readonly FacilityInput[];
  readonly models?: Maybe<readonly ModelInput[]>;
  readonly variants: readonly VariantInput[];
  readonly results: readonly ResultInput[];
  readonly sweeps?: Maybe<readonly SweepInput[]>;
  readonly adjustments?: Maybe<readonly AdjustmentInput[]>;
  readonly correlations?: Maybe<readonly CorrelationInput[]>;
  readonly request?: Maybe<RankRequest>;
}
