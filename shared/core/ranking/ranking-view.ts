import type { AirInput } from '../air/air-input';
import type { Contribution } from '../uncertainty/figure';
import type { EvidenceBasis, RankingOrder } from './ranking-choices';
import type { Basis, EvidenceRule, FacilityKind } from './ranking-input';
import type { RankedCombination, ReductionCaution, ReductionStepName } from './ranking-output';

/** A drag area [m²] with its uncertainty. */
export interface ViewFigure {
  readonly dragAreaM2: number;
  readonly standardUncertaintyM2: number;
  readonly expandedUncertaintyM2: number;
  readonly coverageFactor: number;
  /** Null: infinite. */
  readonly effectiveDegreesOfFreedom: number | null;
}

/** A coefficient on a named area, with its expanded uncertainty. */
export interface ViewCoefficient {
  readonly areaM2: number;
  readonly value: number;
  readonly expandedUncertainty: number;
}

/** Energy at the wheel on the chosen cycle, of the configuration named. */
export interface ViewEnergy {
  readonly wheelEnergyWhPerKm: number;
  readonly expandedUncertaintyWhPerKm: number;
  readonly brakingEnergyWhPerKm: number;
  /** What one count on the common area costs [Wh/km]. */
  readonly whPerKmPerCount: number;
  readonly f0N: number;
  readonly f1NPerKmh: number;
  readonly f2NPerKmh2: number;
}

export interface ViewEvidence {
  readonly resultId: string;
  readonly name: string;
  readonly testDate: string;
  readonly facilityName: string;
  readonly facilityKind: FacilityKind;
  readonly scale: number;
  readonly adopted: boolean;
  /** Why it counts though it is not comparable; null where it is. */
  readonly includedReason: string | null;
}

/** A step of the reduction by its name and its result alone: what may be shown without the raw evidence. */
export interface ViewStep {
  readonly step: ReductionStepName | 'yaw-ratio';
  readonly dragAreaM2: number;
}

/** One line of a budget, with the name of what it belongs to. */
export interface ViewContribution extends Contribution {
  /** The part of the key before the colon. */
  readonly kind: string;
  /** Name of the facility, result, model or variant that the key holds, else its id. */
  readonly of: string;
}

export interface ViewRow {
  /** From 1, in the chosen order. */
  readonly rank: number;
  readonly variantId: string;
  readonly name: string;
  readonly bodyShape: string;
  readonly description: string;
  readonly lengthMm: number | null;
  readonly heightMm: number | null;
  readonly wheelbaseMm: number | null;
  readonly figure: ViewFigure;
  readonly onCommonArea: ViewCoefficient;
  readonly onOwnArea: ViewCoefficient;
  /** Null where the variant has no configuration yet. */
  readonly configuration: string | null;
  /** True where the chosen configuration does not exist on this variant and its base stands in. */
  readonly baseStandsIn: boolean;
  readonly massKg: number | null;
  /** Null where mass or rolling resistance is missing. */
  readonly energy: ViewEnergy | null;
  readonly rankByDragArea: number;
  readonly rankByOwnArea: number;
  readonly rankByEnergy: number | null;
  /** P(this one is lower than the next in the order); null for the last. */
  readonly probabilityLowerThanNext: number | null;
  readonly evidence: readonly ViewEvidence[];
  /** How the figure is formed from them. */
  readonly rule: EvidenceRule;
  /** How they agree, in their order; null for the newest result. */
  readonly combination: RankedCombination | null;
  /** A usable result that is newer than the adopted one in use. */
  readonly newer: ViewEvidence | null;
  /** Null: the result states no air or speed. */
  readonly reynolds: number | null;
  readonly mach: number | null;
  readonly blockageRatio: number | null;
  readonly cautions: readonly ReductionCaution[];
  readonly steps: readonly ViewStep[];
  readonly contributions: readonly ViewContribution[];
}

/** Neighbours among whom no pair is separable at the confidence. */
export interface ViewGroup {
  /** In rank order. */
  readonly variantIds: readonly string[];
  readonly names: readonly string[];
  /** Ranks of the first and the last. */
  readonly fromRank: number;
  readonly toRank: number;
  /** Last minus first: m², or Wh/km in the order by energy. */
  readonly difference: number;
  /** P(the first is lower than the last). */
  readonly probability: number;
}

