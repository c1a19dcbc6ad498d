import type { ViewGroup } from '#shared/core/ranking/ranking-view';

/** The piece of a bracket that one row draws. */
export interface BracketPiece {
  /** Brackets that overlap stand side by side: 0 is the one nearest to the rows. */
  readonly lane: number;
  readonly part: 'first' | 'middle' | 'last';
}

/**
 * The brackets of overlapping groups, laid into as few lanes as they need.
 *
 * @returns for each rank the pieces in its row, and how many lanes there are
 */
export function bracketsOf(groups: readonly Pick<ViewGroup, 'fromRank' | 'toRank'>[]): {
  readonly lanes: number;
  readonly pieces: ReadonlyMap<number, readonly BracketPiece[]>;
} {
  const ends: number[] = [];
  const pieces = new Map<number, BracketPiece[]>();
  const ordered = groups.toSorted((a, b) => a.fromRank - b.fromRank);
  for (const { fromRank, toRank } of ordered) {
    const free = ends.findIndex((end) => end < fromRank);
    const lane = free < 0 ? ends.length : free;
    ends[lane] = toRank;
    for (let rank = fromRank; rank <= toRank; rank++) {
      const part = rank === fromRank ? 'first' : rank === toRank ? 'last' : 'middle';
      const row = pieces.get(rank);
      if (row) row.push({ lane, part });
      else pieces.set(rank, [{ lane, part }]);
    }
  }
  return { lanes: ends.length, pieces };
}
