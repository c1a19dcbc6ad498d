import { FormControl, FormGroup, type NonNullableFormBuilder } from '@angular/forms';
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
export type ConditionValues = ReturnType<ConditionForm['getRawValue']>;

export function conditionForm(builder: NonNullableFormBuilder): ConditionForm {
  const choice = (): Choice => builder.control('');
  const measure = (): Measure => builder.control<number | null>(null);
  return builder.group({
    ground: choice(),
    wheels: choice(),
    cooling: choice(),
    mirrors: choice(),
    rideHeightFrontMm: measure(),
    rideHeightRearMm: measure(),
    payloadKg: measure(),
    tyres: choice(),
    beltSpeedRatio: measure(),
    wheelVentilationInForce: choice(),
  });
}

/** What the form shows for a condition, for example a facility's usual one. */
export function conditionToForm(condition: Condition): ConditionValues {
  const { wheelVentilationInForce: ventilation } = condition;
  return {
    ground: condition.ground ?? '',
    wheels: condition.wheels ?? '',
    cooling: condition.cooling ?? '',
    mirrors: condition.mirrors ?? '',
    rideHeightFrontMm: condition.rideHeightFrontMm ?? null,
    rideHeightRearMm: condition.rideHeightRearMm ?? null,
    payloadKg: condition.payloadKg ?? null,
    tyres: condition.tyres ?? '',
    beltSpeedRatio: condition.beltSpeedRatio ?? null,
    wheelVentilationInForce: ventilation === undefined ? '' : ventilation ? 'yes' : 'no',
  };
}

/** What the form says, as the contract wants it. */
export function conditionFromForm({ wheelVentilationInForce, ...rest }: ConditionValues): Condition {
  return {
    ...withoutBlanks(rest),
    ...(wheelVentilationInForce === '' ? {} : { wheelVentilationInForce: wheelVentilationInForce === 'yes' }),
  } as Condition;
}
