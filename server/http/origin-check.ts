import type { RequestHandler } from 'express';
import { ProblemError } from './problem-error';

const SAFE: readonly string[] = ['GET', 'HEAD', 'OPTIONS'];

/** Anything that changes something must come from one of our own origins, stated exactly; a missing Origin is foreign. */
export function checkOrigin(origins: readonly string[]): RequestHandler {
  return (req, _res, next) => {
    const origin = req.get('origin');
    const own = origin !== undefined && origins.includes(origin);
    next(SAFE.includes(req.method) || own ? undefined : new ProblemError('origin-refused'));
  };
}
