import connectPgSimple from 'connect-pg-simple';
import type { Request, RequestHandler } from 'express';
import session from 'express-session';
import type { Config } from '../config';
import type { Pools } from '../db/pools';
import type { SessionIdentity } from './context';

declare module 'express-session' {
  interface SessionData {
    userId?: string;
    organisationId?: string;
  }
}

/** How long a session outlives the last request. */
const IDLE_MS = 12 * 60 * 60 * 1000;

export interface Sessions {
  readonly middleware: RequestHandler;
  readonly close: () => void;
}

/** Sessions in PostgreSQL. A visitor who does not sign in leaves no row and gets no cookie. */
export function openSessions(config: Config, pools: Pools, onError: (error: Error) => void): Sessions {
  const Store = connectPgSimple(session);
  const store = new Store({
    pool: pools.platform,
    tableName: 'web_sessions',
    createTableIfMissing: false,
    // A fixed interval would keep test processes alive and is not needed there.
    pruneSessionInterval: config.mode === 'test' ? false : 15 * 60,
    errorLog: (...details: unknown[]) => onError(new Error(details.map(String).join(' '))),
  });
  const middleware = session({
    name: config.secure ? '__Host-wakeledger' : 'wakeledger',
    secret: config.sessionSecret,
    store,
    resave: false,
    saveUninitialized: false,
    rolling: true,
    cookie: { path: '/', httpOnly: true, sameSite: 'lax', secure: config.secure, maxAge: IDLE_MS },
  });
  return { middleware, close: () => store.close() };
}

export function sessionIdentity(req: Request): SessionIdentity | undefined {
  const { userId, organisationId } = req.session;
  return userId !== undefined && organisationId !== undefined ? { userId, organisationId } : undefined;
}

/** Starts a fresh session under a new id, so that one planted before sign-in is worth nothing afterwards. */
export async function beginSession(req: Request, identity: SessionIdentity): Promise<void> {
  await settled((done) => req.session.regenerate(done));
  req.session.userId = identity.userId;
  req.session.organisationId = identity.organisationId;
  await settled((done) => req.session.save(done));
}

export async function endSession(req: Request): Promise<void> {
  await settled((done) => req.session.regenerate(done));
}

function settled(act: (done: (error?: unknown) => void) => void): Promise<void> {
  return new Promise((resolve, reject) => {
    act((error) => (error ? reject(error) : resolve()));
  });
}
