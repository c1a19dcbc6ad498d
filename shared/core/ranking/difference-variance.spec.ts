import fc from 'fast-check';
import { keyedFigureOf } from '../uncertainty/budget';
import { comparablesOf, inseparableGroups, probabilityLowerOf, type Comparables } from './comparables';
import { varianceOfDifferences } from './difference-variance';

/** Rows in ascending order whose amounts fall under few keys, so that most keys are shared by some. */
const anySet: fc.Arbitrary<Comparables> = fc
  .array(
    fc.record({
      value: fc.double({ min: 0.5, max: 0.53, noNaN: true }),
      amounts: fc.array(
        fc.tuple(
          fc.integer({ min: 0, max: 9 }),
          fc.double({ min: -0.01, max: 0.01, noNaN: true }),
          fc.option(fc.integer({ min: 1, max: 20 })),
        ),
        { minLength: 1, maxLength: 6 },
      ),
    }),
    { minLength: 2, maxLength: 9 },
  )
  .map((rows) =>
    comparablesOf(
      rows
        .sort((a, b) => a.value - b.value)
        .map(({ value, amounts }, i) => ({
          id: `v${i}`,
          value,
          rate: 1,
          budget: keyedFigureOf({
            dragAreaM2: value,
            contributions: amounts.map(([key, amountM2, degreesOfFreedom]) => ({
              key: `k${key}`,
              amountM2,
              degreesOfFreedom,
            })),
          }).budget,
        })),
    ),
  );

/** Amounts of a row by key name. */
function amountsOf(set: Comparables, row: number): ReadonlyMap<string, number> {
  const amounts = new Map<string, number>();
  for (let at = set.offsets[row]!; at < set.offsets[row + 1]!; at++) {
    amounts.set(set.keyNames[set.keys[at]!]!, set.amounts[at]!);
  }
  return amounts;
}

test('The variance of a difference is the sum over all keys of the squared differences of their amounts', () => {
  fc.assert(
    fc.property(anySet, (set) => {
      const varianceOf = varianceOfDifferences(set);
      for (let a = 0; a < set.ids.length; a++) {
        for (let b = 0; b < set.ids.length; b++) {
          if (a === b) continue;
          const left = amountsOf(set, a);
          const right = amountsOf(set, b);
          const expected = set.keyNames.reduce(
            (sum, key) => sum + ((left.get(key) ?? 0) - (right.get(key) ?? 0)) ** 2,
            0,
          );
          expect(varianceOf(a, b)).toBeCloseTo(expected, 18);
        }
      }
    }),
  );
});

test('Amounts that all rows share alike cancel', () => {
  const row = (id: string, own: number) => ({
    id,
    value: 0.5,
    rate: 1,
    budget: keyedFigureOf({
      dragAreaM2: 0.5,
      contributions: [
        { key: 'facility:a', amountM2: 0.02 },
        { key: `installation:${id}`, amountM2: own },
      ],
    }).budget,
  });
  const varianceOf = varianceOfDifferences(comparablesOf([row('x', 0.003), row('y', 0.004)]));
  expect(varianceOf(0, 1)).toBeCloseTo(0.000025, 18);
});

test('Brackets are the maximal runs without a separable pair, whatever the shortcut that finds them', () => {
  fc.assert(
    fc.property(anySet, fc.constantFrom(0.5, 0.8, 0.95, 0.99), (set, confidence) => {
      const separable = (a: number, b: number): boolean => {
        const p = probabilityLowerOf(set, a, b);
        return Math.max(p, 1 - p) >= confidence;
      };
      const count = set.ids.length;
      const isRun = (from: number, to: number): boolean => {
        for (let a = from; a < to; a++) for (let b = a + 1; b <= to; b++) if (separable(a, b)) return false;
        return true;
      };
      const expected: string[][] = [];
      for (let from = 0; from < count; from++) {
        for (let to = count - 1; to > from; to--) {
          if (!isRun(from, to)) continue;
          const larger = (from > 0 && isRun(from - 1, to)) || (to < count - 1 && isRun(from, to + 1));
          if (!larger) expected.push([...set.ids.slice(from, to + 1)]);
        }
      }
      expect(inseparableGroups(set, confidence)).toEqual(expected);
    }),
  );
});
