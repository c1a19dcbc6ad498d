import * as fc from 'fast-check';
import type { FacilityInput, ProgrammeInput, RankingInput, ResultInput } from '../ranking/ranking-input';
import type { ReducedResult } from '../ranking/ranking-output';
import { aFacility, aRanking, aResult, aVariant } from '../testing/ranking-builders';
import { evaluateReduce, reduceResults } from './reduce';
import { reductionContextOf } from './reduction-context';
import { sweepPointsOf } from './sweep-points';

const CONDITION = { ground: 'five-belts', wheels: 'rotating' };
const programme = (changes: Partial<ProgrammeInput> = {}): ProgrammeInput => ({
  ...aRanking().programme,
  policies: null,
  ...changes,
});
const OFF = { frictionLine: 'off', frictionShare: 0, frictionShareU: 0 } as const;
const SEA_LEVEL = { state: 'iso-2533-sea-level' } as const;

function reduced(
  result: Partial<ResultInput>,
  input: Partial<RankingInput> = {},
): ReducedResult & { readonly amounts: ReadonlyMap<string, number> } {
  const whole = aRanking({ programme: programme(), ...input, results: [aResult('r', 'a', result)] });
  const output = evaluateReduce(whole);
  const [only] = output.reducedResults;
  if (only === undefined) throw new Error(`It was refused: ${JSON.stringify(output.excludedResults)}`);
  return {
    ...only,
    amounts: new Map(only.zeroYaw.contributions.map(({ key, amountM2 }) => [key, amountM2])),
  };
}

function rulesOf(result: Partial<ResultInput>, input: Partial<RankingInput> = {}): readonly string[] {
  const whole = aRanking({ programme: programme(), ...input, results: [aResult('r', 'a', result)] });
  return evaluateReduce(whole).excludedResults[0]?.rules ?? [];
}

