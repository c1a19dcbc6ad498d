import { TestBed } from '@angular/core/testing';
import { FormBuilder } from '@angular/forms';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { planFaults } from './plan-faults';
import { planFieldsOf, planForm, setPlan, type TypedPlan } from './plan-form';
import { testPlanFields } from '#shared/testing/domain-fields';

const ids = { variantId: 'v', facilityId: 'f' };

describe('the figures of a plan as they are typed', () => {
  const form = () => planForm(TestBed.inject(FormBuilder).nonNullable);
  const faultsOf = (change: Partial<TypedPlan['inputs']>, section = { areaM2: 2.4 }) => {
    const typed = form();
    setPlan(typed, testPlanFields(ids));
    return planFaults({ ...typed.getRawValue().inputs, ...change }, section, TestBed.inject(QuantityFormat));
  };

  it('pass where they can be used, and are not judged while they are empty', () => {
    expect(faultsOf({})).toEqual({});
    expect(faultsOf({ targetBasis: 'reference', targetMillions: 0 })).toEqual({});
    expect(faultsOf({ scale: null, tunnelTemperatureC: null, frontalAreaM2: null })).toEqual({});
  });

  it.each([
    [{ scale: 0 }, 'scale', 'above 0, at most 1'],
    [{ scale: 1.5 }, 'scale', 'above 0, at most 1'],
    [{ scale: 1, frontalAreaM2: 3 }, 'scale', 'A scale up to 0.89 is accepted'],
    [{ tunnelTemperatureC: 293 }, 'tunnelTemperatureC', 'is it kelvin? 20\u202f°C would be accepted'],
    [{ tunnelTemperatureC: 95 }, 'tunnelTemperatureC', 'looks mistyped'],
    [{ tunnelPressurePa: 1013 }, 'tunnelPressurePa', 'is it hPa?'],
    [{ tunnelPressurePa: 1.2 }, 'tunnelPressurePa', 'is it bar?'],
    [{ tunnelPressurePa: 5e6 }, 'tunnelPressurePa', 'looks mistyped'],
    [{ speedKmh: 0 }, 'speedKmh', 'above 0'],
    [{ speedKmh: 300, maximumSpeedKmh: 220 }, 'speedKmh', 'The facility reaches 220'],
    [{ targetBasis: 'typed', targetMillions: 0 }, 'targetMillions', 'above 0'],
    [{ dragCoefficient: -0.3 }, 'dragCoefficient', 'above 0'],
    [{ targetBasis: 'sweep', targetResultId: '' }, 'targetResultId', 'Choose the result'],
  ] satisfies readonly (readonly [Partial<TypedPlan['inputs']>, keyof TypedPlan['inputs'], string])[])(
    'with %j are refused at %s',
    (change, field, words) => {
      const faults = faultsOf(change);
      expect(Object.keys(faults)).toEqual([field]);
      expect(faults[field]).toContain(words);
    },
  );

  it('come back from the form exactly as a plan was saved', () => {
    const fields = testPlanFields(ids, {
      target: { basis: 'sweep', reynolds: 3_141_593, resultId: 'r' },
      speedKmh: 180,
      maximumSpeedKmh: 220,
      maximumForceN: 600,
      coefficientAreaM2: 2.2,
      coolingGas: 'nitrogen',
      turbulence: true,
      remark: 'Trips along the bonnet',
    });
    const typed = form();
    setPlan(typed, fields);
    expect(planFieldsOf(typed)).toEqual(fields);
    expect(typed.dirty).toBe(false);
  });
});
