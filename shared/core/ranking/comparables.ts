import { AMOUNT_FLOOR_M2 } from '../constants';
import { probabilityAbove, type Budget } from '../uncertainty/budget';
import { studentQuantile } from '../uncertainty/student';
import { varianceOfDifferences } from './difference-variance';

/** A value to be compared, with its amounts by key; m² or J, the same for all. */
export interface KeyedValue {
  readonly id: string;
  readonly value: number;
  readonly budget: Budget;
  /** What every amount of the budget is multiplied by: 1 for drag areas, J/m² for energies. */
  readonly rate: number;
}

/** Values laid out for many comparisons: keys as numbers in code-unit order, amounts in flat arrays. */
export interface Comparables {
  readonly ids: readonly string[];
  readonly values: Float64Array;
  /** Row i holds entries offsets[i] to offsets[i + 1]. */
  readonly offsets: Int32Array;
  readonly keys: Int32Array;
  readonly amounts: Float64Array;
  /** 1/ν, 0 where infinite. */
  readonly inverseNu: Float64Array;
  /** Variance estimates as numbers; null where every estimate is its key, so that nothing is pooled. */
  readonly estimates: Int32Array | null;
  readonly keyNames: readonly string[];
}

/** Numbers the texts of a list in code-unit order; one look-up a text, because a ranking has thousands. */
function numbered(texts: readonly string[]): {
  readonly names: readonly string[];
  readonly numbers: Int32Array;
} {
  const firstSeen = new Map<string, number>();
  const numbers = new Int32Array(texts.length);
  texts.forEach((text, i) => {
    const number = firstSeen.get(text) ?? firstSeen.size;
    if (number === firstSeen.size) firstSeen.set(text, number);
    numbers[i] = number;
  });
  const names = [...firstSeen.keys()].sort();
  const inOrder = new Int32Array(names.length);
  names.forEach((name, i) => (inOrder[firstSeen.get(name) as number] = i));
  return { names, numbers: numbers.map((number) => inOrder[number] as number) };
}

export function comparablesOf(list: readonly KeyedValue[]): Comparables {
  const entries = list.flatMap((item) => item.budget);
  const keyed = numbered(entries.map((entry) => entry.key));
  const pooled = entries.some((entry) => entry.varianceEstimate !== entry.key);
  const offsets = new Int32Array(list.length + 1);
  const amounts = new Float64Array(entries.length);
  const inverseNu = new Float64Array(entries.length);
  let at = 0;
  list.forEach(({ budget, rate }, i) => {
    for (const { amountM2, degreesOfFreedom } of budget) {
      amounts[at] = amountM2 * rate;
      inverseNu[at] = 1 / degreesOfFreedom;
      at++;
    }
    offsets[i + 1] = at;
  });
  return {
    ids: list.map((item) => item.id),
    values: Float64Array.from(list, (item) => item.value),
    offsets,
    keys: keyed.numbers,
    amounts,
    inverseNu,
    estimates: pooled ? numbered(entries.map((entry) => entry.varianceEstimate)).numbers : null,
    keyNames: keyed.names,
  };
}

/** Variance of the difference of two rows and Σ (Σc²)²/ν of it. */
interface Spread {
  variance: number;
  denominator: number;
}

type Visit = (difference: number, inverseNu: number, estimate: number) => void;

/** Walks over the amounts of a − b, key by key; shared keys cancel. */
function walk(set: Comparables, a: number, b: number, visit: Visit): void {
  const { offsets, keys, amounts, inverseNu, estimates } = set;
  let i = offsets[a] as number;
  let j = offsets[b] as number;
  const endI = offsets[a + 1] as number;
  const endJ = offsets[b + 1] as number;
  const estimateOf = (at: number): number => (estimates === null ? at : (estimates[at] as number));
  while (i < endI || j < endJ) {
    const keyI = i < endI ? (keys[i] as number) : Infinity;
    const keyJ = j < endJ ? (keys[j] as number) : Infinity;
    if (keyI === keyJ) {
      const nu = Math.max(inverseNu[i] as number, inverseNu[j] as number);
      visit((amounts[i] as number) - (amounts[j] as number), nu, estimateOf(i));
      i++;
      j++;
    } else if (keyI < keyJ) {
      visit(amounts[i] as number, inverseNu[i] as number, estimateOf(i));
      i++;
    } else {
      visit(-(amounts[j] as number), inverseNu[j] as number, estimateOf(j));
      j++;
    }
  }
}

