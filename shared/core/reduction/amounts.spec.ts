import * as fc from 'fast-check';
import type { RankingInput, ResultInput } from '../ranking/ranking-input';
import { skinFriction } from '../similarity/skin-friction';
import { everyStep, type Chosen } from '../testing/every-step';
import { reduceResults } from './reduce';
import type { Reduction } from './reduction';

/**
 * Every amount of a budget against the numeric derivative of the whole reduction: the input that the key belongs to is changed
 * by a small part of its own standard uncertainty, and everything is reduced anew.
 */
const PART = 1e-3;

const chosen: fc.Arbitrary<Chosen> = fc.record({
  value: fc.double({ min: 0.22, max: 0.4, noNaN: true }),
  speedKmh: fc.double({ min: 120, max: 240, noNaN: true }),
  share: fc.double({ min: 0, max: 0.3, noNaN: true }),
  theta: fc.double({ min: 0.1, max: 2.5, noNaN: true }),
  method: fc.constantFrom('none', 'area-ratio', 'maskell', 'factor'),
});

function reductionOf(input: RankingInput): Reduction {
  const { reductions, refused } = reduceResults(input);
  const [reduction] = reductions;
  if (reduction === undefined) throw new Error(JSON.stringify(refused));
  return reduction;
}
type Figure = (reduction: Reduction) => number;
const zeroYaw: Figure = (reduction) => reduction.zeroYaw.dragAreaM2;
const windAveraged: Figure = (reduction) => reduction.windAverage.figure?.dragAreaM2 ?? NaN;

/** d(figure)/dt by central differences, t in standard uncertainties of what is changed. */
function slopeOf(change: (t: number) => RankingInput, figure: Figure = zeroYaw): number {
  return (figure(reductionOf(change(PART))) - figure(reductionOf(change(-PART)))) / (2 * PART);
}
const amountOf = (reduction: Reduction, key: string): number =>
  reduction.zeroYaw.budget.find((entry) => entry.key === key)?.amountM2 ?? 0;

function changedResult(
  input: RankingInput,
  change: (result: ResultInput) => Partial<ResultInput>,
): RankingInput {
  return { ...input, results: input.results.map((result) => ({ ...result, ...change(result) })) };
}
const changedPoint = (input: RankingInput, index: number, by: number): RankingInput =>
  changedResult(input, (result) => ({
    points: result.points?.map((point, i) =>
      i === index ? { ...point, value: (point.value ?? NaN) + by } : point,
    ),
  }));

const CHANGES: readonly (readonly [
  string,
  (input: RankingInput, reduction: Reduction, t: number) => RankingInput,
])[] = [
  ['repeatability:r', (input, _reduction, t) => changedPoint(input, 0, (t * 0.0005) / Math.sqrt(5))],
  [
    'stated-area:r',
    (input, _reduction, t) => changedResult(input, () => ({ quotedAreaM2: 0.36 + t * 0.001 })),
  ],
  [
    'frontal-area:a',
    (input, _reduction, t) => ({
      ...input,
      variants: input.variants.map((variant) => ({ ...variant, frontalAreaM2: 2.24 + t * 0.008 })),
    }),
  ],
  [
    'friction-share:policy',
    (input, _reduction, t) => {
      const { policies } = input.programme;
      const frictionShare = (policies?.frictionShare ?? NaN) + t * 0.06;
      return { ...input, programme: { ...input.programme, policies: { ...policies, frictionShare } } };
    },
  ],
  [
    'adjustment:floor',
    (input, _reduction, t) => ({
      ...input,
      adjustments: input.adjustments?.map((one) =>
        one.id === 'floor' ? { ...one, deltaDragAreaM2: 0.015 + t * 0.004 } : one,
      ),
    }),
  ],
  [
    'adjustment:height',
    (input, _reduction, t) => ({
      ...input,
      adjustments: input.adjustments?.map((one) =>
        one.id === 'height' ? { ...one, perUnitDragAreaM2: 0.0006 + t * 0.00015 } : one,
      ),
    }),
  ],
  [
    'correlation-level:c',
    (input, { correlation }, t) => withPairs(input, () => t * (correlation?.fit.levelUncertaintyM2 ?? NaN)),
  ],
  [
    'correlation-slope:c',
    (input, { correlation }, t) =>
      withPairs(
        input,
        (x) => t * (correlation?.fit.slopeUncertainty ?? NaN) * (x - (correlation?.fit.centroidM2 ?? NaN)),
      ),
  ],
];

