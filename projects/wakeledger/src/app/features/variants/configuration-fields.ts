import { ChangeDetectionStrategy, Component, effect, input, untracked } from '@angular/core';
import { ReactiveFormsModule, type AbstractControl } from '@angular/forms';
import { formPulse } from '../../core/editing/form-pulse';
import { controlError } from '../../ui/field/control-error';
import { Field, WlInput } from '../../ui/field/field';
import { NumberField } from '../../ui/field/number-field';
import { enableParts, type ConfigurationForm } from './configuration-form';

/** One way in which the variant is sold: mass, road load in one of its two forms, powertrain, share of sales. */
@Component({
  selector: 'wl-configuration-fields',
  imports: [Field, NumberField, ReactiveFormsModule, WlInput],
  templateUrl: './configuration-fields.html',
  styleUrl: './configuration-fields.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfigurationFields {
  readonly form = input.required<ConfigurationForm>();

  private readonly pulse = formPulse(this.form);

  constructor() {
    effect(() => {
      this.pulse();
      untracked(() => enableParts(this.form()));
    });
  }

  protected error(control: AbstractControl): string | undefined {
    this.pulse();
    return controlError(control);
  }

  protected server(control: AbstractControl): string | undefined {
    this.pulse();
    return control.errors?.['server'] as string | undefined;
  }

  protected chosen(control: AbstractControl): boolean {
    this.pulse();
    return control.value === true || control.value === 'measured';
  }
}