/** Who can do something about an exclusion, and how. */
export type Remedy = 'include-with-reason' | 'change-policy' | 'enter-anew' | 'measure-yaw' | 'bring-back';

export interface ViewExclusionRule {
  /** `set-aside`, `mach`, `blockage`, `not-comparable`, `no-wind-average:<code>` or `refused:<code>`. */
  readonly rule: string;
  readonly remedy: Remedy;
  /** What was found and what the limit is, where the rule has one. */
  readonly value: number | null;
  readonly limit: number | null;
  /** Items of the condition that differ; a value that is not stated is null. */
  readonly items: readonly {
    readonly item: string;
    readonly reference: string | number | boolean;
    readonly stated: string | number | boolean | null;
  }[];
  /** The method's own words, of a refusal; a person's, of a result that is set aside. */
  readonly detail: string | null;
}

export interface ViewExclusion {
  readonly resultId: string;
  readonly name: string;
  readonly variantId: string;
  readonly variantName: string;
  readonly facilityName: string;
  readonly testDate: string;
  readonly adopted: boolean;
  readonly rules: readonly ViewExclusionRule[];
}

/** A variant whose place in another order contradicts its place by drag area. */
export interface ViewInversion {
  readonly variantId: string;
  readonly name: string;
  /** `behind`: by the other order it comes after those over which it is lower by drag area. */
  readonly direction: 'behind' | 'ahead';
  /** Its figure in the other order: a coefficient, or Wh/km. */
  readonly value: number;
  readonly others: readonly { readonly variantId: string; readonly name: string; readonly value: number }[];
  /** Why: its frontal area [m²], or its mass [kg], is the smallest or largest of those named; null where neither. */
  readonly extreme: 'smallest' | 'largest' | null;
}

export interface ViewNotice {
  readonly order: 'own-area' | 'energy';
  readonly inversions: readonly ViewInversion[];
  /** How many more variants there are than those named. */
  readonly more: number;
}

export type IgnoredChoice = 'area' | 'air' | 'cycle' | 'configuration' | 'order';

/** What the controls may offer. */
export interface ViewOffers {
  readonly areas: readonly { readonly variantId: string; readonly name: string; readonly areaM2: number }[];
  readonly cycles: readonly { readonly key: string; readonly name: string }[];
  readonly configurations: readonly string[];
  readonly programmeAir: AirInput;
  readonly programmeAreaM2: number;
  /** Name of the variant whose area the programme uses; null: a fixed area. */
  readonly programmeAreaOf: string | null;
  readonly programmeConfidence: number;
}

/** The ranking as it is shown: one answer of one function, for the screen that computes and for the server that answers. */
export interface RankingView {
  readonly programmeName: string;
  readonly order: RankingOrder;
  readonly basis: Basis;
  readonly evidence: EvidenceBasis;
  readonly commonAreaM2: number;
  /** Name of the variant that the common area belongs to; null: a typed or fixed one. */
  readonly commonAreaOf: string | null;
  readonly confidence: number;
  readonly cycle: { readonly key: string; readonly name: string; readonly distanceM: number } | null;
  readonly air: { readonly state: string; readonly densityKgM3: number };
  readonly configuration: string | null;
  readonly referenceReynolds: number;
  readonly characteristicLengthName: string;
  /** Choices that do not fit the programme (any more) and were left at their defaults. */
  readonly ignored: readonly IgnoredChoice[];
  readonly resultCount: number;
  readonly rows: readonly ViewRow[];
  readonly groups: readonly ViewGroup[];
  readonly notices: readonly ViewNotice[];
  readonly stayedOut: readonly ViewExclusion[];
  readonly withoutEvidence: readonly { readonly variantId: string; readonly name: string }[];
  /** Variants in the ranking without mass or rolling resistance: they have no energy. */
  readonly withoutEnergy: readonly { readonly variantId: string; readonly name: string }[];
  readonly offers: ViewOffers;
}
