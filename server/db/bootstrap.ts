import pg from 'pg';
import { DATABASE_ROLES, type DatabaseRole, ROLE_NAMES } from './roles';

const ATTRIBUTES: Readonly<Record<DatabaseRole, string>> = {
  owner: 'NOBYPASSRLS',
  maintenance: 'BYPASSRLS',
  tenant: 'NOBYPASSRLS',
  platform: 'NOBYPASSRLS',
};

/** Creates the logins, or gives existing ones these passwords again. For a superuser, in any database of the cluster. */
export function roleStatements(passwords: Readonly<Record<DatabaseRole, string>>): readonly string[] {
  return DATABASE_ROLES.flatMap((role) => {
    const name = ROLE_NAMES[role];
    const rights = `LOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOREPLICATION ${ATTRIBUTES[role]}`;
    return [
      `DO $$ BEGIN CREATE ROLE ${name}; EXCEPTION WHEN duplicate_object THEN NULL; END $$`,
      `ALTER ROLE ${name} ${rights} PASSWORD ${pg.escapeLiteral(passwords[role])}`,
    ];
  });
}

/** For a superuser, after `CREATE DATABASE … OWNER wakeledger_owner`: who may connect at all. */
export function connectStatements(database: string): readonly string[] {
  const name = pg.escapeIdentifier(database);
  const roles = DATABASE_ROLES.map((role) => ROLE_NAMES[role]).join(', ');
  return [`REVOKE ALL ON DATABASE ${name} FROM PUBLIC`, `GRANT CONNECT ON DATABASE ${name} TO ${roles}`];
}

/**
 * For a superuser, inside the database: takes row counts, sizes and other sessions' statements away from the request
 * roles. They are statistics of all organisations together, and growth seen over time is knowledge of the others.
 */
export const STATISTICS_STATEMENTS: readonly string[] = [
  `DO $$
  DECLARE thing record; allowed text := 'pg_monitor, ${ROLE_NAMES.owner}, ${ROLE_NAMES.maintenance}';
  BEGIN
    FOR thing IN
      SELECT c.oid::regclass AS name FROM pg_class c
      WHERE c.relnamespace = 'pg_catalog'::regnamespace AND c.relkind = 'v'
        AND (c.relname LIKE 'pg\\_stat%' OR c.relname LIKE 'pg\\_stats%')
    LOOP
      EXECUTE format('REVOKE ALL ON %s FROM PUBLIC', thing.name);
      EXECUTE format('GRANT SELECT ON %s TO %s', thing.name, allowed);
    END LOOP;
    FOR thing IN
      SELECT p.oid::regprocedure AS name FROM pg_proc p
      WHERE p.pronamespace = 'pg_catalog'::regnamespace AND p.prokind = 'f'
        AND (p.proname LIKE 'pg\\_stat\\_get\\_%'
          OR p.proname IN ('pg_relation_size', 'pg_total_relation_size', 'pg_table_size', 'pg_indexes_size'))
    LOOP
      EXECUTE format('REVOKE ALL ON FUNCTION %s FROM PUBLIC', thing.name);
      EXECUTE format('GRANT EXECUTE ON FUNCTION %s TO %s', thing.name, allowed);
    END LOOP;
    REVOKE ALL ON pg_catalog.pg_class FROM PUBLIC;
    EXECUTE format('GRANT SELECT ON pg_catalog.pg_class TO %s', allowed);
    EXECUTE (
      SELECT format('GRANT SELECT (%s) ON pg_catalog.pg_class TO PUBLIC', string_agg(quote_ident(attname), ', '))
      FROM pg_attribute
      WHERE attrelid = 'pg_catalog.pg_class'::regclass AND NOT attisdropped
        AND attname NOT IN ('reltuples', 'relpages', 'relallvisible')
    );
  END $$`,
];
