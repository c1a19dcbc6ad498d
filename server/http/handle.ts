import type { IRouter, Request, Response } from 'express';
import { may } from '#shared/access/permissions';
import type { Container } from '../container';
import { inTenant, type TransactionMode } from '../db/in-tenant';
import type { MemberContext, SessionIdentity } from './context';
import { commandHash, once, readKey } from './idempotency';
import { findMember } from './membership';
import type { Download, Route, UploadedFile } from './module';
import { parseBody, parseParams, parseQuery, readExpectedVersion } from './parse-request';
import { fail } from './problem-error';
import { expectedFailure } from './problem-details';
import { publicContext } from './public-context';
import { sendDownload, sendJson } from './reply';
import { requestIdOf } from './request-context';
import { isDeclared } from './declared-problems';
import { sessionIdentity } from './session';
import { readUpload } from './uploads';

type MemberRoute = Extract<Route, { audience: 'member' }>;
type PublicRoute = Extract<Route, { audience: 'public' }>;

/** Mounts one operation: everything between the wire and a handler happens here, for all of them alike. */
export function mount(router: IRouter, route: Route, container: Container): void {
  const method = route.endpoint.method.toLowerCase() as Lowercase<typeof route.endpoint.method>;
  router[method](route.endpoint.path, async (req, res) => {
    res.setHeader('Cache-Control', 'no-store');
    try {
      if (route.audience === 'public') await servePublic(route, container, req, res);
      else await serveMember(route, container, req, res);
    } catch (error) {
      throw honest(error, route, container);
    }
  });
}

/** In tests and development an undeclared failure is a mistake of ours and fails loudly. */
function honest(error: unknown, route: Route, container: Container): unknown {
  const problem = expectedFailure(error);
  if (problem === undefined || container.config.mode === 'production') return error;
  if (isDeclared(route.endpoint, problem.code)) return error;
  return new Error(`${route.endpoint.method} ${route.endpoint.path} does not declare ${problem.code}`, {
    cause: error,
  });
}

async function servePublic(route: PublicRoute, container: Container, req: Request, res: Response) {
  const { endpoint } = route;
  if (endpoint.access === 'signed-in' && sessionIdentity(req) === undefined) fail('not-signed-in');
  const input = {
    params: parseParams(endpoint, req),
    query: parseQuery(endpoint, req),
    body: parseBody(endpoint, req),
    expectedVersion: 0,
  };
  sendJson(res, container, endpoint, await route.handler(input, publicContext(container, req, res)));
}

async function serveMember(route: MemberRoute, container: Container, req: Request, res: Response) {
  const { endpoint } = route;
  const identity = sessionIdentity(req) ?? fail('not-signed-in');
  const params = parseParams(endpoint, req);
  const query = parseQuery(endpoint, req);
  const expectedVersion = endpoint.versioned ? readExpectedVersion(req.get('if-match')) : 0;
  const key = endpoint.command ? readKey(req.get('idempotency-key')) : undefined;
  let file: UploadedFile | undefined;
  if (endpoint.kind === 'upload') {
    // Whether the person may is settled before a byte of the file is read.
    await run(container, identity, 'read', res, (context) => permit(endpoint.access, context));
    file = await readUpload(req, route.maximumBytes);
  }
  const body = endpoint.kind === 'upload' ? {} : parseBody(endpoint, req);
  const mode = endpoint.method === 'GET' ? 'read' : 'write';
  const reply = await run(container, identity, mode, res, async (context) => {
    await permit(endpoint.access, context);
    const deed = () => route.handler({ params, query, body, expectedVersion, file }, context);
    if (key === undefined) return deed();
    const bodyHash = commandHash([endpoint.method, req.path, query, body, expectedVersion, file?.sha256]);
    return once(context.tx, identity.organisationId, { userId: identity.userId, key, bodyHash }, deed);
  });
  if (endpoint.kind === 'download') sendDownload(res, reply as Download);
  else sendJson(res, container, endpoint, reply);
}

async function permit(access: MemberRoute['endpoint']['access'], context: MemberContext): Promise<void> {
  if (access === 'public' || access === 'signed-in') return;
  if (!context.may(access)) fail('forbidden');
}

/** One transaction as this member; what was put off until after the commit is done once it has happened. */
async function run<T>(
  container: Container,
  identity: SessionIdentity,
  mode: TransactionMode,
  res: Response,
  work: (context: MemberContext) => Promise<T>,
): Promise<T> {
  const requestId = requestIdOf(res);
  const afterwards: (() => void)[] = [];
  const result = await inTenant(container.pools, { ...identity, requestId }, mode, async (tx) => {
    const member = (await findMember(tx, identity.userId)) ?? fail('not-signed-in');
    return work({
      tx,
      ...identity,
      requestId,
      member,
      now: container.clock(),
      log: container.log,
      may: (permission) => may(member.role, permission),
      afterCommit: (deed) => afterwards.push(deed),
      wakeJobs: () => afterwards.push(() => container.wakeJobs(identity.organisationId)),
    });
  });
  for (const deed of afterwards) deed();
  return result;
}
