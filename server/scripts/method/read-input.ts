import type * as z from 'zod';
import { Refused, refuse } from '#shared/core/refusal';
import { REFUSAL_TITLES } from './refusal-titles';

type Issue = z.core.$ZodIssue;
type Path = readonly PropertyKey[];

/** Codes that a schema gives itself, as the message of a check. */
const OWN_CODES = new Set(['degrees-of-freedom', 'confidence-out-of-range']);

const pathOf = (path: Path): string => path.map(String).join('.') || 'input';

function valueAt(root: unknown, path: Path): unknown {
  return path.reduce<unknown>(
    (value, key) =>
      typeof value === 'object' && value !== null ? (value as Record<PropertyKey, unknown>)[key] : undefined,
    root,
  );
}

const isUnrecognised = (issue: Issue): boolean => issue.code === 'unrecognized_keys';

/** Misspelt fields come first: they explain what seems to be missing. */
function firstOf(issues: readonly Issue[]): Issue | undefined {
  return issues.find(isUnrecognised) ?? issues[0];
}

/** Of a union the branch that was most likely meant: fewest fields that it does not know, then fewest that are missing. */
function likeliestBranch(branches: readonly (readonly Issue[])[], value: unknown): readonly Issue[] {
  const distance = (issues: readonly Issue[]): number =>
    issues.reduce((sum, issue) => {
      if (issue.code === 'unrecognized_keys') return sum + 100 * issue.keys.length;
      if (issue.path.length === 0) return sum + 1000;
      return sum + (valueAt(value, issue.path) == null ? 10 : 1);
    }, 0);
  return [...branches].sort((a, b) => distance(a) - distance(b))[0] ?? [];
}

/** Null is the same as absent, but for the whole input: that is no object. */
function codeOf(issue: Issue, value: unknown, path: Path): string {
  if (OWN_CODES.has(issue.message)) return issue.message;
  if (issue.code === 'invalid_type' || issue.code === 'invalid_value' || issue.code === 'invalid_union') {
    if (value == null && path.length > 0) return 'missing-input';
    return typeof value === 'number' && !Number.isFinite(value) ? 'not-a-number' : 'malformed-input';
  }
  if (issue.code === 'too_small' && issue.origin === 'number') {
    return issue.inclusive ? 'negative' : 'not-positive';
  }
  return 'malformed-input';
}

function wordsOf(code: string, where: string, message: string): string {
  if (code === 'missing-input') return `${where} is missing.`;
  return OWN_CODES.has(message) ? `${where}: ${REFUSAL_TITLES[code] ?? message}` : message;
}

function refusalOf(issue: Issue, root: unknown, above: Path = []): Refused {
  const path = [...above, ...issue.path];
  const value = valueAt(root, path);
  if (issue.code === 'invalid_union' && typeof value === 'object' && value !== null) {
    const inner = firstOf(likeliestBranch(issue.errors, value));
    if (inner !== undefined) return refusalOf(inner, root, path);
  }
  const where = pathOf(issue.code === 'unrecognized_keys' ? [...path, issue.keys[0] ?? ''] : path);
  const code = codeOf(issue, value, path);
  return new Refused(code, where, wordsOf(code, where, issue.message));
}

/** @throws {Refused} not-json */
export function parseJson(text: string): unknown {
  try {
    return JSON.parse(text) as unknown;
  } catch {
    return refuse('not-json', 'input', 'The text on standard input is not JSON.');
  }
}

/**
 * Checks an input against a schema.
 *
 * @throws {Refused} missing-input, malformed-input, not-a-number, not-positive, negative, degrees-of-freedom,
 *   confidence-out-of-range
 */
export function readInput(schema: z.ZodType, input: unknown): unknown {
  const parsed = schema.safeParse(input);
  if (parsed.success) return parsed.data;
  const issue = firstOf(parsed.error.issues);
  throw issue === undefined
    ? new Refused('malformed-input', 'input', parsed.error.message)
    : refusalOf(issue, input);
}
