import { decimalMarkOf, isTable, pastedPoints, readCell } from './pasted-points';

describe('pastedPoints', () => {
  it('reads rows without a header as yaw and value', () => {
    expect(pastedPoints('-5\t0,281\n0\t0,274\n5\t0,283\n')).toEqual([
      { yawDeg: '-5', value: '0,281' },
      { yawDeg: '0', value: '0,274' },
      { yawDeg: '5', value: '0,283' },
    ]);
  });

  it('lets a header decide the columns and skips those it does not know', () => {
    expect(pastedPoints('Run\tC_D\tYaw [°]\tn\r\n12\t0.274\t0\t3\r\n')).toEqual([
      { value: '0.274', yawDeg: '0', n: '3' },
    ]);
  });

  it('reads words common in German workshops', () => {
    expect(pastedPoints('Schräganströmwinkel;cw-Wert\n0;0,274')).toEqual([{ yawDeg: '0', value: '0,274' }]);
  });

  it('skips blank lines and leaves empty cells out', () => {
    expect(pastedPoints('\n0\t0.3\t\t2\n\n')).toEqual([{ yawDeg: '0', value: '0.3', n: '2' }]);
  });

  it('finds nothing in nothing', () => {
    expect(pastedPoints('  \n')).toEqual([]);
  });
});

describe('isTable', () => {
  it.each([
    ['0.274', false],
    ['0.274\n', false],
    ['0\t0.274', true],
    ['0.274\n0.275', true],
  ])('says of %j: %s', (text, table) => {
    expect(isTable(text)).toBe(table);
  });
});

describe('decimalMarkOf', () => {
  it('lets one clear cell decide for those that could be read in two ways', () => {
    const points = pastedPoints('0\t539.612\n5\t541.1');
    expect(decimalMarkOf(points)).toBe('.');
    expect(readCell('539.612', '.')).toBe(539.612);
    expect(decimalMarkOf(pastedPoints('0\t539,612\n5\t541,1'))).toBe(',');
  });

  it('is unclear where every cell can be read in two ways', () => {
    expect(decimalMarkOf(pastedPoints('0\t539.612\n5\t541.118'))).toBe('unclear');
  });

  it('takes thousands for what they are beside the other mark', () => {
    expect(decimalMarkOf(pastedPoints('0\t1.234\n5\t0,5'))).toBe(',');
    expect(readCell('1.234', ',')).toBe(1234);
  });

  it('needs no mark for whole numbers', () => {
    expect(decimalMarkOf(pastedPoints('0\t539\n5\t541'))).toBe('either');
  });
});
