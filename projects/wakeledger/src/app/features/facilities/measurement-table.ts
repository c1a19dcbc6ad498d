import {
  ChangeDetectionStrategy,
  Component,
  Injector,
  LOCALE_ID,
  computed,
  inject,
  input,
  output,
  runInInjectionContext,
} from '@angular/core';
import { formatDate } from '@angular/common';
import type { CheckMeasurement, TestSession } from '#shared/contracts/test-sessions';
import { askInDialog } from '../../ui/confirm-dialog/confirm-dialog';
import { QuantityFormat } from '../../ui/quantity/quantity-format';

export interface Striking {
  readonly measurement: CheckMeasurement;
  readonly reason: string;
}

/** Every measurement of the check body, newest first; what was struck out stays, with its reason. */
@Component({
  selector: 'wl-measurement-table',
  templateUrl: './measurement-table.html',
  styles: `
    .struck :is(.day, .value, .wl-figure) {
      text-decoration: line-through;
    }
    .small {
      font-size: var(--wl-small);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MeasurementTable {
  readonly measurements = input.required<readonly CheckMeasurement[]>();
  readonly sessions = input.required<readonly TestSession[]>();
  readonly mayEdit = input(false);
  readonly struck = output<Striking>();

  private readonly injector = inject(Injector);
  private readonly format = inject(QuantityFormat);
  private readonly locale = inject(LOCALE_ID);

  protected readonly rows = computed(() => {
    const names = new Map(this.sessions().map(({ id, name }) => [id, name]));
    return this.measurements()
      .toReversed()
      .map((measurement) => {
        const { testSessionId, measuredOn, dragAreaM2, s, n } = measurement;
        const day = formatDate(measuredOn, 'd MMM y', this.locale);
        const session = names.get(testSessionId) ?? '';
        return {
          measurement,
          day,
          session,
          value: this.format.value(dragAreaM2, 'drag-area', { digits: 5 }),
          s: s === undefined ? '–' : this.format.value(s, 'drag-area', { digits: 5 }),
          n: n === undefined ? '–' : String(n),
          strike: $localize`Strike out ${session}:SESSION:, ${day}:DAY:`,
        };
      });
  });

  protected async strike(measurement: CheckMeasurement): Promise<void> {
    const reason = await runInInjectionContext(this.injector, () =>
      askInDialog({
        title: $localize`Strike out this measurement?`,
        detail: $localize`It stays readable with your reason and counts for nothing. It cannot be brought back; enter it anew if it was right.`,
        reasonLabel: $localize`Why it does not count`,
        confirm: $localize`Strike out`,
        cancel: $localize`Keep it`,
        severe: true,
      }),
    );
    if (reason) this.struck.emit({ measurement, reason });
  }
}
