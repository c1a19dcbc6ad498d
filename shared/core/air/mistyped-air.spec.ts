import { pressureMistypedAs, temperatureMistypedAs } from './mistyped-air';

describe('air typed in the wrong unit', () => {
  it('is recognised where 293 was typed as degrees Celsius and meant in kelvin', () => {
    expect(temperatureMistypedAs(293)).toEqual({ unit: 'K', converted: expect.closeTo(19.85, 10) });
    expect(temperatureMistypedAs(288.15)).toEqual({ unit: 'K', converted: expect.closeTo(15, 10) });
  });

  it.each([20, -40, 60, 100, -100, 400])('is not guessed at for %d °C', (typed) => {
    expect(temperatureMistypedAs(typed)).toBeUndefined();
  });

  it.each([
    [1013.25, 'hPa', 101_325],
    [989, 'hPa', 98_900],
    [101.325, 'kPa', 101_325],
    [1.013, 'bar', 101_300],
    [6, 'bar', 600_000],
  ])('is recognised where %d was typed as pascals and meant in %s', (typed, unit, pascals) => {
    expect(pressureMistypedAs(typed)).toEqual({ unit, converted: expect.closeTo(pascals, 6) });
  });

  it.each([101_325, 30_000, 1_000_000, 0, 0.01, 20_000, 2_000_000])(
    'is not guessed at for %d Pa',
    (typed) => {
      expect(pressureMistypedAs(typed)).toBeUndefined();
    },
  );
});
