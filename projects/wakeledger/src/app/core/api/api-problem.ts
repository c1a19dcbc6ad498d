import { PROBLEMS, problem, type Problem, type ProblemCode } from '#shared/contracts/problem';

/** What can go wrong between here and the server besides what the server says itself. */
export type ApiProblemCode = ProblemCode | 'no-connection' | 'unreadable-answer';

/** Where a refusal points and what it says, for one field or cell. */
export interface ProblemIssue {
  readonly where: string;
  readonly detail: string;
  readonly reason?: string;
}

/** A refusal or failure of one call, as the pages see it: always with a code, never a raw HTTP error. */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';

  constructor(
    readonly code: ApiProblemCode,
    readonly problem?: Problem,
    options?: ErrorOptions,
  ) {
    super(problem?.detail ?? problem?.title ?? code, options);
  }

  /** Everything that was said to be wrong, field by field; empty when the problem is not about a field. */
  get issues(): readonly ProblemIssue[] {
    if (this.problem?.issues?.length) return this.problem.issues;
    const { where, detail, title } = this.problem ?? {};
    return where ? [{ where, detail: detail ?? title ?? this.code }] : [];
  }
}

/** Reads the body of a failed answer. Anything but a Problem object counts as a failure of the server's. */
export function toApiProblem(status: number, body: unknown, cause: unknown): ApiProblem {
  if (status === 0) return new ApiProblem('no-connection', undefined, { cause });
  const parsed = problem.safeParse(body);
  if (parsed.success) return new ApiProblem(parsed.data.code, parsed.data, { cause });
  const code: ApiProblemCode = status >= 500 ? 'internal-error' : 'unreadable-answer';
  return new ApiProblem(code, undefined, { cause });
}

/** Turns whatever was thrown into a problem, so that a page has one thing to show. */
export function asApiProblem(thrown: unknown): ApiProblem {
  return thrown instanceof ApiProblem
    ? thrown
    : new ApiProblem('unreadable-answer', undefined, { cause: thrown });
}

export function isProblemCode(code: string): code is ProblemCode {
  return code in PROBLEMS;
}
