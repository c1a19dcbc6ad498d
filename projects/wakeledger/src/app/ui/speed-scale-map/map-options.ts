import type { EChartsCoreOption } from 'echarts/core';
import { KMH_PER_MS } from '#shared/core/constants';
import type { QuantityFormat } from '../quantity/quantity-format';
import { regionOf, SMALLEST_SCALE, type MapPoint, type SpeedScaleModel } from './map-region';

type Pair = readonly [number, number];
type Curve = (scale: number) => number;

/**
 * The theme gives its inks to names in the order in which they first come: petrol, ochre, plum, moss, rust, edge. Every name
 * is always there, also without a line, so that each keeps its ink.
 */
const INK_NAMES = {
  here: 'here',
  caution: 'caution',
  accepted: 'accepted',
  wanted: 'wanted',
  limit: 'limit',
  ground: 'ground',
} as const;
type Ink = keyof typeof INK_NAMES;

const STEPS = 90;
const SCALES = Array.from(
  { length: STEPS + 1 },
  (_, i) => SMALLEST_SCALE + ((1 - SMALLEST_SCALE) * i) / STEPS,
);

/** The highest speed that the map shows [km/h]: the limits with room above them, and the speed that is needed. */
export function mapHeightKmh({ limits, neededKmh, working }: SpeedScaleModel): number {
  const limitKmh = limits.machLimitMs * KMH_PER_MS;
  const highest = Math.max(
    1.25 * limitKmh,
    1.1 * working.speedKmh,
    1.1 * Math.min(neededKmh, 2.2 * limitKmh),
  );
  return Math.ceil(highest / 100) * 100;
}

/** Speed against scale with every limit drawn in and named at its line, the region that keeps them all shaded. */
export function mapOptions(model: SpeedScaleModel, format: QuantityFormat): EChartsCoreOption {
  const { limits, working, neededKmh } = model;
  const { factor, unit } = format.display('speed');
  const height = mapHeightKmh(model) * factor;
  const kmh = (speedMs: number): number => speedMs * KMH_PER_MS * factor;
  const million = (reynolds: number): string =>
    format.value(reynolds / 1e6, 'number', { digits: reynolds < 1e7 ? 1 : 0 });
  const mach = (value: number): string => format.value(value, 'number', { digits: 2 });
  const slices = regionOf(model);
  const curve = (ink: Ink, at: Curve | null, dash: string, label: string, share: number) =>
    at === null ? [] : [line(ink, at, dash, kmh), named(ink, at, label, share * height, kmh)];

  return {
    grid: { left: 62, right: 20, top: 16, bottom: 46 },
    xAxis: {
      type: 'value',
      name: $localize`Scale (model length over full length)`,
      nameLocation: 'middle',
      nameGap: 28,
      min: 0,
      max: 1,
      axisLabel: { formatter: (value: number) => format.value(value, 'number', { digits: 1 }) },
    },
    yAxis: {
      type: 'value',
      name: $localize`Speed in ${unit}:UNIT:`,
      nameLocation: 'middle',
      nameGap: 44,
      min: 0,
      max: height,
    },
    series: [
      // Named once each, in the order of the inks.
      ...Object.values(INK_NAMES).map((name) => ({ type: 'line', name, data: [], silent: true })),
      ...region(
        slices.map(({ scale, lowestKmh, highestKmh }) => [scale, lowestKmh * factor, highestKmh * factor]),
      ),
      ...level(
        'limit',
        limits.machLimitMs,
        $localize`Mach ${mach(model.machLimit)}:MACH:, limit`,
        'solid',
        kmh,
      ),
      ...level(
        'caution',
        limits.machCautionMs,
        $localize`Mach ${mach(model.machCaution)}:MACH:, caution`,
        'dashed',
        kmh,
      ),
      ...(limits.facilityMaximumMs === null
        ? []
        : level('ground', limits.facilityMaximumMs, $localize`the facility’s highest speed`, 'solid', kmh)),
      ...upright('limit', limits.blockageExcludedScale, $localize`blockage, limit`, 'solid', height),
      ...(limits.blockageCautionScale === null
        ? []
        : upright('caution', limits.blockageCautionScale, $localize`blockage, caution`, 'dashed', height)),
      ...curve(
        'wanted',
        limits.targetReynolds,
        'solid',
        $localize`Re ${million(model.targetReynolds)}:RE: million, target`,
        0.93,
      ),
      ...curve(
        'accepted',
        limits.acceptedReynolds,
        'solid',
        $localize`Re ${million(model.acceptedReynolds ?? 0)}:RE: million, accepted`,
        0.84,
      ),
      ...curve(
        'limit',
        limits.balanceRange,
        'dotted',
        $localize`force balance, ${format.text(model.balanceN ?? 0, 'force', { digits: 0 })}:FORCE:`,
        0.74,
      ),
      ...curve(
        'ground',
        limits.minimumReynolds,
        'dashed',
        $localize`Re ${million(model.minimumReynolds)}:RE: million, minimum`,
        0.64,
      ),
      point(
        'wanted',
        { scale: working.scale, speedKmh: neededKmh * factor },
        'emptyDiamond',
        'left',
        $localize`needed`,
      ),
      point(
        'here',
        { scale: working.scale, speedKmh: working.speedKmh * factor },
        'circle',
        'right',
        $localize`here`,
      ),
    ],
  };
}

