import type { Endpoint } from '#shared/contracts/endpoint';
import type { ProblemCode } from '#shared/contracts/problem';

const ALWAYS: readonly ProblemCode[] = ['malformed-input', 'not-ready', 'internal-error'];
const OF_MEMBERS: readonly ProblemCode[] = ['not-signed-in', 'forbidden', 'not-found'];
const OF_CHANGES: readonly ProblemCode[] = ['origin-refused', 'too-large'];
const OF_COMMANDS: readonly ProblemCode[] = [
  'idempotency-key-missing',
  'idempotency-key-reused',
  'command-in-progress',
  'unusable-input',
];
const OF_VERSIONED: readonly ProblemCode[] = ['precondition-missing', 'conflict'];

/** Every failure that an operation may answer: its own and those that come with its kind. */
export function declaredProblems(endpoint: Endpoint): readonly ProblemCode[] {
  return [
    ...new Set([
      ...ALWAYS,
      ...(endpoint.access === 'public' ? [] : OF_MEMBERS),
      ...(endpoint.method === 'GET' ? [] : OF_CHANGES),
      ...(endpoint.command ? OF_COMMANDS : []),
      ...(endpoint.versioned ? OF_VERSIONED : []),
      ...endpoint.problems,
    ]),
  ];
}

export function isDeclared(endpoint: Endpoint, code: ProblemCode): boolean {
  return declaredProblems(endpoint).includes(code);
}
