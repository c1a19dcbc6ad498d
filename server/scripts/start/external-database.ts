import pg from 'pg';
import { DATABASE_ROLES, type DatabaseRole, ROLE_NAMES } from '../../db/roles';
import { type DatabaseUrls, urlVariable } from './database';

const HOW_TO = `How to set up what is missing: npm run database:prepare -- --help`;

interface Powers {
  readonly name: string;
  readonly bypasses: boolean;
  readonly may_create: boolean;
}

/**
 * Looks whether a database server that was given to us has the logins and the database that the product needs.
 *
 * @throws {Error} naming everything that is missing, and how to set it up
 */
export async function requireDatabase(urls: DatabaseUrls): Promise<void> {
  const faults = await Promise.all(DATABASE_ROLES.map((role) => faultOf(role, urls[role])));
  const found = faults.filter((fault) => fault !== undefined);
  if (found.length > 0) {
    throw new Error(['The database is not ready for Wakeledger.', ...found, HOW_TO].join('\n  '));
  }
}

async function faultOf(role: DatabaseRole, url: string): Promise<string | undefined> {
  const variable = urlVariable(role);
  const client = new pg.Client({ connectionString: url, connectionTimeoutMillis: 10_000 });
  client.on('error', () => undefined);
  try {
    await client.connect();
    const { rows } = await client.query<Powers>(
      `select current_user as name, rolbypassrls as bypasses,
         has_database_privilege(current_database(), 'CREATE') as may_create
       from pg_roles where rolname = current_user`,
    );
    return faultOfLogin(role, rows[0]);
  } catch (error) {
    return `${variable}: ${connectionWords(error, client)}`;
  } finally {
    await client.end();
  }
}

/** The grants of the migrations name the roles, so a login of another name would reach nothing. */
function faultOfLogin(role: DatabaseRole, powers: Powers | undefined): string | undefined {
  const variable = urlVariable(role);
  if (powers?.name !== ROLE_NAMES[role]) {
    return `${variable} must be the login ${ROLE_NAMES[role]}; it is ${powers?.name ?? 'unknown'}.`;
  }
  if (role === 'owner' && !powers.may_create) return `${variable}: the login does not own the database.`;
  if (role === 'maintenance' && !powers.bypasses) {
    return `${variable}: the login lacks BYPASSRLS, which seeds and data migrations need.`;
  }
  return undefined;
}

function connectionWords(error: unknown, client: pg.Client): string {
  const { code = '', message = String(error) } = error as {
    readonly code?: string;
    readonly message?: string;
  };
  const words: Readonly<Record<string, string>> = {
    ECONNREFUSED: `no server answers at ${client.host}:${client.port}.`,
    ENOTFOUND: `there is no host ${client.host}.`,
    '28P01': `the server refuses the login ${client.user ?? ''}: it does not exist, or has another password.`,
    '28000': `the server does not let the login ${client.user ?? ''} in (${message}).`,
    '3D000': `there is no database ${client.database ?? ''}.`,
    '42501': `the login ${client.user ?? ''} may not connect to ${client.database ?? ''}.`,
  };
  return words[code] ?? `${message}.`;
}
