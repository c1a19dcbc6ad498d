import type { FacilityInput, RankingInput, ResultInput } from '../ranking/ranking-input';
import { aFacility, aRanking, aResult } from '../testing/ranking-builders';
import { evaluateReduce, reduceResults } from './reduce';

const force: Partial<ResultInput> = {
  quantity: 'force',
  tareAlreadySubtracted: true,
  points: [{ value: 500 }],
};

function rulesOf(changes: Partial<ResultInput>, facility: Partial<FacilityInput> = {}): readonly string[] {
  const input = aRanking({
    facilities: [aFacility('tunnel', facility)],
    results: [aResult('r', 'a', changes), aResult('other', 'a')],
  });
  return evaluateReduce(input).excludedResults.find((one) => one.resultId === 'r')?.rules ?? [];
}

const only = (changes: Partial<ResultInput>, input: Partial<RankingInput> = {}) => {
  const [reduced] = evaluateReduce(
    aRanking({ ...input, results: [aResult('r', 'a', changes)] }),
  ).reducedResults;
  if (reduced === undefined) throw new Error('It was refused.');
  return reduced;
};
const amountOf = (reduced: ReturnType<typeof only>, key: string): number | undefined =>
  reduced.zeroYaw.contributions.find((one) => one.key === key)?.amountM2;

describe('A result is refused by itself', () => {
  type Row = readonly [code: string, changes: Partial<ResultInput>, facility?: Partial<FacilityInput>];
  const rows: readonly Row[] = [
    ['unknown-variant', { variantId: 'nobody' }],
    ['unknown-facility', { facilityId: 'nowhere' }],
    ['unknown-model', { modelId: 'none' }],
    ['unknown-quantity', { quantity: 'drag' }],
    ['missing-input', { quantity: null }],
    ['missing-input', { testDate: null }],
    ['missing-input', { scale: null }],
    ['missing-input', { air: null }],
    ['missing-input', { speedKmh: null }],
    ['missing-input', { points: null }],
    ['missing-input', { points: [] }],
    ['missing-input', { points: [{ n: 4 }] }],
    ['missing-input', { quotedAreaM2: null }],
    ['missing-input', { quotedAreaScale: null }],
    ['missing-input', { ...force, tareAlreadySubtracted: null }],
    ['missing-input', { ...force, tareAlreadySubtracted: false }],
    ['missing-input', { stated: { k: 2 } }],
    ['missing-input', { points: [{ value: 0.3 }] }, { repeatabilityURelative: null }],
    ['missing-input', {}, { areaM2: null }],
    ['missing-input', {}, { blockage: null }],
    ['missing-input', {}, { blockage: { method: 'maskell' } }],
    ['missing-input', {}, { blockage: { method: 'factor' } }],
    ['unknown-method', {}, { blockage: { method: 'solid' } }],
    ['not-positive', {}, { areaM2: 0 }],
    ['not-positive', {}, { blockage: { method: 'factor', factor: -1 } }],
    ['not-positive', { quotedAreaM2: 0 }],
    ['not-positive', { speedKmh: 0 }],
    ['not-positive', { points: [{ value: 0.3, n: 0 }] }],
    ['not-positive', { stated: { expandedU: 0.01, k: 0 } }],
    ['drag-not-positive', { points: [{ value: 0 }] }],
    ['drag-not-positive', { ...force, tareAlreadySubtracted: false, tareN: 500 }],
    ['repeatability-needs-two', { points: [{ value: 0.3, s: 0.001 }] }],
    ['scale-out-of-range', { scale: 1.2 }],
    ['model-larger-than-section', {}, { areaM2: 2 }],
    ['yaw-no-zero', { points: [{ value: 0.3, yawDeg: 2 }] }],
    ['zero-yaw-mixed-speeds', { points: [{ value: 0.3 }, { value: 0.3, speedKmh: 100 }] }],
    ['temperature-out-of-range', { air: { temperatureC: 99, pressurePa: 1e5, relativeHumidity: 0 } }],
    ['unknown-air-state', { air: { state: 'isa' } }],
  ];
  it.each(rows.map(([code, changes, facility = {}]) => [code, changes, facility] as const))(
    '%s: %j %j',
    (code, changes, facility) => {
      expect(rulesOf(changes, facility)).toEqual([`refused:${code}`]);
    },
  );

  it('and the others are reduced', () => {
    const input = aRanking({ results: [aResult('bad', 'a', { scale: 2 }), aResult('good', 'a')] });
    expect(reduceResults(input).reductions.map((one) => one.output.resultId)).toEqual(['good']);
  });
});

describe('A point', () => {
  it('goes by its own speed, dynamic pressure and tare before the result’s', () => {
    const reduced = only({
      ...force,
      tareAlreadySubtracted: false,
      tareN: 100,
      points: [{ value: 510, tareN: 10, dynamicPressurePa: 800 }],
    });
    expect(reduced.dynamicPressurePa).toBe(800);
    expect(reduced.modelDragAreaM2).toBeCloseTo(500 / 800, 14);
  });

  it('has the speed that its dynamic pressure stands for where none is given', () => {
    const air = { state: 'iso-2533-sea-level' };
    const reduced = only({ ...force, air, speedKmh: null, dynamicPressurePa: 0.5 * 1.225 * 40 * 40 });
    expect(reduced.mach).toBeCloseTo(40 / 340.294, 6);
  });

  it('as a coastdown is 2 % off in the air of another regulation', () => {
    const dragArea = (state: string) =>
      only({ quantity: 'coastdown-f2', air: { state }, points: [{ value: 0.03 }] }).modelDragAreaM2;
    expect(dragArea('sae-j2263') / dragArea('un-gtr-15')).toBeCloseTo(1.0188, 4);
  });
});

