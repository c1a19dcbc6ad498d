import type { FacilityInput, RankingInput, ResultInput } from '../ranking/ranking-input';
import { aProgramme, reduced, rulesOf, stepNames } from '../testing/one-result';
import { aFacility } from '../testing/ranking-builders';

const CONDITION = { ground: 'five-belts', wheels: 'rotating' };

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
    programme: aProgramme({ referenceFacilityId: 'tunnel' }),
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
    expect(stepNames(found)).toEqual(['full-scale-drag-area', 'reynolds', 'facility-correlation']);
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
    expect(stepNames(replaced)).toEqual(['full-scale-drag-area', 'facility-correlation']);
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
      programme: aProgramme({
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
    expect(stepNames(elsewhere)).not.toContain('facility-correlation');
    const own = correlated({ facilityId: 'tunnel' });
    expect(stepNames(reduced({}, own))).not.toContain('facility-correlation');
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
    const { result, ...input } = { ...set, programme: aProgramme({ referenceFacilityId: 'gone' }) };
    expect(rulesOf(result, input)).toEqual(['refused:unknown-facility']);
  });
});
