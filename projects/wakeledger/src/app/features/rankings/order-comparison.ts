import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { Quantity } from '../../ui/quantity/quantity';
import { QuantityFormat } from '../../ui/quantity/quantity-format';

/** The orders beside each other: by drag area, by coefficient on each own area, by energy. */
@Component({
  selector: 'wl-order-comparison',
  imports: [Quantity],
  template: `
    <div class="wl-scroll" tabindex="0" role="region" aria-label="The orders compared" i18n-aria-label>
      <table class="wl-table">
        <thead>
          <tr>
            <th scope="col" i18n>Variant</th>
            <th scope="col" class="wl-figure" i18n>Rank by drag area</th>
            <th scope="col" class="wl-figure">m²</th>
            <th scope="col" class="wl-figure" i18n>Rank on own area</th>
            <th scope="col" class="wl-figure" i18n>C<sub>D</sub> on own area</th>
            <th scope="col" class="wl-figure" i18n>Own area in m²</th>
            <th scope="col" class="wl-figure" i18n>Rank by energy</th>
            <th scope="col" class="wl-figure">{{ energyUnit() }}</th>
            <th scope="col" class="wl-figure" i18n>Mass in kg</th>
          </tr>
        </thead>
        <tbody>
          @for (row of rows(); track row.variantId) {
            <tr>
              <th scope="row">{{ row.name }}</th>
              <td class="wl-figure">{{ row.rankByDragArea }}</td>
              <td class="wl-figure">
                <wl-quantity kind="drag-area" [value]="row.figure.dragAreaM2" [withUnit]="false" />
              </td>
              <td class="wl-figure" [class.moved]="row.rankByOwnArea !== row.rankByDragArea">
                {{ row.rankByOwnArea }}
                @if (row.rankByOwnArea !== row.rankByDragArea) {
                  <span class="wl-ochre">{{ row.rankByOwnArea > row.rankByDragArea ? '▼' : '▲' }}</span>
                }
              </td>
              <td class="wl-figure"><wl-quantity kind="coefficient" [value]="row.onOwnArea.value" /></td>
              <td class="wl-figure">
                <wl-quantity kind="area" [value]="row.onOwnArea.areaM2" [withUnit]="false" />
              </td>
              <td class="wl-figure">
                {{ row.rankByEnergy ?? '–' }}
                @if (row.rankByEnergy !== null && row.rankByEnergy !== row.rankByDragArea) {
                  <span class="wl-ochre">{{ row.rankByEnergy > row.rankByDragArea ? '▼' : '▲' }}</span>
                }
              </td>
              <td class="wl-figure">
                <wl-quantity
                  kind="energy-per-distance"
                  [value]="row.energy?.wheelEnergyWhPerKm"
                  [withUnit]="false"
                />
              </td>
              <td class="wl-figure"><wl-quantity kind="mass" [value]="row.massKg" [withUnit]="false" /></td>
            </tr>
          }
        </tbody>
      </table>
    </div>
  `,
  styles: `
    :host {
      display: block;
      margin-bottom: 14px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OrderComparison {
  readonly view = input.required<RankingView>();

  private readonly format = inject(QuantityFormat);
  protected readonly energyUnit = computed(() => this.format.display('energy-per-distance').unit);
  protected readonly rows = computed(() =>
    this.view().rows.toSorted((a, b) => a.rankByDragArea - b.rankByDragArea),
  );
}
