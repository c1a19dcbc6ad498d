import type { CorrelationPairInput } from '../ranking/ranking-input';
import { fitCorrelation } from './correlation';
import { correlationInfluence } from './influence';

/**
 * Age at the first word [months] and Gesell adaptive score of 21 children: Mickey, Dunn and Clark, Comput. Biomed. Res. 1
 * (1967) 105, the textbook case of influence (Belsley, Kuh and Welsch; Rousseeuw and Leroy). The scores are turned round
 * (200 − y), because a correlation must rise; leverage, distances and sizes of residuals stay what they
 * were. The published figures are from memory.
 */
const AGE = [15, 26, 10, 9, 15, 20, 18, 11, 8, 20, 7, 9, 10, 11, 11, 10, 12, 42, 17, 11, 10];
const SCORE = [95, 71, 83, 91, 102, 87, 93, 100, 104, 94, 113, 96, 83, 84, 102, 100, 105, 57, 121, 86, 100];
const CHILDREN: readonly CorrelationPairInput[] = AGE.map((age, i) => ({
  dragAreaM2: age,
  uM2: Math.SQRT1_2,
  referenceDragAreaM2: 200 - (SCORE[i] ?? NaN),
  referenceUM2: Math.SQRT1_2,
}));

const WEIGHTED: readonly CorrelationPairInput[] = [
  [0.5, 0.004, 0.512, 0.003],
  [0.55, 0.006, 0.556, 0.003],
  [0.61, 0.004, 0.617, 0.005],
  [0.66, 0.009, 0.68, 0.004],
  [0.7, 0.004, 0.705, 0.003],
  [0.74, 0.005, 0.752, 0.006],
].map(([dragAreaM2 = NaN, uM2 = NaN, referenceDragAreaM2 = NaN, referenceUM2 = NaN]) => ({
  dragAreaM2,
  uM2,
  referenceDragAreaM2,
  referenceUM2,
}));

describe('the influence of a pair', () => {
  it('agrees with the published case: the child of 42 months pulls, the one that scored 121 stands off', () => {
    const fit = fitCorrelation(CHILDREN);
    expect(fit.slope).toBeCloseTo(1.127, 3);
    expect(200 - fit.interceptM2).toBeCloseTo(109.874, 3);
    const influence = correlationInfluence(CHILDREN);
    expect(influence[17]?.leverage).toBeCloseTo(0.6516, 4);
    expect(influence[17]?.cooksDistance).toBeCloseTo(0.678, 3);
    expect(influence[18]?.residualM2).toBeCloseTo(-30.285, 3);
    expect(influence[18]?.standardisedResidual).toBeCloseTo(-2.823, 3);
    expect(influence[18]?.cooksDistance).toBeCloseTo(0.223, 3);
  });

  it('is the change of a fit made without it, by the deletion formula of Belsley, Kuh and Welsch as by fitting anew', () => {
    const fit = fitCorrelation(WEIGHTED);
    const total = fit.weights.reduce((sum, w) => sum + w, 0);
    const squares = WEIGHTED.reduce(
      (sum, { dragAreaM2 }, i) => sum + fit.weights[i]! * (dragAreaM2 - fit.centroidM2) ** 2,
      0,
    );
    correlationInfluence(WEIGHTED).forEach(({ residualM2, leverage, without }, i) => {
      const pull = (fit.weights[i]! * residualM2) / (1 - leverage);
      const slopeChange = (-pull * (WEIGHTED[i]!.dragAreaM2 - fit.centroidM2)) / squares;
      expect(without).toMatchObject({
        slopeChange: expect.closeTo(slopeChange, 10),
        levelChangeM2: expect.closeTo(-pull / total, 10),
        becomesOffset: false,
      });
    });
  });

  it('has leverages that add up to the number of fitted values', () => {
    const added = (pairs: readonly CorrelationPairInput[]) =>
      correlationInfluence(pairs).reduce((sum, { leverage }) => sum + leverage, 0);
    expect(added(WEIGHTED)).toBeCloseTo(2, 12);
    expect(added(WEIGHTED.slice(0, 3))).toBeCloseTo(1, 12);
  });

  it('names the end of the range where the carried figure would move most', () => {
    const [first] = correlationInfluence(WEIGHTED);
    expect(first?.without).toMatchObject({ largestChangeAtM2: 0.5, validFromM2: 0.55 });
  });

  it('says that five pairs without one are an offset, and that one pair without itself is nothing', () => {
    expect(correlationInfluence(WEIGHTED.slice(0, 5))[0]?.without).toMatchObject({ becomesOffset: true });
    const [only] = correlationInfluence(WEIGHTED.slice(0, 1));
    expect(only).toMatchObject({
      standardisedResidual: null,
      cooksDistance: null,
      without: { refusal: 'correlation-too-few-pairs' },
    });
  });

  it('says where leaving one out would leave no correlation at all', () => {
    const equal = WEIGHTED.map((pair, i) => ({ ...pair, dragAreaM2: i === 0 ? 0.5 : 0.6 }));
    expect(correlationInfluence(equal)[0]?.without).toEqual({ refusal: 'correlation-no-spread' });
  });
});
