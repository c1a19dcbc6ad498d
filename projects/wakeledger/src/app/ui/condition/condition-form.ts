import { FormControl, FormGroup } from '@angular/forms';
import type { Condition } from '#shared/contracts/condition';
import { withoutBlanks } from '../../core/editing/without-blanks';

type Choice = FormControl<string>;
type Measure = FormControl<number | null>;

/** The controls of a test condition; '' and null stand for an item that is left open. */
export type ConditionForm = FormGroup<{
  ground: Choice;
  wheels: Choice;
  cooling: Choice;
  mirrors: Choice;
  rideHeightFrontMm: Measure;
  rideHeightRearMm: Measure;
  payloadKg: Measure;
  tyres: Choice;
  beltSpeedRatio: Measure;
  wheelVentilationInForce: Choice;
}>;

export function conditionForm(condition: Condition = {}): ConditionForm {
  const choice = (value: string | undefined): Choice => new FormControl(value ?? '', { nonNullable: true });
  const measure = (value: number | undefined): Measure => new FormControl(value ?? null);
  const { wheelVentilationInForce: ventilation } = condition;
  return new FormGroup({
    ground: choice(condition.ground),
    wheels: choice(condition.wheels),
    cooling: choice(condition.cooling),
    mirrors: choice(condition.mirrors),
    rideHeightFrontMm: measure(condition.rideHeightFrontMm),
    rideHeightRearMm: measure(condition.rideHeightRearMm),
    payloadKg: measure(condition.payloadKg),
    tyres: choice(condition.tyres),
    beltSpeedRatio: measure(condition.beltSpeedRatio),
    wheelVentilationInForce: choice(ventilation === undefined ? '' : ventilation ? 'yes' : 'no'),
  });
}

/** Puts a condition into the form, for example a facility's usual one. */
export function setCondition(form: ConditionForm, condition: Condition): void {
  form.setValue(conditionForm(condition).getRawValue());
}

/** What the form says, as the contract wants it. */
export function conditionOf(form: ConditionForm): Condition {
  const { wheelVentilationInForce, ...rest } = form.getRawValue();
  return {
    ...withoutBlanks(rest),
    ...(wheelVentilationInForce === '' ? {} : { wheelVentilationInForce: wheelVentilationInForce === 'yes' }),
  } as Condition;
}