const steps = ({ steps: list }: ReducedResult): readonly string[] => list.map(({ step }) => step);
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
    const off = reduced(slow, { programme: programme({ policies: { frictionLine: 'off' } }) });
    const none = reduced(slow, { programme: programme({ policies: OFF }) });
    expect(steps(on)).toEqual(['full-scale-drag-area', 'reynolds']);
    expect(steps(off)).toEqual(['full-scale-drag-area']);
    expect(off.zeroYaw.dragAreaM2).toBe(none.zeroYaw.dragAreaM2);
    const omitted = on.zeroYaw.dragAreaM2 - off.zeroYaw.dragAreaM2;
    expect(off.amounts.get('friction-share:policy')).toBeCloseTo(omitted, 13);
    expect(off.amounts.get('reynolds-shape:a')).toBeCloseTo(omitted / 2, 13);
    expect([...none.amounts.keys()].filter((key) => /friction|shape/.test(key))).toEqual([]);
  });

  it('two results of one organisation share what is not known of the friction share', () => {
    const both = evaluateReduce(
      aRanking({
        programme: programme({ policies: { policyId: 'v2' } }),
        results: [aResult('r', 'a', slow), aResult('q', 'a', { ...slow, speedKmh: 90 })],
      }),
    );
    const keys = both.reducedResults.map(({ zeroYaw }) => zeroYaw.contributions.map(({ key }) => key));
    expect(keys.every((list) => list.includes('friction-share:v2'))).toBe(true);
  });

  it('a mistyped speed is refused', () => {
    expect(rulesOf({ ...model, speedKmh: 0.01 })).toEqual(['refused:reynolds-out-of-range']);
    expect(rulesOf({ ...model, speedKmh: 0.01 }, { programme: programme({ policies: OFF }) })).toEqual([]);
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
    const input = aRanking({ programme: programme(), results: [aResult('r', 'a', own)] });
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
      programme: programme(),
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
        programme: programme({ referenceSpeedKmh: 25 }),
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

describe('The condition', () => {
  const floor = {
    id: 'floor',
    item: 'ground',
    fromValue: 'fixed-floor',
    toValue: 'five-belts',
    deltaDragAreaM2: -0.012,
    uM2: 0.003,
  };
  const ground = (value: string | null) => ({ condition: { ...CONDITION, ground: value } });
  const withFloor = { adjustments: [floor] };

  it('is adjusted forwards, and backwards with the sign turned', () => {
    const plain = reduced({});
    const forwards = reduced(ground('fixed-floor'), withFloor);
    const backwards = reduced(ground('fixed-floor'), {
      adjustments: [{ ...floor, fromValue: 'five-belts', toValue: 'fixed-floor', deltaDragAreaM2: 0.012 }],
    });
    for (const found of [forwards, backwards]) {
      expect(found.zeroYaw.dragAreaM2).toBeCloseTo(plain.zeroYaw.dragAreaM2 - 0.012, 13);
      expect(steps(found)).toEqual(['full-scale-drag-area', 'reynolds', 'condition-adjustments']);
      expect(found.excludedBy).toEqual([]);
    }
    expect(forwards.amounts.get('adjustment:floor')).toBe(0.003);
    expect(backwards.amounts.get('adjustment:floor')).toBe(-0.003);
  });

  it('is adjusted by the first that fits, and only for the variants that it holds for', () => {
    const second = { ...floor, id: 'second', deltaDragAreaM2: -0.02 };
    const found = reduced(ground('fixed-floor'), { adjustments: [floor, second] });
    expect(found.amounts.has('adjustment:second')).toBe(false);
    const other = reduced(ground('fixed-floor'), {
      adjustments: [
        { ...floor, variantIds: ['b'] },
        { ...second, variantIds: ['a', 'b'] },
      ],
    });
    expect(other.amounts.has('adjustment:floor')).toBe(false);
    expect(other.amounts.get('adjustment:second')).toBe(0.003);
  });

  it('of a number is adjusted per unit, times reference minus test', () => {
    const found = reduced(
      { condition: { ...CONDITION, rideHeightFrontMm: 12 } },
      {
        programme: programme({ referenceCondition: { ...CONDITION, rideHeightFrontMm: 2 } }),
        adjustments: [
          {
            id: 'height',
            item: 'rideHeightFrontMm',
            perUnitDragAreaM2: 0.0004,
            uPerUnitM2: 0.0001,
            degreesOfFreedom: 5,
          },
        ],
      },
    );
    expect(found.zeroYaw.dragAreaM2 - reduced({}).zeroYaw.dragAreaM2).toBeCloseTo(-0.004, 12);
    expect(found.amounts.get('adjustment:height')).toBeCloseTo(-0.001, 14);
  });

  it('that nothing adjusts keeps a result out: another value, an item not stated, a number as text', () => {
    expect(reduced(ground('one-belt'), withFloor).excludedBy).toEqual(['not-comparable']);
    expect(reduced(ground(null), withFloor).excludedBy).toEqual(['not-comparable']);
    expect(rulesOf(ground('fixed-floor'))).toEqual(['not-comparable']);
  });

  it('that is adjusted in one item and differs in another is adjusted and stays out', () => {
    const found = reduced({ condition: { ground: 'fixed-floor', wheels: 'stationary' } }, withFloor);
    expect(found.amounts.get('adjustment:floor')).toBe(0.003);
    expect(found.excludedBy).toEqual(['not-comparable']);
  });

  it('is included with a written reason, which is a caution; a blank one is none', () => {
    const found = reduced({ ...ground('one-belt'), includedWithReason: 'the only run of this clay' });
    expect(found).toMatchObject({ cautions: ['included-with-reason'], excludedBy: [] });
    expect(reduced({ ...ground('one-belt'), includedWithReason: '  ' }).excludedBy).toEqual([
      'not-comparable',
    ]);
    expect(reduced({ includedWithReason: 'not needed' }).cautions).toEqual([]);
  });

  it.each([
    [{ id: 'x', item: 'ground' }, 'adjustments.0.fromValue'],
    [{ ...floor, uM2: null }, 'adjustments.0.uM2'],
    [{ ...floor, deltaDragAreaM2: null }, 'adjustments.0.deltaDragAreaM2'],
    [{ id: 'x', item: 'rideHeightFrontMm', perUnitDragAreaM2: 0.001 }, 'adjustments.0.uPerUnitM2'],
  ])('is not adjusted by half an adjustment: %j', (adjustment, where) => {
    expect(() => reduceResults(aRanking({ adjustments: [adjustment] }))).toThrow(
      expect.objectContaining({ code: 'missing-input', where }),
    );
  });
});

describe('A correlation to the reference facility', () => {
  const pairs = [0.45, 0.55, 0.65, 0.75, 0.85].map((x, i) => ({
    dragAreaM2: x,
    uM2: 0.003,
    referenceDragAreaM2: 0.9 * x + 0.05 + 0.001 * (i % 2),
    referenceUM2: 0.003,
  }));
  const line = { id: 'c', facilityId: 'solver', referenceFacilityId: 'tunnel', pairs };
  const solver: Partial<ResultInput> = {
    facilityId: 'solver',
    quantity: 'drag-area',
    points: [{ value: 0.62, s: 0.0008, n: 4 }],
  };
  const correlated = (
    changes: object = {},
    result: Partial<ResultInput> = {},
    facility: Partial<FacilityInput> = { kind: 'simulation' },
  ): Partial<RankingInput> & { readonly result: Partial<ResultInput> } => ({
    programme: programme({ referenceFacilityId: 'tunnel' }),
    facilities: [
      aFacility('tunnel', { biasURelative: 0.008, biasUM2: 0.001 }),
      aFacility('solver', facility),
    ],
    correlations: [{ ...line, ...changes }],
    result: { ...solver, ...result },
  });
  const run = (setUp: ReturnType<typeof correlated>) => {
    const { result, ...input } = setUp;
    return reduced(result, input);
  };

  it('gives the reference facility’s bias instead of the own one, and all else times b', () => {
    const without = reduced(solver, { ...correlated(), correlations: [] });
    const found = run(correlated());
    expect(steps(found)).toEqual(['full-scale-drag-area', 'reynolds', 'facility-correlation']);
    expect(found.amounts.has('simulation-bias:solver')).toBe(false);
    expect(found.amounts.get('facility-bias:tunnel')).toBeCloseTo(
      0.008 * found.zeroYaw.dragAreaM2 + 0.001,
      14,
    );
    const slope = (found.amounts.get('session:r') ?? NaN) / (without.amounts.get('session:r') ?? NaN);
    expect(slope).toBeCloseTo(0.9, 2);
    for (const key of ['installation:r', 'repeatability:r', 'friction-share:policy', 'reynolds-shape:a']) {
      expect(found.amounts.get(key)).toBeCloseTo((without.amounts.get(key) ?? NaN) * slope, 14);
    }
    expect(found.zeroYaw.contributions.find(({ key }) => key === 'correlation-level:c')).toMatchObject({
      degreesOfFreedom: 3,
      varianceEstimate: 'correlation:c',
    });
  });

  it('that replaces steps skips them and their keys', () => {
    const tunnel = {
      kind: 'closed',
      blockage: { method: 'area-ratio', uFractionOfCorrection: 0.5 },
    } as const;
    const none = run(correlated({}, {}, tunnel));
    const replaced = run(correlated({ replaces: ['blockage', 'reynolds'] }, {}, tunnel));
    expect([...none.amounts.keys()]).toContain('blockage-method:solver');
    expect([...replaced.amounts.keys()].filter((key) => /blockage|frontal|friction|shape/.test(key))).toEqual(
      [],
    );
    expect(steps(replaced)).toEqual(['full-scale-drag-area', 'facility-correlation']);
    expect(replaced.blockageCorrectedModelDragAreaM2).toBe(replaced.modelDragAreaM2);
    expect(replaced.blockageRatio).toBe(none.blockageRatio);
  });

  it('that replaces blockage leaves the section’s limits standing, and needs no method', () => {
    const small = { kind: 'closed', areaM2: 20, blockage: null } as const;
    expect(run(correlated({ replaces: ['blockage'] }, {}, small)).excludedBy).toEqual(['blockage']);
  });

  it('that replaces ground simulation compares the other items only', () => {
    const condition = { ground: 'fixed-floor', wheels: 'stationary' };
    const adjustments = [
      {
        id: 'f',
        item: 'ground',
        fromValue: 'fixed-floor',
        toValue: 'five-belts',
        deltaDragAreaM2: -1,
        uM2: 1,
      },
    ];
    const found = run({ ...correlated({ replaces: ['ground-simulation'] }, { condition }), adjustments });
    expect(found.excludedBy).toEqual([]);
    expect(found.amounts.has('adjustment:f')).toBe(false);
    const mirrors = {
      ...correlated({ replaces: ['ground-simulation'] }, { condition }),
      programme: programme({
        referenceFacilityId: 'tunnel',
        referenceCondition: { ...CONDITION, mirrors: 'series' },
      }),
    };
    expect(run(mirrors).excludedBy).toEqual(['not-comparable']);
  });

  it('that replaces Reynolds needs neither air nor speed; the numbers are then unknown, not 0', () => {
    const blind = { air: null, speedKmh: null };
    expect(run(correlated({ replaces: ['reynolds'] }, blind))).toMatchObject({
      reynolds: null,
      mach: null,
      excludedBy: [],
      cautions: [],
    });
    const { result, ...input } = correlated({}, blind);
    expect(rulesOf(result, input)).toEqual(['refused:missing-input']);
    const force = correlated(
      { replaces: ['reynolds'] },
      { ...blind, quantity: 'force', tareAlreadySubtracted: true },
    );
    expect(rulesOf(force.result, { ...force })).toEqual(['refused:missing-input']);
  });

  it('is used only where its reference is the programme’s and the facility is not, the first one', () => {
    const elsewhere = run(correlated({ referenceFacilityId: 'other' }));
    expect(steps(elsewhere)).not.toContain('facility-correlation');
    const own = correlated({ facilityId: 'tunnel' });
    expect(steps(reduced({}, own))).not.toContain('facility-correlation');
    const two = correlated();
    const second = { ...line, id: 'd', pairs: pairs.slice(0, 3) };
    expect(run({ ...two, correlations: [line, second] }).amounts.has('correlation-level:c')).toBe(true);
    expect(run({ ...two, correlations: [second, line] }).amounts.has('correlation-level:d')).toBe(true);
  });

  it.each<readonly [string, object]>([
    ['correlation-range', { pairs: pairs.slice(0, 2) }],
    ['correlation-too-few-pairs', { pairs: [] }],
    [
      'correlation-negative-slope',
      { pairs: pairs.map((one) => ({ ...one, referenceDragAreaM2: 1 - one.dragAreaM2 })) },
    ],
    ['correlation-no-spread', { pairs: pairs.map((one) => ({ ...one, dragAreaM2: 0.62 })) }],
    ['uncertainty-zero', { pairs: pairs.map((one) => ({ ...one, uM2: 0, referenceUM2: 0 })) }],
  ])('is refused by itself: %s', (code, changes) => {
    const { result, ...input } = correlated(changes);
    expect(rulesOf(result, input)).toEqual([`refused:${code}`]);
  });

  it('to a facility that is not there is refused', () => {
    const set = correlated({ referenceFacilityId: 'gone' });
    const { result, ...input } = { ...set, programme: programme({ referenceFacilityId: 'gone' }) };
    expect(rulesOf(result, input)).toEqual(['refused:unknown-facility']);
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
