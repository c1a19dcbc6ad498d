import { DEFAULT_CHECK_LIMITS, DEFAULT_POLICIES } from '../constants';
import type { PoliciesInput } from '../ranking/ranking-input';

export interface LimitRange {
  readonly from: number;
  readonly to: number;
}

/** What is plausible for one body shape: drag coefficient on the frontal area, and that area [m²]. */
export interface PlausibleBody<Shape extends string = string> {
  readonly bodyShape: Shape;
  readonly dragCoefficient: LimitRange;
  readonly frontalAreaM2: LimitRange;
}

/** The limits of every check: what an organisation holds for acceptable. Units in the names; blockage etc. are fractions. */
export interface CheckLimits {
  readonly machCaution: number;
  readonly machExcluded: number;
  readonly blockageCaution: number;
  readonly blockageExcluded: number;
  readonly openJetLimit: number;
  readonly minimumReynolds: number;
  readonly reynoldsToleranceM2: number;
  readonly frictionShare: number;
  readonly frictionShareU: number;
  readonly yawCoverageDeg: number;
  readonly repeatabilityCaution: number;
  readonly airTemperatureC: LimitRange;
  readonly airPressurePa: LimitRange;
  readonly frontLiftLimit: number;
  readonly rearLiftLimit: number;
  readonly plausible: readonly PlausibleBody[];
}

const { frictionLine: _perProgramme, ...METHOD_LIMITS } = DEFAULT_POLICIES;

/** What holds until somebody in the organisation says otherwise; the sources stand with the constants. */
export const DEFAULT_LIMITS = { ...METHOD_LIMITS, ...DEFAULT_CHECK_LIMITS } satisfies CheckLimits;

/** Number of the limits that hold before anybody has changed them. */
export const DEFAULT_LIMITS_NUMBER = 0;

/** The part of the limits that the method itself reads, with the id that its keys and derivations name. */
export function policiesInputOf(
  limits: CheckLimits,
  number: number,
  frictionLine: 'on' | 'off',
): PoliciesInput {
  const { machCaution, machExcluded, blockageCaution, blockageExcluded, openJetLimit } = limits;
  const { minimumReynolds, reynoldsToleranceM2, frictionShare, frictionShareU } = limits;
  return {
    policyId: `v${number}`,
    machCaution,
    machExcluded,
    blockageCaution,
    blockageExcluded,
    openJetLimit,
    minimumReynolds,
    reynoldsToleranceM2,
    frictionLine,
    frictionShare,
    frictionShareU,
  };
}
