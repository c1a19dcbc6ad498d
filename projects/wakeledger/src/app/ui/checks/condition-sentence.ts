import type { Check, DifferingItem } from '#shared/core/checks/check';
import type { CheckLanguage } from './check-figures';
import type { Condition } from '#shared/contracts/condition';
import type { NumberLocale } from '../../core/numbers/number-locale';
import { conditionItemWord, conditionValueWords, isConditionItem } from '../condition/condition-words';

type StatedValue = Condition[keyof Condition];

/** `ground fixed floor, not several belts` */
function itemWords({ item, reference, stated }: DifferingItem, locale: NumberLocale): string {
  if (!isConditionItem(item)) return item;
  const word = conditionItemWord(item).toLocaleLowerCase();
  if (stated === null) return $localize`${word}:ITEM: not stated`;
  const is = conditionValueWords(item, stated as StatedValue, locale);
  const asked = conditionValueWords(item, reference as StatedValue, locale);
  return $localize`${word}:ITEM: ${is}:STATED:, not ${asked}:REFERENCE:`;
}

/** What the test condition was against the programme's reference. */
export function conditionSentence({ verdict, finding, items }: Check, { locale }: CheckLanguage): string {
  const differing = items.map((item) => itemWords(item, locale)).join('; ');
  if (verdict === 'excluded') {
    return $localize`Not comparable with the reference condition: ${differing}:ITEMS:. It stays out of the ranking.`;
  }
  if (finding === 'included-with-reason') {
    return $localize`Not comparable with the reference condition, and included with a written reason: ${differing}:ITEMS:.`;
  }
  if (finding === 'adjusted') {
    return $localize`Brought to the reference condition by the organisation’s adjustments: ${differing}:ITEMS:.`;
  }
  return $localize`Tested in the programme’s reference condition.`;
}
