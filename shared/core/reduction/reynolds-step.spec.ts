import * as fc from 'fast-check';
import type { ResultInput } from '../ranking/ranking-input';
import { aProgramme, reduced, rulesOf, stepNames } from '../testing/one-result';
import { aFacility, aRanking, aResult, aVariant } from '../testing/ranking-builders';
import { evaluateReduce, reduceResults } from './reduce';
import { reductionContextOf } from './reduction-context';
import { sweepPointsOf } from './sweep-points';

const OFF = { frictionLine: 'off', frictionShare: 0, frictionShareU: 0 } as const;
const SEA_LEVEL = { state: 'iso-2533-sea-level' } as const;
const model = {
  scale: 0.25,
  quotedAreaScale: 'full' as const,
  blockageAlreadyCorrectedBy: 'x',
  air: SEA_LEVEL,
};
const slow = { ...model, speedKmh: 80 };
const speeds = (values: readonly number[], from = 80, step = 45) =>
  values.map((value, i) => ({ value, speedKmh: from + step * i }));
const sweep = (from: number, slope: number, id = 'sw') => ({
  id,
  points: [1, 1.5, 2.2, 3].map((factor, i) => ({ reynolds: from * factor, dragAreaM2: 0.65 - slope * i })),
});

describe('Without a sweep', () => {
  it('a result moves along the friction line unless the programme has switched it off', () => {
    const on = reduced(slow);
    const off = reduced(slow, { programme: aProgramme({ policies: { frictionLine: 'off' } }) });
    const none = reduced(slow, { programme: aProgramme({ policies: OFF }) });
    expect(stepNames(on)).toEqual(['full-scale-drag-area', 'reynolds']);
    expect(stepNames(off)).toEqual(['full-scale-drag-area']);
    expect(off.zeroYaw.dragAreaM2).toBe(none.zeroYaw.dragAreaM2);
    const omitted = on.zeroYaw.dragAreaM2 - off.zeroYaw.dragAreaM2;
    expect(off.amounts.get('friction-share:policy')).toBeCloseTo(omitted, 13);
    expect(off.amounts.get('reynolds-shape:a')).toBeCloseTo(omitted / 2, 13);
    expect([...none.amounts.keys()].filter((key) => /friction|shape/.test(key))).toEqual([]);
  });

  it('two results of one organisation share what is not known of the friction share', () => {
    const both = evaluateReduce(
      aRanking({
        programme: aProgramme({ policies: { policyId: 'v2' } }),
        results: [aResult('r', 'a', slow), aResult('q', 'a', { ...slow, speedKmh: 90 })],
      }),
    );
    const keys = both.reducedResults.map(({ zeroYaw }) => zeroYaw.contributions.map(({ key }) => key));
    expect(keys.every((list) => list.includes('friction-share:v2'))).toBe(true);
  });

  it('a mistyped speed is refused', () => {
    expect(rulesOf({ ...model, speedKmh: 0.01 })).toEqual(['refused:reynolds-out-of-range']);
    expect(rulesOf({ ...model, speedKmh: 0.01 }, { programme: aProgramme({ policies: OFF }) })).toEqual([]);
  });
});

