import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { CycleDetail } from '#shared/contracts/cycles';
import { Chart, type ChartTable } from '../../ui/chart/chart';
import { Quantity } from '../../ui/quantity/quantity';
import { QuantityFormat } from '../../ui/quantity/quantity-format';

/** Rows that a table of a trace holds at most: enough to read, few enough to scroll. */
const TABLE_ROWS = 2_000;

/** A speed trace: its totals, so that a wrong one is noticed, its cautions, and the trace itself. */
@Component({
  selector: 'wl-cycle-figures',
  imports: [Chart, Quantity],
  templateUrl: './cycle-figures.html',
  styleUrl: './cycle-figures.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CycleFigures {
  readonly cycle = input.required<CycleDetail>();

  private readonly format = inject(QuantityFormat);
  private readonly speedUnit = computed(() => this.format.display('speed').unit);

  protected readonly caption = computed(() => {
    const { name } = this.cycle();
    return $localize`${name}:NAME:: speed over time`;
  });

  protected readonly options = computed(() => {
    const { timeS, speedKmh } = this.cycle();
    const { factor } = this.format.display('speed');
    return {
      grid: { left: 56, right: 16, top: 16, bottom: 44 },
      xAxis: {
        type: 'value',
        name: $localize`Time in s`,
        nameLocation: 'middle',
        nameGap: 28,
        min: timeS[0],
        max: timeS.at(-1),
        splitLine: { show: false },
        axisLabel: { formatter: (time: number) => this.format.value(time, 'duration') },
      },
      yAxis: {
        type: 'value',
        name: $localize`Speed in ${this.speedUnit()}:UNIT:`,
        nameLocation: 'middle',
        nameGap: 38,
        splitNumber: 4,
      },
      tooltip: { trigger: 'axis' },
      series: [
        {
          type: 'line',
          showSymbol: false,
          name: this.speedUnit(),
          data: timeS.map((time, index) => [time, (speedKmh[index] ?? 0) * factor]),
        },
      ],
    };
  });

  protected readonly table = computed<ChartTable>(() => {
    const { timeS, speedKmh } = this.cycle();
    return {
      columns: [$localize`Time in s`, $localize`Speed in ${this.speedUnit()}:UNIT:`],
      rows: timeS
        .slice(0, TABLE_ROWS)
        .map((time, index) => [
          this.format.value(time, 'duration', { digits: Number.isInteger(time) ? 0 : 2 }),
          this.format.value(speedKmh[index] ?? 0, 'speed'),
        ]),
    };
  });
  protected readonly cut = computed(() => Math.max(0, this.cycle().timeS.length - TABLE_ROWS));
}
