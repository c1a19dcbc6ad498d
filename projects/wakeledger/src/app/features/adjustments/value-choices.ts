import { adjustmentItem, type AdjustmentItem } from '#shared/contracts/adjustments';
import { CONDITION_CHOICES, conditionChoiceWord } from '../../ui/condition/condition-words';

export interface ValueChoice {
  readonly value: string;
  readonly words: string;
}

/** What an item may be chosen from; undefined where it is typed (tyres), and for numbers. */
export function valueChoices(item: AdjustmentItem): readonly ValueChoice[] | undefined {
  if (item === 'wheelVentilationInForce') {
    return [
      { value: 'yes', words: $localize`yes` },
      { value: 'no', words: $localize`no` },
    ];
  }
  if (!(item in CONDITION_CHOICES)) return undefined;
  const values = CONDITION_CHOICES[item as keyof typeof CONDITION_CHOICES];
  return values.map((value) => ({ value, words: conditionChoiceWord(value) }));
}

/** The item that an address names; undefined where it names none. */
export function itemOf(word: string | undefined): AdjustmentItem | undefined {
  const parsed = adjustmentItem.safeParse(word);
  return parsed.success ? parsed.data : undefined;
}