describe('Repeats at zero yaw', () => {
  it('are averaged, their repeatabilities as independent and all else as shared', () => {
    const one = only({ points: [{ value: 0.28, s: 0.001, n: 4 }] });
    const two = only({
      points: [
        { value: 0.28, s: 0.001, n: 4 },
        { value: 0.28, s: 0.001, n: 4 },
      ],
    });
    expect(two.zeroYaw.dragAreaM2).toBeCloseTo(one.zeroYaw.dragAreaM2, 14);
    expect(amountOf(two, 'repeatability:r')).toBeCloseTo(
      (amountOf(one, 'repeatability:r') ?? NaN) / Math.SQRT2,
      14,
    );
    expect(amountOf(two, 'blockage-method:tunnel')).toBeCloseTo(
      amountOf(one, 'blockage-method:tunnel') ?? NaN,
      14,
    );
    const nu = two.zeroYaw.contributions.find((line) => line.key === 'repeatability:r')?.degreesOfFreedom;
    expect(nu).toBeCloseTo(6, 12);
  });
});

describe('A stated uncertainty', () => {
  it('stands for repeatability, session and installation', () => {
    const reduced = only({ stated: { expandedU: 0.006, k: 2, degreesOfFreedom: 8 } });
    expect(reduced.zeroYaw.contributions.map((one) => one.key)).toEqual([
      'blockage-method:tunnel',
      'facility-bias:tunnel',
      'frontal-area:a',
      'stated:r',
    ]);
  });

  it('gives the facility’s bias its own key, and is never less than nothing', () => {
    const within = only({ stated: { expandedU: 0.001, k: 2, includesFacilityBias: true } });
    expect(amountOf(within, 'stated:r')).toBeUndefined();
    expect(amountOf(within, 'facility-bias:tunnel')).toBeCloseTo(0.01 * within.zeroYaw.dragAreaM2, 14);
  });

  it('alone makes no wind average: the points need uncertainties of their own', () => {
    const points = [0, 4, 8].map((yawDeg) => ({ yawDeg, value: 0.28 + yawDeg / 500 }));
    const facilities = [aFacility('tunnel', { repeatabilityURelative: null })];
    const stated = { expandedU: 0.006, k: 2 };
    expect(only({ points, stated }, { facilities }).windAveragedRefusal).toBe('missing-input');
    expect(only({ points, stated }).windAveragedRefusal).toBeNull();
  });
});

describe('A yaw sweep of several speeds', () => {
  const at = (yawDeg: number, speedKmh: number) => ({
    yawDeg,
    speedKmh,
    value: 0.28 + Math.abs(yawDeg) / 500,
  });

  it('has no wind average where the yawed points differ', () => {
    expect(only({ points: [at(0, 140), at(4, 140), at(8, 120)] }).windAveragedRefusal).toBe(
      'yaw-mixed-speeds',
    );
  });

  it('leaves out zero-yaw points of another speed', () => {
    expect(only({ points: [at(0, 140), at(4, 120), at(6, 120), at(8, 120)] }).windAveragedRefusal).toBe(
      'yaw-no-zero',
    );
  });
});

describe('Cautions and exclusions', () => {
  const model = { scale: 0.25, blockageAlreadyCorrectedBy: 'x', quotedAreaScale: 'full' as const };

  it('warn of transition on small models only, and not where turbulence is added', () => {
    expect(only({ ...model, speedKmh: 80 }).cautions).toEqual(['transition']);
    expect(only({ ...model, speedKmh: 80, turbulenceGenerationOrTrips: true }).cautions).toEqual([]);
    expect(only({ speedKmh: 20 }).cautions).toEqual([]);
  });

  it('test blockage also where it was corrected already', () => {
    const facilities = [aFacility('tunnel', { areaM2: 20 })];
    expect(only({ blockageAlreadyCorrectedBy: 'x' }, { facilities }).excludedBy).toEqual(['blockage']);
  });

  it('stand in a set order: Mach, blockage, comparability', () => {
    const facilities = [aFacility('tunnel', { areaM2: 20 })];
    expect(only({ speedKmh: 500, condition: {} }, { facilities }).excludedBy).toEqual([
      'mach',
      'blockage',
      'not-comparable',
    ]);
  });

  it('give simulations a bias of their own kind', () => {
    const facilities = [aFacility('tunnel', { kind: 'simulation' })];
    const reduced = only({}, { facilities });
    expect(reduced.blockageRatio).toBeNull();
    expect(amountOf(reduced, 'simulation-bias:tunnel')).toBeGreaterThan(0);
  });
});

it('Lift and side force pass coefficient and scale only, for the points that state any', () => {
  const reduced = only({
    scale: 0.5,
    quotedAreaScale: 'model',
    quotedAreaM2: 0.56,
    points: [
      { value: 0.28, n: 3, frontLift: 0.05 },
      { value: 0.28, n: 2 },
    ],
  });
  expect(reduced.liftAndSide).toEqual([
    {
      yawDeg: 0,
      frontLiftAreaM2: expect.closeTo(0.05 * 2.24, 13),
      rearLiftAreaM2: null,
      sideForceAreaM2: null,
    },
  ]);
});

it('An id that is there twice refuses the whole', () => {
  expect(() => reduceResults(aRanking({ results: [aResult('r', 'a'), aResult('r', 'a')] }))).toThrow(
    'duplicate-id',
  );
});
