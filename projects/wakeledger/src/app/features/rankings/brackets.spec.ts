import { bracketsOf } from './brackets';

describe('bracketsOf', () => {
  it('draws a group from its first to its last rank', () => {
    const { lanes, pieces } = bracketsOf([{ fromRank: 2, toRank: 4 }]);
    expect(lanes).toBe(1);
    expect(pieces.get(1)).toBeUndefined();
    expect([2, 3, 4].map((rank) => pieces.get(rank)?.[0]?.part)).toEqual(['first', 'middle', 'last']);
  });

  it('puts groups that overlap side by side and uses a lane again once it is free', () => {
    const { lanes, pieces } = bracketsOf([
      { fromRank: 1, toRank: 3 },
      { fromRank: 2, toRank: 4 },
      { fromRank: 5, toRank: 6 },
    ]);
    expect(lanes).toBe(2);
    expect(pieces.get(3)?.map(({ lane }) => lane)).toEqual([0, 1]);
    expect(pieces.get(5)).toEqual([{ lane: 0, part: 'first' }]);
  });
});
