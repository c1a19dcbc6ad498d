import { type NonNullableFormBuilder, Validators } from '@angular/forms';
import type { TestPlanFields, TestPlanInputs, PlanTarget } from '#shared/contracts/test-plans';
import type { CoolingGas } from '#shared/core/planning/planning-setting';
import { withoutBlanks } from '../../core/editing/without-blanks';
import { conditionForm, conditionOf, setCondition } from '../../ui/condition/condition-form';

export type TargetBasis = PlanTarget['basis'];

/** Reynolds numbers are typed in millions: nobody counts noughts. */
const MILLION = 1e6;

/** Controls of a planned test. Those of the inputs carry the contract's names, so that a refusal finds its field. */
export function planForm(builder: NonNullableFormBuilder) {
  const measure = (value: number | null = null) => builder.control<number | null>(value);
  return builder.group({
    name: ['', [Validators.required, Validators.maxLength(120)]],
    variantId: ['', [Validators.required]],
    facilityId: ['', [Validators.required]],
    inputs: builder.group({
      scale: measure(),
      frontalAreaM2: measure(),
      dragCoefficient: measure(),
      coefficientAreaM2: measure(),
      tunnelTemperatureC: measure(20),
      tunnelPressurePa: measure(100_000),
      maximumSpeedKmh: measure(),
      maximumForceN: measure(),
      targetBasis: builder.control<TargetBasis>('reference'),
      /** Of the bases typed and sweep, in millions. */
      targetMillions: measure(),
      targetResultId: '',
      speedKmh: measure(),
      coolingGas: builder.control<CoolingGas>('air'),
      turbulence: false,
      condition: conditionForm(),
      remark: ['', [Validators.maxLength(4000)]],
    }),
  });
}
export type PlanForm = ReturnType<typeof planForm>;
export type TypedPlan = ReturnType<PlanForm['getRawValue']>;
export type PlanField = keyof TypedPlan['inputs'];

/** The Reynolds number in the unit in which it is typed; twelve digits, so that nothing is lost on the way back. */
export const inMillions = (reynolds: number): number => Number((reynolds / MILLION).toPrecision(12));
export const fromMillions = (millions: number): number => Number((millions * MILLION).toPrecision(12));

/** Puts a plan into the form, as saved: nothing counts as changed afterwards. */
export function setPlan(form: PlanForm, { name, variantId, facilityId, inputs }: TestPlanFields): void {
  const { target, condition, ...rest } = inputs;
  form.reset();
  form.patchValue({
    name,
    variantId,
    facilityId,
    inputs: {
      ...rest,
      targetBasis: target.basis,
      targetMillions: target.basis === 'reference' ? null : inMillions(target.reynolds),
      targetResultId: target.basis === 'sweep' ? target.resultId : '',
    },
  });
  setCondition(form.controls.inputs.controls.condition, condition);
  form.markAsPristine();
  form.markAsUntouched();
}

function targetOf({ targetBasis, targetMillions, targetResultId }: TypedPlan['inputs']): PlanTarget {
  const reynolds = targetMillions === null ? Number.NaN : fromMillions(targetMillions);
  if (targetBasis === 'sweep') return { basis: 'sweep', reynolds, resultId: targetResultId };
  return targetBasis === 'typed' ? { basis: 'typed', reynolds } : { basis: 'reference' };
}

const required = (value: number | null): number => value ?? Number.NaN;

/** What the form says, as the contract wants it. A number that is missing or unreadable is NaN. */
export function planFieldsOf(form: PlanForm): TestPlanFields {
  const { name, variantId, facilityId, inputs } = form.getRawValue();
  const complete: TestPlanInputs = {
    scale: required(inputs.scale),
    target: targetOf(inputs),
    tunnelTemperatureC: required(inputs.tunnelTemperatureC),
    tunnelPressurePa: required(inputs.tunnelPressurePa),
    frontalAreaM2: required(inputs.frontalAreaM2),
    dragCoefficient: required(inputs.dragCoefficient),
    coolingGas: inputs.coolingGas,
    turbulence: inputs.turbulence,
    condition: conditionOf(form.controls.inputs.controls.condition),
    ...withoutBlanks({
      coefficientAreaM2: inputs.coefficientAreaM2,
      maximumSpeedKmh: inputs.maximumSpeedKmh,
      maximumForceN: inputs.maximumForceN,
      speedKmh: inputs.speedKmh,
      remark: inputs.remark,
    }),
  };
  return { name: name.trim(), variantId, facilityId, inputs: complete };
}
