import { sql } from 'drizzle-orm';
import { customType, pgRole, timestamp } from 'drizzle-orm/pg-core';
import { ROLE_NAMES } from '../roles';

export const tenantRole = pgRole(ROLE_NAMES.tenant).existing();
export const platformRole = pgRole(ROLE_NAMES.platform).existing();

/** The organisation that the transaction is in; NULL outside one (the setting reads '' after a commit). */
export const currentOrganisation = sql`nullif(current_setting('app.organisation_id', true), '')::uuid`;

/** The person that the platform role is looking up. */
export const currentUser = sql`nullif(current_setting('app.user_id', true), '')::uuid`;

export const bytea = customType<{ data: Buffer; driverData: Buffer }>({
  dataType: () => 'bytea',
});

/** A point in time; arrives as a Date, goes out as `toISOString()`. */
export const instant = (name: string) => timestamp(name, { withTimezone: true, precision: 6 });
