import { TestBed } from '@angular/core/testing';
import type { DerivationStep as TracedStep } from '#shared/core/derivation/derivation';
import { inValues } from '#shared/core/derivation/in-values';
import { QuantityFormat } from '../quantity/quantity-format';
import { stepFromTrace } from './from-trace';
import { wordedUncertainty } from './worded';

const traced = (changes: Partial<TracedStep>): TracedStep => ({
  methodId: 'some',
  version: 1,
  title: '',
  formulaMathml: '',
  formulaText: '',
  values: [],
  value: 1,
  unit: '',
  source: '',
  assumed: [],
  cautions: [],
  ...changes,
});
const format = () => TestBed.inject(QuantityFormat);

describe('a traced step on the sheet', () => {
  it.each([
    ['sutherland-viscosity', 0.00001577234, 'm²/s', '1.577\u00a0×\u00a010⁻⁵\u202fm²/s', '0.00001577234 m²/s'],
    ['flow-similarity', 11093517, '', '1.11\u00a0×\u00a010⁷', '11093517'],
    ['full-scale-drag-area', 2 / 3, 'm²', '0.6667\u202fm²', '0.6666667 m²'],
    ['moist-air', 1.156812, 'kg/m³', '1.1568\u202fkg/m³', '1.156812 kg/m³'],
    ['dynamic-pressure', 899.312, 'Pa', '899.3\u202fPa', '899.312 Pa'],
    ['yaw-ratio', 1.045678, '', '1.046', '1.045678'],
    ['cycle-energy-gtr-15', 12345678, 'J', '12.35\u202fMJ', '12345678 J'],
  ])('%s of %d %s reads %s and is copied as %s', (methodId, value, unit, shown, plain) => {
    expect(stepFromTrace(traced({ methodId, value, unit }), format()).result).toEqual({ shown, plain });
  });

  it('shows values for a person and copies them for a machine', () => {
    const values = inValues`½ × ${1.156812} kg/m³ × (${140 / 3.6} m/s)², ν_k = ${1.577234e-5} m²/s, ${21.5} °C`;
    expect(stepFromTrace(traced({ values }), format()).values).toEqual({
      shown:
        '½ × 1.1568\u202fkg/m³ × (38.889\u202fm/s)², ν_k\u00a0=\u00a01.577\u00a0×\u00a010⁻⁵\u202fm²/s, 21.5\u202f°C',
      plain: '½ × 1.156812 kg/m³ × (38.88889 m/s)², ν_k = 0.00001577234 m²/s, 21.5 °C',
    });
  });

  it('says a standard uncertainty with two digits, however small', () => {
    expect(wordedUncertainty(0.002, 'm²', format()).shown).toBe('0.0020\u202fm²');
    expect(wordedUncertainty(-0.00041234, 'm²', format())).toEqual({
      shown: '0.00041\u202fm²',
      plain: '0.00041234 m²',
    });
  });
});
