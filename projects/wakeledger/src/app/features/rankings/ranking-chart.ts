import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { EChartsCoreOption } from 'echarts/core';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { Chart, type ChartTable } from '../../ui/chart/chart';
import { QuantityFormat } from '../../ui/quantity/quantity-format';

/** Height of one variant in the chart [px]. */
const ROW_PX = 26;

/** The ranking as a chart: drag areas with their U, the lowest at the top. */
@Component({
  selector: 'wl-ranking-chart',
  imports: [Chart],
  template: `<div class="frame" [style.--wl-chart-height.px]="height()">
    <wl-chart [caption]="caption()" [options]="options()" [table]="table()" />
  </div>`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RankingChart {
  readonly view = input.required<RankingView>();

  private readonly format = inject(QuantityFormat);

  protected readonly height = computed(() => 90 + ROW_PX * this.view().rows.length);
  protected readonly caption = computed(
    () =>
      $localize`Drag area of the variants of ${this.view().programmeName}:PROGRAMME:, with expanded uncertainty`,
  );
  protected readonly options = computed((): EChartsCoreOption => {
    const { rows } = this.view();
    // A line through three points and a gap: one bar of U a variant, its disc in the middle.
    const end = { symbol: 'rect', symbolSize: [1.5, 10] };
    const bars = rows.flatMap(({ figure }, index) => [
      { value: [figure.dragAreaM2 - figure.expandedUncertaintyM2, index], ...end },
      { value: [figure.dragAreaM2, index], symbol: 'circle', symbolSize: 10 },
      { value: [figure.dragAreaM2 + figure.expandedUncertaintyM2, index], ...end },
      { value: [null, null] },
    ]);
    return {
      grid: { left: 8, right: 24, top: 8, bottom: 44, containLabel: true },
      xAxis: {
        type: 'value',
        scale: true,
        name: $localize`Drag area in m²`,
        nameLocation: 'middle',
        nameGap: 28,
        axisLabel: { formatter: (value: number) => this.format.value(value, 'drag-area', { digits: 2 }) },
      },
      yAxis: {
        type: 'category',
        inverse: true,
        data: rows.map(({ rank, name }) => `${rank}  ${name}`),
      },
      series: [
        { type: 'line', data: bars, connectNulls: false, showSymbol: true, lineStyle: { width: 1.5 } },
      ],
    };
  });
  protected readonly table = computed((): ChartTable => ({
    columns: [$localize`Variant`, $localize`Drag area in m²`, $localize`U in m²`],
    rows: this.view().rows.map(({ name, figure }) => [
      name,
      this.format.value(figure.dragAreaM2, 'drag-area'),
      this.format.value(figure.expandedUncertaintyM2, 'drag-area'),
    ]),
  }));
}
