import * as z from 'zod';
import { MAKER_ROLES, ORGANISATION_KINDS, SUPPLIER_ROLES } from '#shared/access/roles';
import { PERMISSIONS } from '#shared/access/permissions';
import { id, name, nothing } from './common';
import { endpoint } from './endpoint';

export const role = z.enum([...MAKER_ROLES, ...SUPPLIER_ROLES]);
export const organisationKind = z.enum(ORGANISATION_KINDS);

export const membership = z.strictObject({
  organisationId: id,
  organisationName: name,
  organisationSlug: z.string(),
  kind: organisationKind,
  role,
});

/** Who is signed in, where, and what that allows. `member` is absent before sign-in. */
export const sessionState = z.strictObject({
  member: z
    .strictObject({
      userId: id,
      displayName: name,
      email: z.string(),
      organisationId: id,
      role,
      permissions: z.array(z.enum(PERMISSIONS)),
      memberships: z.array(membership),
      /** The latest programme opened in this organisation, if any: where sign-in leads. */
      latestProgrammeId: id.optional(),
    })
    .optional(),
  /** Present in the demo only: the people one may continue as. */
  demoPeople: z
    .array(z.strictObject({ userId: id, displayName: name, role, organisationName: name, task: z.string() }))
    .optional(),
});
export type SessionState = z.infer<typeof sessionState>;
export type Membership = z.infer<typeof membership>;

export const sessionRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/session',
  summary: 'Who is signed in, and what that allows',
  access: 'public',
  params: nothing,
  query: nothing,
  body: nothing,
  response: sessionState,
  command: false,
  versioned: false,
  problems: [],
});

export const passwordSignIn = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/session/password',
  summary: 'Sign in with organisation, e-mail address and password',
  access: 'public',
  params: nothing,
  query: nothing,
  body: z.strictObject({
    organisationSlug: z.string().trim().min(1).max(60),
    email: z.string().trim().min(3).max(254),
    password: z.string().min(1).max(1024),
  }),
  response: sessionState,
  command: false,
  versioned: false,
  problems: ['sign-in-refused', 'too-many-attempts'],
});

/** The one-time link that `npm run organisation:create` prints leads here: the token is worth one password. */
export const passwordSet = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/session/password-setting',
  summary: 'Set a password with a one-time token; sessions of that person end',
  access: 'public',
  params: nothing,
  query: nothing,
  body: z.strictObject({
    token: z.string().min(20).max(200),
    password: z.string().min(12).max(1024),
  }),
  response: z.strictObject({ email: z.string(), organisationSlug: z.string() }),
  command: false,
  versioned: false,
  problems: ['sign-in-refused', 'too-many-attempts'],
});

export const demoSignIn = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/session/demo',
  summary: 'Continue as one of the demo people (demo only)',
  access: 'public',
  params: nothing,
  query: nothing,
  body: z.strictObject({ userId: id }),
  response: sessionState,
  command: false,
  versioned: false,
  problems: ['not-found', 'too-many-attempts'],
});

export const organisationSwitch = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/session/organisation',
  summary: 'Work in another organisation that the person belongs to',
  access: 'signed-in',
  params: nothing,
  query: nothing,
  body: z.strictObject({ organisationId: id }),
  response: sessionState,
  command: false,
  versioned: false,
  problems: ['not-found'],
});

export const signOut = endpoint({
  kind: 'json',
  method: 'DELETE',
  path: '/api/v1/session',
  summary: 'Sign out',
  access: 'signed-in',
  params: nothing,
  query: nothing,
  body: nothing,
  response: sessionState,
  command: false,
  versioned: false,
  problems: [],
});
