import { formatForInput, formatNumber, formatSignificant, formatSigned } from './format-number';
import { NUMBER_LOCALES } from './number-locale';
import { parseTypedNumber } from './parse-typed-number';

describe('a written number', () => {
  it('has fixed digits, a real minus and threes from 10 000 on', () => {
    expect(formatNumber(0.5942, 3, 'en-GB')).toBe('0.594');
    expect(formatNumber(-12345.6, 1, 'en-GB')).toBe('\u221212,345.6');
    expect(formatNumber(1234.5, 1, 'en-GB')).toBe('1234.5');
  });

  it('follows the person’s locale, apart from the language', () => {
    expect(formatNumber(12345.6, 1, 'de-DE')).toBe('12.345,6');
    expect(formatNumber(12345.6, 1, 'fr-FR')).toBe('12\u202f345,6');
  });

  it('gives a zero no sign, whatever it was rounded from', () => {
    expect(formatNumber(-0.0001, 3, 'en-GB')).toBe('0.000');
    expect(formatSigned(0.0001, 3, 'en-GB')).toBe('0.000');
  });

  it('writes the sign of a change', () => {
    expect(formatSigned(0.0166, 4, 'en-GB')).toBe('+0.0166');
    expect(formatSigned(-0.005, 3, 'en-GB')).toBe('\u22120.005');
  });

  it.each([
    [0.00001577234, '1.577\u00a0×\u00a010⁻⁵'],
    [11093517, '1.109\u00a0×\u00a010⁷'],
    [0.1128405, '0.11284'],
    [1.156812, '1.1568'],
    [38.88889, '38.889'],
    [99840.4, '99\u202f840'],
    [101325, '101\u202f325'],
    [999999.9, '1.000\u00a0×\u00a010⁶'],
    [0.0004, '0.0004'],
    [-5.5, '\u22125.5'],
    [0, '0'],
  ])('inside a calculation has five digits that count: %d reads %s', (value, words) => {
    expect(formatSignificant(value, 5, 'en-GB')).toBe(words);
  });

  it('inside a calculation keeps the person’s decimal mark', () => {
    expect(formatSignificant(12345.67, 6, 'de-DE')).toBe('12\u202f345,7');
    expect(formatSignificant(1.25e-6, 3, 'fr-FR')).toBe('1,25\u00a0×\u00a010⁻⁶');
  });

  it('is read back from an input without loss in every locale', () => {
    for (const locale of NUMBER_LOCALES) {
      for (const value of [0.123456789, -17.25, 1500.5, 98765.4321, 3e-7]) {
        expect(parseTypedNumber(formatForInput(value, locale))).toEqual({ kind: 'number', value });
      }
    }
  });
});
