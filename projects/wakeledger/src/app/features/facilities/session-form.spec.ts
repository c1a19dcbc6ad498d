import { TestBed } from '@angular/core/testing';
import { NonNullableFormBuilder } from '@angular/forms';
import { testSessionFields } from '#shared/contracts/test-sessions';
import { clearForNext, measurementFieldsOf, measurementForm } from './measurement-form';
import { sessionFieldsOf, sessionForm, setSession } from './session-form';

describe('a session’s form', () => {
  it('gives back what it was filled with, and leaves out what is empty', () => {
    const form = sessionForm(TestBed.inject(NonNullableFormBuilder));
    const fields = { name: 'Spring', startDate: '2026-03-02' };
    setSession(form, fields);
    expect(sessionFieldsOf(form)).toEqual(fields);
    expect(testSessionFields.safeParse(sessionFieldsOf(form)).success).toBe(true);
  });

  it('refuses a last day before the first, in words at the last day', () => {
    const form = sessionForm(TestBed.inject(NonNullableFormBuilder));
    setSession(form, { name: 'Spring', startDate: '2026-03-02', endDate: '2026-03-01' });
    expect(form.controls.endDate.errors?.['server']).toContain('before it begins');
    form.controls.endDate.setValue('2026-03-02');
    expect(form.valid).toBe(true);
  });
});

describe('the form of a measurement', () => {
  it('gives nothing while no drag area stands in it, and keeps session and day for the next', () => {
    const form = measurementForm(TestBed.inject(NonNullableFormBuilder));
    form.patchValue({ testSessionId: 's1', measuredOn: '2026-03-03', s: 0.0004, n: 5 });
    expect(measurementFieldsOf(form)).toBeUndefined();
    form.controls.dragAreaM2.setValue(0.6123);
    expect(measurementFieldsOf(form)).toEqual({
      testSessionId: 's1',
      measuredOn: '2026-03-03',
      dragAreaM2: 0.6123,
      s: 0.0004,
      n: 5,
    });
    clearForNext(form);
    expect(form.getRawValue()).toMatchObject({
      testSessionId: 's1',
      measuredOn: '2026-03-03',
      dragAreaM2: null,
    });
  });
});
