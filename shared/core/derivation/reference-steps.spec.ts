import type { RankingInput, ResultInput } from '../ranking/ranking-input';
import { reduceResults } from '../reduction/reduce';
import { aFacility, aRanking, aResult, aVariant } from '../testing/ranking-builders';
import { derivationAsText, methodChain } from './derivation';
import { traceOfFigure } from './trace-of-figure';

const model: Partial<ResultInput> = {
  facilityId: 'model-tunnel',
  scale: 0.4,
  modelId: 'm',
  speedKmh: 120,
  air: { state: 'iso-2533-sea-level' },
};
const speeds = [70, 105, 145, 190, 240];
const CONDITION = { ground: 'five-belts', wheels: 'rotating', rideHeightFrontMm: 0 };
const elsewhere = { ...CONDITION, ground: 'fixed-floor', rideHeightFrontMm: 6 };
const yawed = [0, 4, 8].map((yawDeg) => ({ yawDeg, value: 0.28 + yawDeg / 500, s: 0.0004, n: 4 }));

const results: readonly ResultInput[] = [
  aResult('line', 'a', { ...model, condition: CONDITION }),
  aResult('own', 'a', {
    ...model,
    condition: CONDITION,
    reynoldsMethod: 'own-sweep',
    points: speeds.map((speedKmh, i) => ({ speedKmh, value: 0.2805 - 0.0006 * i })),
  }),
  aResult('moved', 'a', { ...model, condition: CONDITION, reynoldsMethod: 'sweep:sw' }),
  aResult('adjusted', 'a', { condition: elsewhere, points: yawed }),
  aResult('correlated', 'a', {
    facilityId: 'solver',
    quantity: 'drag-area',
    condition: elsewhere,
    points: [{ value: 0.63 }],
  }),
  aResult('blind', 'a', {
    facilityId: 'solver',
    quantity: 'drag-area',
    air: null,
    speedKmh: null,
    condition: CONDITION,
    points: [{ value: 0.63 }],
  }),
  aResult('included', 'a', {
    condition: { ...CONDITION, wheels: 'stationary' },
    includedWithReason: 'the only run of this clay',
  }),
];

const input: RankingInput = aRanking({
  programme: {
    ...aRanking().programme,
    referenceFacilityId: 'tunnel',
    referenceCondition: CONDITION,
    policies: { policyId: 'v3' },
  },
  facilities: [
    aFacility('tunnel', { name: 'Full-size tunnel' }),
    aFacility('model-tunnel', { areaM2: 8.2, blockage: { method: 'maskell', theta: 1.2 } }),
    aFacility('solver', { kind: 'simulation' }),
  ],
  models: [{ id: 'm', scaleU: 0.0004 }],
  variants: [aVariant('a', { name: 'Hatch' })],
  results,
  sweeps: [
    {
      id: 'sw',
      name: 'Sweep of the estate',
      points: [1.6e6, 2.3e6, 3.4e6, 4.9e6].map((reynolds, i) => ({
        reynolds,
        dragAreaM2: 0.671 - 0.004 * i,
      })),
    },
  ],
  adjustments: [
    {
      id: 'floor',
      name: 'Fixed floor',
      item: 'ground',
      fromValue: 'five-belts',
      toValue: 'fixed-floor',
      deltaDragAreaM2: 0.015,
      uM2: 0.004,
    },
    { id: 'height', item: 'rideHeightFrontMm', perUnitDragAreaM2: 0.0006, uPerUnitM2: 0.00015 },
  ],
  correlations: [
    {
      id: 'solver-line',
      name: 'Solver to tunnel',
      facilityId: 'solver',
      referenceFacilityId: 'tunnel',
      replaces: ['reynolds'],
      pairs: [0.45, 0.55, 0.65, 0.75, 0.85].map((x, i) => ({
        dragAreaM2: x,
        uM2: 0.003,
        referenceDragAreaM2: x * 0.98 + 0.012 + 0.012 * (i % 2),
        referenceUM2: 0.003,
      })),
    },
  ],
});
const reduced = reduceResults(input);
const traceOf = (id: string) => traceOfFigure(input, id, 'zero-yaw');

