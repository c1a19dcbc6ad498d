import type { Request } from 'express';
import type { Endpoint } from '#shared/contracts/endpoint';
import { fail } from './problem-error';
import { malformed } from './problem-details';

/** An address that cannot be one of ours is answered like one that does not exist. */
export function parseParams(endpoint: Endpoint, req: Request): unknown {
  const parsed = endpoint.params.safeParse({ ...req.params });
  return parsed.success ? parsed.data : fail('not-found');
}

export function parseQuery(endpoint: Endpoint, req: Request): unknown {
  const parsed = endpoint.query.safeParse({ ...req.query });
  if (!parsed.success) throw malformed(parsed.error, 'query');
  return parsed.data;
}

export function parseBody(endpoint: Endpoint, req: Request): unknown {
  const given: unknown = req.body ?? {};
  const parsed = endpoint.body.safeParse(given);
  if (!parsed.success) throw malformed(parsed.error, 'body');
  return parsed.data;
}

/** If-Match as the client got it (`"3"` from the ETag) or as the bare version. */
export function readExpectedVersion(header: string | undefined): number {
  if (header === undefined) fail('precondition-missing');
  const digits = /^"?(\d{1,9})"?$/.exec(header.trim())?.[1];
  if (digits === undefined) {
    fail('malformed-input', {
      where: 'headers.if-match',
      detail: 'The version is expected, for example "3".',
    });
  }
  return Number(digits);
}
