import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { formPulse } from '../../core/editing/form-pulse';
import { controlError } from '../field/control-error';
import { Field, WlInput } from '../field/field';
import { NumberField } from '../field/number-field';
import type { ConditionForm } from './condition-form';
import { CONDITION_CHOICES, conditionChoiceWord, conditionItemWord } from './condition-words';

const CHOICE_ITEMS = ['ground', 'wheels', 'cooling', 'mirrors'] as const;

/** The items of a test condition as fields; each may be left open. */
@Component({
  selector: 'wl-condition-fields',
  imports: [Field, NumberField, ReactiveFormsModule, WlInput],
  template: `
    <ng-container [formGroup]="form()">
      @for (item of choices; track item.name) {
        <wl-field [label]="item.words" [error]="error(item.name)">
          <select wlInput [formControlName]="item.name">
            <option value="">{{ open() }}</option>
            @for (option of item.options; track option.value) {
              <option [value]="option.value">{{ option.words }}</option>
            }
          </select>
        </wl-field>
      }
      <wl-number-field
        [label]="word('rideHeightFrontMm')"
        unit="mm"
        formControlName="rideHeightFrontMm"
        [optional]="true"
        [serverError]="serverError('rideHeightFrontMm')"
      />
      <wl-number-field
        [label]="word('rideHeightRearMm')"
        unit="mm"
        formControlName="rideHeightRearMm"
        [optional]="true"
        [serverError]="serverError('rideHeightRearMm')"
      />
      <wl-number-field
        [label]="word('payloadKg')"
        unit="kg"
        [minimum]="0"
        formControlName="payloadKg"
        [optional]="true"
        [serverError]="serverError('payloadKg')"
      />
      <wl-number-field
        [label]="word('beltSpeedRatio')"
        i18n-hint
        hint="1 where the belt runs with the wind"
        [minimum]="0"
        [maximum]="2"
        formControlName="beltSpeedRatio"
        [optional]="true"
        [serverError]="serverError('beltSpeedRatio')"
      />
      <wl-field [label]="word('tyres')" [optional]="true" [error]="error('tyres')">
        <input wlInput type="text" maxlength="120" formControlName="tyres" />
      </wl-field>
      <wl-field
        [label]="word('wheelVentilationInForce')"
        i18n-hint
        hint="Whether the balance sees what the turning wheels resist"
        [error]="error('wheelVentilationInForce')"
      >
        <select wlInput formControlName="wheelVentilationInForce">
          <option value="">{{ open() }}</option>
          <option value="yes" i18n>yes</option>
          <option value="no" i18n>no</option>
        </select>
      </wl-field>
    </ng-container>
  `,
  styles: `
    :host {
      display: contents;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConditionFields {
  readonly form = input.required<ConditionForm>();
  /** How an item that is left open reads. */
  readonly open = input($localize`not stated`);

  protected readonly choices = CHOICE_ITEMS.map((name) => ({
    name,
    words: conditionItemWord(name),
    options: CONDITION_CHOICES[name].map((value) => ({ value, words: conditionChoiceWord(value) })),
  }));
  protected readonly word = conditionItemWord;
  private readonly pulse = formPulse(this.form);

  protected error(name: keyof ConditionForm['controls']): string | undefined {
    this.pulse();
    return controlError(this.form().controls[name]);
  }

  protected serverError(name: keyof ConditionForm['controls']): string | undefined {
    this.pulse();
    return this.form().controls[name].errors?.['server'] as string | undefined;
  }
}