function pooledSpread(set: Comparables, a: number, b: number): Spread {
  const squares = new Map<number, { sum: number; inverseNu: number }>();
  let variance = 0;
  walk(set, a, b, (difference, inverseNu, estimate) => {
    const square = difference * difference;
    variance += square;
    if (square === 0) return;
    const before = squares.get(estimate);
    if (before === undefined) squares.set(estimate, { sum: square, inverseNu });
    else {
      before.sum += square;
      before.inverseNu = Math.max(before.inverseNu, inverseNu);
    }
  });
  let denominator = 0;
  for (const { sum, inverseNu } of squares.values()) denominator += sum * sum * inverseNu;
  return { variance, denominator };
}

function spreadOf(set: Comparables, a: number, b: number): Spread {
  if (set.estimates !== null) return pooledSpread(set, a, b);
  const spread = { variance: 0, denominator: 0 };
  walk(set, a, b, (difference, inverseNu) => {
    const square = difference * difference;
    spread.variance += square;
    spread.denominator += square * square * inverseNu;
  });
  return spread;
}

const nuOf = ({ variance, denominator }: Spread): number =>
  denominator > 0 ? (variance * variance) / denominator : Infinity;

/** P(row a < row b) by Student's distribution of the difference by keys (method section 14). */
export function probabilityLowerOf(set: Comparables, a: number, b: number): number {
  const spread = spreadOf(set, a, b);
  const difference = (set.values[b] as number) - (set.values[a] as number);
  return probabilityAbove(difference, Math.sqrt(spread.variance), nuOf(spread));
}

/**
 * Tells whether two rows of a set are separable at a confidence: max(P, 1 − P) ≥ confidence. Student's quantile is never below
 * the normal one, so most pairs are settled by the variance of their difference alone.
 */
export function separabilityWithin(set: Comparables, confidence: number): (a: number, b: number) => boolean {
  const needed = confidence > 0.5 ? studentQuantile(confidence) * (1 - 1e-9) : 0;
  const varianceOf = varianceOfDifferences(set);
  return (a, b) => {
    const u = Math.sqrt(varianceOf(a, b));
    const difference = Math.abs((set.values[a] as number) - (set.values[b] as number));
    if (u >= AMOUNT_FLOOR_M2 && difference < needed * u) return false;
    const p = probabilityLowerOf(set, a, b);
    return Math.max(p, 1 - p) >= confidence;
  };
}

/** P(each < its next), one shorter than the rows. */
export function neighbourProbabilities(set: Comparables): number[] {
  return set.ids.slice(1).map((_, i) => probabilityLowerOf(set, i, i + 1));
}

/** For each row the list of P(it < each later one): n²/2 probabilities, for the whole table only. */
export function probabilityLowerThanLaterOnes(set: Comparables): number[][] {
  return set.ids.map((_, i) =>
    set.ids.slice(i + 1).map((_later, k) => probabilityLowerOf(set, i, i + 1 + k)),
  );
}

/**
 * The maximal runs of two or more neighbours within which no pair is separable; they may overlap. Only pairs within runs are
 * looked at.
 */
export function inseparableGroups(set: Comparables, confidence: number): string[][] {
  const separable = separabilityWithin(set, confidence);
  const groups: string[][] = [];
  const count = set.ids.length;
  let start = 0;
  const close = (end: number): void => {
    if (end - start >= 2) groups.push(set.ids.slice(start, end));
  };
  for (let next = 1; next < count; next++) {
    let k = next - 1;
    while (k >= start && !separable(k, next)) k--;
    if (k >= start) {
      close(next);
      start = k + 1;
    }
  }
  close(count);
  return groups;
}
