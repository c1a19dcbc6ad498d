import { createServer, type Server } from 'node:http';
import { createApp } from '../app';
import { readConfig } from '../config';
import { type Container, createContainer } from '../container';
import type { ServerModule } from '../http/module';
import { MODULES } from '../modules/registry';
import { ApiMember, type Caller } from './as-member';
import { type TestDatabase, createTestDatabase } from './test-database';
import { type TestOrganisation, addOrganisation } from './test-members';
import type { Role } from '#shared/access/roles';

export const TEST_ORIGIN = 'http://wakeledger.test';
const SECRET = 'a secret that is used in tests only, and nowhere else';

/** The whole server on a database of its own, with two organisations that must never learn of each other. */
export interface ApiHarness {
  readonly database: TestDatabase;
  readonly container: Container;
  readonly server: Server;
  readonly first: TestOrganisation;
  readonly second: TestOrganisation;
  /** A person with this role, signed in; in the first organisation unless another is named. */
  readonly asMember: (role: Role, organisation?: TestOrganisation) => Promise<ApiMember>;
  /** Nobody: a caller without a session. */
  readonly asVisitor: () => ApiMember;
  readonly caller: Caller;
  readonly close: () => Promise<void>;
}

export interface HarnessOptions {
  readonly modules?: readonly ServerModule[];
  readonly environment?: Readonly<Record<string, string>>;
}

/** Call in `beforeAll`, and `close()` in `afterAll`. */
export async function startApi(options: HarnessOptions = {}): Promise<ApiHarness> {
  const database = await createTestDatabase();
  const config = readConfig({
    WAKELEDGER_MODE: 'test',
    DATABASE_URL_TENANT: database.url('tenant'),
    DATABASE_URL_PLATFORM: database.url('platform'),
    DATABASE_CONNECTIONS: '6',
    SESSION_SECRET: SECRET,
    PUBLIC_ORIGINS: TEST_ORIGIN,
    LOG_LEVEL: 'fatal',
    ...options.environment,
  });
  const container = createContainer(config);
  const app = createApp(
    {
      ...container,
      log: {
        ...container.log,
        // A 500 in a test must be seen with its cause.
        error: (details, message) => {
          process.stderr.write(`${message}: ${describe(details)}\n`);
        },
      },
    },
    options.modules ?? MODULES,
  );
  const server = createServer(app);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const first = await addOrganisation(database, 'First Motors');
  const second = await addOrganisation(database, 'Second Motors');
  const caller: Caller = { server, origin: TEST_ORIGIN, secret: SECRET, platform: container.pools.platform };
  return {
    database,
    container,
    server,
    first,
    second,
    caller,
    asMember: (role, organisation = first) => ApiMember.signIn(caller, organisation, role),
    asVisitor: () => new ApiMember(caller, undefined),
    close: async () => {
      await new Promise((resolve) => server.close(resolve));
      await container.close();
      await database.drop();
    },
  };
}

function describe(details: object): string {
  const error = 'err' in details ? details.err : details;
  if (!(error instanceof Error)) return JSON.stringify(details);
  const cause = error.cause instanceof Error ? `\ncaused by ${error.cause.stack}` : '';
  return `${error.stack}${cause}`;
}
