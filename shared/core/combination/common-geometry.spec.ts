import { Refused } from '../refusal';
import type { InteractionInput } from '../statement/interactions';
import { evaluateCombine, type CombineInput } from './combine-operation';

const result = (dragAreaM2: number, id: string, containsPostings: readonly string[]) => ({
  dragAreaM2,
  contributions: [{ key: `repeatability:${id}`, amountM2: 0.001 }],
  containsPostings,
});
const posting = (id: string, dragAreaM2: number) => ({
  id,
  dragAreaM2,
  contributions: [{ key: `stated:${id}`, amountM2: 0.0005 }],
});
const interaction = (id: string, deltaIds: readonly string[], joint = -0.02): InteractionInput => ({
  id,
  deltaIds,
  jointDeltaDragAreaM2: joint,
  uM2: 0.001,
});
const postings = [posting('d1', -0.006), posting('d2', -0.01), posting('d3', 0.003)];

const combineOf = (input: Partial<CombineInput>) =>
  evaluateCombine({ variantId: 'v', results: [], postings, ...input });

const refusalOf = (input: Partial<CombineInput>): string | undefined => {
  try {
    combineOf(input);
  } catch (error) {
    if (error instanceof Refused) return error.code;
    throw error;
  }
  return undefined;
};

describe('Bringing results to one geometry', () => {
  test('gives each what another contains and it does not', () => {
    const { combined, commonGeometryContains } = combineOf({
      results: [result(0.65, 'a', []), result(0.644, 'b', ['d1'])],
    });
    expect(commonGeometryContains).toEqual(['d1']);
    expect(combined.dragAreaM2).toBeCloseTo(0.644, 14);
    expect(combined.contributions.map(({ key }) => key)).toContain('stated:d1');
  });

  test('leaves out what no result contains', () => {
    const { combined, commonGeometryContains } = combineOf({
      results: [result(0.65, 'a', []), result(0.65, 'b', [])],
    });
    expect(commonGeometryContains).toEqual([]);
    expect(combined.dragAreaM2).toBeCloseTo(0.65, 14);
  });

  test('adds the joint effect where a result lacks every delta of an interaction, and the single one where it lacks one', () => {
    const joined = combineOf({
      results: [result(0.65, 'a', []), result(0.63, 'b', ['d1', 'd2'])],
      interactions: [interaction('i12', ['d1', 'd2'])],
    });
    expect(joined.combined.dragAreaM2).toBeCloseTo(0.63, 14);
    const single = combineOf({
      results: [result(0.64, 'a', ['d1']), result(0.63, 'b', ['d1', 'd2'])],
      interactions: [interaction('i12', ['d1', 'd2'])],
    });
    expect(single.combined.dragAreaM2).toBeCloseTo(0.63, 14);
  });

  test('takes the largest of overlapping interactions', () => {
    const { combined } = combineOf({
      results: [result(0.65, 'a', []), result(0.6, 'b', ['d1', 'd2', 'd3'])],
      interactions: [interaction('i12', ['d1', 'd2']), interaction('i123', ['d1', 'd2', 'd3'], -0.05)],
    });
    expect(combined.dragAreaM2).toBeCloseTo(0.6, 14);
    expect(combined.contributions.map(({ key }) => key)).toContain('stated:i123');
  });

  test('carries an interaction over with its factor and the factor’s uncertainty', () => {
    const { combined } = combineOf({
      results: [result(0.65, 'a', []), result(0.64, 'b', ['d1', 'd2'])],
      interactions: [{ ...interaction('i12', ['d1', 'd2']), carryOver: { factor: 0.5, u: 0.1 } }],
    });
    expect(combined.dragAreaM2).toBeCloseTo(0.64, 14);
    const amounts = new Map(combined.contributions.map(({ key, amountM2 }) => [key, Math.abs(amountM2)]));
    expect(amounts.get('carry-over:i12:v')! / amounts.get('stated:i12')!).toBeCloseTo(
      (0.02 * 0.1) / (0.001 * 0.5),
      12,
    );
  });

  test('says nothing of the common geometry where no postings are given', () => {
    const output = evaluateCombine({ variantId: 'v', results: [result(0.65, 'a', [])] });
    expect(output).not.toHaveProperty('commonGeometryContains');
  });

  const two = [result(0.65, 'a', []), result(0.6, 'b', ['d1', 'd2', 'd3'])];
  test.each<[string, string, Partial<CombineInput>]>([
    ['unknown-posting', 'a posting that is not there', { results: [result(0.65, 'a', ['d9'])] }],
    ['nothing-to-combine', 'no result', { results: [] }],
    [
      'interactions-overlap',
      'two interactions of equal size that share a delta',
      { results: two, interactions: [interaction('i', ['d1', 'd2']), interaction('j', ['d2', 'd3'])] },
    ],
    [
      'basis-mixed',
      'a wind-averaged interaction',
      { results: two, interactions: [{ ...interaction('i', ['d1', 'd2']), basis: 'wind-averaged' }] },
    ],
    ['malformed-input', 'an interaction of no delta', { results: two, interactions: [interaction('i', [])] }],
    ['duplicate-id', 'a delta named twice', { results: two, interactions: [interaction('i', ['d1', 'd1'])] }],
    ['duplicate-id', 'a posting given twice', { results: two, postings: [...postings, posting('d1', 0)] }],
    ['duplicate-id', 'a posting contained twice', { results: [result(0.65, 'a', ['d1', 'd1'])] }],
  ])('is refused as %s: %s', (code, _what, input) => {
    expect(refusalOf(input)).toBe(code);
  });

  test('passes over overlapping interactions of which one is contained', () => {
    expect(
      refusalOf({
        results: [result(0.65, 'a', ['d1']), result(0.6, 'b', ['d1', 'd2', 'd3'])],
        interactions: [interaction('i', ['d1', 'd2']), interaction('j', ['d2', 'd3'])],
      }),
    ).toBeUndefined();
  });
});
