import { fiveVariants } from '../../testing/ranking-scenario';
import { canonicalText } from '../canonical-text';
import { evaluateEvidence } from './evaluation';
import { evidenceInputOf, type EvidenceChoice } from './evaluation-input';
import { evaluateRank } from './rank';
import type { RankingInput, ResultInput } from './ranking-input';
import { withSweeps } from './sweeps';

const SPORT: EvidenceChoice = { variantId: 'sport', resultIds: ['r-sport'], rule: 'newest' };
const rank = (input: RankingInput) => evaluateRank(input, () => undefined);

/** The scenario with a second result of the sport, a little higher. */
function withRepeat(): RankingInput {
  const { inputs } = fiveVariants();
  const own = inputs.results.find(({ id }) => id === 'r-sport')!;
  const again: ResultInput = {
    ...own,
    id: 'r-again',
    name: 'VT-0050',
    sessionId: 'spring',
    testDate: '2026-11-02',
    entrySequence: 50,
    points: own.points!.map((point) => ({ ...point, value: point.value! * 1.004 })),
  };
  return { ...inputs, results: [...inputs.results, again] };
}

describe('the evidence of one variant', () => {
  it('comes to the figure that the ranking of the whole programme has, on both bases', () => {
    const { inputs } = fiveVariants();
    const { output } = evaluateEvidence(evidenceInputOf(inputs, SPORT));
    const ranked = rank(inputs).ranking.find(({ variantId }) => variantId === 'sport');
    const { dragAreaM2, expandedUncertaintyM2, contributions } = ranked!;
    expect(output.zeroYaw).toMatchObject({ dragAreaM2, expandedUncertaintyM2, contributions });
    const windy = rank({ ...inputs, request: { basis: 'wind-averaged' } }).ranking;
    expect(output.windAveraged?.dragAreaM2).toBe(
      windy.find(({ variantId }) => variantId === 'sport')?.dragAreaM2,
    );
    expect(output.usedResultIds).toEqual(['r-sport']);
    expect(output.combination).toBeNull();
  });

  it('as a weighted mean has weights that sum to 1 and says how its results agree', () => {
    const choice = { ...SPORT, resultIds: ['r-again', 'r-sport'], rule: 'weighted-mean' } as const;
    const { output, methods } = evaluateEvidence(evidenceInputOf(withRepeat(), choice));
    expect(output.usedResultIds).toEqual(['r-sport', 'r-again']);
    expect(output.combination?.weights.reduce((sum, weight) => sum + weight, 0)).toBeCloseTo(1, 14);
    expect(output.combination?.birgeRatio).toBeGreaterThan(0);
    expect(output.results.map(({ resultId }) => resultId)).toEqual(['r-again', 'r-sport']);
    expect(new Set(methods).size).toBe(methods.length);
    expect(methods.every((name) => /^[a-z0-9-]+@\d+$/.test(name))).toBe(true);
  });

  it('holds what it needs of the programme and nothing else, so that the rest may change', () => {
    const { inputs } = fiveVariants();
    const whole: RankingInput = {
      ...inputs,
      sweeps: [{ id: 'unused', points: [] }],
      adjustments: [{ id: 'ride', item: 'ride-height' }],
      correlations: [{ id: 'c', facilityId: 'solver', referenceFacilityId: 'belt', pairs: [] }],
    };
    const own = evidenceInputOf(whole, SPORT);
    expect([own.variants, own.results, own.facilities].map((list) => list.map(({ id }) => id))).toEqual([
      ['sport'],
      ['r-sport'],
      ['belt'],
    ]);
    expect([own.sweeps, own.adjustments, own.correlations]).toEqual([[], [], []]);
    const fewer = { ...whole, results: whole.results.filter(({ id }) => id === 'r-sport') };
    expect(canonicalText(evidenceInputOf(fewer, SPORT))).toBe(canonicalText(own));
  });

  it('keeps the adjustment that a result’s condition needs, and the sweep that it uses', () => {
    const { inputs } = fiveVariants();
    const whole: RankingInput = {
      ...inputs,
      results: inputs.results.map((result) =>
        result.id === 'r-fixed' ? { ...result, reynoldsMethod: 'sweep:s1' } : result,
      ),
      sweeps: [
        { id: 's1', points: [] },
        { id: 's2', points: [] },
      ],
      adjustments: [
        { id: 'belt', item: 'ground', fromValue: 'fixed-floor', toValue: 'one-belt' },
        { id: 'wheels', item: 'wheels' },
      ],
    };
    const own = evidenceInputOf(whole, { variantId: 'crossback', resultIds: ['r-fixed'], rule: 'newest' });
    expect([own.sweeps, own.adjustments].map((list) => list?.map(({ id }) => id))).toEqual([
      ['s1'],
      ['belt'],
    ]);
  });

  it('comes to nothing where no result is usable, and says by which rule', () => {
    const { inputs } = fiveVariants();
    const { output, methods } = evaluateEvidence(
      evidenceInputOf(inputs, { variantId: 'crossback', resultIds: ['r-fixed'], rule: 'newest' }),
    );
    expect([output.zeroYaw, output.windAveraged, output.usedResultIds, methods]).toEqual([
      null,
      null,
      [],
      [],
    ]);
    expect(output.excluded).toEqual([{ resultId: 'r-fixed', rules: ['not-comparable'] }]);
  });

  it('recomputes to the same from its own text', () => {
    const input = evidenceInputOf(withRepeat(), {
      ...SPORT,
      resultIds: ['r-sport', 'r-again'],
      rule: 'weighted-mean',
    });
    expect(evaluateEvidence(JSON.parse(canonicalText(input)) as RankingInput)).toEqual(
      evaluateEvidence(input),
    );
  });
});

