import { ProblemError } from '../http/problem-error';

/**
 * What the database's refusals mean to a person. Texts and names of constraints stay inside: they could tell about
 * rows that the person may not see.
 */
export function fromDatabaseError(error: unknown): ProblemError | undefined {
  switch (databaseCode(error)) {
    case '23505':
      return new ProblemError('already-exists');
    case '23503':
      return stillReferenced(error)
        ? new ProblemError('still-in-use')
        : new ProblemError('unusable-input', { detail: 'It refers to something that does not exist.' });
    case '23514':
    case '23502':
    case '22003':
      return new ProblemError('unusable-input', { detail: 'A value is outside what can be stored.' });
    case '22021':
    case '22P05':
      return new ProblemError('malformed-input', {
        detail: 'A text contains a character that cannot be kept.',
      });
    case '40001':
    case '40P01':
      return new ProblemError('command-in-progress', { detail: 'Two changes met; send it again.' });
    case '57P01':
    case '57P03':
    case 'ECONNREFUSED':
      return new ProblemError('not-ready');
    default:
      return undefined;
  }
}

/** The SQLSTATE; drizzle wraps the driver's error as `cause`. */
export function databaseCode(error: unknown): string | undefined {
  for (let e = error; e instanceof Error; e = e.cause) {
    if ('code' in e && typeof e.code === 'string') return e.code;
  }
  return undefined;
}

function stillReferenced(error: unknown): boolean {
  for (let e = error; e instanceof Error; e = e.cause) {
    if ('detail' in e && typeof e.detail === 'string') return e.detail.includes('still referenced');
  }
  return false;
}
