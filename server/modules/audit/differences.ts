import type { Difference } from '../../db/tables/work';

/** The fields in which two plain objects differ, compared by their canonical text. */
export function differences(
  before: Readonly<Record<string, unknown>>,
  after: Readonly<Record<string, unknown>>,
): readonly Difference[] {
  const fields = [...new Set([...Object.keys(before), ...Object.keys(after)])].sort();
  return fields
    .filter((field) => canonical(before[field]) !== canonical(after[field]))
    .map((field) => ({ field, before: before[field], after: after[field] }));
}

/** JSON with sorted keys, so that the order in which a database returns them is no difference. */
function canonical(value: unknown): string {
  return (
    JSON.stringify(value, (_key, inner: unknown) =>
      inner !== null && typeof inner === 'object' && !Array.isArray(inner) && !(inner instanceof Date)
        ? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)))
        : inner,
    ) ?? 'absent'
  );
}
