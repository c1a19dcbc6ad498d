import type { EChartsCoreOption } from 'echarts/core';
import type { ChartPoint, ControlChart } from '#shared/core/uncertainty/control-chart';
import { ACTION_LIMIT, WARNING_LIMIT } from '#shared/core/uncertainty/control-chart';
import type { ColourValues } from '../../../theme/token-values';
import type { ChartTable } from '../../ui/chart/chart';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import { markOf } from './control-chart-words';

/** What the chart is told of a session beside its figures. */
export interface SessionLabel {
  readonly name: string;
  readonly date: string;
}

export type LabelOf = (point: ChartPoint) => SessionLabel;

const SYMBOLS = { '○': 'emptyCircle', '●': 'circle', '▲': 'triangle', '◆': 'diamond' } as const;

const areaFigure = (format: QuantityFormat, value: number): string =>
  format.value(value, 'drag-area', { digits: 4 });

function limitLine(chart: ControlChart, name: string, deviations: number, colour: string, dashed: boolean) {
  const centre = chart.scatter?.centreM2 ?? NaN;
  return {
    type: 'line' as const,
    name,
    step: 'middle' as const,
    symbol: 'none',
    silent: true,
    lineStyle: { color: colour, width: 1, type: dashed ? ('dashed' as const) : ('solid' as const) },
    endLabel: { show: true, formatter: name, color: colour, fontSize: 12 },
    data: chart.points.map(({ limits }) =>
      limits === undefined ? null : centre + deviations * limits.deviationM2,
    ),
  };
}

/** Session means over the sessions in order, with centre line and limits, each labelled where it ends. */
export function controlChartOptions(
  chart: ControlChart,
  labelOf: LabelOf,
  format: QuantityFormat,
  colours: Pick<ColourValues, 'ink' | 'ochre' | 'rust' | 'petrol'>,
): EChartsCoreOption {
  const [warning, action] = [$localize`warning`, $localize`action`];
  const lines =
    chart.scatter === undefined
      ? []
      : [
          limitLine(chart, $localize`centre`, 0, colours.ink, false),
          limitLine(chart, warning, WARNING_LIMIT, colours.ochre, true),
          limitLine(chart, warning, -WARNING_LIMIT, colours.ochre, true),
          limitLine(chart, action, ACTION_LIMIT, colours.rust, false),
          limitLine(chart, action, -ACTION_LIMIT, colours.rust, false),
        ];
  return {
    grid: { left: 76, right: 76, top: 20, bottom: 64 },
    tooltip: { trigger: 'item' },
    xAxis: {
      type: 'category',
      name: $localize`Session, by day of measurement`,
      nameLocation: 'middle',
      nameGap: 46,
      boundaryGap: true,
      // Two lines: the name and the day.
      axisLabel: { lineHeight: 16 },
      data: chart.points.map((point) => {
        const { name, date } = labelOf(point);
        return `${name}\n${date}`;
      }),
    },
    yAxis: {
      type: 'value',
      scale: true,
      name: $localize`Drag area of the check body in m²`,
      nameLocation: 'middle',
      nameGap: 58,
      axisLabel: { formatter: (value: number) => areaFigure(format, value) },
    },
    series: [
      ...lines,
      {
        type: 'line',
        name: $localize`Session mean`,
        z: 5,
        lineStyle: { color: colours.petrol, width: 1 },
        data: chart.points.map((point) => {
          const mark = markOf(point);
          const outstanding = mark.shape === '◆' || mark.shape === '▲';
          const colour = mark.shape === '◆' ? colours.rust : outstanding ? colours.ochre : colours.petrol;
          return {
            value: Number(point.meanM2.toPrecision(6)),
            symbol: SYMBOLS[mark.shape as keyof typeof SYMBOLS],
            symbolSize: outstanding ? 13 : 9,
            itemStyle: { color: colour },
            label: {
              show: outstanding,
              position: 'top',
              color: colour,
              formatter: mark.shape === '◆' ? $localize`drift` : $localize`warning`,
            },
          };
        }),
      },
    ],
  };
}

/** The figures behind the chart. */
export function controlChartTable(chart: ControlChart, labelOf: LabelOf, format: QuantityFormat): ChartTable {
  const centre = chart.scatter?.centreM2 ?? NaN;
  return {
    columns: [
      $localize`Session`,
      $localize`Day`,
      $localize`Mean in m²`,
      $localize`Readings`,
      $localize`Warning limits in m²`,
      $localize`Action limits in m²`,
      $localize`Deviations from the centre`,
      $localize`Sets the limits`,
      $localize`Says`,
    ],
    rows: chart.points.map((point) => {
      const { name, date } = labelOf(point);
      const { limits } = point;
      const band = (deviations: number): string =>
        limits === undefined
          ? '–'
          : $localize`${areaFigure(format, centre - deviations * limits.deviationM2)}:FROM: to ${areaFigure(format, centre + deviations * limits.deviationM2)}:TO:`;
      const mark = markOf(point);
      return [
        name,
        date,
        areaFigure(format, point.meanM2),
        String(point.readings),
        band(WARNING_LIMIT),
        band(ACTION_LIMIT),
        limits === undefined || !Number.isFinite(limits.distance)
          ? '–'
          : format.value(limits.distance, 'number', { digits: 1, signed: true }),
        point.setsLimits ? $localize`yes` : $localize`no`,
        `${mark.shape} ${mark.words}`,
      ];
    }),
  };
}
