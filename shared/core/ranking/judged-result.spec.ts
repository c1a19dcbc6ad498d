import { isSweep, judgedResult, reynoldsMethodOf, sweepIdsOf, usualReynolds } from './judged-result';
import type { ResultInput } from './ranking-input';

const result = (points: ResultInput['points'], rest: Partial<ResultInput> = {}): ResultInput => ({
  id: 'r',
  variantId: 'v',
  facilityId: 'f',
  points,
  ...rest,
});
const straight = (speedKmh?: number) => ({
  yawDeg: 0,
  value: 0.3,
  ...(speedKmh === undefined ? {} : { speedKmh }),
});

describe('a result and what is held of it', () => {
  it('is a sweep where its zero-yaw points were taken at several speeds, and no other', () => {
    expect(isSweep(result([straight(100), straight(140)]))).toBe(true);
    expect(isSweep(result([straight(140), straight()], { speedKmh: 140 }))).toBe(false);
    expect(isSweep(result([straight(140), { yawDeg: 5, value: 0.31, speedKmh: 100 }]))).toBe(false);
    expect(
      isSweep(
        result([
          { value: 300, dynamicPressurePa: 400 },
          { value: 700, dynamicPressurePa: 900 },
        ]),
      ),
    ).toBe(true);
  });

  it('goes by its own sweep where it is one and nobody said otherwise, else by the friction line', () => {
    const sweep = result([straight(100), straight(140)]);
    expect(usualReynolds(sweep)).toEqual({ kind: 'own-sweep' });
    expect(judgedResult(result([straight(140)]), undefined).reynoldsMethod).toBe('friction-line');
    expect(judgedResult(sweep, { reynolds: { kind: 'friction-line' } }).reynoldsMethod).toBe('friction-line');
  });

  it('names the result whose sweep it uses, and carries the reason why it is included', () => {
    const judged = judgedResult(result([straight(140)]), {
      reynolds: { kind: 'sweep-of', resultId: 's1' },
      includedReason: 'Only the mirrors differ',
    });
    expect(judged).toMatchObject({
      reynoldsMethod: 'sweep:s1',
      includedWithReason: 'Only the mirrors differ',
    });
    expect(sweepIdsOf([judged, judged, result([straight(140)])])).toEqual(['s1']);
    expect(reynoldsMethodOf({ kind: 'own-sweep' })).toBe('own-sweep');
  });
});