describe('the sweeps that results use', () => {
  const sweepResult = (id: string): ResultInput => {
    const { inputs } = fiveVariants();
    const own = inputs.results.find((result) => result.id === 'r-sport')!;
    return {
      ...own,
      id,
      name: 'VT-0060',
      reynoldsMethod: 'own-sweep',
      points: [80, 100, 130, 160].map((speedKmh) => ({
        yawDeg: 0,
        value: 0.29 - 0.00004 * speedKmh,
        speedKmh,
      })),
    };
  };
  const using = (id: string): RankingInput => {
    const { inputs } = fiveVariants();
    return {
      ...inputs,
      results: inputs.results.map((result) =>
        result.id === 'r-sport' ? { ...result, reynoldsMethod: `sweep:${id}` } : result,
      ),
    };
  };

  it('are the zero-yaw points of the results that they are of, whether those are ranked or not', () => {
    const { sweeps } = withSweeps(using('s1'), [sweepResult('s1'), sweepResult('s2')]);
    expect(sweeps?.map(({ id, name }) => [id, name])).toEqual([['s1', 'VT-0060']]);
    const points = sweeps?.[0]?.points ?? [];
    expect(points.map(({ reynolds }) => reynolds / points[0]!.reynolds)).toEqual([
      1,
      expect.closeTo(1.25, 12),
      expect.closeTo(1.625, 12),
      expect.closeTo(2, 12),
    ]);
    expect(points.map(({ dragAreaM2 }) => dragAreaM2)).toEqual(
      points.map(({ dragAreaM2 }) => dragAreaM2).toSorted((a, b) => b - a),
    );
  });

  it('are left out where the result is gone or cannot be reduced; who uses it is refused by name', () => {
    const broken = { ...sweepResult('s1'), air: null };
    for (const candidates of [[], [broken]]) {
      const input = withSweeps(using('s1'), candidates);
      expect(input.sweeps).toEqual([]);
      const { excludedResults } = rank(input);
      expect(excludedResults).toContainEqual(
        expect.objectContaining({ resultId: 'r-sport', rules: ['refused:unknown-sweep'] }),
      );
    }
  });
});