function line(ink: Ink, at: Curve, type: string, kmh: (speedMs: number) => number) {
  return {
    type: 'line',
    name: INK_NAMES[ink],
    silent: true,
    symbol: 'none',
    lineStyle: { type, width: 1.5 },
    data: SCALES.map((scale): Pair => [scale, kmh(at(scale))]),
  };
}

/** A name at the place where its curve, which falls with the scale, passes a height; kept inside the map. */
function named(ink: Ink, at: Curve, words: string, height: number, kmh: (speedMs: number) => number) {
  const scale = Math.min(0.72, Math.max(SMALLEST_SCALE, kmh(at(1)) / height));
  return label(ink, [scale, Math.min(height, kmh(at(scale)))], words, { position: 'right', distance: 6 });
}

/** A name by itself, above all lines. */
function label(ink: Ink, at: Pair, words: string, placing: Readonly<Record<string, unknown>>) {
  return {
    type: 'scatter',
    name: INK_NAMES[ink],
    silent: true,
    z: 4,
    symbolSize: 1,
    data: [at],
    label: { show: true, formatter: words, ...placing },
  };
}

/** A level line, named above its right end. */
function level(ink: Ink, speedMs: number, words: string, type: string, kmh: (speedMs: number) => number) {
  const speed = kmh(speedMs);
  return [
    {
      type: 'line',
      name: INK_NAMES[ink],
      silent: true,
      symbol: 'none',
      lineStyle: { type, width: 1.5 },
      data: [
        [0, speed],
        [1, speed],
      ],
    },
    label(ink, [1, speed], words, { position: 'top', align: 'right', distance: 1 }),
  ];
}

/** An upright line, named along its foot; nothing where it lies beyond the map. */
function upright(ink: Ink, scale: number, words: string, type: string, height: number) {
  if (scale > 1) return [];
  return [
    {
      type: 'line',
      name: INK_NAMES[ink],
      silent: true,
      symbol: 'none',
      lineStyle: { type, width: 1.5 },
      data: [
        [scale, 0],
        [scale, height],
      ],
    },
    label(ink, [scale, 0], words, {
      position: 'inside',
      rotate: 90,
      align: 'left',
      verticalAlign: 'bottom',
      offset: [-3, -5],
    }),
  ];
}

/** The shaded region: what lies under it is drawn without ink, the rest stands on it. */
function region(slices: readonly (readonly [number, number, number])[]) {
  const drawn = { type: 'line', name: INK_NAMES.wanted, silent: true, symbol: 'none', stack: 'region' };
  return [
    { ...drawn, lineStyle: { opacity: 0 }, data: slices.map(([scale, lowest]): Pair => [scale, lowest]) },
    {
      ...drawn,
      lineStyle: { opacity: 0 },
      areaStyle: { opacity: 0.16 },
      data: slices.map(([scale, lowest, highest]): Pair => [scale, highest - lowest]),
    },
  ];
}

function point(
  ink: Ink,
  { scale, speedKmh }: MapPoint,
  symbol: string,
  position: 'left' | 'right',
  words: string,
) {
  return {
    type: 'scatter',
    name: INK_NAMES[ink],
    silent: true,
    z: 5,
    symbol,
    symbolSize: 13,
    data: [[scale, speedKmh]],
    label: { show: true, formatter: words, position, distance: 5, fontWeight: 600 },
  };
}
