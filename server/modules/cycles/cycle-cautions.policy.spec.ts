import { checkOwnCycle } from '#shared/core/cycles/own-cycle';
import { totalsOf } from './cycle-cautions.policy';

const own = (speed: readonly number[], time = speed.map((_, i) => i)) =>
  checkOwnCycle({ time, timeUnit: 's', speed, speedUnit: 'km/h' });

describe('the cautions of an own cycle', () => {
  it('are none for a trace that a car can drive', () => {
    expect(totalsOf(own([0, 10, 10, 0]), [2, 3, 4, 5])).toMatchObject({ durationS: 3, cautions: [] });
  });

  it('name the line of the file, not the row of the trace', () => {
    const { cautions } = totalsOf(own([0, 90, 90, 0]), [4, 5, 7, 9]);
    expect(cautions).toEqual([
      expect.stringMatching(/^Line 5 and in 1 more: the speed changes by up to .?25 m\/s/),
    ]);
  });

  it('say what is not counted where a trace begins or ends moving, or has a gap', () => {
    const { cautions } = totalsOf(own([50, 50, 40], [0, 1, 30]), [1, 2, 3]);
    expect(cautions).toEqual([
      expect.stringContaining('Line 3: up to 29 s between two rows'),
      expect.stringContaining('begins at 50 km/h'),
      expect.stringContaining('ends at 40 km/h'),
    ]);
  });
});
