import type { Figure } from '../uncertainty/figure';
import type { RankedCombination, ReductionStep } from './ranking-output';

/** One result of an evaluation at the reference. */
export interface EvaluatedResult {
  readonly resultId: string;
  readonly reynolds: number | null;
  readonly mach: number | null;
  readonly blockageRatio: number | null;
  readonly steps: readonly ReductionStep[];
  readonly zeroYaw: Figure;
  readonly windAveragedDragAreaM2: number | null;
  readonly windAveragedStandardUncertaintyM2: number | null;
  readonly cautions: readonly string[];
}

/** What the evidence of one variant comes to. A figure is null where no result is usable on that basis. */
export interface EvaluationOutput {
  readonly zeroYaw: Figure | null;
  readonly windAveraged: Figure | null;
  /** Of the zero-yaw figure, oldest first. */
  readonly usedResultIds: readonly string[];
  /** Of the zero-yaw figure of a weighted mean, else null. */
  readonly combination: RankedCombination | null;
  /** By result id. */
  readonly results: readonly EvaluatedResult[];
  readonly excluded: readonly { readonly resultId: string; readonly rules: readonly string[] }[];
}

/** What an evaluation was made with, beside its inputs: which versions stood then. */
export interface EvaluationParameters {
  readonly policyId: string | null;
  readonly frictionLine: string | null;
  readonly facilityVersions: readonly { readonly facilityId: string; readonly number: number }[];
  readonly correlationIds: readonly string[];
  readonly adjustmentIds: readonly string[];
}
