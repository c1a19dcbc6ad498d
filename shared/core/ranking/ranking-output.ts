import type { Figure } from '../uncertainty/figure';
import type { EvidenceRule } from './ranking-input';

/** The steps that a reduced drag area can have passed, in this order; those that did not apply are not listed. */
export type ReductionStepName =
  'full-scale-drag-area' | 'reynolds' | 'condition-adjustments' | 'facility-correlation';

export interface ReductionStep {
  readonly step: ReductionStepName;
  /** Null for the full-scale drag area of a result whose own points are the Reynolds sweep. */
  readonly dragAreaM2: number | null;
}

/** Lift and side force of one point as areas at full scale [m²]; null where not stated. */
export interface LiftAndSide {
  readonly yawDeg: number;
  readonly frontLiftAreaM2: number | null;
  readonly rearLiftAreaM2: number | null;
  readonly sideForceAreaM2: number | null;
}

export type ReductionCaution =
  | 'blockage'
  | 'included-with-reason'
  | 'mach'
  | 'outside-cipm-2007-range'
  | 'transition'
  | 'unpaired-yaw-in-unsymmetrical-sweep';

export type ExclusionRule = 'mach' | 'blockage' | 'not-comparable';

/** A result brought to the programme's reference. */
export interface ReducedResult {
  readonly resultId: string;
  readonly variantId: string;
  /** Of the zero-yaw point, the lowest of an own sweep, on the programme's characteristic length; null: no air or speed stated. */
  readonly reynolds: number | null;
  /** The highest of the result's points; null: no air or speed stated, which only a correlation for Reynolds allows. */
  readonly mach: number | null;
  /** Null outside tunnels. */
  readonly blockageRatio: number | null;
  /** Of the first zero-yaw point of a force result, else null [Pa]. */
  readonly dynamicPressurePa: number | null;
  /** C_D·A at model scale of the first zero-yaw point [m²]. */
  readonly modelDragAreaM2: number;
  readonly blockageCorrectedModelDragAreaM2: number;
  readonly steps: readonly ReductionStep[];
  readonly yawRatio: number | null;
  readonly zeroYaw: Figure;
  readonly windAveragedDragAreaM2: number | null;
  readonly windAveragedStandardUncertaintyM2: number | null;
  /** Code why there is no wind average, else null. */
  readonly windAveragedRefusal: string | null;
  readonly liftAndSide: readonly LiftAndSide[];
  /** Sorted. */
  readonly cautions: readonly ReductionCaution[];
  readonly excludedBy: readonly ExclusionRule[];
}

export interface ExcludedResult {
  readonly resultId: string;
  readonly variantId: string;
  /** Those of `excludedBy`, then `no-wind-average:<code>`; or `refused:<code>` alone. */
  readonly rules: readonly string[];
}

export interface VariantWithoutEvidence {
  readonly variantId: string;
  readonly rule: 'no-usable-evidence';
}

/** How the results of a weighted mean agree, in the order of the results used. */
export interface RankedCombination {
  /** Sum to 1. */
  readonly weights: readonly number[];
  readonly chiSquared: number;
  /** Null for one result; above 1 the mean is widened by it. */
  readonly birgeRatio: number | null;
  /** After DerSimonian and Laird [m⁴, m²]. */
  readonly betweenResultsVarianceM4: number;
  readonly randomEffectsMeanM2: number;
}

/** One variant in the ranking: its figure on the basis asked for, and what it comes from. */
export interface RankedVariant extends Figure {
  readonly variantId: string;
  readonly evidence: EvidenceRule;
  /** Used results, oldest first. */
  readonly resultIds: readonly string[];
  readonly coefficientOnCommonArea: number;
  readonly coefficientOnOwnArea: number;
  readonly ownAreaCoefficientStandardUncertainty: number;
  /** Only for a weighted mean. */
  readonly combination?: RankedCombination;
}

/** Energy of one variant on the cycle, from its zero-yaw drag area. */
export interface VariantEnergy {
  readonly variantId: string;
  readonly f0N: number;
  readonly f1NPerKmh: number;
  readonly f2NPerKmh2: number;
  readonly wheelEnergyJ: number;
  readonly brakingEnergyJ: number;
  readonly distanceM: number;
  readonly wheelEnergyWhPerKm: number;
  /** Central difference of the whole calculation at ±0.001 m² [J/m²]. */
  readonly exchangeRateJPerM2: number;
  readonly standardUncertaintyJ: number;
}

export interface ReduceOutput {
  readonly reducedResults: readonly ReducedResult[];
  readonly excludedResults: readonly ExcludedResult[];
}

export interface EnergyRanking {
  /** Ascending by wheel energy. */
  readonly energy: readonly VariantEnergy[];
  readonly orderByEnergy: readonly string[];
  /** Against the order of the zero-yaw drag areas. */
  readonly energyOrderDisagrees: boolean;
  readonly inseparableGroupsByEnergy: readonly (readonly string[])[];
  /** Of neighbours in the order by energy; one shorter than it. */
  readonly energyProbabilityLowerThanNext: readonly number[];
}

export interface RankOutput extends ReduceOutput, Partial<EnergyRanking> {
  readonly referenceReynolds: number;
  readonly referenceAirDensityKgM3: number;
  readonly variantsWithoutEvidence: readonly VariantWithoutEvidence[];
  /** Ascending by drag area on the basis, equal values by id. */
  readonly ranking: readonly RankedVariant[];
  readonly orderByDragArea: readonly string[];
  readonly orderByOwnAreaCoefficient: readonly string[];
  readonly ownAreaOrderDisagrees: boolean;
  /** For each in rank order P(it < each later one). */
  readonly probabilityLowerThanLaterOnes: readonly (readonly number[])[];
  readonly inseparableGroups: readonly (readonly string[])[];
  /** Share of draws in which a variant is the lowest. */
  readonly probabilityLowest: { readonly [variantId: string]: number };
}
