import { ChangeDetectionStrategy, Component, Directive, computed, inject, input } from '@angular/core';

let count = 0;

/** A label, its input (projected, marked `wlInput`), what is accepted, and what is wrong. */
@Component({
  selector: 'wl-field',
  template: `
    <label [attr.for]="id">{{ words() }}</label>
    <ng-content />
    @if (hint(); as words) {
      <span class="hint" [id]="hintId">{{ words }}</span>
    }
    <span class="error" [id]="errorId" aria-live="polite">
      @if (error(); as words) {
        <span aria-hidden="true">▲ </span>{{ words }}
      }
    </span>
  `,
  styleUrl: './field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Field {
  readonly label = input.required<string>();
  readonly hint = input<string>();
  readonly error = input<string>();
  readonly optional = input(false);

  protected readonly words = computed(() =>
    this.optional() ? $localize`${this.label()}:LABEL:, optional` : this.label(),
  );

  readonly id = `wl-field-${++count}`;
  readonly hintId = `${this.id}-hint`;
  readonly errorId = `${this.id}-error`;
}

/** Ties an input to the field around it: its label, its hint, its error. */
@Directive({
  selector: 'input[wlInput], select[wlInput], textarea[wlInput]',
  host: {
    class: 'wl-input',
    '[id]': 'field.id',
    '[attr.aria-describedby]': 'describedBy()',
    '[attr.aria-invalid]': "field.error() ? 'true' : null",
  },
})
export class WlInput {
  protected readonly field = inject(Field);

  protected describedBy(): string | null {
    const ids = [this.field.hint() && this.field.hintId, this.field.error() && this.field.errorId].filter(
      Boolean,
    );
    return ids.length ? ids.join(' ') : null;
  }
}
