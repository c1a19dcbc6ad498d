/**
 * A figure is a drag area with its uncertainty kept apart by key, so that what two figures share can cancel
 * (JCGM 100:2008; method section 9).
 */

/** One contribution as it is given. Entries of one key add with their signs. */
export interface ContributionInput {
  /** What the amount belongs to, for example `session:s4`. */
  readonly key: string;
  /** Signed standard uncertainty [m²]. */
  readonly amountM2: number;
  /** Above 0; absent or null: infinite. */
  readonly degreesOfFreedom?: number | null | undefined;
  /** Contributions of one variance estimate are pooled in Welch–Satterthwaite; absent: the key itself. */
  readonly varianceEstimate?: string | null | undefined;
}

export interface FigureInput {
  readonly dragAreaM2: number;
  readonly contributions?: readonly ContributionInput[] | null | undefined;
}

/** One line of a budget. */
export interface Contribution {
  readonly key: string;
  /** Signed standard uncertainty [m²], at least 1e-15 in magnitude. */
  readonly amountM2: number;
  /** Null: infinite. */
  readonly degreesOfFreedom: number | null;
  /** Part of the variance, 0 to 1. */
  readonly shareOfVariance: number;
  /** Only where it is not the key. */
  readonly varianceEstimate?: string;
}

/** A figure with its budget, contributions sorted by key (code units). */
export interface Figure {
  readonly dragAreaM2: number;
  readonly standardUncertaintyM2: number;
  /** Null: infinite. */
  readonly effectiveDegreesOfFreedom: number | null;
  /** Student quantile at 0.97725 for the effective degrees of freedom. */
  readonly coverageFactor: number;
  readonly expandedUncertaintyM2: number;
  readonly contributions: readonly Contribution[];
}
