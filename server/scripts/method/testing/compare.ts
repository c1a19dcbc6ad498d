/** Tolerance of a number: max(relative·|expected|, absolute). */
export interface Tolerance {
  readonly relative?: number;
  readonly absolute?: number;
}

export interface CaseTolerance extends Tolerance {
  /** Numbers at or under a field have their own. */
  readonly fields?: { readonly [field: string]: Tolerance };
}

const ABSOLUTE = 1e-14;

function within(found: unknown, expected: number, { relative = 0, absolute = ABSOLUTE }: Tolerance): boolean {
  return (
    typeof found === 'number' &&
    Math.abs(found - expected) <= Math.max(relative * Math.abs(expected), absolute)
  );
}

const isObject = (value: unknown): value is { readonly [name: string]: unknown } =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

/** Where two values differ beyond the tolerance, one line each; everything but numbers is compared exactly. */
export function differences(
  found: unknown,
  expected: unknown,
  tolerance: Tolerance,
  fields: CaseTolerance['fields'] = {},
  at = 'output',
): string[] {
  if (typeof expected === 'number') {
    return within(found, expected, tolerance) ? [] : [`${at}: ${String(found)} instead of ${expected}`];
  }
  if (Array.isArray(expected)) {
    if (!Array.isArray(found) || found.length !== expected.length) {
      return [`${at}: ${JSON.stringify(found)} instead of ${expected.length} entries`];
    }
    return expected.flatMap((one, i) => differences(found[i], one, tolerance, fields, `${at}[${i}]`));
  }
  if (isObject(expected)) {
    if (!isObject(found)) return [`${at}: ${JSON.stringify(found)} instead of an object`];
    const names = [...new Set([...Object.keys(found), ...Object.keys(expected)])];
    return names.flatMap((name) => {
      if (!(name in expected)) return [`${at}.${name}: is not expected`];
      if (!(name in found)) return [`${at}.${name}: is missing`];
      return differences(found[name], expected[name], fields[name] ?? tolerance, fields, `${at}.${name}`);
    });
  }
  return Object.is(found, expected)
    ? []
    : [`${at}: ${JSON.stringify(found)} instead of ${JSON.stringify(expected)}`];
}
