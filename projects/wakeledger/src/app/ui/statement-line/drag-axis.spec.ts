import * as fc from 'fast-check';
import { alongAxis, dragAxis } from './drag-axis';

describe('the drag-area axis', () => {
  it('has round ticks', () => {
    expect(dragAxis([0.54, 0.757])).toMatchObject({
      ticks: [0.56, 0.6, 0.64, 0.68, 0.72, 0.76].map((tick) => expect.closeTo(tick, 10) as number),
      digits: 2,
    });
  });

  it('writes half steps with the digit that they need', () => {
    expect(dragAxis([0, 0.13], 6)).toMatchObject({ digits: 3 });
  });

  it('holds every value with some air, and its ticks are distinct when written', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: 0.02, max: 3, noNaN: true }), { minLength: 1, maxLength: 40 }),
        (values) => {
          const axis = dragAxis(values);
          for (const value of values) {
            expect(alongAxis(value, axis)).toBeGreaterThan(0);
            expect(alongAxis(value, axis)).toBeLessThan(100);
          }
          const written = axis.ticks.map((tick) => tick.toFixed(axis.digits));
          expect(new Set(written).size).toBe(axis.ticks.length);
          expect(axis.ticks.length).toBeGreaterThan(1);
          expect(axis.ticks.length).toBeLessThan(16);
        },
      ),
    );
  });

  it('can be drawn without any value', () => {
    expect(dragAxis([]).ticks.length).toBeGreaterThan(1);
  });
});
