import { PROBLEMS, type Problem, type ProblemCode } from '#shared/contracts/problem';

export type ProblemExtras = Partial<Omit<Problem, 'type' | 'title' | 'status' | 'code' | 'requestId'>>;

/** An expected failure on its way out: thrown anywhere, answered as RFC 9457 by the error handler. */
export class ProblemError extends Error {
  override readonly name = 'ProblemError';

  constructor(
    readonly code: ProblemCode,
    readonly extras: ProblemExtras = {},
  ) {
    super(extras.detail ?? PROBLEMS[code].title);
  }
}

/** Stops with an expected failure. @throws {ProblemError} always */
export function fail(code: ProblemCode, extras: ProblemExtras = {}): never {
  throw new ProblemError(code, extras);
}
