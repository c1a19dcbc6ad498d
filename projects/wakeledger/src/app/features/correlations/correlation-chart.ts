import type { EChartsCoreOption } from 'echarts/core';
import type { ColourValues } from '../../../theme/token-values';
import type { ChartTable } from '../../ui/chart/chart';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import { bandAt, type FittedPairs } from './fitted-pairs';

type Fitted = Extract<FittedPairs, { kind: 'fitted' }>;
type Inks = Pick<ColourValues, 'ink' | 'petrol' | 'ochre' | 'plum' | 'edge'>;
type Point = readonly [number | string, number | string];

export interface AxisNames {
  readonly x: string;
  readonly y: string;
}

/** Steps from one end of the validity range to the other at which the band is drawn. */
const STEPS = 24;
/** Half the length of an error bar in standard uncertainties. */
const BAR = 2;

const plain = (value: number): number => Number(value.toPrecision(7));
const BREAK: Point = ['-', '-'];

/** One line that leaves the paper between its strokes: an error bar in each direction for every pair. */
function errorBars({ used }: Fitted): readonly Point[] {
  return used.flatMap(({ pair: { dragAreaM2: x, uM2, referenceDragAreaM2: y, referenceUM2 } }): Point[] => [
    [plain(x - BAR * uM2), plain(y)],
    [plain(x + BAR * uM2), plain(y)],
    BREAK,
    [plain(x), plain(y - BAR * referenceUM2)],
    [plain(x), plain(y + BAR * referenceUM2)],
    BREAK,
  ]);
}

/** Both facilities' figures of each pair with error bars, the line, its 95 % band and where it holds. */
export function correlationOptions(
  fitted: Fitted,
  names: AxisNames,
  format: QuantityFormat,
  inks: Inks,
): EChartsCoreOption {
  const { fit, used, leftOut } = fitted;
  const span = fit.validToM2 - fit.validFromM2;
  const xs = Array.from({ length: STEPS + 1 }, (_step, i) => fit.validFromM2 + (span * i) / STEPS);
  const band = xs.map((x) => ({ x: plain(x), ...bandAt(fit, x) }));
  const edge = (sign: number): readonly Point[] =>
    band.map(({ x, yM2, halfWidthM2 }) => [x, plain(yM2 + sign * halfWidthM2)]);
  const dashed = { width: 1, type: 'dashed', color: inks.petrol } as const;
  const axis = (name: string) => ({
    type: 'value',
    scale: true,
    name,
    nameLocation: 'middle',
    axisLabel: { formatter: (value: number) => format.value(value, 'drag-area', { digits: 3 }) },
  });
  return {
    grid: { left: 76, right: 40, top: 28, bottom: 56 },
    tooltip: { trigger: 'item' },
    xAxis: { ...axis(names.x), nameGap: 34 },
    yAxis: { ...axis(names.y), nameGap: 56 },
    series: [
      {
        type: 'line',
        name: $localize`95 % of carried figures`,
        symbol: 'none',
        silent: true,
        lineStyle: dashed,
        data: edge(1),
        endLabel: { show: true, formatter: '95 %', color: inks.petrol, fontSize: 12 },
      },
      { type: 'line', symbol: 'none', silent: true, lineStyle: dashed, data: edge(-1) },
      {
        type: 'line',
        name: $localize`The correlation`,
        symbol: 'none',
        silent: true,
        lineStyle: { width: 2, color: inks.petrol },
        data: band.map(({ x, yM2 }): Point => [x, plain(yM2)]),
        markLine: {
          symbol: 'none',
          silent: true,
          lineStyle: { color: inks.edge, type: 'dotted' },
          label: { color: inks.ink, fontSize: 12, position: 'end' },
          data: [
            { xAxis: plain(fit.validFromM2), label: { formatter: $localize`holds from` } },
            { xAxis: plain(fit.validToM2), label: { formatter: $localize`to` } },
          ],
        },
      },
      {
        type: 'line',
        name: $localize`Two standard uncertainties`,
        symbol: 'none',
        silent: true,
        lineStyle: { width: 1, color: inks.ink },
        data: errorBars(fitted),
      },
      {
        type: 'scatter',
        name: $localize`Pair`,
        symbolSize: 9,
        itemStyle: { color: inks.ink },
        data: used.map(({ pair }) => ({
          name: pair.geometry,
          value: [plain(pair.dragAreaM2), plain(pair.referenceDragAreaM2)],
        })),
      },
      {
        type: 'scatter',
        name: $localize`Left out`,
        symbol: 'emptyDiamond',
        symbolSize: 12,
        itemStyle: { color: inks.ochre },
        label: { show: true, position: 'right', color: inks.ochre, formatter: $localize`left out` },
        data: leftOut.map((pair) => ({
          name: pair.geometry,
          value: [plain(pair.dragAreaM2), plain(pair.referenceDragAreaM2)],
        })),
      },
    ],
  };
}

