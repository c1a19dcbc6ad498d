/** Numbers that agree to this part of themselves are the same (architecture: replay). */
export const REPLAY_TOLERANCE = 1e-12;
/** Below this a number is nothing: the floor of amounts [m²], of all fields the smallest unit that means something. */
const NOTHING = 1e-15;
/** Digits that are stored: what rounding costs lies a hundred times under the tolerance. */
const STORED_DIGITS = 14;

type Leaf = number | string | null;

/** One field that is not what it was. */
export interface EvaluationDifference {
  /** Dotted path. */
  readonly field: string;
  readonly stored: Leaf;
  readonly now: Leaf;
  /** Now minus stored; null where one of them is no number. */
  readonly difference: number | null;
}

/** Every number rounded to what is stored of it. */
export function roundedNumbers<T>(value: T): T {
  return JSON.parse(
    JSON.stringify(value, (_key, inner: unknown) =>
      typeof inner === 'number' ? Number(inner.toPrecision(STORED_DIGITS)) : inner,
    ),
  ) as T;
}

function leavesOf(value: unknown, path: string, into: Map<string, Leaf>): Map<string, Leaf> {
  if (value === null || typeof value === 'number' || typeof value === 'string') into.set(path, value);
  else if (typeof value === 'boolean') into.set(path, String(value));
  else if (typeof value === 'object') {
    for (const [name, inner] of Object.entries(value)) {
      leavesOf(inner, path === '' ? name : `${path}.${name}`, into);
    }
  }
  return into;
}

function same(a: Leaf, b: Leaf): boolean {
  if (typeof a !== 'number' || typeof b !== 'number') return a === b;
  const largest = Math.max(Math.abs(a), Math.abs(b));
  return largest < NOTHING || Math.abs(a - b) <= REPLAY_TOLERANCE * largest;
}

/** Every field in which two evaluations are not the same; a field that one of them lacks counts as null there. */
export function evaluationDifferences(stored: unknown, now: unknown): readonly EvaluationDifference[] {
  const before = leavesOf(stored, '', new Map());
  const after = leavesOf(now, '', new Map());
  return [...new Set([...before.keys(), ...after.keys()])].flatMap(
    (field): readonly EvaluationDifference[] => {
      const [a, b] = [before.get(field) ?? null, after.get(field) ?? null];
      if (same(a, b)) return [];
      const difference = typeof a === 'number' && typeof b === 'number' ? b - a : null;
      return [{ field, stored: a, now: b, difference }];
    },
  );
}
