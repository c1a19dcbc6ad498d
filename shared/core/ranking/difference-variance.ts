/** Rows of amounts by key, as they are laid out for comparisons: row i holds entries offsets[i] to offsets[i + 1]. */
export interface KeyedRows {
  readonly offsets: Int32Array;
  /** Ascending within a row. */
  readonly keys: Int32Array;
  readonly amounts: Float64Array;
  readonly keyNames: readonly string[];
}

/** The entries under keys that two or more rows hold, and what the rest of each row adds to any difference. */
interface Split {
  readonly ownVariance: Float64Array;
  readonly offsets: Int32Array;
  readonly keys: Int32Array;
  readonly amounts: Float64Array;
}

function split({ offsets, keys, amounts, keyNames }: KeyedRows): Split {
  const holders = new Int32Array(keyNames.length);
  for (const key of keys) holders[key] = (holders[key] as number) + 1;
  const rows = offsets.length - 1;
  const ownVariance = new Float64Array(rows);
  const sharedOffsets = new Int32Array(rows + 1);
  const sharedKeys = new Int32Array(keys.length);
  const sharedAmounts = new Float64Array(keys.length);
  let count = 0;
  for (let row = 0; row < rows; row++) {
    let own = 0;
    for (let at = offsets[row] as number; at < (offsets[row + 1] as number); at++) {
      const key = keys[at] as number;
      const amount = amounts[at] as number;
      if (holders[key] === 1) own += amount * amount;
      else {
        sharedKeys[count] = key;
        sharedAmounts[count] = amount;
        count++;
      }
    }
    ownVariance[row] = own;
    sharedOffsets[row + 1] = count;
  }
  return { ownVariance, offsets: sharedOffsets, keys: sharedKeys, amounts: sharedAmounts };
}

/**
 * Variance of the difference of two rows, for very many pairs of one set: what a row alone holds can cancel with nothing, so
 * it is summed once, and a pair costs only the keys that are shared by anybody (JCGM 100:2008, 5.2; method section 14).
 */
export function varianceOfDifferences(rows: KeyedRows): (a: number, b: number) => number {
  const { ownVariance, offsets, keys, amounts } = split(rows);
  return (a, b) => {
    let variance = (ownVariance[a] as number) + (ownVariance[b] as number);
    let i = offsets[a] as number;
    let j = offsets[b] as number;
    const endI = offsets[a + 1] as number;
    const endJ = offsets[b + 1] as number;
    while (i < endI && j < endJ) {
      const keyI = keys[i] as number;
      const keyJ = keys[j] as number;
      let difference = 0;
      if (keyI <= keyJ) difference += amounts[i++] as number;
      if (keyJ <= keyI) difference -= amounts[j++] as number;
      variance += difference * difference;
    }
    for (; i < endI; i++) variance += (amounts[i] as number) ** 2;
    for (; j < endJ; j++) variance += (amounts[j] as number) ** 2;
    return variance;
  };
}
