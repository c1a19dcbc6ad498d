import type { Request, Response } from 'express';
import type { Container } from '../container';
import { inPlatform, inTenant } from '../db/in-tenant';
import type { PublicContext } from './context';
import { requestIdOf } from './request-context';
import { beginSession, endSession, sessionIdentity } from './session';

export function publicContext(container: Container, req: Request, res: Response): PublicContext {
  const requestId = requestIdOf(res);
  const now = container.clock();
  return {
    requestId,
    now,
    log: container.log,
    clientAddress: req.ip ?? 'unknown',
    demo: container.config.demo,
    inPlatform: (userId, mode, work) => inPlatform(container.pools, userId, mode, work),
    inTenant: async (identity, mode, work) => {
      const afterwards: (() => void)[] = [];
      const result = await inTenant(container.pools, { ...identity, requestId }, mode, (tx) =>
        work({
          tx,
          ...identity,
          requestId,
          now,
          log: container.log,
          afterCommit: (deed) => afterwards.push(deed),
        }),
      );
      for (const deed of afterwards) deed();
      return result;
    },
    session: {
      identity: () => sessionIdentity(req),
      begin: (identity) => beginSession(req, identity),
      end: () => endSession(req),
    },
    signIn: container.signIn,
  };
}
