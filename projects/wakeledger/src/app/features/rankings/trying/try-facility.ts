import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import { BLOCKAGE_METHODS } from '#shared/contracts/facilities';
import type { JudgementChange } from '#shared/contracts/proposals';
import type { FacilityInput } from '#shared/core/ranking/ranking-input';
import { formatForInput } from '../../../core/numbers/format-number';
import { Preferences } from '../../../core/preferences/preferences';
import type { RankingSources } from '../../../data/rankings/rankings-api';
import { BLOCKAGE_METHOD_WORDS, type BlockageMethodName } from '../../../ui/words/evidence-words';
import { facilityChange, type TypedCorrections } from './facility-change';

/** Another correction for blockage, or other uncertainties, of one facility. */
@Component({
  selector: 'wl-try-facility',
  template: `
    <label>
      <span class="label" i18n>Facility</span>
      <select #which class="wl-input" [value]="chosen()" (change)="choose(which.value)">
        <option value="" i18n>Choose a facility</option>
        @for (facility of sources().inputs.facilities; track facility.id) {
          <option [value]="facility.id" [selected]="facility.id === chosen()">{{ facility.name }}</option>
        }
      </select>
    </label>
    @if (facility(); as held) {
      @if (held.blockage) {
        <label>
          <span class="label" i18n>Blockage is corrected by</span>
          <select #method class="wl-input" (change)="type({ method: asMethod(method.value) })">
            @for (each of methods; track each.method) {
              <option [value]="each.method" [selected]="each.method === typed().method">
                {{ each.words }}
              </option>
            }
          </select>
        </label>
        @if (typed().method === 'maskell' || typed().method === 'factor') {
          <label>
            <span class="label">
              @if (typed().method === 'maskell') {
                <ng-container i18n>θ of this facility</ng-container>
              } @else {
                <ng-container i18n>The facility’s factor q_c/q</ng-container>
              }
            </span>
            <input
              #amount
              class="wl-input figure"
              inputmode="decimal"
              [value]="typed().amount"
              (input)="type({ amount: amount.value })"
            />
          </label>
        }
      }
      <label>
        <span class="label" i18n>Facility bias in %, standard uncertainty</span>
        <input
          #bias
          class="wl-input figure"
          inputmode="decimal"
          [value]="typed().bias"
          (input)="type({ bias: bias.value })"
        />
      </label>
      <label>
        <span class="label" i18n>Scatter between sessions in %, standard uncertainty</span>
        <input
          #session
          class="wl-input figure"
          inputmode="decimal"
          [value]="typed().session"
          (input)="type({ session: session.value })"
        />
      </label>
      @if (outcome() === 'unusable') {
        <p class="wl-rust" role="alert" i18n>Numbers from 0 to 100 %, and factors above 0, please.</p>
      }
      <span class="wl-actions">
        <button type="button" class="wl-button" [disabled]="!change()" (click)="emit()" i18n>
          Try these corrections
        </button>
      </span>
    }
  `,
  styleUrl: './try-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TryFacility {
  readonly sources = input.required<RankingSources>();
  readonly tried = output<JudgementChange>();

  private readonly preferences = inject(Preferences);
  protected readonly methods = BLOCKAGE_METHODS.map((method) => ({
    method,
    words: BLOCKAGE_METHOD_WORDS[method],
  }));
  protected readonly chosen = signal('');
  protected readonly typed = signal<TypedCorrections>({ method: 'none', amount: '', bias: '', session: '' });
  protected readonly facility = computed((): FacilityInput | undefined =>
    this.sources().inputs.facilities.find(({ id }) => id === this.chosen()),
  );
  protected readonly outcome = computed(() => {
    const facility = this.facility();
    return facility === undefined ? 'unchanged' : facilityChange(facility, this.typed());
  });
  protected readonly change = computed(() => {
    const outcome = this.outcome();
    return typeof outcome === 'object' ? outcome : undefined;
  });

  protected choose(facilityId: string): void {
    this.chosen.set(facilityId);
    const held = this.facility();
    const shown = (value: number | null | undefined, factor: number): string =>
      value == null
        ? ''
        : formatForInput(Number((value * factor).toPrecision(12)), this.preferences.numberLocale());
    this.typed.set({
      method: this.asMethod(held?.blockage?.method ?? 'none'),
      amount: shown(held?.blockage?.theta ?? held?.blockage?.factor, 1),
      bias: shown(held?.biasURelative, 100),
      session: shown(held?.sessionURelative, 100),
    });
  }

  protected asMethod(text: string): BlockageMethodName {
    return BLOCKAGE_METHODS.find((method) => method === text) ?? 'none';
  }

  protected type(part: Partial<TypedCorrections>): void {
    this.typed.update((typed) => ({ ...typed, ...part }));
  }

  protected emit(): void {
    const change = this.change();
    if (change) this.tried.emit(change);
  }
}
