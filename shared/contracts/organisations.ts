import * as z from 'zod';
import { id, name, nothing, timestamp } from './common';
import { endpoint } from './endpoint';
import { organisationKind, role } from './session';

/** A person's place in the organisation; `endedAt` once it is over (the person stays in what they wrote). */
export const organisationMember = z.strictObject({
  userId: id,
  displayName: name,
  email: z.string(),
  role,
  since: timestamp,
  endedAt: timestamp.optional(),
});
export type OrganisationMember = z.infer<typeof organisationMember>;

export const organisationRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/organisation',
  summary: 'The organisation that the session is in',
  access: 'organisation.read',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.strictObject({ id, name, slug: z.string(), kind: organisationKind, demo: z.boolean() }),
  command: false,
  versioned: false,
  problems: [],
});

export const memberList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/organisation/members',
  summary: 'The people of the organisation and their roles',
  access: 'members.read',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.strictObject({ members: z.array(organisationMember) }),
  command: false,
  versioned: false,
  problems: [],
});

export const auditEvent = z.strictObject({
  id,
  at: timestamp,
  /** Absent for what the service did by itself. */
  actorName: z.string().optional(),
  action: z.string(),
  entityKind: z.string(),
  entityId: id.optional(),
  differences: z.array(
    z.strictObject({ field: z.string(), before: z.json().optional(), after: z.json().optional() }),
  ),
  requestId: z.string().optional(),
});
export type AuditEvent = z.infer<typeof auditEvent>;

export const auditList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/audit-events',
  summary: 'Who changed what, newest first, a hundred at a time',
  access: 'audit.read',
  params: nothing,
  query: z.strictObject({
    before: timestamp.optional().describe('Only what happened earlier: the last `at` of the page before.'),
    entityId: id.optional(),
  }),
  body: nothing,
  response: z.strictObject({ events: z.array(auditEvent) }),
  command: false,
  versioned: false,
  problems: [],
});
