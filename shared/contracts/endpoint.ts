import './zod-setup';
import type * as z from 'zod';
import type { Permission } from '#shared/access/permissions';
import type { ProblemCode } from './problem';

/**
 * One HTTP operation as one value, used by both sides: the server mounts it, the client calls it, the OpenAPI document
 * is generated from it, the cross-tenant test walks it.
 *
 * `access` is a permission in the organisation that the session is in, or `signed-in` (any member), or `public`.
 * A `command` changes something: it carries an Idempotency-Key header. With `versioned` it also needs If-Match, the
 * version of the row that was edited. Both are enforced by the server's handler, not by each route.
 */
export interface Endpoint<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Response extends z.ZodType = z.ZodType,
> {
  readonly kind: 'json' | 'upload' | 'download';
  readonly method: 'GET' | 'POST' | 'PUT' | 'DELETE';
  /** Express notation below the origin, for example `/api/v1/programmes/:programmeId`. */
  readonly path: string;
  readonly summary: string;
  readonly access: Permission | 'signed-in' | 'public';
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
  readonly response: Response;
  readonly command: boolean;
  readonly versioned: boolean;
  /** Beyond those that every operation of its kind can answer. */
  readonly problems: readonly ProblemCode[];
}

/** Declares an operation, keeping its literal and schema types. */
export function endpoint<
  Params extends z.ZodType,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Response extends z.ZodType,
>(declaration: Endpoint<Params, Query, Body, Response>): Endpoint<Params, Query, Body, Response> {
  return declaration;
}