describe('An own sweep', () => {
  const values = [0.2815, 0.2806, 0.2801, 0.2797, 0.2795];
  const own = { ...model, reynoldsMethod: 'own-sweep', points: speeds(values, 110, 40) };

  it('has no drag area of its own at full scale, its lowest Reynolds number, and no repeatability', () => {
    const found = reduced(own);
    expect(found.steps).toEqual([
      { step: 'full-scale-drag-area', dragAreaM2: null },
      { step: 'reynolds', dragAreaM2: found.zeroYaw.dragAreaM2 },
    ]);
    expect(found.reynolds).toBeCloseTo(((110 / 3.6) * 4.5 * 0.25) / 1.4607e-5, -3);
    expect([...found.amounts.keys()]).toEqual([
      'facility-bias:tunnel',
      'installation:r',
      'session:r',
      'sweep-level:r',
      'sweep:r',
    ]);
    const [level] = found.zeroYaw.contributions.filter(({ key }) => key === 'sweep-level:r');
    expect(level).toMatchObject({ varianceEstimate: 'sweep:r', degreesOfFreedom: 3 });
  });

  it('counts what its points share once: weights sum to 1', () => {
    expect(reduced(own).amounts.get('session:r')).toBeCloseTo(0.002, 14);
  });

  it('weighs a stated uncertainty as it weighs its points', () => {
    const found = reduced({ ...own, stated: { expandedU: 0.004, k: 2 } });
    expect(found.amounts.get('stated:r')).toBeCloseTo(0.002 * 2.24, 12);
    expect(found.amounts.has('session:r')).toBe(false);
  });

  it('needs its points, at different speeds, near the reference', () => {
    expect(rulesOf({ ...own, points: speeds([0.28, 0.279]) })).toEqual(['refused:sweep-too-few-points']);
    expect(rulesOf({ ...own, points: speeds([0.28, 0.279, 0.279, 0.278], 100, 0) })).toEqual([
      'refused:sweep-too-narrow',
    ]);
    expect(rulesOf({ ...own, points: speeds([0.28, 0.279, 0.279, 0.278], 20, 5) })).toEqual([
      'refused:sweep-extrapolation',
    ]);
    expect(rulesOf({ ...own, reynoldsMethod: null })).toEqual(['refused:zero-yaw-mixed-speeds']);
  });

  it('is the same as a sweep of another result’s would be, as points', () => {
    const input = aRanking({ programme: aProgramme(), results: [aResult('r', 'a', own)] });
    const [reduction] = reduceResults(input).reductions;
    const points = sweepPointsOf(aResult('r', 'a', own), reductionContextOf(input));
    expect(reduction?.reynolds.kind === 'own-sweep' && reduction.reynolds.fit.points).toEqual(points);
  });

  it('keeps the yaw sweep at one speed: the zero-yaw point of that speed fixes the ratio', () => {
    const yaw = [4, 8].map((yawDeg) => ({ yawDeg, speedKmh: 150, value: 0.28 + yawDeg / 500 }));
    const found = reduced({ ...own, points: [...own.points, ...yaw] });
    expect(found.windAveragedRefusal).toBeNull();
    expect(found.windAveragedDragAreaM2).toBeCloseTo(found.zeroYaw.dragAreaM2 * (found.yawRatio ?? NaN), 14);
  });
});

describe('A result moved along another sweep', () => {
  it('shifts by the slope and carries its uncertainty with its sign, under the sweep’s key', () => {
    const found = reduced(
      { ...model, speedKmh: 150, reynoldsMethod: 'sweep:sw' },
      { sweeps: [sweep(2e6, 0.004)] },
    );
    const [start, moved] = found.steps.map(({ dragAreaM2 }) => dragAreaM2 ?? NaN);
    expect(moved).toBeLessThan(start ?? NaN);
    expect(found.amounts.get('sweep:sw')).toBeLessThan(0);
    expect(found.zeroYaw.contributions.find(({ key }) => key === 'sweep:sw')?.degreesOfFreedom).toBe(2);
  });

  it('is refused by itself where the sweep is not there or does not reach, and others are reduced', () => {
    const input = aRanking({
      programme: aProgramme(),
      sweeps: [sweep(2e6, 0.004), { id: 'short', points: sweep(2e6, 0.004).points.slice(0, 2) }],
      results: [
        aResult('far', 'a', { ...model, speedKmh: 20, reynoldsMethod: 'sweep:sw' }),
        aResult('none', 'a', { ...slow, reynoldsMethod: 'sweep:none' }),
        aResult('short', 'a', { ...slow, reynoldsMethod: 'sweep:short' }),
        aResult('short-too', 'a', { ...slow, reynoldsMethod: 'sweep:short' }),
        aResult('unknown', 'a', { ...slow, reynoldsMethod: 'guess' }),
        aResult('good', 'a', slow),
      ],
    });
    const { reductions, refused } = reduceResults(input);
    expect(reductions.map(({ output }) => output.resultId)).toEqual(['good']);
    expect(refused.map(({ resultId, code }) => [resultId, code])).toEqual([
      ['far', 'sweep-extrapolation'],
      ['none', 'unknown-sweep'],
      ['short', 'sweep-too-few-points'],
      ['short-too', 'sweep-too-few-points'],
      ['unknown', 'unknown-method'],
    ]);
  });

  it('under an id that is there twice refuses the whole', () => {
    const twice = aRanking({ sweeps: [sweep(2e6, 0.004), sweep(2e6, 0.004)] });
    expect(() => reduceResults(twice)).toThrow('duplicate-id');
  });
});

