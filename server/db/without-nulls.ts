/** A row as a contract wants it: a column that may be NULL becomes a property that may be absent. */
export type WithoutNulls<Row> = {
  [K in keyof Row as null extends Row[K] ? never : K]: Row[K];
} & {
  [K in keyof Row as null extends Row[K] ? K : never]?: NonNullable<Row[K]>;
};

/** Leaves out the properties that are NULL: in the product a missing figure is absent, never null and never 0. */
export function withoutNulls<Row extends object>(row: Row): WithoutNulls<Row> {
  // A plain loop: lists hold tens of thousands of rows.
  const kept: { [column: string]: unknown } = {};
  for (const [column, value] of Object.entries(row)) {
    if (value !== null && value !== undefined) kept[column] = value;
  }
  return kept as WithoutNulls<Row>;
}

/** The other way: every property that may be absent becomes NULL, so that an update clears what was cleared. */
export function withNulls<T extends object, K extends keyof T>(
  fields: T,
  columns: readonly K[],
): { [P in K]-?: Exclude<T[P], undefined> | (undefined extends T[P] ? null : never) } {
  return Object.fromEntries(columns.map((column) => [column, fields[column] ?? null])) as {
    [P in K]-?: Exclude<T[P], undefined> | (undefined extends T[P] ? null : never);
  };
}
