import type * as z from 'zod';
import { Refused, refuse } from '../../../shared/core/refusal';

type Issue = z.core.$ZodIssue;

/** Codes that a schema gives itself, as the message of a check. */
const OWN_CODES = new Set(['degrees-of-freedom', 'confidence-out-of-range']);

const pathOf = (path: readonly PropertyKey[]): string => path.map(String).join('.');

/** Of a union the branch that was most likely meant: fewest fields that it does not know, then fewest that are missing. */
function likeliestBranch(branches: readonly (readonly Issue[])[]): readonly Issue[] {
  const distance = (issues: readonly Issue[]): number =>
    issues.reduce((sum, issue) => {
      if (issue.code === 'unrecognized_keys') return sum + 100 * issue.keys.length;
      return sum + (issue.input === undefined ? 10 : 1);
    }, 0);
  return [...branches].sort((a, b) => distance(a) - distance(b))[0] ?? [];
}

function typeCode(issue: Issue): string {
  if (issue.input == null) return 'missing-input';
  return typeof issue.input === 'number' ? 'not-a-number' : 'malformed-input';
}

function codeOf(issue: Issue): string {
  if (OWN_CODES.has(issue.message)) return issue.message;
  switch (issue.code) {
    case 'invalid_type':
      return issue.expected === 'number' || issue.input == null ? typeCode(issue) : 'malformed-input';
    case 'invalid_value':
      return issue.input == null ? 'missing-input' : 'malformed-input';
    case 'too_small':
      return issue.origin === 'number' ? (issue.inclusive ? 'negative' : 'not-positive') : 'malformed-input';
    default:
      return 'malformed-input';
  }
}

function refusalOf(issue: Issue, above: readonly PropertyKey[] = []): Refused {
  const path = [...above, ...issue.path];
  if (issue.code === 'invalid_union') {
    if (issue.input == null) return new Refused('missing-input', pathOf(path), `${pathOf(path)} is missing.`);
    const [first] = inOrder(likeliestBranch(issue.errors));
    if (first !== undefined && (first.path.length > 0 || first.code === 'unrecognized_keys')) {
      return refusalOf(first, path);
    }
    if (typeof issue.input === 'number') {
      return new Refused('not-a-number', pathOf(path), `${pathOf(path)} is beyond the range of numbers.`);
    }
  }
  const where = pathOf(issue.code === 'unrecognized_keys' ? [...path, issue.keys[0] ?? ''] : path);
  const code = codeOf(issue);
  return new Refused(code, where, code === 'missing-input' ? `${where} is missing.` : issue.message);
}

/** Misspelt fields come first: they explain what seems to be missing. */
function inOrder(issues: readonly Issue[]): readonly Issue[] {
  return [...issues].sort(
    (a, b) => Number(b.code === 'unrecognized_keys') - Number(a.code === 'unrecognized_keys'),
  );
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
  const parsed = schema.safeParse(input, { reportInput: true });
  if (parsed.success) return parsed.data;
  const [first] = inOrder(parsed.error.issues);
  throw first === undefined
    ? new Refused('malformed-input', 'input', parsed.error.message)
    : refusalOf(first);
}