describe('The caution about transition', () => {
  const cautions = (result: Partial<ResultInput>, list = [sweep(1.2e6, 0.0002)]) =>
    reduced({ ...slow, ...result }, { sweeps: list }).cautions;

  it('stands on a slow model and is cleared by a flat sweep that reaches above the minimum', () => {
    expect(cautions({})).toEqual(['transition']);
    expect(cautions({ reynoldsMethod: 'sweep:sw' })).toEqual([]);
  });

  it('stands where the sweep is wholly below the minimum, or is not flat', () => {
    const low = reduced(
      { ...slow, reynoldsMethod: 'sweep:sw' },
      {
        programme: aProgramme({ referenceSpeedKmh: 25 }),
        sweeps: [sweep(0.65e6, 0.0002)],
      },
    );
    expect(low.cautions).toEqual(['transition']);
    expect(cautions({ reynoldsMethod: 'sweep:sw' }, [sweep(1.2e6, 0.004)])).toEqual(['transition']);
  });

  it('is cleared by the sweep that the result itself uses, not by one that is only there', () => {
    expect(cautions({ reynoldsMethod: 'friction-line' })).toEqual(['transition']);
    const own = reduced({
      ...model,
      reynoldsMethod: 'own-sweep',
      points: speeds([0.2802, 0.2801, 0.2801, 0.28], 80, 50),
    });
    expect(own.reynolds).toBeLessThan(2e6);
    expect(own.cautions).toEqual([]);
  });
});

it('The choice of the area that a coefficient is quoted on changes nothing at the reference', () => {
  fc.assert(
    fc.property(fc.double({ min: 0.2, max: 8, noNaN: true }), (factor) => {
      const one = reduced({ ...slow, quotedAreaM2: 2.24, points: [{ value: 0.28, s: 0.0005, n: 5 }] });
      const other = reduced({
        ...slow,
        quotedAreaM2: 2.24 * factor,
        points: [{ value: 0.28 / factor, s: 0.0005 / factor, n: 5 }],
      });
      expect(other.zeroYaw.dragAreaM2).toBeCloseTo(one.zeroYaw.dragAreaM2, 12);
      expect(other.zeroYaw.expandedUncertaintyM2).toBeCloseTo(one.zeroYaw.expandedUncertaintyM2, 12);
    }),
  );
});

it('More drag is more drag at the reference, whatever steps lie between', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.2, max: 0.4, noNaN: true }),
      fc.double({ min: 0.0005, max: 0.05, noNaN: true }),
      fc.constantFrom('none', 'area-ratio', 'maskell', 'factor'),
      (value, more, method) => {
        const facilities = [aFacility('tunnel', { blockage: { method, theta: 1.5, factor: 1.01 } })];
        const at = (coefficient: number) =>
          reduced({ points: [{ value: coefficient }] }, { facilities, variants: [aVariant('a')] }).zeroYaw
            .dragAreaM2;
        expect(at(value + more)).toBeGreaterThan(at(value));
      },
    ),
  );
});
