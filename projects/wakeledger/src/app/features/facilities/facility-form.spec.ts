import { TestBed } from '@angular/core/testing';
import { NonNullableFormBuilder } from '@angular/forms';
import { facilityFields as contract, type FacilityFields } from '#shared/contracts/facilities';
import { facilityFields } from '#shared/testing/domain-fields';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { facilityChangeOf, facilityFieldsOf, facilityForm, setFacility, takeOver } from './facility-form';
import { uncertaintyLines } from './facility-words';

describe('a facility’s form', () => {
  const filled = (fields: FacilityFields) => {
    const form = facilityForm(TestBed.inject(NonNullableFormBuilder));
    setFacility(form, fields);
    return form;
  };

  it('gives back what it was filled with, though shares are typed in per cent', () => {
    const fields = facilityFields({ sessionURelative: 0.0015, sessionDegreesOfFreedom: 9, biasUM2: 0.001 });
    const form = filled(fields);
    expect(form.value.biasURelative).toBe(0.6);
    expect(facilityFieldsOf(form)).toEqual(fields);
    expect(contract.safeParse(facilityFieldsOf(form)).success).toBe(true);
    expect(form.dirty).toBe(false);
  });

  it('keeps the check body, and sends none where its name is empty', () => {
    const fields = facilityFields({ checkBody: { name: 'Grey box', remark: 'aluminium, 1.2 m' } });
    const form = filled(fields);
    expect(facilityFieldsOf(form)).toEqual(fields);
    form.controls.checkBody.controls.name.setValue(' ');
    expect(facilityFieldsOf(form)).not.toHaveProperty('checkBody');
  });

  it('takes over a session scatter in the place of the stated one, with a comment, and counts as changed', () => {
    const form = filled(facilityFields({ sessionUM2: 0.001, sessionURelative: 0.001 }));
    takeOver(form, { uRelative: 0.00213, degreesOfFreedom: 4.2, comment: 'From six sessions' });
    const change = facilityChangeOf(form);
    expect(change).toMatchObject({
      sessionURelative: 0.00213,
      sessionDegreesOfFreedom: 4.2,
      comment: 'From six sessions',
    });
    expect(change).not.toHaveProperty('sessionUM2');
    expect(form.dirty).toBe(true);
  });

  it('asks a proving ground for no section and no blockage', () => {
    const form = filled(facilityFields());
    form.controls.kind.setValue('road');
    expect(facilityFieldsOf(form)).not.toHaveProperty('areaM2');
    expect(facilityFieldsOf(form)).not.toHaveProperty('blockage');
  });

  it('sends only what the chosen blockage method uses', () => {
    const form = filled(facilityFields());
    form.controls.blockage.patchValue({ method: 'maskell', theta: 0.96 });
    expect(facilityFieldsOf(form).blockage).toEqual({
      method: 'maskell',
      theta: 0.96,
      uFractionOfCorrection: 0.3,
    });
    form.controls.blockage.patchValue({ method: 'none', uRelative: 1.5 });
    expect(facilityFieldsOf(form).blockage).toEqual({ method: 'none', uRelative: 0.015 });
  });
});

describe('uncertaintyLines', () => {
  it('says only what is stated', () => {
    const format = TestBed.inject(QuantityFormat);
    expect(uncertaintyLines(facilityFields(), format)).toEqual([
      { label: 'bias', words: '0.60\u202f%' },
      { label: 'repeatability', words: '0.20\u202f%, ν 12' },
    ]);
  });
});
