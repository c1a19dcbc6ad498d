import type { Result } from '#shared/contracts/results';
import type { ReductionCaution } from '#shared/core/ranking/ranking-output';
import type { Reduction, ReductionContext } from '#shared/core/reduction/reduction';
import type { RefusedResult } from '#shared/core/reduction/reduce';
import { differingItems } from '#shared/core/similarity/condition';
import type { NumberLocale } from '../../core/numbers/number-locale';
import { conditionItemWord, conditionValueWords, isConditionItem } from '../../ui/condition/condition-words';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';

/** What the method says of a result, as a word; each has a shape of its own beside it. */
export const CHECK_STATES = ['comparable', 'caution', 'excluded', 'withdrawn', 'unknown'] as const;
export type CheckState = (typeof CHECK_STATES)[number];

export interface Check {
  readonly state: CheckState;
  /** Why, each in words; empty for a comparable result. */
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
  comparable: '●',
  caution: '▲',
  excluded: '■',
  withdrawn: '○',
  unknown: '?',
};
export const CHECK_INKS: Readonly<Record<CheckState, string>> = {
  comparable: 'wl-moss',
  caution: 'wl-ochre',
  excluded: 'wl-rust',
  withdrawn: '',
  unknown: 'wl-ochre',
};

export interface CheckWords {
  readonly format: QuantityFormat;
  readonly locale: NumberLocale;
}

/** The check of one result in words. `reduction` and `refused` come from the method; without either it was not checked. */
export function checkOf(
  result: Pick<Result, 'withdrawn'>,
  found: {
    readonly context: ReductionContext | null;
    readonly reduction?: Reduction;
    readonly refused?: RefusedResult;
    readonly unchecked?: string;
  },
  words: CheckWords,
): Check {
  if (result.withdrawn) {
    return { state: 'withdrawn', reasons: [$localize`withdrawn: ${result.withdrawn.reason}:REASON:`] };
  }
  if (found.refused) {
    return {
      state: 'excluded',
      reasons: [$localize`the method refuses it: ${found.refused.detail}:DETAIL:`],
    };
  }
  if (!found.reduction || !found.context) {
    return { state: 'unknown', reasons: [found.unchecked ?? $localize`its variant is retired`] };
  }
  const excluded = exclusionReasons(found.reduction, found.context, words);
  const cautions = found.reduction.output.cautions.map((caution) =>
    cautionReason(caution, found.reduction as Reduction, words),
  );
  if (excluded.length > 0) return { state: 'excluded', reasons: [...excluded, ...cautions] };
  return cautions.length > 0 ? { state: 'caution', reasons: cautions } : { state: 'comparable', reasons: [] };
}

function exclusionReasons(
  { output, parts }: Reduction,
  { policies, referenceCondition }: ReductionContext,
  { format, locale }: CheckWords,
): readonly string[] {
  return output.excludedBy.map((rule) => {
    if (rule === 'mach') {
      const limit = format.value(policies.machExcluded, 'number', { digits: 2 });
      return $localize`Mach ${format.value(output.mach, 'number', { digits: 2 })}:MACH:, over the limit of ${limit}:LIMIT:`;
    }
    if (rule === 'blockage') {
      const limit = parts.facility.kind === 'open-jet' ? policies.openJetLimit : policies.blockageExcluded;
      return $localize`blockage ${percent(output.blockageRatio ?? 0, format)}:BLOCKAGE:, over the limit of ${percent(limit, format)}:LIMIT:`;
    }
    const items = differingItems(referenceCondition, parts.result.condition)
      .filter(isConditionItem)
      .map((item) => {
        const stated = parts.result.condition?.[item];
        const word = conditionItemWord(item).toLocaleLowerCase();
        return stated === undefined || stated === null
          ? $localize`${word}:ITEM: not stated`
          : $localize`${word}:ITEM: ${conditionValueWords(item, stated as never, locale)}:STATED:, not ${conditionValueWords(item, referenceCondition[item] as never, locale)}:REFERENCE:`;
      });
    return $localize`not comparable with the reference condition: ${items.join('; ')}:ITEMS:`;
  });
}

function cautionReason(caution: ReductionCaution, { output }: Reduction, { format }: CheckWords): string {
  switch (caution) {
    case 'mach':
      return $localize`Mach ${format.value(output.mach, 'number', { digits: 2 })}:MACH:: compressibility may matter`;
    case 'blockage':
      return $localize`blockage ${percent(output.blockageRatio ?? 0, format)}:BLOCKAGE:: the correction matters`;
    case 'transition':
      return $localize`Reynolds number ${reynoldsWords(output.reynolds, format)}:REYNOLDS: without trips: transition may sit in the wrong place`;
    case 'outside-cipm-2007-range':
      return $localize`air outside the range of CIPM-2007`;
    case 'unpaired-yaw-in-unsymmetrical-sweep':
      return $localize`a yaw angle without its mirror in a sweep that is not symmetrical`;
    case 'included-with-reason':
      return $localize`included with a reason`;
  }
}

const percent = (fraction: number, format: QuantityFormat): string =>
  format.text(fraction * 100, 'percent', { digits: 1 });

/** `4.29 × 10⁶`, as it is read aloud in the trade. */
export function reynoldsWords(reynolds: number, format: QuantityFormat): string {
  return `${format.value(reynolds / 1e6, 'number', { digits: 2 })} × 10⁶`;
}
