import type { Result } from '#shared/contracts/results';
import { gravest, type Check } from '#shared/core/checks/check';
import { checksOf, checksOfRefused } from '#shared/core/checks/checks-of';
import type { CheckLimits } from '#shared/core/checks/limits';
import type { Reduction, ReductionContext } from '#shared/core/reduction/reduction';
import type { RefusedResult } from '#shared/core/reduction/reduce';
import type { CheckLanguage } from '../../ui/checks/check-figures';
import { checkSentence, VERDICT_INKS, VERDICT_SHAPES } from '../../ui/checks/check-words';

/** What the checks of a result come to, as a word; each has a shape of its own beside it. */
export const CHECK_STATES = ['comparable', 'caution', 'excluded', 'withdrawn', 'unknown'] as const;
export type CheckState = (typeof CHECK_STATES)[number];

export interface ResultCheck {
  readonly state: CheckState;
  /** Every check, for the list part `wl-checks`; empty where none was made. */
  readonly checks: readonly Check[];
  /** What needs a look, each in one sentence, the gravest first; empty for a comparable result. */
  readonly reasons: readonly string[];
}

export const CHECK_WORDS: Readonly<Record<CheckState, string>> = {
  comparable: $localize`comparable`,
  caution: $localize`caution`,
  excluded: $localize`excluded`,
  withdrawn: $localize`withdrawn`,
  unknown: $localize`not checked`,
};
export const CHECK_SHAPES: Readonly<Record<CheckState, string>> = {
  comparable: VERDICT_SHAPES.passes,
  caution: VERDICT_SHAPES.caution,
  excluded: VERDICT_SHAPES.excluded,
  withdrawn: '○',
  unknown: '?',
};
export const CHECK_INKS: Readonly<Record<CheckState, string>> = {
  comparable: VERDICT_INKS.passes,
  caution: VERDICT_INKS.caution,
  excluded: VERDICT_INKS.excluded,
  withdrawn: '',
  unknown: 'wl-ochre',
};

/** What one result is checked against. `reduction` and `refused` come from the method; without either it was not checked. */
export interface CheckGround {
  readonly context: ReductionContext | null;
  readonly reduction?: Reduction | undefined;
  readonly refused?: RefusedResult | undefined;
  /** Why it could not be reduced, where there is a reason to tell. */
  readonly unchecked?: string | undefined;
  /** The limits in force; undefined until they have come. */
  readonly limits: CheckLimits | undefined;
  /** The body shape of its variant. */
  readonly bodyShape: string | undefined;
}

const unknown = (reason: string): ResultCheck => ({ state: 'unknown', checks: [], reasons: [reason] });

function checksMade(result: Pick<Result, 'air'>, ground: CheckGround, limits: CheckLimits): readonly Check[] {
  const { context, reduction, refused, bodyShape } = ground;
  if (refused) return checksOfRefused(refused, result, limits);
  return reduction && context ? checksOf(reduction, { context, limits }, bodyShape ?? 'other') : [];
}

/** The checks of one result, and what they come to. */
export function checkOf(
  result: Pick<Result, 'withdrawn' | 'air'>,
  ground: CheckGround,
  language: CheckLanguage,
): ResultCheck {
  if (result.withdrawn) {
    return {
      state: 'withdrawn',
      checks: [],
      reasons: [$localize`Withdrawn: ${result.withdrawn.reason}:REASON:`],
    };
  }
  if (ground.limits === undefined) return unknown($localize`The organisation’s limits are not here yet.`);
  const checks = checksMade(result, ground, ground.limits);
  if (checks.length === 0) return unknown(ground.unchecked ?? $localize`Its variant is retired.`);
  const verdict = gravest(checks);
  return {
    state: verdict === 'passes' ? 'comparable' : verdict,
    checks,
    reasons: (['excluded', 'caution'] as const).flatMap((grave) =>
      checks.filter((check) => check.verdict === grave).map((check) => checkSentence(check, language)),
    ),
  };
}
