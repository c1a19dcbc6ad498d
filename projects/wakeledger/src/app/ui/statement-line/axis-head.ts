import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { formatNumber } from '../../core/numbers/format-number';
import { Preferences } from '../../core/preferences/preferences';
import { type DragAxis, alongAxis } from './drag-axis';

/** The shared axis above the rows: its ticks in figures, and what it measures. */
@Component({
  selector: 'wl-axis-head',
  template: `
    <span class="what"><ng-container i18n>C<sub>D</sub>·A in m²</ng-container></span>
    <span class="ticks" aria-hidden="true">
      @for (tick of ticks(); track tick.text) {
        <span class="tick" [style.left.%]="tick.at">{{ tick.text }}</span>
      }
    </span>
  `,
  styles: `
    :host {
      display: block;
      min-width: 120px;
      font-size: var(--wl-small);
      font-weight: 400;
    }
    .what {
      display: block;
      text-align: right;
    }
    .ticks {
      position: relative;
      display: block;
      height: 1.4em;
    }
    .tick {
      position: absolute;
      transform: translateX(-50%);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AxisHead {
  readonly axis = input.required<DragAxis>();

  private readonly preferences = inject(Preferences);

  protected readonly ticks = computed(() => {
    const axis = this.axis();
    return axis.ticks.map((tick) => ({
      text: formatNumber(tick, axis.digits, this.preferences.numberLocale()),
      at: alongAxis(tick, axis),
    }));
  });
}
