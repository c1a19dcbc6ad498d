import fc from 'fast-check';
import { decimalEvidence, readNumber } from './numbers';

describe('A number in a file', () => {
  it.each([
    ['0.285', 'point', 0.285],
    ['0,285', 'comma', 0.285],
    ['−5', 'point', -5],
    ['1,234.5', 'point', 1234.5],
    ['1.234,5', 'comma', 1234.5],
    ['1.234.567', 'comma', 1234567],
    ['1 234,5', 'comma', 1234.5],
    ['1\u202f234.5', 'point', 1234.5],
    ['2.6e-2', 'point', 0.026],
    ['.5', 'point', 0.5],
  ] as const)('%s with a decimal %s is %d', (text, decimal, value) => {
    expect(readNumber(text, decimal)).toEqual({ value });
  });

  it.each([
    ['1,234', 'point', 'two ways'],
    ['1.234', 'comma', 'two ways'],
    ['0,285', 'point', 'Write 0.285'],
    ['0.285', 'comma', 'Write 0,285'],
    ['abc', 'point', 'not a number'],
    ['1e999', 'point', 'too large'],
    ['12-5', 'point', 'not a number'],
  ] as const)('%s with a decimal %s is refused, and it is said why', (text, decimal, words) => {
    expect(readNumber(text, decimal)).toEqual({ problem: expect.stringContaining(words) as string });
  });

  it('is a thousand where the person who was asked said so', () => {
    expect(readNumber('1.234', 'comma', true)).toEqual({ value: 1234 });
    expect(readNumber('1.234', 'point', true)).toEqual({ value: 1.234 });
  });

  it.each([
    ['0,285', 'comma'],
    ['12.5', 'point'],
    ['1.234', 'either'],
    ['140', 'none'],
    ['02.03.2026', undefined],
    ['Liftback', undefined],
  ] as const)('%s shows the decimal sign %s', (text, evidence) => {
    expect(decimalEvidence(text)).toBe(evidence);
  });

  it('comes back exactly, however it was written', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        expect(readNumber(String(value), 'point')).toEqual({ value: value + 0 });
        expect(readNumber(String(value).replace('.', ','), 'comma')).toEqual({ value: value + 0 });
      }),
    );
  });
});
