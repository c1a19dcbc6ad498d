import type { EChartsCoreOption } from 'echarts/core';
import type { ColourValues } from '../../../../theme/token-values';
import type { SweepView } from './sweep-view';

/** Words and number marks of the chart, so that what is drawn stays a pure function of the figures. */
export interface SweepChartWords {
  readonly reynoldsAxis: string;
  readonly dragAreaAxis: string;
  readonly points: string;
  readonly fit: string;
  readonly reference: string;
  readonly lowest: string;
  readonly minimum: string;
  readonly tolerance: string;
  readonly reynolds: (value: number) => string;
}

/** 1, 2 and 5 of each decade within a range: where the logarithmic axis carries its labels. */
export function decadeTicks(from: number, to: number): readonly number[] {
  const ticks: number[] = [];
  for (let decade = Math.floor(Math.log10(from)); decade <= Math.ceil(Math.log10(to)); decade += 1) {
    for (const leading of [1, 2, 5]) {
      const tick = leading * 10 ** decade;
      if (tick >= from && tick <= to) ticks.push(tick);
    }
  }
  return ticks;
}

const log = (reynolds: number): number => Math.log10(reynolds);
const rounded = (value: number): number => Number(value.toPrecision(7));

/** C_D·A against Re on a logarithmic axis: points, fit with its band, reference, tolerance and lowest acceptable Re. */
export function sweepChartOptions(
  view: SweepView,
  words: SweepChartWords,
  inks: ColourValues,
): EChartsCoreOption {
  const { outcome, curve, points, referenceReynolds, toleranceM2, minimumReynolds } = view;
  const from = curve[0]?.reynolds ?? referenceReynolds / 2;
  const to = curve.at(-1)?.reynolds ?? referenceReynolds;
  const ticks = decadeTicks(from, to).map(log);
  const at = outcome.predictionAtReferenceM2;
  const vertical = (reynolds: number, name: string, ink: string, type: 'solid' | 'dashed' | 'dotted') =>
    reynolds < from || reynolds > to
      ? []
      : [
          {
            xAxis: log(reynolds),
            name,
            lineStyle: { color: ink, type, width: 1.5 },
            label: { formatter: name, color: ink, rotate: 90, position: 'insideEndTop' as const },
          },
        ];
  const band = curve.map(({ reynolds, dragAreaM2, expandedUncertaintyM2: u }) => ({
    x: log(reynolds),
    low: rounded(dragAreaM2 - u),
    width: rounded(2 * u),
  }));
  const quiet = { symbol: 'none', silent: true, tooltip: { show: false } };
  return {
    grid: { left: 68, right: 28, top: 24, bottom: 52 },
    tooltip: { trigger: 'item' },
    xAxis: {
      type: 'value',
      name: words.reynoldsAxis,
      nameLocation: 'middle',
      nameGap: 32,
      min: log(from),
      max: log(to),
      axisTick: { show: true, customValues: ticks },
      axisLabel: { customValues: ticks, formatter: (value: number) => words.reynolds(10 ** value) },
      splitLine: { show: false },
    },
    yAxis: {
      type: 'value',
      name: words.dragAreaAxis,
      nameLocation: 'middle',
      nameGap: 52,
      scale: true,
    },
    series: [
      {
        ...quiet,
        type: 'line',
        stack: 'band',
        lineStyle: { opacity: 0 },
        data: band.map(({ x, low }) => [x, low]),
      },
      {
        ...quiet,
        type: 'line',
        stack: 'band',
        lineStyle: { opacity: 0 },
        areaStyle: { color: inks.band, opacity: 0.6 },
        data: band.map(({ x, width }) => [x, width]),
      },
      {
        ...quiet,
        type: 'line',
        name: words.fit,
        lineStyle: { color: inks.petrol, width: 2 },
        data: curve.map(({ reynolds, dragAreaM2 }) => [log(reynolds), rounded(dragAreaM2)]),
        markArea: {
          silent: true,
          itemStyle: { color: inks.moss, opacity: 0.14 },
          label: { show: true, color: inks.moss, position: 'insideTopLeft' },
          data: [[{ yAxis: at - toleranceM2, name: words.tolerance }, { yAxis: at + toleranceM2 }]],
        },
        markLine: {
          silent: true,
          symbol: 'none',
          data: [
            ...vertical(referenceReynolds, words.reference, inks.ink, 'solid'),
            ...vertical(outcome.lowestReynoldsWithinTolerance, words.lowest, inks.moss, 'dashed'),
            ...vertical(minimumReynolds, words.minimum, inks.ochre, 'dotted'),
          ],
        },
      },
      {
        type: 'scatter',
        name: words.points,
        symbol: 'circle',
        symbolSize: 9,
        itemStyle: { color: inks.petrol },
        data: points.map(({ reynolds, dragAreaM2 }) => [log(reynolds), rounded(dragAreaM2)]),
        tooltip: {
          formatter: ({ value }: { value: readonly [number, number] }) =>
            `Re ${words.reynolds(10 ** value[0])}\n${words.dragAreaAxis}: ${value[1]}`,
        },
      },
    ],
  };
}
