import type { ViewExclusion } from '#shared/core/ranking/ranking-view';
import type { NumberLocale } from '../../core/numbers/number-locale';
import { conditionItemWord, conditionValueWords, isConditionItem } from '../../ui/condition/condition-words';

/** An adjustment that would answer for a difference; `query` fills in its form. */
export interface MissingAdjustment {
  readonly words: string;
  readonly query: Readonly<Record<string, string>>;
}

const typed = (value: string | number | boolean): string =>
  typeof value === 'boolean' ? (value ? 'yes' : 'no') : String(value);

/**
 * The adjustments that are missing for results to be comparable, each once. A result that does not state an item needs the
 * item stated, and no adjustment.
 */
export function missingAdjustments(
  exclusions: readonly ViewExclusion[],
  locale: NumberLocale,
): readonly MissingAdjustment[] {
  const missing = new Map<string, MissingAdjustment>();
  for (const { item, reference, stated } of exclusions.flatMap(({ rules }) =>
    rules.flatMap(({ items }) => items),
  )) {
    if (stated === null || !isConditionItem(item)) continue;
    const words = conditionItemWord(item).toLocaleLowerCase();
    const numeric = typeof reference === 'number';
    const [from, to] = [stated, reference].map((value) => conditionValueWords(item, value as never, locale));
    const found: MissingAdjustment = numeric
      ? { words: $localize`Add an adjustment for ${words}:ITEM:`, query: { item } }
      : {
          words: $localize`Add an adjustment for ${words}:ITEM:, from ${from}:FROM: to ${to}:TO:`,
          query: { item, from: typed(stated), to: typed(reference) },
        };
    missing.set(found.words, found);
  }
  return [...missing.values()];
}
