import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { KMH_PER_MS } from '#shared/core/constants';
import { Chart, type ChartTable } from '../chart/chart';
import { QuantityFormat } from '../quantity/quantity-format';
import { mapHeightKmh, mapOptions } from './map-options';
import {
  blockageAt,
  highestKmhAt,
  keepsEveryLimit,
  lowestKmhAt,
  regionOf,
  SMALLEST_SCALE,
  type MapPoint,
  type SpeedScaleModel,
} from './map-region';

const TABLE_SCALES = [0.1, 0.15, 0.2, 0.25, 0.3, 0.35, 0.4, 0.5, 0.6, 0.75, 1];
const SCALE_STEP = 0.005;
const SPEED_STEP_KMH = 1;

/**
 * A map of speed against scale: what limits a test in one facility, and the region in which it can be run. The point at which it
 * is to be run is moved with the two sliders, by keyboard or by pointer.
 */
@Component({
  selector: 'wl-speed-scale-map',
  imports: [Chart],
  templateUrl: './speed-scale-map.html',
  styleUrl: './speed-scale-map.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SpeedScaleMap {
  readonly model = input.required<SpeedScaleModel>();
  /** Off where somebody may look, but not plan. */
  readonly movable = input(true);
  readonly moved = output<Partial<MapPoint>>();

  private readonly format = inject(QuantityFormat);
  protected readonly scaleStep = SCALE_STEP;
  protected readonly smallest = SMALLEST_SCALE;
  protected readonly speedStep = SPEED_STEP_KMH;
  protected readonly caption = $localize`Speed against scale, with what limits the test`;

  protected readonly options = computed(() => mapOptions(this.model(), this.format));
  protected readonly highest = computed(() => mapHeightKmh(this.model()));
  protected readonly scaleWords = computed(() => this.scale(this.model().working.scale));
  protected readonly speedWords = computed(() => this.speed(this.model().working.speedKmh));
  protected readonly verdict = computed(() => {
    const model = this.model();
    const at = $localize`At scale ${this.scaleWords()}:SCALE: and ${this.speedWords()}:SPEED:`;
    return keepsEveryLimit(model, model.working)
      ? { kept: true, words: $localize`${at}:AT: every limit is kept.` }
      : { kept: false, words: $localize`${at}:AT: not every limit is kept.` };
  });
  protected readonly regionWords = computed(() => {
    const slices = regionOf(this.model());
    const [first, last] = [slices[0], slices.at(-1)];
    if (!first || !last) {
      return $localize`Nowhere on this map are all limits kept: no scale and speed reach what is wanted here.`;
    }
    return $localize`Shaded: every limit is kept, from scale ${this.scale(first.scale)}:FROM: at ${this.speed(first.highestKmh)}:SPEED: to scale ${this.scale(last.scale)}:TO: between ${this.speed(last.lowestKmh)}:LOWEST: and ${this.speed(last.highestKmh)}:HIGHEST:.`;
  });

  protected readonly table = computed<ChartTable>(() => {
    const model = this.model();
    const { limits, working } = model;
    const scales = [...new Set([...TABLE_SCALES, working.scale])].sort((one, other) => one - other);
    const accepted = limits.acceptedReynolds;
    const balance = limits.balanceRange;
    return {
      columns: [
        $localize`Scale`,
        $localize`Speed for the target`,
        ...(accepted ? [$localize`Speed for what is accepted`] : []),
        $localize`Speed for the minimum Reynolds number`,
        ...(balance ? [$localize`Speed at the balance’s range`] : []),
        $localize`Highest speed allowed`,
        $localize`Blockage`,
        $localize`Can it be run?`,
      ],
      rows: scales.map((scale) => {
        const ms = (at: (scale: number) => number) => this.speed(at(scale) * KMH_PER_MS);
        const highestKmh = highestKmhAt(model, scale);
        const can =
          lowestKmhAt(model, scale) <= highestKmh && keepsEveryLimit(model, { scale, speedKmh: highestKmh });
        return [
          this.scale(scale),
          ms(limits.targetReynolds),
          ...(accepted ? [ms(accepted)] : []),
          ms(limits.minimumReynolds),
          ...(balance ? [ms(balance)] : []),
          this.speed(highestKmh),
          this.format.text(100 * blockageAt(model, scale), 'percent', { digits: 1 }),
          can ? $localize`yes` : $localize`no`,
        ];
      }),
    };
  });

  protected moveScale(value: string): void {
    this.moved.emit({ scale: Number(value) });
  }

  protected moveSpeed(value: string): void {
    this.moved.emit({ speedKmh: Number(value) });
  }

  private scale(value: number): string {
    return this.format.value(value, 'number', { digits: 3 });
  }

  private speed(kmh: number): string {
    return this.format.text(kmh, 'speed', { digits: 0 });
  }
}
