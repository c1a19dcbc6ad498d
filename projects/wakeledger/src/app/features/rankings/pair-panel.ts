import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { pairRows } from './pair-rows';
import { probabilityWords } from './ranking-words';

/** Can two variants be told apart? One against every other, in figures. */
@Component({
  selector: 'wl-pair-panel',
  template: `
    <h2 i18n>One against the others</h2>
    <label>
      <span i18n>Compare</span>
      <select #which class="wl-input" [value]="chosen().variantId" (change)="asked.set(which.value)">
        @for (row of view().rows; track row.variantId) {
          <option [value]="row.variantId" [selected]="row.variantId === chosen().variantId">
            {{ row.name }}
          </option>
        }
      </select>
    </label>
    <p role="status">{{ summary() }}</p>
    <div
      class="wl-scroll"
      tabindex="0"
      role="region"
      aria-label="One variant against the others"
      i18n-aria-label
    >
      <table class="wl-table">
        <caption class="wl-heard" i18n>
          Drag area of each variant against
          {{
            chosen().name
          }}
        </caption>
        <thead>
          <tr>
            <th scope="col" i18n>Variant</th>
            <th scope="col" class="wl-figure" i18n>Difference, m²</th>
            <th scope="col" class="wl-figure" i18n>Probability that {{ chosen().name }} is lower</th>
            <th scope="col" i18n>At {{ percent() }} %</th>
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.variantId) {
            <tr>
              <th scope="row">{{ row.name }}</th>
              <td class="wl-figure">{{ row.difference }}</td>
              <td class="wl-figure">{{ row.probability }}</td>
              <td>
                @if (row.separable) {
                  <ng-container i18n>separable</ng-container>
                } @else {
                  <span class="wl-plum" i18n>not separable</span>
                }
              </td>
            </tr>
          }
        </tbody>
      </table>
    </div>
    <p class="small" i18n>
      What both figures share (a facility’s bias, one session) cancels in the difference; its ± is what is
      left.
    </p>
  `,
  styles: `
    h2 {
      margin-bottom: 6px;
    }
    label {
      display: flex;
      flex-wrap: wrap;
      align-items: baseline;
      gap: 4px 10px;
    }
    p {
      margin: 6px 0;
    }
    .small {
      font-size: var(--wl-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PairPanel {
  /** With two rows at least. */
  readonly view = input.required<RankingView>();

  private readonly format = inject(QuantityFormat);
  protected readonly asked = signal('');
  /** The first of the order until somebody asks for another one, or where that one has left. */
  protected readonly chosen = computed(() => {
    const { rows } = this.view();
    const row = rows.find(({ variantId }) => variantId === this.asked()) ?? rows[0];
    if (row === undefined) throw new Error('A ranking without rows compares nothing.');
    return row;
  });
  private readonly pairs = computed(() => pairRows(this.view(), this.chosen()));
  protected readonly percent = computed(() =>
    this.format.value(this.view().confidence * 100, 'number', { digits: 0 }),
  );
  protected readonly rows = computed(() =>
    this.pairs().map((pair) => ({
      ...pair,
      difference: `${this.format.value(pair.differenceM2, 'drag-area', { digits: 4, signed: true })} ± ${this.format.value(pair.expandedUncertaintyM2, 'drag-area', { digits: 4 })}`,
      probability: probabilityWords(pair.probabilityLower, this.format),
    })),
  );
  protected readonly summary = computed(() => {
    const { name } = this.chosen();
    const apart = this.pairs().filter(({ separable }) => separable).length;
    const count = this.pairs().length;
    return $localize`${name}:VARIANT: can be told from ${String(apart)}:APART: of ${String(count)}:COUNT: others at ${this.percent()}:PERCENT: %.`;
  });
}