describe('A derivation to the reference', () => {
  it.each(results.map(({ id }) => id))('of %s ends in the very figure of the ranking', (id) => {
    const output = reduced.reductions.find((one) => one.output.resultId === id)?.output;
    const trace = traceOf(id);
    expect(trace.value).toBe(output?.zeroYaw.dragAreaM2);
    expect(trace.standardUncertainty).toBe(output?.zeroYaw.standardUncertaintyM2);
  });

  it.each(results.map(({ id }) => id))('of %s passes the very figures of every step', (id) => {
    const output = reduced.reductions.find((one) => one.output.resultId === id)?.output;
    const values = traceOf(id).steps.map(({ value }) => value);
    for (const { dragAreaM2 } of output?.steps ?? []) {
      if (dragAreaM2 !== null) expect(values).toContain(dragAreaM2);
    }
  });

  it('of a wind average carries the adjusted figure on', () => {
    const output = reduced.reductions.find((one) => one.output.resultId === 'adjusted')?.output;
    const trace = traceOfFigure(input, 'adjusted', 'wind-averaged');
    expect(trace.value).toBe(output?.windAveragedDragAreaM2);
    expect(methodChain(trace).slice(-6)).toEqual([
      'friction-line@1',
      'condition-adjustment@1',
      'condition-adjustment-per-unit@1',
      'yaw-ratio-j1252@1',
      'wind-averaged-drag-area@1',
      'uncertainty-budget@1',
    ]);
  });

  it.each([
    ['line', ['skin-friction@1', 'friction-line@1']],
    ['own', ['skin-friction@1', 'reynolds-sweep-fit@1', 'reynolds-own-sweep@1']],
    ['moved', ['skin-friction@1', 'reynolds-sweep-fit@1', 'reynolds-sweep-move@1']],
    [
      'correlated',
      [
        'condition-adjustment@1',
        'condition-adjustment-per-unit@1',
        'facility-correlation-fit@1',
        'facility-correlation@1',
      ],
    ],
    ['included', ['skin-friction@1', 'friction-line@1']],
  ])('of %s lists its steps after the full-scale drag area, and no others', (id, expected) => {
    const chain = methodChain(traceOf(id));
    expect(chain.slice(chain.indexOf('full-scale-drag-area@1') + 1, -1)).toEqual(expected);
  });

  it('without air and speed has no Reynolds number, and says what stands for it', () => {
    const trace = traceOf('blind');
    expect(methodChain(trace)).toEqual([
      'stated-drag-area@1',
      'full-scale-drag-area@1',
      'facility-correlation-fit@1',
      'facility-correlation@1',
      'uncertainty-budget@1',
    ]);
    expect(derivationAsText(trace)).toContain(
      'the correlation stands for the correction to the reference Reynolds number',
    );
  });

  it('says in words what was assumed, which sweep, which way an adjustment was used, and why it counts', () => {
    const words = results.map(({ id }) => derivationAsText(traceOf(id))).join('\n');
    for (const expected of [
      'a share of 0.12 ± 0.06 of the drag is skin friction (v3)',
      'the result follows the sweep Sweep of the estate',
      'the adjustment “Fixed floor” holds for this body, used backwards',
      'ground, fixed-floor to five-belts',
      'the figure is that of Full-size tunnel, with the bias of that facility',
      'shown for the first point of the sweep; the other 4 are reduced alike, each at its own speed',
      'not comparable: wheels differ from the reference condition',
      'included with a written reason: “the only run of this clay”',
      'Share of friction in the drag, by the policies: v3',
      'How the body follows the friction line: Hatch',
      'Slope of the Reynolds sweep: Sweep of the estate',
      'Level of the correlation: Solver to tunnel',
      'Scatter between bodies in the correlation: Solver to tunnel, Hatch',
    ]) {
      expect(words).toContain(expected);
    }
    expect(words).not.toMatch(/NaN|undefined/);
  });

  it('says that the friction line is off, and what the correction would have been', () => {
    const off = { ...input.programme, policies: { policyId: 'v4', frictionLine: 'off' as const } };
    const trace = traceOfFigure({ ...input, programme: off }, 'line', 'zero-yaw');
    const on = traceOf('line');
    expect(methodChain(trace)).not.toContain('friction-line@1');
    const omitted = on.value - trace.value;
    const share = trace.budget.find(({ key }) => key === 'friction-share:v4');
    expect(share?.amount).toBeCloseTo(omitted, 12);
    expect(derivationAsText(trace)).toContain('the friction line is off');
  });
});
