import pino from 'pino';
import type { Config } from './config';
import type { Log, SignInServices } from './http/context';
import { openSignInLimits } from './http/sign-in-limits';
import { openSessions, type Sessions } from './http/session';
import { openPools, type Pools } from './db/pools';

/** Everything that outlives a request, wired once. */
export interface Container {
  readonly config: Config;
  readonly log: Log;
  readonly logger: pino.Logger;
  readonly pools: Pools;
  readonly sessions: Sessions;
  readonly signIn: SignInServices;
  readonly clock: () => Date;
  readonly wakeJobs: (organisationId: string) => void;
  /** Who listens for new jobs; the runner registers itself here. */
  readonly onWakeJobs: (listener: (organisationId: string) => void) => void;
  readonly close: () => Promise<void>;
}

export function createContainer(config: Config): Container {
  const logger = pino({
    level: config.logLevel,
    redact: ['req.headers.cookie', 'req.headers.authorization', 'res.headers["set-cookie"]'],
  });
  const log: Log = {
    error: (details, message) => logger.error(details, message),
    warn: (details, message) => logger.warn(details, message),
    info: (details, message) => logger.info(details, message),
  };
  const pools = openPools({
    tenantUrl: config.tenantUrl,
    platformUrl: config.platformUrl,
    maximumConnections: config.databaseConnections,
    onIdleError: (err) => log.warn({ err }, 'a database connection was lost'),
  });
  const sessions = openSessions(config, pools, (err) => log.error({ err }, 'sessions cannot be kept'));
  const listeners: ((organisationId: string) => void)[] = [];
  return {
    config,
    log,
    logger,
    pools,
    sessions,
    signIn: openSignInLimits(pools, config.mode !== 'test'),
    clock: () => new Date(),
    wakeJobs: (organisationId) => listeners.forEach((listener) => listener(organisationId)),
    onWakeJobs: (listener) => listeners.push(listener),
    close: async () => {
      sessions.close();
      await pools.close();
    },
  };
}
