import { randomUUID } from 'node:crypto';
import type { RequestHandler, Response } from 'express';

/** Every request gets an id of our own making; it stands in the answer, the log and the audit trail. */
export const giveRequestId: RequestHandler = (_req, res, next) => {
  const requestId = randomUUID();
  res.locals['requestId'] = requestId;
  res.setHeader('X-Request-Id', requestId);
  next();
};

export function requestIdOf(res: Response): string {
  const value: unknown = res.locals['requestId'];
  return typeof value === 'string' ? value : 'none';
}
