import type { ResultInput } from '../ranking/ranking-input';
import type { Reduction, ReductionContext } from '../reduction/reduction';
import type { Refusal } from '../refusal';
import { airChecks } from './air-checks';
import { liftChecks, plausibilityChecks, quotedAreaCheck } from './body-checks';
import { check, type Check } from './check';
import { conditionCheck } from './condition-check';
import { blockageCheck, machCheck, reynoldsCheck, transitionCheck } from './flow-checks';
import type { CheckLimits } from './limits';
import { repeatabilityCheck, yawCoverageCheck, yawPairsCheck } from './reading-checks';
import { refusedAir } from './unit-suspicion';

/** What results are checked against. */
export interface CheckSurroundings {
  /** Made of the same limits (`policiesInputOf`), so that the checks say what the ranking does. */
  readonly context: ReductionContext;
  readonly limits: CheckLimits;
}

/**
 * Every check of one reduced result, in the order of `CHECK_NAMES`. What keeps it out of the ranking is decided by the
 * reduction itself; the checks say by which limit, and add what a person should look at.
 *
 * @param bodyShape the variant's, as the plausible ranges of the limits name it
 */
export function checksOf(
  reduction: Reduction,
  { context, limits }: CheckSurroundings,
  bodyShape: string,
): readonly Check[] {
  return [
    conditionCheck(reduction, context),
    ...machCheck(reduction, limits),
    ...blockageCheck(reduction, limits),
    ...reynoldsCheck(reduction, limits),
    ...transitionCheck(reduction, limits),
    ...plausibilityChecks(reduction, limits, bodyShape),
    ...quotedAreaCheck(reduction),
    repeatabilityCheck(reduction, limits),
    yawCoverageCheck(reduction, limits),
    ...yawPairsCheck(reduction),
    ...airChecks(reduction, limits),
    ...liftChecks(reduction, limits),
  ];
}

/** The one check of a result that the method refuses, with the unit that was probably meant. */
export function checksOfRefused(
  { code, where, detail }: Refusal,
  result: Pick<ResultInput, 'air'>,
  limits: CheckLimits,
): readonly Check[] {
  return [
    check({
      check: 'refused',
      verdict: 'excluded',
      ...refusedAir(code, result.air, limits),
      refusal: { code, where, detail },
    }),
  ];
}
