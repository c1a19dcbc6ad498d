import type { CycleCaution, OwnCycle } from '#shared/core/cycles/own-cycle';
import type { CycleTotals } from '../../db/tables/cycles';

const rounded = (value: number): string => `${Number(value.toPrecision(3))}`.replace('-', '−');

/** What looks wrong in a trace, in words that name the line of the file. */
export function cautionWords(caution: CycleCaution, lines: readonly number[]): string {
  const line = lines[caution.row - 1] ?? caution.row;
  const more = caution.count > 1 ? ` and in ${caution.count - 1} more` : '';
  const extreme = rounded(caution.extreme);
  switch (caution.code) {
    case 'implausible-acceleration':
      return `Line ${line}${more}: the speed changes by up to ${extreme} m/s each second, more than a road car can. Check the units and missing rows.`;
    case 'implausible-speed':
      return `Line ${line}${more}: up to ${extreme} km/h. Check the unit of the speed.`;
    case 'time-gap':
      return `Line ${line}${more}: up to ${extreme} s between two rows; what the car did meanwhile is not counted.`;
    case 'starts-moving':
      return `The trace begins at ${extreme} km/h: the energy to get there is not counted.`;
    case 'ends-moving':
      return `The trace ends at ${extreme} km/h: what is left in the moving car is not counted.`;
  }
}

export function totalsOf({ totals, cautions }: OwnCycle, lines: readonly number[]): CycleTotals {
  return {
    durationS: totals.durationS,
    distanceM: totals.distanceM,
    maximumSpeedKmh: totals.maximumSpeedKmh,
    meanSpeedKmh: totals.meanSpeedKmh,
    maximumAccelerationMs2: totals.maximumAccelerationMs2,
    cautions: cautions.map((caution) => cautionWords(caution, lines)),
  };
}
