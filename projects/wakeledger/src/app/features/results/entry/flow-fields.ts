import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { type AbstractControl, ReactiveFormsModule } from '@angular/forms';
import { AIR_STATES } from '#shared/contracts/condition';
import { formPulse } from '../../../core/editing/form-pulse';
import { controlError } from '../../../ui/field/control-error';
import { Field, WlInput } from '../../../ui/field/field';
import { PRESSURE_UNITS, SPEED_UNITS, limitIn } from '../../../ui/field/measured-units';
import { NumberField } from '../../../ui/field/number-field';
import { AIR_STATE_WORDS } from '../../../ui/words/evidence-words';
import type { ResultForm } from './result-form';

const STATES_OF_AIR = ['custom', ...AIR_STATES] as const;

/** Speed or dynamic pressure, the air, and whether blockage is corrected already. */
@Component({
  selector: 'wl-flow-fields',
  imports: [Field, NumberField, ReactiveFormsModule, WlInput],
  templateUrl: './flow-fields.html',
  styles: `
    :host {
      display: contents;
    }
    .unit {
      width: auto;
      min-width: 84px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FlowFields {
  readonly form = input.required<ResultForm>();

  private readonly pulse = formPulse(this.form);
  protected readonly airStates = STATES_OF_AIR.map((value) => ({
    value,
    words: value === 'custom' ? $localize`as measured` : AIR_STATE_WORDS[value],
  }));
  protected readonly coastdownHint = $localize`The state that f2 is corrected to: two common ones are nearly 2 % apart`;
  protected readonly speedUnits = SPEED_UNITS.map(({ unit }) => unit);
  protected readonly pressureUnits = PRESSURE_UNITS.map(({ unit }) => unit).toReversed();

  protected readonly value = computed(() => {
    this.pulse();
    return this.form().getRawValue();
  });
  protected readonly pressureLimits = computed(() => {
    const { pressureUnit } = this.value().air;
    return {
      minimum: limitIn(30_000, pressureUnit, PRESSURE_UNITS),
      maximum: limitIn(1_000_000, pressureUnit, PRESSURE_UNITS),
    };
  });

  protected error(control: AbstractControl): string | undefined {
    this.pulse();
    return controlError(control);
  }
}
