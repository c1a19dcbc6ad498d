type Filled<T> = { [K in keyof T]?: Exclude<T[K], null | undefined> };

/** The fields in which something stands: an empty input is an absent field, never 0 and never an empty text. */
export function withoutBlanks<T extends object>(fields: T): Filled<T> {
  return Object.fromEntries(
    Object.entries(fields)
      .map(([name, value]) => [name, typeof value === 'string' ? value.trim() : (value as unknown)] as const)
      .filter(([, value]) => value !== null && value !== undefined && value !== ''),
  ) as Filled<T>;
}

/** As {@link withoutBlanks}; undefined where nothing at all stands. */
export function filledOrAbsent<T extends object>(fields: T): Filled<T> | undefined {
  const filled = withoutBlanks(fields);
  return Object.keys(filled).length > 0 ? filled : undefined;
}
