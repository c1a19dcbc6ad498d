import { TestBed } from '@angular/core/testing';
import { NonNullableFormBuilder } from '@angular/forms';
import { adjustmentFields as contract, type AdjustmentFields } from '#shared/contracts/adjustments';
import { adjustmentFields } from '#shared/testing/domain-fields';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import {
  adjustmentFieldsOf,
  adjustmentForm,
  controlOf,
  inSquareMetres,
  setAdjustment,
} from './adjustment-form';
import { shapeWords, subjectWords, worthWords } from './adjustment-words';

const PER_MM: AdjustmentFields = {
  name: 'Ride height',
  item: 'rideHeightRearMm',
  perUnitDragAreaM2: 0.0006,
  uPerUnitM2: 0.0002,
  bodyShapes: [],
  evidence: 'Five heights measured in Halmere',
};

describe('an adjustment’s form', () => {
  const filled = (fields: AdjustmentFields) => {
    const form = adjustmentForm(TestBed.inject(NonNullableFormBuilder));
    setAdjustment(form, fields);
    return form;
  };

  it('gives back what it was filled with, of either kind', () => {
    for (const fields of [
      adjustmentFields({ bodyShapes: ['estate', 'van'] }),
      adjustmentFields({ item: 'wheelVentilationInForce', fromValue: true, toValue: false }),
      adjustmentFields({ item: 'tyres', fromValue: '205/55 R16', toValue: '225/45 R17' }),
      PER_MM,
    ]) {
      const form = filled(fields);
      expect(adjustmentFieldsOf(form)).toEqual(fields);
      expect(contract.safeParse(adjustmentFieldsOf(form)).success).toBe(true);
      expect(form.dirty).toBe(false);
    }
  });

  it('sends only what the kind of the item asks for', () => {
    const form = filled(adjustmentFields());
    form.controls.item.setValue('payloadKg');
    const fields = adjustmentFieldsOf(form);
    expect(fields).toMatchObject({ perUnitDragAreaM2: 0.012, uPerUnitM2: 0.004 });
    expect(fields).not.toHaveProperty('fromValue');
    expect(fields).not.toHaveProperty('uM2');
  });

  it('keeps counts as m²: a thousandth in the coefficient on the named area', () => {
    const form = filled(adjustmentFields());
    form.patchValue({ unit: 'counts', worth: 12, u: 3, countsAreaM2: 2.19 });
    expect(adjustmentFieldsOf(form)).toMatchObject({ deltaDragAreaM2: 0.02628, uM2: 0.00657 });
    expect(inSquareMetres(12, 'counts', null)).toBeUndefined();
    expect(inSquareMetres(0, 'm2', null)).toBe(0);
  });

  it('takes an uncertainty of zero to the server, whose words stand at the field', () => {
    const form = filled(adjustmentFields());
    form.controls.u.setValue(0);
    expect(adjustmentFieldsOf(form).uM2).toBe(0);
    expect(controlOf('uM2')).toBe('u');
    expect(controlOf('perUnitDragAreaM2')).toBe('worth');
    expect(controlOf('name')).toBe('name');
  });
});

describe('an adjustment in words', () => {
  it('says from what to what, what that is worth, and for which bodies', () => {
    const format = TestBed.inject(QuantityFormat);
    expect(subjectWords(adjustmentFields(), 'en-GB')).toBe('Ground, from fixed floor to several belts');
    expect(subjectWords(PER_MM, 'en-GB')).toBe('Ride height, rear, per mm');
    expect(worthWords(adjustmentFields(), format)).toBe('+0.0120\u202fm², u 0.0040');
    expect(worthWords(PER_MM, format)).toBe('+0.000600\u202fm², u 0.000200');
    expect(shapeWords({ bodyShapes: [] })).toBe('every body shape');
    expect(shapeWords({ bodyShapes: ['estate', 'coupe'] })).toBe('Estate, Coupé');
  });
});
