import { BODY_SHAPES } from '#shared/contracts/variants';
import { silhouette } from './silhouette';

describe('a silhouette', () => {
  it.each(BODY_SHAPES)('of a %s stays within its dimensions and stands on the ground', (bodyShape) => {
    const drawn = silhouette({ bodyShape, lengthMm: 4300, heightMm: 1480, wheelbaseMm: 2650 });
    const numbers = [...drawn.body.matchAll(/-?\d+/g)].map(Number);
    expect(Math.min(...numbers)).toBeGreaterThan(-60);
    expect(Math.max(...numbers)).toBeLessThan(4300 + 60);
    expect(drawn.body).not.toContain('NaN');
    expect(drawn.glass).not.toBe('');
    const [front, rear] = drawn.wheels;
    expect((rear?.x ?? 0) - (front?.x ?? 0)).toBeCloseTo(2650, 6);
    for (const wheel of drawn.wheels) expect(wheel.y + wheel.radius).toBeCloseTo(1480, 6);
  });

  it('fits its wheels even where the wheelbase is stated too long', () => {
    const { wheels, width } = silhouette({
      bodyShape: 'other',
      lengthMm: 3000,
      heightMm: 1500,
      wheelbaseMm: 3500,
    });
    for (const { x, radius } of wheels) {
      expect(x - radius).toBeGreaterThanOrEqual(0);
      expect(x + radius).toBeLessThanOrEqual(width);
    }
  });
});