function withPairs(input: RankingInput, by: (x: number) => number): RankingInput {
  return {
    ...input,
    correlations: input.correlations?.map((one) => ({
      ...one,
      pairs: one.pairs.map((pair) => ({
        ...pair,
        referenceDragAreaM2: pair.referenceDragAreaM2 + by(pair.dragAreaM2),
      })),
    })),
  };
}

describe('With every step, the amount of', () => {
  it.each(CHANGES)('%s is the derivative of the whole reduction', (key, change) => {
    fc.assert(
      fc.property(chosen, (choice) => {
        const input = everyStep(choice);
        const reduction = reductionOf(input);
        const expected = slopeOf((t) => change(input, reduction, t));
        expect(amountOf(reduction, key)).toBeCloseTo(expected, 9);
      }),
      { numRuns: 30 },
    );
  });

  it('session, installation and blockage method is what it is at full scale, times all later derivatives', () => {
    fc.assert(
      fc.property(chosen, (choice) => {
        const input = everyStep(choice);
        const reduction = reductionOf(input);
        const fullScale = reduction.fullScaleM2 ?? NaN;
        const later =
          slopeOf((t) => changedPoint(input, 0, 0.001 * t)) /
          slopeOf(
            (t) => changedPoint(input, 0, 0.001 * t),
            (one) => one.fullScaleM2 ?? NaN,
          );
        const uncorrected = reduction.zeroYawPoints[0]?.uncorrectedDragAreaM2 ?? NaN;
        const method = choice.method === 'none' ? 0.004 * fullScale : 0.4 * (fullScale - uncorrected);
        expect(amountOf(reduction, 'session:r')).toBeCloseTo((0.003 * fullScale + 0.002) * later, 9);
        expect(amountOf(reduction, 'installation:r')).toBeCloseTo(0.001 * later, 9);
        expect(amountOf(reduction, 'blockage-method:hall')).toBeCloseTo(method * later, 9);
      }),
      { numRuns: 30 },
    );
  });

  it('the shape is half the move along the line, times the slope of the correlation', () => {
    fc.assert(
      fc.property(chosen, (choice) => {
        const reduction = reductionOf(everyStep(choice));
        const [start, moved] = reduction.output.steps.map(({ dragAreaM2 }) => dragAreaM2 ?? NaN);
        const half = ((moved ?? NaN) - (start ?? NaN)) / 2;
        expect(amountOf(reduction, 'reynolds-shape:a')).toBeCloseTo(
          half * (reduction.correlation?.fit.slope ?? NaN),
          13,
        );
      }),
      { numRuns: 30 },
    );
  });

  it('the readings of a yaw sweep is that of the wind average, the zero point in one with its repeatability', () => {
    fc.assert(
      fc.property(chosen, (choice) => {
        const input = everyStep(choice);
        const reduction = reductionOf(input);
        const budget = reduction.windAverage.figure?.budget ?? [];
        const found = (key: string) => budget.find((entry) => entry.key === key)?.amountM2 ?? NaN;
        const byPoint = (index: number, u: number) =>
          slopeOf((t) => changedPoint(input, index, t * u), windAveraged);
        expect(found('repeatability:r')).toBeCloseTo(byPoint(0, 0.0005 / Math.sqrt(5)), 6);
        const others = [1, 2, 3, 4].map((index) => byPoint(index, 0.0006 / Math.sqrt(3)));
        expect(found('yaw-ratio:r')).toBeCloseTo(Math.hypot(...others), 6);
      }),
      { numRuns: 20 },
    );
  });
});

