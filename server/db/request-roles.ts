import type pg from 'pg';
import type { Pools } from './pools';

interface Powers {
  readonly name: string;
  readonly superuser: boolean;
  readonly bypasses: boolean;
  readonly owns: boolean;
}

// Counting also what the login could become by SET ROLE: a membership in the owner is as good as being it.
const POWERS = `
  with reach as (select oid, rolname, rolsuper, rolbypassrls from pg_roles where pg_has_role(current_user, oid, 'member'))
  select current_user as name,
    bool_or(rolsuper) as superuser,
    bool_or(rolbypassrls) as bypasses,
    exists (
      select from pg_class join reach on reach.oid = relowner
      where relnamespace = 'public'::regnamespace and relkind in ('r', 'p', 'v', 'm')
    ) or exists (
      select from pg_database join reach on reach.oid = datdba where datname = current_database()
    ) as owns
  from reach`;

/**
 * Refuses to serve requests with a login that row-level security does not bind.
 *
 * @throws {Error} when a request login is superuser, bypasses row-level security or owns tables or the database
 */
export async function assertRequestRoles(pools: Pools): Promise<void> {
  for (const pool of [pools.tenant, pools.platform]) await assertHarmless(pool);
}

async function assertHarmless(pool: pg.Pool): Promise<void> {
  const { rows } = await pool.query<Powers>(POWERS);
  const powers = rows[0];
  if (powers === undefined) throw new Error('The database does not say who is connected.');
  const reasons = [
    powers.superuser ? 'is a superuser' : '',
    powers.bypasses ? 'bypasses row-level security' : '',
    powers.owns ? 'owns the database or its tables' : '',
  ].filter((reason) => reason !== '');
  if (reasons.length > 0) {
    throw new Error(
      `The login ${powers.name} ${reasons.join(' and ')}. Requests must not run as it: ` +
        'give DATABASE_URL_TENANT and DATABASE_URL_PLATFORM logins without these powers.',
    );
  }
}
