import { PRESSURE_UNITS, SPEED_UNITS, inBaseUnit, limitIn } from './measured-units';

describe('inBaseUnit', () => {
  it.each([
    [140, 'km/h', 140],
    [38.8889, 'm/s', 140.00004],
    [80, 'mph', 128.74752],
  ])('reads %d %s as %d km/h', (typed, unit, base) => {
    expect(inBaseUnit(typed, unit, SPEED_UNITS)).toBeCloseTo(base, 10);
  });

  it('adds no digits by converting', () => {
    expect(inBaseUnit(99.84, 'kPa', PRESSURE_UNITS)).toBe(99840);
    expect(inBaseUnit(998.4, 'hPa', PRESSURE_UNITS)).toBe(99840);
  });
});

describe('limitIn', () => {
  it('says a limit in the unit that was chosen', () => {
    expect(limitIn(30_000, 'hPa', PRESSURE_UNITS)).toBe(300);
  });
});
