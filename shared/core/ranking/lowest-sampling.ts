import { LOWEST_DRAWS } from '../constants';
import { normalQuantile } from '../uncertainty/normal-quantile';
import { uniformNumbers } from '../uncertainty/sfc32';
import type { Comparables } from './comparables';

/** What P(lowest) is sampled from: plain and flat, so that a worker can be sent it. */
export interface LowestSamplingInput {
  /** In rank order. */
  readonly ids: readonly string[];
  readonly values: Float64Array;
  /** Root sum of squares of the amounts under keys that a row alone holds. */
  readonly ownAmounts: Float64Array;
  readonly sharedKeyCount: number;
  /** Row i holds shared entries offsets[i] to offsets[i + 1]. */
  readonly offsets: Int32Array;
  readonly sharedKeys: Int32Array;
  readonly sharedAmounts: Float64Array;
  readonly seed: number;
  readonly draws: number;
}

/** Splits the amounts into those under keys that two or more rows hold, numbered in key order, and the rows' own. */
export function lowestSamplingInputOf(
  set: Comparables,
  seed: number,
  draws: number = LOWEST_DRAWS,
): LowestSamplingInput {
  const holders = new Int32Array(set.keyNames.length);
  for (const key of set.keys) holders[key] = (holders[key] as number) + 1;
  const sharedNumber = new Int32Array(holders.length).fill(-1);
  let sharedKeyCount = 0;
  holders.forEach((count, key) => {
    if (count > 1) sharedNumber[key] = sharedKeyCount++;
  });
  const rows = set.ids.length;
  const ownAmounts = new Float64Array(rows);
  const offsets = new Int32Array(rows + 1);
  const sharedKeys: number[] = [];
  const sharedAmounts: number[] = [];
  for (let row = 0; row < rows; row++) {
    let ownVariance = 0;
    for (let at = set.offsets[row] as number; at < (set.offsets[row + 1] as number); at++) {
      const amount = set.amounts[at] as number;
      const shared = sharedNumber[set.keys[at] as number] as number;
      if (shared < 0) ownVariance += amount * amount;
      else {
        sharedKeys.push(shared);
        sharedAmounts.push(amount);
      }
    }
    ownAmounts[row] = Math.sqrt(ownVariance);
    offsets[row + 1] = sharedKeys.length;
  }
  return {
    ids: set.ids,
    values: set.values,
    ownAmounts,
    sharedKeyCount,
    offsets,
    sharedKeys: Int32Array.from(sharedKeys),
    sharedAmounts: Float64Array.from(sharedAmounts),
    seed,
    draws,
  };
}

/** In one draw the row that comes out lowest; of equal ones the first in rank. */
function lowestRow(input: LowestSamplingInput, shared: Float64Array, uniform: () => number): number {
  const { values, ownAmounts, offsets, sharedKeys, sharedAmounts } = input;
  let lowest = 0;
  let lowestValue = Infinity;
  for (let row = 0; row < values.length; row++) {
    let value = (values[row] as number) + (ownAmounts[row] as number) * normalQuantile(uniform());
    for (let at = offsets[row] as number; at < (offsets[row + 1] as number); at++) {
      value += (sharedAmounts[at] as number) * (shared[sharedKeys[at] as number] as number);
    }
    if (value < lowestValue) {
      lowestValue = value;
      lowest = row;
    }
  }
  return lowest;
}

/**
 * Share of draws in which each is the lowest, normal amounts: per draw one number per shared key in key order, then one per
 * row in rank order (method section 14). Seeded, so the same on every machine; call it from a worker where it may take long.
 */
export function sampleLowest(input: LowestSamplingInput): Record<string, number> {
  const uniform = uniformNumbers(input.seed);
  const wins = new Int32Array(input.ids.length);
  const shared = new Float64Array(input.sharedKeyCount);
  for (let draw = 0; draw < input.draws && wins.length > 0; draw++) {
    for (let key = 0; key < shared.length; key++) shared[key] = normalQuantile(uniform());
    const row = lowestRow(input, shared, uniform);
    wins[row] = (wins[row] as number) + 1;
  }
  return Object.fromEntries(input.ids.map((id, row) => [id, (wins[row] as number) / input.draws]));
}
