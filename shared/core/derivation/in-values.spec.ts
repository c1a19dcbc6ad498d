import { inValues, joined, plain, valuesAsText } from './in-values';

describe('A formula in values', () => {
  it('keeps numbers apart from words, and leaves out what is not there', () => {
    expect(inValues`q = ${899.3} Pa${null}, ${'isa'}`).toEqual(['q = ', 899.3, ' Pa', ', ', 'isa']);
  });

  it('can hold other formulas in values', () => {
    const sum = joined([[0.5], [0.25]], ' + ');
    expect(inValues`(${sum}) m² / ${2}`).toEqual(['(', 0.5, ' + ', 0.25, ') m² / ', 2]);
  });

  it('is plain as text: every digit of what was typed, seven of what was computed', () => {
    expect(valuesAsText(inValues`p = ${101325.25} Pa, x = ${2 / 3}, ν_k = ${1.5768e-5}`)).toBe(
      'p = 101325.25 Pa, x = 0.6666667, ν_k = 0.000015768',
    );
    expect(plain(-0.1 - 0.2)).toBe('-0.3');
    expect(plain(12345678.9)).toBe('12345678.9');
  });
});
