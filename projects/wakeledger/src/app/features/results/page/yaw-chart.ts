import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { EChartsCoreOption } from 'echarts/core';
import type { Reduction } from '#shared/core/reduction/reduction';
import { Chart, type ChartTable } from '../../../ui/chart/chart';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';

/** Drag area over yaw, every reading a point: what the sweep says before anything is folded or averaged. */
@Component({
  selector: 'wl-yaw-chart',
  imports: [Chart],
  template: `<wl-chart [caption]="caption()" [options]="options()" [table]="table()" />`,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class YawChart {
  readonly reduction = input.required<Reduction>();
  readonly name = input.required<string>();

  private readonly format = inject(QuantityFormat);
  private readonly points = computed(() =>
    this.reduction().points.toSorted((one, other) => one.yawDeg - other.yawDeg),
  );
  protected readonly caption = computed(() => $localize`Drag area over yaw, ${this.name()}:NAME:`);

  protected readonly options = computed<EChartsCoreOption>(() => ({
    grid: { left: 64, right: 24, top: 20, bottom: 48 },
    tooltip: { trigger: 'axis' },
    xAxis: { type: 'value', name: $localize`Yaw angle in °`, nameLocation: 'middle', nameGap: 30 },
    yAxis: {
      type: 'value',
      name: $localize`Drag area in m²`,
      nameLocation: 'middle',
      nameGap: 48,
      scale: true,
    },
    series: [
      {
        type: 'line',
        name: $localize`Drag area in m²`,
        symbol: 'circle',
        symbolSize: 8,
        data: this.points().map(({ yawDeg, dragAreaM2 }) => [yawDeg, Number(dragAreaM2.toPrecision(6))]),
      },
    ],
  }));
  protected readonly table = computed<ChartTable>(() => ({
    columns: [$localize`Yaw angle in °`, $localize`Drag area in m²`],
    rows: this.points().map(({ yawDeg, dragAreaM2 }) => [
      this.format.value(yawDeg, 'angle'),
      this.format.value(dragAreaM2, 'drag-area', { digits: 4 }),
    ]),
  }));
}
