import type { Result } from '#shared/contracts/results';
import type { Reduction } from '#shared/core/reduction/reduction';
import type { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { STATE_WORDS } from '../page/state-words';
import type { OfferedResult } from './adoption-dialog';

/** Results that a variant may rest on, newest first: when, where, what they came to and where they stand. */
export function offeredResults(
  results: readonly Result[],
  reductions: ReadonlyMap<string, Reduction>,
  facilityName: (facilityId: string) => string,
  format: QuantityFormat,
): readonly OfferedResult[] {
  return results
    .filter(({ withdrawn }) => withdrawn === undefined)
    .toSorted(
      (one, other) => other.testDate.localeCompare(one.testDate) || other.entrySequence - one.entrySequence,
    )
    .map(({ id, name, testDate, facilityId, state }) => {
      const figure = reductions.get(id)?.output.zeroYaw;
      const worth =
        figure === undefined
          ? $localize`no figure`
          : format.text(figure.dragAreaM2, 'drag-area', { expandedU: figure.expandedUncertaintyM2 });
      return { id, name, words: [testDate, facilityName(facilityId), worth, STATE_WORDS[state]].join(', ') };
    });
}
