import { readTenths } from './tenths';

test('A repeated speed is written once with its count', () => {
  expect(readTenths('\n  0x3 2 17\n  120x2\n')).toEqual([0, 0, 0, 2, 17, 120, 120]);
});

test.each(['1.5', '-3', '12x', 'x4', '7 a'])('The table “%s” is not read', (table) => {
  expect(() => readTenths(table)).toThrow(SyntaxError);
});
