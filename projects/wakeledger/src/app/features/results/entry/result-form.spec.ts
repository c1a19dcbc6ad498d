import { TestBed } from '@angular/core/testing';
import { NonNullableFormBuilder } from '@angular/forms';
import { resultFields as contract } from '#shared/contracts/results';
import { resultFieldsOf, resultForm, type ResultForm } from './result-form';

const VARIANT = '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0060';
const FACILITY = '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0061';

describe('a result typed by hand', () => {
  const typed = (): ResultForm => {
    const form = resultForm(TestBed.inject(NonNullableFormBuilder));
    form.patchValue({
      name: ' H-0412 ',
      variantId: VARIANT,
      facilityId: FACILITY,
      testDate: '2026-09-14',
      quotedAreaM2: 2.19,
      speedKmh: 38.88888888888889,
      speedUnit: 'm/s',
      air: { temperatureC: 22, pressurePa: 991, pressureUnit: 'hPa', relativeHumidity: 40 },
      points: [{ yawDeg: 0, value: 0.2712 }],
    });
    return form;
  };

  it('is kept in the units of the contract whatever it was typed in', () => {
    const fields = resultFieldsOf(typed());
    expect(fields).toMatchObject({
      name: 'H-0412',
      speedKmh: 140,
      quotedAreaScale: 'full',
      air: { state: 'custom', temperatureC: 22, pressurePa: 99_100, relativeHumidity: 0.4 },
      points: [{ yawDeg: 0, value: 0.2712 }],
    });
    expect(contract.safeParse(fields).success).toBe(true);
  });

  it('carries no area and no tare where the quantity has none', () => {
    const form = typed();
    form.patchValue({ quantity: 'drag-area', tareN: 3, tareAlreadySubtracted: 'no' });
    const fields = resultFieldsOf(form);
    expect(fields).not.toHaveProperty('quotedAreaM2');
    expect(fields).not.toHaveProperty('quotedAreaScale');
    expect(fields).not.toHaveProperty('tareN');
    expect(fields).not.toHaveProperty('tareAlreadySubtracted');
  });

  it('says of a force whether its tare is in it', () => {
    const form = typed();
    form.patchValue({ quantity: 'force', tareAlreadySubtracted: 'no', tareN: 3.2 });
    expect(resultFieldsOf(form)).toMatchObject({ tareAlreadySubtracted: false, tareN: 3.2 });
    form.patchValue({ tareAlreadySubtracted: 'yes' });
    expect(resultFieldsOf(form)).toMatchObject({ tareAlreadySubtracted: true });
    expect(resultFieldsOf(form)).not.toHaveProperty('tareN');
  });

  it('names a reference state of the air and nothing beside it', () => {
    const form = typed();
    form.patchValue({ air: { state: 'un-gtr-15' } });
    expect(resultFieldsOf(form).air).toEqual({ state: 'un-gtr-15' });
  });

  it('states an uncertainty only where one was typed, with its k', () => {
    const form = typed();
    expect(resultFieldsOf(form)).not.toHaveProperty('stated');
    form.patchValue({ stated: { expandedU: 0.002 } });
    expect(resultFieldsOf(form).stated).toEqual({ expandedU: 0.002, k: 2, includesFacilityBias: false });
  });
});
