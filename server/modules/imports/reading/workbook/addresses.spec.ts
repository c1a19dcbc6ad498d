import * as fc from 'fast-check';
import { addressOf, columnName, placeOf } from './addresses';

describe('addresses of cells', () => {
  it('go there and back for every cell of a sheet', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1_048_576 }),
        fc.integer({ min: 0, max: 16_383 }),
        (row, column) => {
          expect(placeOf(addressOf({ row, column }))).toEqual({ row, column });
        },
      ),
    );
  });

  it('end with XFD1048576', () => {
    expect(columnName(16_383)).toBe('XFD');
    expect(placeOf('$XFD$1048576')).toEqual({ row: 1_048_576, column: 16_383 });
    for (const none of ['XFE1', 'A0', 'A1048577', 'ABCD1', 'A', '1', 'A1:B2', '', 'Ä1'])
      expect(placeOf(none)).toBeUndefined();
  });
});
