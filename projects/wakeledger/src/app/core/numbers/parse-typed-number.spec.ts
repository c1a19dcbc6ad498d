import { parseTypedNumber } from './parse-typed-number';

describe('a typed number', () => {
  it.each([
    ['12', 12],
    ['0.594', 0.594],
    ['0,594', 0.594],
    [',5', 0.5],
    ['12.5', 12.5],
    ['1.2345', 1.2345],
    ['-3,2', -3.2],
    ['\u22123.2', -3.2],
    ['\u20133.2', -3.2],
    ['+4', 4],
    ['1,234.5', 1234.5],
    ['1.234,5', 1234.5],
    ['1 234,5', 1234.5],
    ['1\u202f234,5', 1234.5],
    ['1’234.5', 1234.5],
    ['1.234.567', 1234567],
    ['1e-3', 0.001],
    ['1.234e3', 1234],
    ['0.500', 0.5],
    ['12.', 12],
  ])('%s is read as %d', (text, value) => {
    expect(parseTypedNumber(text)).toEqual({ kind: 'number', value });
  });

  it.each(['1.234', '1,234', '-12,345', '999.000'])('%s is asked, never guessed', (text) => {
    expect(parseTypedNumber(text).kind).toBe('ambiguous');
  });

  it('gives both readings of what is ambiguous', () => {
    expect(parseTypedNumber('1.234')).toEqual({
      kind: 'ambiguous',
      readings: { decimal: 1.234, grouped: 1234 },
    });
  });

  it('is not ambiguous where the accepted range leaves one reading', () => {
    expect(parseTypedNumber('2.184', { minimum: 0.1, maximum: 20 })).toEqual({
      kind: 'number',
      value: 2.184,
    });
    expect(parseTypedNumber('1.450', { minimum: 100 })).toEqual({ kind: 'number', value: 1450 });
  });

  it('stays ambiguous where neither reading is accepted, so that the person sees both', () => {
    expect(parseTypedNumber('1.234', { maximum: 1 }).kind).toBe('ambiguous');
  });

  it.each(['abc', '1.2.3', '1,23,4', '--1', '1e', '12 kg', '1,234.5,6', '.', 'Infinity', '1e999'])(
    '%s is not a number',
    (text) => {
      expect(parseTypedNumber(text)).toEqual({ kind: 'not-a-number' });
    },
  );

  it.each(['', '   ', '\u202f'])('nothing is nothing, not 0', (text) => {
    expect(parseTypedNumber(text)).toEqual({ kind: 'empty' });
  });
});
