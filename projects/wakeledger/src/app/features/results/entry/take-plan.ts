import type { TestPlan } from '#shared/contracts/test-plans';
import { setCondition } from '../../../ui/condition/condition-form';
import type { ResultForm } from './result-form';

/** Puts what was planned into the form: variant, facility, scale, speed, condition, turbulence. What was measured is left alone. */
export function takePlan(form: ResultForm, { id, variantId, facilityId, inputs }: TestPlan): void {
  form.patchValue({
    planId: id,
    variantId,
    facilityId,
    scale: inputs.scale,
    flowBy: 'speed',
    speedUnit: 'km/h',
    speedKmh: inputs.speedKmh ?? null,
    turbulenceGenerationOrTrips: inputs.turbulence ?? false,
  });
  const { condition } = form.controls;
  setCondition(condition, inputs.condition);
  // The facility's usual condition does not take its place.
  condition.markAsDirty({ onlySelf: true });
}