/** Residuals over the first facility's figure, each with Cook's distance where it stands out. */
export function residualOptions(
  { used }: Fitted,
  names: AxisNames,
  format: QuantityFormat,
  inks: Inks,
  standsOut: (cooksDistance: number | null) => boolean,
): EChartsCoreOption {
  const axisLabel = { formatter: (value: number) => format.value(value, 'drag-area', { digits: 4 }) };
  return {
    grid: { left: 84, right: 56, top: 36, bottom: 56 },
    tooltip: { trigger: 'item' },
    xAxis: {
      type: 'value',
      scale: true,
      name: names.x,
      nameLocation: 'middle',
      nameGap: 34,
      axisLabel: { formatter: (value: number) => format.value(value, 'drag-area', { digits: 3 }) },
    },
    yAxis: {
      type: 'value',
      name: $localize`Measured less carried, in m²`,
      nameLocation: 'middle',
      nameGap: 64,
      axisLabel,
    },
    series: [
      {
        type: 'scatter',
        name: $localize`Residual`,
        data: used.map(({ pair, influence }) => {
          const outstanding = standsOut(influence.cooksDistance);
          return {
            name: pair.geometry,
            value: [plain(pair.dragAreaM2), plain(influence.residualM2)],
            symbol: outstanding ? 'triangle' : 'circle',
            symbolSize: outstanding ? 14 : 9,
            itemStyle: { color: outstanding ? inks.ochre : inks.ink },
            label: {
              show: outstanding,
              position: 'top',
              color: inks.ochre,
              formatter: pair.geometry,
            },
          };
        }),
        markLine: {
          symbol: 'none',
          silent: true,
          lineStyle: { color: inks.petrol, type: 'solid' },
          label: { show: false },
          data: [{ yAxis: 0 }],
        },
      },
    ],
  };
}

/** The figures behind the first chart. */
export function correlationTable(
  { fit, used }: Fitted,
  names: AxisNames,
  format: QuantityFormat,
): ChartTable {
  const area = (value: number): string => format.value(value, 'drag-area', { digits: 4 });
  return {
    columns: [
      $localize`Geometry`,
      names.x,
      $localize`its u`,
      names.y,
      $localize`its u`,
      $localize`carried, in m²`,
      $localize`95 % of carried figures, ± m²`,
    ],
    rows: used.map(({ pair }) => {
      const { yM2, halfWidthM2 } = bandAt(fit, pair.dragAreaM2);
      return [
        pair.geometry,
        area(pair.dragAreaM2),
        area(pair.uM2),
        area(pair.referenceDragAreaM2),
        area(pair.referenceUM2),
        area(yM2),
        area(halfWidthM2),
      ];
    }),
  };
}

/** The figures behind the second chart: what each pair does to the line. */
export function influenceTable({ used }: Fitted, format: QuantityFormat): ChartTable {
  const area = (value: number): string => format.value(value, 'drag-area', { digits: 4, signed: true });
  const number = (value: number | null, digits = 2): string =>
    value === null ? '–' : format.value(value, 'number', { digits });
  return {
    columns: [
      $localize`Geometry`,
      $localize`Residual, in m²`,
      $localize`Standardised`,
      $localize`Leverage`,
      $localize`Cook’s distance`,
      $localize`Without it, slope`,
      $localize`Without it, level in m²`,
      $localize`Without it, at most in m²`,
    ],
    rows: used.map(({ pair, influence }) => {
      const { without } = influence;
      const changes =
        'refusal' in without
          ? [$localize`no line is left`, '–', '–']
          : [
              `${format.value(without.slopeChange, 'number', { digits: 3, signed: true })}${without.becomesOffset ? $localize` (an offset is left)` : ''}`,
              area(without.levelChangeM2),
              $localize`${area(without.largestChangeM2)}:CHANGE: at ${format.value(without.largestChangeAtM2, 'drag-area', { digits: 3 })}:AT:`,
            ];
      return [
        pair.geometry,
        area(influence.residualM2),
        number(influence.standardisedResidual),
        number(influence.leverage),
        number(influence.cooksDistance),
        ...changes,
      ];
    }),
  };
}