describe('The scale as built', () => {
  it('enters through the full-scale drag area', () => {
    fc.assert(
      fc.property(chosen, (choice) => {
        // Without the friction line, because the scale would change the Reynolds number of the test as well.
        const whole = everyStep({
          ...choice,
          method: choice.method === 'area-ratio' ? 'maskell' : choice.method,
        });
        const input = {
          ...whole,
          programme: {
            ...whole.programme,
            policies: { frictionLine: 'off' as const, frictionShare: 0, frictionShareU: 0 },
          },
        };
        const expected = slopeOf((t) => changedResult(input, () => ({ scale: 0.4 + 0.0004 * t })));
        expect(amountOf(reductionOf(input), 'as-built-scale:m')).toBeCloseTo(expected, 8);
      }),
      { numRuns: 30 },
    );
  });
});

describe('With a Reynolds sweep, the amount of', () => {
  const reynolds = [1.6e6, 2.3e6, 3.4e6, 4.9e6, 6.2e6];
  const scattered = [0.671, 0.6664, 0.662, 0.6575, 0.656];

  it('the slope of another’s sweep is the derivative of the whole reduction', () => {
    fc.assert(
      fc.property(chosen, (choice) => {
        const whole = changedResult(everyStep(choice), () => ({ reynoldsMethod: 'sweep:sw' }));
        const withSweep = (by: (c: number) => number): RankingInput => ({
          ...whole,
          sweeps: [
            {
              id: 'sw',
              points: reynolds.map((re, i) => ({
                reynolds: re,
                dragAreaM2: (scattered[i] ?? NaN) + by(skinFriction(re)),
              })),
            },
          ],
        });
        const reduction = reductionOf(withSweep(() => 0));
        const step = reduction.reynolds;
        if (step.kind !== 'sweep') throw new Error(step.kind);
        const expected = slopeOf((t) =>
          withSweep((c) => t * step.fit.slopeUncertaintyM2 * (c - step.fit.meanFriction)),
        );
        expect(amountOf(reduction, 'sweep:sw')).toBeCloseTo(expected, 9);
      }),
      { numRuns: 20 },
    );
  });

  it('level and slope of an own sweep, and of the area that it is stated on, are derivatives', () => {
    fc.assert(
      fc.property(chosen, ({ value }) => {
        const whole = everyStep({ value, speedKmh: 100, share: 0.12, theta: 1, method: 'none' });
        const own = changedResult(whole, () => ({ reynoldsMethod: 'own-sweep' }));
        const with5 = (by: (c: number) => number): RankingInput =>
          changedResult(own, () => ({
            points: [70, 105, 145, 190, 240].map((speedKmh, i) => {
              const friction = frictionOf(whole, speedKmh);
              // The quoted area at full scale per unit of the coefficient.
              const perValue = 0.36 / 0.16;
              return { speedKmh, value: value - 0.0006 * i + 0.0002 * (i % 2) + by(friction) / perValue };
            }),
          }));
        const reduction = reductionOf(with5(() => 0));
        const step = reduction.reynolds;
        if (step.kind !== 'own-sweep') throw new Error(step.kind);
        const { levelUncertaintyM2, slopeUncertaintyM2, meanFriction } = step.fit;
        expect(amountOf(reduction, 'sweep-level:r')).toBeCloseTo(
          slopeOf((t) => with5(() => t * levelUncertaintyM2)),
          9,
        );
        expect(amountOf(reduction, 'sweep:r')).toBeCloseTo(
          slopeOf((t) => with5((c) => t * slopeUncertaintyM2 * (c - meanFriction))),
          9,
        );
        expect(amountOf(reduction, 'stated-area:r')).toBeCloseTo(
          slopeOf((t) =>
            changedResult(
              with5(() => 0),
              () => ({ quotedAreaM2: 0.36 + t * 0.001 }),
            ),
          ),
          9,
        );
      }),
      { numRuns: 20 },
    );
  });
});

/** c_f at a speed of the one result, from its own reduction. */
function frictionOf(input: RankingInput, speedKmh: number): number {
  const at = changedResult(input, () => ({ speedKmh, reynoldsMethod: null }));
  return skinFriction(reductionOf(at).zeroYawPoints[0]?.reynolds ?? NaN);
}
