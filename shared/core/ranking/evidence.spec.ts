import { combine } from '../combination/combination';
import { reduceResults } from '../reduction/reduce';
import { Refused } from '../refusal';
import { aFacility, aRanking, aResult, aVariant } from '../testing/ranking-builders';
import { figureOf } from '../uncertainty/budget';
import { pickEvidence } from './evidence';
import { evaluateRank } from './rank';
import type { Basis, EvidenceRule, RankingInput } from './ranking-input';

const sweep = (value: number) => [
  { yawDeg: 0, value, s: 0.0005, n: 5 },
  { yawDeg: 5, value: value * 1.04, s: 0.0005, n: 5 },
  { yawDeg: 10, value: value * 1.1, s: 0.0005, n: 5 },
];

/** Three usable results of one variant, entered out of order, and one that stays out. */
const input = (evidence: EvidenceRule, changes: Partial<RankingInput> = {}): RankingInput =>
  aRanking({
    facilities: [aFacility('tunnel'), aFacility('other', { kind: 'open-jet', areaM2: 24 })],
    variants: [aVariant('a', { evidence })],
    results: [
      aResult('late', 'a', { testDate: '2031-05-01', sessionId: 's2', points: sweep(0.284) }),
      aResult('early', 'a', { testDate: '2031-03-01', sessionId: 's1', points: sweep(0.28) }),
      aResult('second', 'a', {
        testDate: '2031-03-01',
        entrySequence: 1,
        facilityId: 'other',
        points: sweep(0.279),
      }),
      aResult('fixed-floor', 'a', { testDate: '2031-06-01', condition: { ground: 'fixed-floor' } }),
    ],
    ...changes,
  });

const picked = (given: RankingInput, basis: Basis) => {
  const reduced = reduceResults(given);
  return { reduced, evidence: pickEvidence(given.variants, reduced, basis).chosen[0]! };
};

describe('The evidence of a variant', () => {
  test('is its newest usable result by date, then entry', () => {
    const { evidence } = picked(input('newest'), 'zero-yaw');
    expect(evidence).toMatchObject({ evidence: 'newest', resultIds: ['late'], combination: null });
  });

  test('is the weighted mean of all usable ones where the variant says so, oldest first', () => {
    const { evidence, reduced } = picked(input('weighted-mean'), 'zero-yaw');
    expect(evidence.resultIds).toEqual(['early', 'second', 'late']);
    const byId = new Map(reduced.reductions.map(({ output, zeroYaw }) => [output.resultId, zeroYaw]));
    const expected = combine(
      ['early', 'second', 'late'].map((id) => byId.get(id)!),
      'a',
    );
    expect(evidence.figure).toEqual(expected.figure);
    expect(evidence.zeroYaw).toEqual(expected.figure);
    expect(evidence.combination?.weights).toEqual(expected.weights);
  });

  test('on the wind-averaged basis keeps the zero-yaw mean of the same results for energy', () => {
    const given = input('weighted-mean');
    const withoutWind = { ...given, results: [...given.results, aResult('zero-only', 'a')] };
    const { evidence, reduced } = picked(withoutWind, 'wind-averaged');
    expect(evidence.resultIds).toEqual(['early', 'second', 'late']);
    const byId = new Map(reduced.reductions.map((one) => [one.output.resultId, one]));
    const used = evidence.resultIds.map((id) => byId.get(id)!);
    expect(evidence.figure).toEqual(
      combine(
        used.map(({ windAverage }) => windAverage.figure!),
        'a',
      ).figure,
    );
    expect(evidence.zeroYaw).toEqual(
      combine(
        used.map(({ zeroYaw }) => zeroYaw),
        'a',
      ).figure,
    );
  });

  test('of one usable result is that result, and the ranking says so', () => {
    const given = input('weighted-mean');
    const single = evaluateRank({ ...given, results: given.results.slice(0, 1) }, () => {
      throw new Error('no cycle is asked for');
    });
    const newest = evaluateRank({ ...input('newest'), results: given.results.slice(0, 1) }, () => {
      throw new Error('no cycle is asked for');
    });
    const [row] = single.ranking;
    expect(row).toMatchObject({
      evidence: 'weighted-mean',
      resultIds: ['late'],
      combination: { weights: [1], chiSquared: 0, birgeRatio: null, betweenResultsVarianceM4: 0 },
    });
    expect(row?.standardUncertaintyM2).toBe(newest.ranking[0]?.standardUncertaintyM2);
    expect(newest.ranking[0]).not.toHaveProperty('combination');
  });

  test('carries Birge’s widening into the ranked figure', () => {
    const given = input('weighted-mean');
    const [late, early] = given.results;
    const apart = { ...given, results: [late!, { ...early!, points: sweep(0.25) }] };
    const { evidence } = picked(apart, 'zero-yaw');
    expect(evidence.combination?.birgeRatio).toBeGreaterThan(1);
    expect(figureOf(evidence.figure).contributions.map(({ key }) => key)).toContain('combination:a');
  });

  test('is said to be missing where no result is usable, under either rule', () => {
    const given = input('weighted-mean');
    const reduced = reduceResults({ ...given, results: given.results.slice(3) });
    expect(pickEvidence(given.variants, reduced, 'zero-yaw')).toEqual({
      chosen: [],
      variantsWithoutEvidence: [{ variantId: 'a', rule: 'no-usable-evidence' }],
    });
  });

  test('refuses the whole where a result of a mean has no uncertainty of its own', () => {
    const facility = {
      id: 'tunnel',
      kind: 'closed' as const,
      areaM2: 46,
      blockage: { method: 'none' },
      biasUM2: 0.005,
    };
    const exact = [{ value: 0.28, s: 0, n: 2 }];
    const given = input('weighted-mean', {
      facilities: [facility],
      results: [aResult('r1', 'a', { points: exact }), aResult('r2', 'a', { points: exact })],
    });
    expect(() => picked(given, 'zero-yaw')).toThrow(Refused);
    expect(() => picked(given, 'zero-yaw')).toThrow(expect.objectContaining({ code: 'uncertainty-zero' }));
  });
});
