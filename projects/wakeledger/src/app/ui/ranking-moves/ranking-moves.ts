import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { RankingComparison, RankingMove, Standing } from '#shared/core/ranking/ranking-comparison';
import { QuantityFormat } from '../quantity/quantity-format';

/** What a change does to a ranking: who moves, whose figure changes, which brackets come and go. */
@Component({
  selector: 'wl-ranking-moves',
  template: `
    @if (comparison().changed) {
      @if (moved().length) {
        <div
          class="wl-scroll"
          tabindex="0"
          role="region"
          aria-label="What changes in the ranking"
          i18n-aria-label
        >
          <table class="wl-table">
            <thead>
              <tr>
                <th scope="col" i18n>Variant</th>
                <th scope="col" class="wl-figure" i18n>Rank</th>
                <th scope="col" class="wl-figure" i18n>Before, m²</th>
                <th scope="col" class="wl-figure" i18n>After, m²</th>
                <th scope="col" class="wl-figure" i18n>Change, m²</th>
              </tr>
            </thead>
            <tbody>
              @for (row of moved(); track row.variantId) {
                <tr>
                  <th scope="row">{{ row.name }}</th>
                  <td class="wl-figure">
                    {{ row.rank }}
                    @if (row.way; as way) {
                      <span class="wl-ochre">{{ way }}</span>
                    }
                  </td>
                  <td class="wl-figure">{{ row.before }}</td>
                  <td class="wl-figure">{{ row.after }}</td>
                  <td class="wl-figure">{{ row.shift }}</td>
                </tr>
              }
            </tbody>
          </table>
        </div>
      } @else {
        <p i18n>No variant moves, and no figure changes.</p>
      }
      @for (line of lines(); track line) {
        <p>{{ line }}</p>
      }
    } @else {
      <p i18n>Nothing in the ranking changes.</p>
    }
  `,
  styles: `
    p {
      margin: 4px 0 0;
      font-size: var(--wl-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RankingMoves {
  readonly comparison = input.required<RankingComparison>();

  private readonly format = inject(QuantityFormat);

  protected readonly moved = computed(() =>
    this.comparison()
      .moves.filter(({ moved }) => moved)
      .map((move) => ({
        variantId: move.variantId,
        name: move.name,
        rank: rankWords(move),
        way: move.places > 0 ? '▲' : move.places < 0 ? '▼' : '',
        before: this.figure(move.before),
        after: this.figure(move.after),
        shift:
          move.shiftM2 === null
            ? '–'
            : this.format.value(move.shiftM2, 'drag-area', { digits: 4, signed: true }),
      })),
  );

  /** What the table does not hold: results that come and go, and who can no longer or now be told apart. */
  protected readonly lines = computed(() => {
    const { entering, leaving, bracketsGained, bracketsLost } = this.comparison();
    const { exclusionsGained, exclusionsLost } = this.comparison();
    return [
      ...entering.map(
        ({ evidence, variantName }) =>
          $localize`${evidence.name}:RESULT: counts for ${variantName}:VARIANT:.`,
      ),
      ...leaving.map(
        ({ evidence, variantName }) =>
          $localize`${evidence.name}:RESULT: no longer counts for ${variantName}:VARIANT:.`,
      ),
      ...named(exclusionsGained, exclusionsLost).map((result) => $localize`${result}:RESULT: stays out now.`),
      ...named(exclusionsLost, exclusionsGained).map(
        (result) => $localize`${result}:RESULT: stays out no longer.`,
      ),
      ...bracketsGained.map(({ names }) => $localize`Not separable any more: ${names.join(', ')}:VARIANTS:.`),
      ...bracketsLost.map(({ names }) => $localize`No longer one group: ${names.join(', ')}:VARIANTS:.`),
    ];
  });

  private figure(standing: Standing | null): string {
    if (standing === null) return $localize`not ranked`;
    const { dragAreaM2, expandedUncertaintyM2: expandedU } = standing.figure;
    return this.format.text(dragAreaM2, 'drag-area', { expandedU, withUnit: false });
  }
}

/** Results that are kept out on the one side and not on the other; those kept out by other rules are on both. */
function named(
  exclusions: RankingComparison['exclusionsGained'],
  others: RankingComparison['exclusionsGained'],
): readonly string[] {
  const known = new Set(others.map(({ resultId }) => resultId));
  return exclusions.filter(({ resultId }) => !known.has(resultId)).map(({ name }) => name);
}

/** `3 → 1`, or the rank alone where it stays. */
function rankWords({ before, after }: RankingMove): string {
  const from = before === null ? '–' : String(before.rank);
  const to = after === null ? '–' : String(after.rank);
  return from === to ? to : `${from} → ${to}`;
}
