import { decimalsOf } from './from-trace';

describe('decimalsOf', () => {
  it.each([
    [899.312, 2],
    [0.2747, 5],
    [0.00042, 6],
    [41234, 0],
    [0, 0],
  ])('gives %d %d decimals', (value, decimals) => {
    expect(decimalsOf(value)).toBe(decimals);
  });
});
