import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  Injector,
  type AfterContentInit,
  computed,
  forwardRef,
  inject,
  input,
  signal,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import {
  type ControlValueAccessor,
  NG_VALIDATORS,
  NG_VALUE_ACCESSOR,
  NgControl,
  type ValidationErrors,
  type Validator,
} from '@angular/forms';
import { formatForInput } from '../../core/numbers/format-number';
import { parseTypedNumber, within } from '../../core/numbers/parse-typed-number';
import { Preferences } from '../../core/preferences/preferences';

let count = 0;

/**
 * A number with its unit beside it and its accepted range in words. Takes comma or point and any minus; asks where
 * `1.234` can be meant in two ways; keeps what was typed even when it cannot be used. The form's value is a number or
 * null, and the control is invalid while the text cannot be read.
 */
@Component({
  selector: 'wl-number-field',
  templateUrl: './number-field.html',
  styleUrl: './field.scss',
  providers: [
    { provide: NG_VALUE_ACCESSOR, useExisting: forwardRef(() => NumberField), multi: true },
    { provide: NG_VALIDATORS, useExisting: forwardRef(() => NumberField), multi: true },
  ],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NumberField implements ControlValueAccessor, AfterContentInit, Validator {
  readonly label = input.required<string>();
  readonly unit = input('');
  /** Off where a choice of units is projected in its place (`unitChoice`). */
  readonly unitBeside = input(true);
  /** For a cell of a table, whose head says what it is: label and range are there, but not seen. */
  readonly bare = input(false);
  readonly hint = input<string>();
  readonly minimum = input<number>();
  readonly maximum = input<number>();
  readonly optional = input(false);
  /** What the server said about it. */
  readonly serverError = input<string>();

  private readonly preferences = inject(Preferences);
  protected readonly id = `wl-number-${++count}`;
  protected readonly text = signal('');
  protected readonly disabled = signal(false);
  private readonly left = signal(false);
  private readonly injector = inject(Injector);
  private readonly destroyed = inject(DestroyRef);
  /** What the server said, as the form put it on the control. */
  private readonly refused = signal<string | undefined>(undefined);
  /** The reading that the person chose for this very text. */
  private readonly chosen = signal<number | undefined>(undefined);
  private changed: (value: number | null) => void = () => undefined;
  private touched: () => void = () => undefined;
  private revalidate: () => void = () => undefined;

  private readonly typed = computed(() =>
    parseTypedNumber(this.text(), { minimum: this.minimum(), maximum: this.maximum() }),
  );
  protected readonly readings = computed(() => {
    const typed = this.typed();
    if (typed.kind !== 'ambiguous' || this.chosen() !== undefined) return undefined;
    return [typed.readings.decimal, typed.readings.grouped].map((value) => ({
      value,
      words: this.plain(value),
    }));
  });
  private readonly value = computed(() => {
    const typed = this.typed();
    if (typed.kind === 'number') return typed.value;
    return typed.kind === 'ambiguous' ? (this.chosen() ?? null) : null;
  });

  private readonly range = computed(() => {
    const [minimum, maximum] = [this.minimum(), this.maximum()];
    const unit = this.unit() ? `\u00a0${this.unit()}` : '';
    if (minimum !== undefined && maximum !== undefined) {
      return $localize`${this.plain(minimum)}:MINIMUM: to ${this.plain(maximum)}:MAXIMUM:${unit}:UNIT:`;
    }
    if (minimum !== undefined) return $localize`at least ${this.plain(minimum)}:MINIMUM:${unit}:UNIT:`;
    return maximum === undefined ? '' : $localize`at most ${this.plain(maximum)}:MAXIMUM:${unit}:UNIT:`;
  });

  protected readonly help = computed(() => [this.hint(), this.range()].filter(Boolean).join('; '));
  protected readonly words = computed(() =>
    this.optional() ? $localize`${this.label()}:LABEL:, optional` : this.label(),
  );

  protected readonly error = computed(() => {
    const server = this.serverError() ?? this.refused();
    if (server) return server;
    const typed = this.typed();
    if (typed.kind === 'empty') {
      return this.left() && !this.optional() ? $localize`A number is needed here.` : undefined;
    }
    if (!this.left()) return undefined;
    if (typed.kind === 'not-a-number')
      return $localize`“${this.text()}:TEXT:” is not a number. Write it as 12.5 or 12,5.`;
    const value = this.value();
    if (value !== null && !within(value, { minimum: this.minimum(), maximum: this.maximum() })) {
      return $localize`Accepted: ${this.range()}:RANGE:.`;
    }
    return undefined;
  });

  protected readonly describedBy = computed(() =>
    [`${this.id}-hint`, this.error() && `${this.id}-error`, this.readings() && `${this.id}-asked`]
      .filter(Boolean)
      .join(' '),
  );

  ngAfterContentInit(): void {
    // Asked for late: the control needs this field as its validator before it exists, and a control that is found by its
    // name is there only once all directives of this element have been set up.
    const control = this.injector.get(NgControl, null, { optional: true, self: true })?.control;
    control?.events.pipe(takeUntilDestroyed(this.destroyed)).subscribe(() => {
      this.left.set(control.touched);
      const said: unknown = control.errors?.['server'];
      this.refused.set(typeof said === 'string' ? said : undefined);
    });
  }

  protected onInput(text: string): void {
    this.text.set(text);
    this.chosen.set(undefined);
    this.changed(this.value());
  }

  protected choose(value: number): void {
    this.chosen.set(value);
    this.changed(value);
  }

  protected onBlur(): void {
    this.left.set(true);
    this.touched();
  }

  writeValue(value: number | null | undefined): void {
    if (value === this.value() && this.typed().kind !== 'not-a-number' && this.text() !== '') return;
    const known = value !== null && value !== undefined;
    this.text.set(known ? formatForInput(value, this.preferences.numberLocale()) : '');
    this.chosen.set(value ?? undefined);
    this.revalidate();
  }

  registerOnChange(changed: (value: number | null) => void): void {
    this.changed = changed;
  }

  registerOnTouched(touched: () => void): void {
    this.touched = touched;
  }

  registerOnValidatorChange(revalidate: () => void): void {
    this.revalidate = revalidate;
  }

  setDisabledState(disabled: boolean): void {
    this.disabled.set(disabled);
  }

  validate(): ValidationErrors | null {
    const typed = this.typed();
    if (typed.kind === 'empty') return this.optional() ? null : { required: true };
    if (typed.kind === 'not-a-number') return { notANumber: true };
    const value = this.value();
    if (value === null) return { ambiguous: true };
    return within(value, { minimum: this.minimum(), maximum: this.maximum() }) ? null : { range: true };
  }

  private plain(value: number): string {
    return formatForInput(value, this.preferences.numberLocale());
  }
}
