import fc from 'fast-check';
import { noticeOf, type OrderedVariant } from './ranking-view-orders';

const variant = (variantId: string, value: number, cause: number | null = null): OrderedVariant => ({
  variantId,
  name: variantId.toUpperCase(),
  value,
  cause,
});

describe('noticeOf', () => {
  it('says nothing where the orders agree', () => {
    expect(noticeOf('own-area', [variant('a', 1), variant('b', 2)], ['a', 'b'])).toBeNull();
  });

  it('names the one variant that explains all contradictions', () => {
    const notice = noticeOf(
      'energy',
      [variant('a', 9, 2000), variant('b', 2, 1500), variant('c', 3, 1600)],
      ['b', 'c', 'a'],
    );
    expect(notice?.inversions).toEqual([
      {
        variantId: 'a',
        name: 'A',
        direction: 'behind',
        value: 9,
        others: [
          { variantId: 'b', name: 'B', value: 2 },
          { variantId: 'c', name: 'C', value: 3 },
        ],
        extreme: 'largest',
      },
    ]);
  });

  it('names no cause that would speak against what it shall explain', () => {
    const light = [variant('a', 9, 1500), variant('b', 2, 2000)];
    expect(noticeOf('energy', light, ['b', 'a'])?.inversions[0]).toMatchObject({
      direction: 'behind',
      extreme: null,
    });
    expect(noticeOf('own-area', light, ['b', 'a'])?.inversions[0]?.extreme).toBe('smallest');
  });

  it('says that a variant comes ahead of those before it', () => {
    const notice = noticeOf('own-area', [variant('a', 2), variant('b', 3), variant('c', 1)], ['c', 'a', 'b']);
    expect(notice?.inversions[0]).toMatchObject({ variantId: 'c', direction: 'ahead', extreme: null });
  });

  it('accounts for every contradiction exactly once', () => {
    fc.assert(
      fc.property(fc.shuffledSubarray([0, 1, 2, 3, 4], { minLength: 5 }), (other) => {
        const list = [0, 1, 2, 3, 4].map((id) => variant(String(id), id));
        const notice = noticeOf('energy', list, other.map(String));
        const contradictions = [0, 1, 2, 3, 4].flatMap((a) =>
          [0, 1, 2, 3, 4].filter((b) => a < b && other.indexOf(a) > other.indexOf(b)),
        );
        const named = (notice?.inversions ?? []).reduce((sum, { others }) => sum + others.length, 0);
        if (notice?.more) expect(named).toBeLessThan(contradictions.length);
        else expect(named).toBe(contradictions.length);
      }),
    );
  });
});
