/**
 * JSON of a value that is the same for equal values: keys sorted by code units, no spaces, what is absent or null left out of
 * objects (in the inputs of the method both mean the same).
 */
export function canonicalText(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) =>
    inner !== null && typeof inner === 'object' && !Array.isArray(inner) ? sortedEntries(inner) : inner,
  );
}

function sortedEntries(value: object): object {
  return Object.fromEntries(
    Object.entries(value)
      .filter(([, inner]) => inner !== null && inner !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : 1)),
  );
}
