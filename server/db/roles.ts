/**
 * The database roles. Each is a login of its own (never SET ROLE), so a mistake in a request can never reach further
 * than the grants of the pool that it runs on.
 */
export const ROLE_NAMES = {
  /** Owns the schema, runs migrations. Row-level security is forced on it too. */
  owner: 'wakeledger_owner',
  /** Data migrations, seeds, backup: bypasses row-level security; no request ever holds it. */
  maintenance: 'wakeledger_maintenance',
  /** Requests and jobs inside one organisation. */
  tenant: 'wakeledger_tenant',
  /** Sign-in, sessions, and which organisations a person belongs to. */
  platform: 'wakeledger_platform',
} as const;
export type DatabaseRole = keyof typeof ROLE_NAMES;

export const DATABASE_ROLES = Object.keys(ROLE_NAMES) as readonly DatabaseRole[];
