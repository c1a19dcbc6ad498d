import { ChangeDetectionStrategy, Component, inject, input, output, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule, Validators } from '@angular/forms';
import type { CorrelationPair } from '#shared/contracts/correlations';
import { formPulse } from '../../core/editing/form-pulse';
import { revealErrors } from '../../core/editing/reveal-errors';
import { controlError } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { NumberField } from '../../ui/field/number-field';

/** A pair of figures that are not results of a programme: from a round robin, or a body that nobody ranks. */
@Component({
  selector: 'wl-hand-pair',
  imports: [Field, NumberField, ReactiveFormsModule, WlInput],
  template: `
    <form class="wl-form" [formGroup]="form" (ngSubmit)="add()" novalidate>
      <fieldset class="wl-group">
        <legend i18n>A pair typed by hand</legend>
        <wl-field class="wl-wide" label="Geometry" i18n-label [error]="geometryError()">
          <input wlInput type="text" maxlength="120" formControlName="geometry" />
        </wl-field>
        <wl-number-field
          formControlName="dragAreaM2"
          [label]="labels().figure"
          unit="m²"
          [minimum]="0.01"
          [maximum]="20"
        />
        <wl-number-field
          formControlName="uM2"
          [label]="labels().u"
          unit="m²"
          [minimum]="0.00001"
          [maximum]="1"
          hint="Standard uncertainty without the facility’s own bias; zero is never known"
          i18n-hint
        />
        <wl-number-field
          formControlName="referenceDragAreaM2"
          [label]="labels().reference"
          unit="m²"
          [minimum]="0.01"
          [maximum]="20"
        />
        <wl-number-field
          formControlName="referenceUM2"
          [label]="labels().referenceU"
          unit="m²"
          [minimum]="0.00001"
          [maximum]="1"
          hint="Standard uncertainty without the facility’s own bias; zero is never known"
          i18n-hint
        />
        <div class="wl-wide wl-actions">
          <button type="submit" class="wl-button" i18n>Add this pair</button>
        </div>
      </fieldset>
    </form>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HandPair {
  readonly labels = input.required<{
    readonly figure: string;
    readonly u: string;
    readonly reference: string;
    readonly referenceU: string;
  }>();
  readonly added = output<CorrelationPair>();

  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly form = this.builder.group({
    geometry: ['', [Validators.required, Validators.maxLength(120)]],
    dragAreaM2: this.builder.control<number | null>(null),
    uM2: this.builder.control<number | null>(null),
    referenceDragAreaM2: this.builder.control<number | null>(null),
    referenceUM2: this.builder.control<number | null>(null),
  });
  private readonly pulse = formPulse(signal(this.form));

  protected geometryError(): string | undefined {
    this.pulse();
    return controlError(this.form.controls.geometry);
  }

  protected add(): void {
    revealErrors(this.form);
    const { geometry, dragAreaM2, uM2, referenceDragAreaM2, referenceUM2 } = this.form.getRawValue();
    if (this.form.invalid) return;
    if (dragAreaM2 === null || uM2 === null || referenceDragAreaM2 === null || referenceUM2 === null) return;
    this.added.emit({ geometry: geometry.trim(), dragAreaM2, uM2, referenceDragAreaM2, referenceUM2 });
    this.form.reset();
  }
}
