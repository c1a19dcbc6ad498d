import { airIssues } from './air-rules';

describe('air', () => {
  it('may be a named state alone, or measured with all three figures', () => {
    expect(airIssues({ state: 'un-gtr-15' }, 'air')).toEqual([]);
    expect(airIssues({ temperatureC: 21, pressurePa: 98_900, relativeHumidity: 0.45 }, 'air')).toEqual([]);
    expect(
      airIssues({ state: 'custom', temperatureC: 21, pressurePa: 98_900, relativeHumidity: 0.45 }, 'air'),
    ).toEqual([]);
  });

  it('is refused where a named state and a measured figure contradict each other', () => {
    expect(airIssues({ state: 'un-gtr-15', temperatureC: 21 }, 'air')).toEqual([
      { where: 'air.temperatureC', detail: expect.stringContaining('named state') },
    ]);
  });

  it('is refused by each figure that is missing', () => {
    expect(airIssues({ temperatureC: 21 }, 'referenceAir').map((issue) => issue.where)).toEqual([
      'referenceAir.pressurePa',
      'referenceAir.relativeHumidity',
    ]);
  });

  it.each([
    [{ temperatureC: 293, pressurePa: 98_900, relativeHumidity: 0.4 }, 'temperature-out-of-range'],
    [{ temperatureC: 20, pressurePa: 989, relativeHumidity: 0.4 }, 'pressure-out-of-range'],
    [{ temperatureC: 20, pressurePa: 98_900, relativeHumidity: 40 }, 'humidity-out-of-range'],
  ])('with %j looks mistyped and says what is accepted', (air, reason) => {
    expect(airIssues(air, 'air')).toEqual([
      expect.objectContaining({ reason, detail: expect.stringContaining('is accepted') }),
    ]);
  });

  it('takes the limits themselves', () => {
    expect(airIssues({ temperatureC: -40, pressurePa: 30_000, relativeHumidity: 0 }, 'air')).toEqual([]);
    expect(airIssues({ temperatureC: 60, pressurePa: 1_000_000, relativeHumidity: 1 }, 'air')).toEqual([]);
  });
});
