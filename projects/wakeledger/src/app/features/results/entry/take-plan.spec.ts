import { TestBed } from '@angular/core/testing';
import { FormBuilder } from '@angular/forms';
import { testPlanFields } from '#shared/testing/domain-fields';
import { resultFieldsOf, resultForm } from './result-form';
import { takePlan } from './take-plan';

describe('a plan taken over into the entry of a result', () => {
  const plan = {
    ...testPlanFields(
      { variantId: 'v', facilityId: 'f' },
      { speedKmh: 180, turbulence: true, condition: { ground: 'one-belt', wheels: 'rotating' } },
    ),
    id: 'p',
    programmeId: 'g',
    version: 1,
    createdAt: '2026-09-01T08:00:00Z',
    createdBy: 'Ingrid',
  };

  it('prefills variant, facility, scale, speed, condition and turbulence, and leaves the readings alone', () => {
    const form = resultForm(TestBed.inject(FormBuilder).nonNullable);
    form.controls.name.setValue('D-14');
    form.controls.points.at(0).controls.value.setValue(0.28);
    takePlan(form, plan);
    const fields = resultFieldsOf(form);
    expect(fields).toMatchObject({
      name: 'D-14',
      variantId: 'v',
      facilityId: 'f',
      scale: 0.4,
      speedKmh: 180,
      condition: { ground: 'one-belt', wheels: 'rotating' },
      turbulenceGenerationOrTrips: true,
    });
    expect(fields.points[0]?.value).toBe(0.28);
    expect(fields).not.toHaveProperty('planId');
  });

  it('is not displaced by the facility’s usual condition', () => {
    const form = resultForm(TestBed.inject(FormBuilder).nonNullable);
    takePlan(form, plan);
    expect(form.controls.condition.dirty).toBe(true);
    expect(form.controls.name.dirty).toBe(false);
  });
});
