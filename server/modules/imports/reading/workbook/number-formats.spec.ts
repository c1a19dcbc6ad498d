import { kindOfFormat } from './number-formats';

describe('kindOfFormat', () => {
  it.each([
    ['General', 'number'],
    ['0.00', 'number'],
    ['#,##0.00 [$€-407]', 'number'],
    ['0.00E+00', 'number'],
    ['_-* #,##0.00_-', 'number'],
    ['@', 'number'],
    // Letters in texts, after a stroke, in a colour or a condition say nothing.
    ['"day "0', 'number'],
    ['0.00 "m/s"', 'number'],
    ['0.00\\ \\d', 'number'],
    ['[Red]0.0', 'number'],
    ['[>1]0.0"s";0.0%', 'number'],
    ['0%', 'percent'],
    ['0.0%', 'percent'],
    ['dd/mm/yyyy', 'date'],
    ['[$-809]d mmmm yyyy;@', 'date'],
    ['mmm-yy', 'date'],
    ['m/d/yy h:mm', 'date'],
    ['yyyy-mm-dd hh:mm', 'date'],
    ['h:mm', 'time'],
    ['mm:ss', 'time'],
    // A duration goes beyond a day: it is no time of a day.
    ['[h]:mm:ss', 'number'],
  ])('%s shows a %s', (code, kind) => {
    expect(kindOfFormat(code)).toBe(kind);
  });
});
