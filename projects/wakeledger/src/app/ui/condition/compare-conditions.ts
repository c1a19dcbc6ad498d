import type { Condition, ConditionItem } from '#shared/contracts/condition';
import { differingItems } from '#shared/core/similarity/condition';
import type { NumberLocale } from '../../core/numbers/number-locale';
import { CONDITION_ITEMS, conditionItemWord, conditionValueWords } from './condition-words';

export type ConditionVerdict = 'same' | 'differs' | 'not-stated' | 'not-compared';

export interface ComparedItem {
  readonly item: ConditionItem;
  readonly words: string;
  readonly reference: string;
  readonly stated: string;
  readonly verdict: ConditionVerdict;
}

/**
 * A test condition beside the programme's reference, item by item. Values match exactly; an item that the result does
 * not state counts as different; one that the programme leaves open is not compared (method section 8).
 */
export function compareConditions(
  reference: Condition,
  stated: Condition,
  locale: NumberLocale,
): readonly ComparedItem[] {
  const differing = new Set(differingItems(reference, stated));
  return CONDITION_ITEMS.map((item) => ({
    item,
    words: conditionItemWord(item),
    reference:
      reference[item] === undefined
        ? $localize`left open`
        : conditionValueWords(item, reference[item], locale),
    stated: conditionValueWords(item, stated[item], locale),
    verdict: verdictOf(reference[item], stated[item], differing.has(item)),
  }));
}

function verdictOf(
  reference: Condition[ConditionItem],
  stated: Condition[ConditionItem],
  differs: boolean,
): ConditionVerdict {
  if (reference === undefined) return 'not-compared';
  if (!differs) return 'same';
  return stated === undefined ? 'not-stated' : 'differs';
}
