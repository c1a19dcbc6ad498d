import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import type { JudgementChange } from '#shared/contracts/proposals';
import { formatForInput } from '../../../core/numbers/format-number';
import { Preferences } from '../../../core/preferences/preferences';
import type { RankingSources } from '../../../data/rankings/rankings-api';
import { TRIED_LIMITS } from '../../../ui/words/change-words';
import { typedValue } from './typed-value';

/** Another limit of the organisation, or the friction line of the programme. */
@Component({
  selector: 'wl-try-limits',
  template: `
    <label>
      <span class="label" i18n>Limit</span>
      <select #which class="wl-input" (change)="choose(which.value)">
        @for (each of limits; track each.limit) {
          <option [value]="each.limit" [selected]="each.limit === chosen().limit">
            {{ each.words }}{{ each.unit && ', ' + each.unit }}
          </option>
        }
      </select>
    </label>
    <label>
      <span class="label" i18n>Value</span>
      <input
        #value
        class="wl-input figure"
        inputmode="decimal"
        [value]="shown()"
        [attr.aria-invalid]="refused()"
        [attr.aria-describedby]="refused() ? 'tried-limit-mistake' : null"
        (input)="text.set(value.value)"
      />
    </label>
    @if (refused()) {
      <p id="tried-limit-mistake" class="wl-rust" role="alert" i18n>
        A number within what this limit can be, please.
      </p>
    }
    <span class="wl-actions">
      <button type="button" class="wl-button" [disabled]="text() === null" (click)="emit()" i18n>
        Try this limit
      </button>
      <button type="button" class="wl-button" (click)="switchLine()">
        @if (lineOn()) {
          <ng-container i18n>Try without the friction line</ng-container>
        } @else {
          <ng-container i18n>Try with the friction line</ng-container>
        }
      </button>
    </span>
  `,
  styleUrl: './try-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TryLimits {
  readonly sources = input.required<RankingSources>();
  readonly tried = output<JudgementChange>();

  private readonly preferences = inject(Preferences);
  protected readonly limits = TRIED_LIMITS;
  private readonly name = signal<string>(TRIED_LIMITS[0].limit);
  protected readonly chosen = computed(
    () => TRIED_LIMITS.find(({ limit }) => limit === this.name()) ?? TRIED_LIMITS[0],
  );
  /** Null: nothing typed yet, the held value is shown. */
  protected readonly text = signal<string | null>(null);
  protected readonly refused = signal(false);
  private readonly policies = computed(() => this.sources().inputs.programme.policies);
  protected readonly lineOn = computed(() => this.policies()?.frictionLine === 'on');
  protected readonly shown = computed(() => {
    const { limit, factor } = this.chosen();
    const held = this.policies()?.[limit];
    const typed = this.text();
    if (typed !== null || held == null) return typed ?? '';
    return formatForInput(Number((held * factor).toPrecision(12)), this.preferences.numberLocale());
  });

  protected choose(limit: string): void {
    this.name.set(limit);
    this.text.set(null);
    this.refused.set(false);
  }

  protected emit(): void {
    const { limit, factor } = this.chosen();
    // Every limit that can be tried is a fraction of one but the Reynolds number, which is typed in millions.
    const maximum = limit === 'minimumReynolds' ? 100 : factor;
    const minimum = limit === 'frictionShare' || limit === 'frictionShareU' ? 0 : 1e-6;
    const value = typedValue(this.text() ?? '', { minimum, maximum });
    this.refused.set(typeof value !== 'number');
    if (typeof value !== 'number') return;
    this.tried.emit({ kind: 'policies', values: { [limit]: value / factor } });
    this.text.set(null);
  }

  protected switchLine(): void {
    this.tried.emit({ kind: 'friction-line', frictionLine: this.lineOn() ? 'off' : 'on' });
  }
}
