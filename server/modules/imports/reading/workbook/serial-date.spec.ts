import { dayOfSerial, timeOfSerial } from './serial-date';

/** Checked against openpyxl 3.1.5 (`to_excel`, with its calendars of 1900 and 1904). */
const DAYS = [
  ['1900-01-01', 1, undefined],
  ['1900-02-28', 59, undefined],
  ['1900-03-01', 61, undefined],
  ['1904-01-01', 1462, 0],
  ['1999-12-31 23:59:59', 36525.99998842592, 35063.99998842592],
  ['2008-01-01', 39448, 37986],
  ['2026-05-04', 46146, 44684],
  ['2026-05-04 14:30:00', 46146.604166666664, 44684.604166666664],
  ['9999-12-31', 2958465, 2957003],
] as const;

describe('dayOfSerial', () => {
  it.each(DAYS)('reads %s as sheets count it, from 1900 and from 1904', (day, from1900, from1904) => {
    expect(dayOfSerial(from1900, false)).toBe(day);
    if (from1904 !== undefined) expect(dayOfSerial(from1904, true)).toBe(day);
  });

  it('knows no 29 February 1900, no day before the first and none after the last', () => {
    expect(dayOfSerial(60, false)).toBeUndefined();
    expect(dayOfSerial(-1, false)).toBeUndefined();
    expect(dayOfSerial(2_958_466.5, false)).toBeUndefined();
    expect(dayOfSerial(Number.NaN, false)).toBeUndefined();
  });

  it('rounds to the second into the next day, not to a second 60', () => {
    expect(dayOfSerial(46145.9999999, false)).toBe('2026-05-04');
  });
});

describe('timeOfSerial', () => {
  it('reads a part of a day as a time, and nothing else', () => {
    expect(timeOfSerial(0.604166666666667)).toBe('14:30:00');
    expect(timeOfSerial(0.99999999)).toBe('23:59:59');
    expect(timeOfSerial(1.5)).toBeUndefined();
    expect(timeOfSerial(-0.1)).toBeUndefined();
  });
});
