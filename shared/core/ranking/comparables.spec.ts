import * as fc from 'fast-check';
import { amount, budgetOf, probabilityLower, type KeyedFigure } from '../uncertainty/budget';
import {
  comparablesOf,
  neighbourProbabilities,
  probabilityLowerOf,
  probabilityLowerThanLaterOnes,
} from './comparables';
import { lowestSamplingInputOf, sampleLowest } from './lowest-sampling';

const entry = fc.tuple(
  fc.constantFrom('bias', 'session', 'own-a', 'own-b', 'level', 'slope'),
  fc.double({ min: -0.01, max: 0.01, noNaN: true }),
  fc.constantFrom(2, 5.5, Infinity),
);
const figure = fc
  .tuple(fc.double({ min: 0.5, max: 0.52, noNaN: true }), fc.array(entry, { minLength: 1, maxLength: 6 }))
  .map(([dragAreaM2, entries]): KeyedFigure => ({
    dragAreaM2,
    budget: budgetOf(
      entries.map(([key, value, nu]) =>
        amount(key, value, nu, key === 'level' || key === 'slope' ? 'sweep' : undefined),
      ),
    ),
  }));
const laidOut = (figures: readonly KeyedFigure[]) =>
  comparablesOf(
    figures.map(({ dragAreaM2, budget }, i) => ({ id: `v${i}`, value: dragAreaM2, budget, rate: 1 })),
  );

it('Comparing in flat arrays gives what comparing budgets gives, pooled estimates included', () => {
  fc.assert(
    fc.property(figure, figure, (a, b) => {
      expect(probabilityLowerOf(laidOut([a, b]), 0, 1)).toBeCloseTo(probabilityLower(a, b), 10);
    }),
    { numRuns: 300 },
  );
});

it('The neighbours stand on the diagonal of the whole table', () => {
  fc.assert(
    fc.property(fc.array(figure, { minLength: 1, maxLength: 5 }), (figures) => {
      const set = laidOut(figures);
      const table = probabilityLowerThanLaterOnes(set);
      expect(neighbourProbabilities(set)).toEqual(table.slice(0, -1).map((row) => row[0]));
    }),
  );
});

describe('P(lowest)', () => {
  const value = (dragAreaM2: number, ...amounts: readonly ReturnType<typeof amount>[]): KeyedFigure => ({
    dragAreaM2,
    budget: budgetOf(amounts),
  });

  it('adds up to one and is the same for the same seed', () => {
    const set = laidOut([value(0.5, amount('a', 0.01)), value(0.505, amount('b', 0.01)), value(0.51)]);
    const shares = sampleLowest(lowestSamplingInputOf(set, 7, 5000));
    expect(Object.values(shares).reduce((sum, share) => sum + share, 0)).toBeCloseTo(1, 12);
    expect(sampleLowest(lowestSamplingInputOf(set, 7, 5000))).toEqual(shares);
    expect(sampleLowest(lowestSamplingInputOf(set, 8, 5000))).not.toEqual(shares);
  });

  it('of two equals is one half, and what they share decides nothing', () => {
    const own = laidOut([value(0.5, amount('a', 0.01)), value(0.5, amount('b', 0.01))]);
    expect(sampleLowest(lowestSamplingInputOf(own, 1))['v0']).toBeCloseTo(0.5, 1);
    const shared = laidOut([value(0.5, amount('bias', 0.05)), value(0.5001, amount('bias', 0.05))]);
    expect(sampleLowest(lowestSamplingInputOf(shared, 1))).toEqual({ v0: 1, v1: 0 });
  });

  it('of equal draws is the first in rank, and of nobody nothing', () => {
    expect(sampleLowest(lowestSamplingInputOf(laidOut([value(0.5), value(0.5)]), 1, 10))).toEqual({
      v0: 1,
      v1: 0,
    });
    expect(sampleLowest(lowestSamplingInputOf(laidOut([]), 1, 10))).toEqual({});
  });

  it('survives being sent to a worker', () => {
    const input = lowestSamplingInputOf(laidOut([value(0.5, amount('a', 0.01)), value(0.51)]), 3, 1000);
    expect(sampleLowest(structuredClone(input))).toEqual(sampleLowest(input));
  });
});
