import { randomBytes } from 'node:crypto';
import { parseArgs } from 'node:util';
import pg from 'pg';
import { STATISTICS_STATEMENTS, connectStatements, roleStatements } from '../db/bootstrap';
import { DATABASE_ROLES, type DatabaseRole, ROLE_NAMES } from '../db/roles';
import { DATABASE_NAME, urlVariable, withClient } from './start/database';

const USAGE = `Sets up a PostgreSQL server (15 or later) of yours for Wakeledger: four logins, one database, and what they may see.

  npm run -s database:prepare -- --host db.example.org > prepare.sql
      prints the statements, for psql as a superuser, and after them the variables that npm start wants
  npm run -s database:prepare -- --superuser-url postgresql://postgres:…@db.example.org/postgres
      carries them out, and prints the variables

  --database NAME   another name than ${DATABASE_NAME}
  --host, --port    how the product reaches the server, for the variables (default 127.0.0.1, 5432, or the superuser’s)

Passwords are drawn anew each time, and existing logins are given the new ones.
`;

const text = { type: 'string' } as const;
const { values } = parseArgs({
  options: {
    'superuser-url': text,
    database: { ...text, default: DATABASE_NAME },
    host: text,
    port: text,
    help: { type: 'boolean' },
  },
});

type Passwords = Readonly<Record<DatabaseRole, string>>;

const draw = () => randomBytes(24).toString('base64url');

function variables(passwords: Passwords, host: string, database: string): readonly string[] {
  return DATABASE_ROLES.map(
    (role) =>
      `${urlVariable(role)}=postgresql://${ROLE_NAMES[role]}:${passwords[role]}@${host}/${encodeURIComponent(database)}`,
  );
}

/** As psql reads it: the database is created only where it is missing, and entered. */
function script(passwords: Passwords, host: string, database: string): string {
  const create = `CREATE DATABASE ${pg.escapeIdentifier(database)} OWNER ${ROLE_NAMES.owner}`;
  const missing = `WHERE NOT EXISTS (SELECT FROM pg_database WHERE datname = ${pg.escapeLiteral(database)})`;
  const lines = [
    '\\set ON_ERROR_STOP on',
    ...roleStatements(passwords).map((statement) => `${statement};`),
    `SELECT ${pg.escapeLiteral(create)} ${missing} \\gexec`,
    ...connectStatements(database).map((statement) => `${statement};`),
    `\\connect ${pg.escapeIdentifier(database)}`,
    ...STATISTICS_STATEMENTS.map((statement) => `${statement};`),
    '',
    '-- What npm start wants in its environment:',
    ...variables(passwords, host, database).map((line) => `-- ${line}`),
  ];
  return `${lines.join('\n')}\n`;
}

async function carryOut(superuserUrl: string, passwords: Passwords, database: string): Promise<void> {
  await withClient(superuserUrl, async (client) => {
    for (const statement of roleStatements(passwords)) await client.query(statement);
    const { rowCount } = await client.query('select from pg_database where datname = $1', [database]);
    if (rowCount === 0) {
      await client.query(`CREATE DATABASE ${pg.escapeIdentifier(database)} OWNER ${ROLE_NAMES.owner}`);
    }
    for (const statement of connectStatements(database)) await client.query(statement);
  });
  const inside = new URL(superuserUrl);
  inside.pathname = `/${encodeURIComponent(database)}`;
  await withClient(inside.href, async (client) => {
    for (const statement of STATISTICS_STATEMENTS) await client.query(statement);
  });
}

/** `npm run database:prepare`: what a superuser has to do before the product can use a server that is already there. */
async function main(): Promise<void> {
  if (values.help) {
    process.stdout.write(USAGE);
    return;
  }
  const given = values['superuser-url'] === undefined ? undefined : new URL(values['superuser-url']);
  const hostName = values.host ?? given?.hostname ?? '127.0.0.1';
  const host = `${hostName}:${values.port ?? (given?.port || '5432')}`;
  const passwords = { owner: draw(), maintenance: draw(), tenant: draw(), platform: draw() };
  if (given === undefined) {
    process.stdout.write(script(passwords, host, values.database));
    return;
  }
  await carryOut(given.href, passwords, values.database);
  process.stdout.write(`${variables(passwords, host, values.database).join('\n')}\n`);
}

await main();
