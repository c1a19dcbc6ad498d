import { evaluateReduce } from '../reduction/reduce';
import { aFacility, aRanking, aResult, aVariant } from '../testing/ranking-builders';
import type { RankingInput } from '../ranking/ranking-input';
import { candidatePairs, type ReplacedStep } from './candidate-pairs';

const FACILITIES = [
  aFacility('small', { areaM2: 30, blockage: { method: 'area-ratio', uFractionOfCorrection: 0.5 } }),
  aFacility('large', { areaM2: 90 }),
];
const small = (id: string, variantId: string, changes = {}) =>
  aResult(id, variantId, { facilityId: 'small', ...changes });
const large = (id: string, variantId: string, changes = {}) =>
  aResult(id, variantId, { facilityId: 'large', points: [{ value: 0.285, s: 0.0004, n: 4 }], ...changes });

const INPUT = aRanking({
  facilities: FACILITIES,
  variants: [aVariant('hatch'), aVariant('estate'), aVariant('coupe')],
  results: [
    small('hatch small', 'hatch'),
    large('hatch large', 'hatch', { testDate: '2031-02-01' }),
    large('hatch large newer', 'hatch', { testDate: '2031-04-01' }),
    small('estate small', 'estate'),
  ],
});
const pairsOf = (input: RankingInput, replaces: readonly ReplacedStep[] = []) =>
  candidatePairs(input, { facilityId: 'small', referenceFacilityId: 'large', replaces });

describe('candidate pairs', () => {
  it('are one variant with a result in each facility, the newest of both first', () => {
    expect(
      pairsOf(INPUT).pairs.map(({ variantId, referenceResultId, newest }) => [
        variantId,
        referenceResultId,
        newest,
      ]),
    ).toEqual([
      ['hatch', 'hatch large newer', true],
      ['hatch', 'hatch large', false],
    ]);
  });

  it('carry the figures as they are reduced, with u but for the bias of the facility itself', () => {
    const [pair] = pairsOf(INPUT).pairs;
    const reduced = evaluateReduce(INPUT).reducedResults.find(({ resultId }) => resultId === 'hatch small');
    const figure = reduced!.zeroYaw;
    const bias = figure.contributions.find(({ key }) => key === 'facility-bias:small')!;
    expect(pair?.dragAreaM2).toBe(figure.dragAreaM2);
    expect(bias.amountM2).toBeGreaterThan(0);
    expect(pair!.uM2 ** 2 + bias.amountM2 ** 2).toBeCloseTo(figure.standardUncertaintyM2 ** 2, 15);
  });

  it('are what enters the correlation once it stands for a step: never corrected twice', () => {
    const correlation = {
      id: 'c',
      facilityId: 'small',
      referenceFacilityId: 'large',
      replaces: ['blockage'] as const,
      pairs: [0.5, 0.6, 0.7, 0.8].map((x) => ({
        dragAreaM2: x,
        uM2: 0.004,
        referenceDragAreaM2: x - 0.02,
        referenceUM2: 0.003,
      })),
    };
    const correlated = evaluateReduce({
      ...INPUT,
      programme: { ...INPUT.programme, referenceFacilityId: 'large' },
      correlations: [correlation],
    });
    const carried = correlated.reducedResults.find(({ resultId }) => resultId === 'hatch small')!;
    const before = pairsOf(INPUT, ['blockage']).pairs[0]!;
    expect(before.dragAreaM2).toBeCloseTo(carried.zeroYaw.dragAreaM2 + 0.02, 12);
    expect(before.dragAreaM2).toBeGreaterThan(pairsOf(INPUT).pairs[0]!.dragAreaM2);
    expect(before.referenceDragAreaM2).toBe(pairsOf(INPUT).pairs[0]!.referenceDragAreaM2);
  });

  it('leave out the difference of the ground where the correlation stands for it, and name it where it does not', () => {
    const fixed = {
      ...INPUT,
      results: INPUT.results.map((result) =>
        result.facilityId === 'small'
          ? { ...result, condition: { ground: 'fixed-floor', wheels: 'stationary' } }
          : result,
      ),
    };
    expect(pairsOf(fixed).pairs[0]).toMatchObject({ excludedBy: ['not-comparable'], newest: false });
    expect(pairsOf(fixed, ['ground-simulation']).pairs[0]).toMatchObject({ excludedBy: [], newest: true });
  });

  it('name a result that cannot be reduced, and go on without it', () => {
    const broken = { ...INPUT, results: [...INPUT.results, small('broken', 'hatch', { scale: 3 })] };
    const { pairs, refused } = pairsOf(broken);
    expect(refused).toEqual([expect.objectContaining({ resultId: 'broken', code: 'scale-out-of-range' })]);
    expect(pairs).toEqual(pairsOf(INPUT).pairs);
  });

  it('are none between a facility and itself', () => {
    const request = { facilityId: 'small', referenceFacilityId: 'small', replaces: [] };
    expect(candidatePairs(INPUT, request)).toEqual({ pairs: [], refused: [] });
  });
});
