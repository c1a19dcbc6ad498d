import type { ErrorRequestHandler } from 'express';
import type * as z from 'zod';
import { PROBLEMS, type Problem, type ProblemCode } from '#shared/contracts/problem';
import { Refused } from '#shared/core/refusal';
import { fromDatabaseError } from '../db/database-errors';
import { ProblemError, type ProblemExtras } from './problem-error';
import { requestIdOf } from './request-context';

export function problemDetails(code: ProblemCode, requestId: string, extras: ProblemExtras = {}): Problem {
  const { status, title } = PROBLEMS[code];
  return { type: `/problems/${code}`, title, status, code, ...extras, requestId };
}

/** What zod found wrong, as a list with dotted paths. */
export function malformed(error: z.ZodError, root: string): ProblemError {
  const issues = error.issues.slice(0, 50).map((issue) => ({
    where: [root, ...issue.path.map(String)].join('.'),
    detail: issue.message,
  }));
  const first = issues[0];
  return new ProblemError('malformed-input', { detail: first?.detail, where: first?.where, issues });
}

/** The expected failure behind an error, or undefined: then it is ours, and a 500. */
export function expectedFailure(error: unknown): ProblemError | undefined {
  if (error instanceof ProblemError) return error;
  if (error instanceof Refused) {
    return new ProblemError('method-refused', {
      reason: error.code,
      where: error.where,
      detail: error.detail,
    });
  }
  return fromParserError(error) ?? fromDatabaseError(error);
}

/** Errors of express.json and of the router carry a type or a status; their own texts are not passed on. */
function fromParserError(error: unknown): ProblemError | undefined {
  if (!(error instanceof Error)) return undefined;
  const type = 'type' in error ? error.type : undefined;
  if (type === 'entity.too.large') return new ProblemError('too-large');
  if (typeof type === 'string' && /^(entity|encoding|charset|request|stream)\./.test(type)) {
    return new ProblemError('malformed-input', { detail: 'The body is not readable as JSON.' });
  }
  return error instanceof URIError ? new ProblemError('not-found') : undefined;
}

export interface ErrorSink {
  readonly error: (details: object, message: string) => void;
}

/** The last middleware: every error leaves as a Problem; an unexpected one with its request id and nothing else. */
export function problemHandler(log: ErrorSink): ErrorRequestHandler {
  return (error: unknown, req, res, next) => {
    const requestId = requestIdOf(res);
    const expected = expectedFailure(error);
    if (expected === undefined) {
      log.error({ err: error, requestId, method: req.method, path: req.path }, 'unexpected failure');
    }
    if (res.headersSent) {
      next(error);
      return;
    }
    const body = problemDetails(expected?.code ?? 'internal-error', requestId, expected?.extras);
    if (body.retryAfterS !== undefined) res.setHeader('Retry-After', String(Math.ceil(body.retryAfterS)));
    res.status(body.status).type('application/problem+json').send(JSON.stringify(body));
  };
}
