import { ROLE_NAMES } from '../roles';

/** Policies as PostgreSQL prints them. One per tenant table; the exceptions are listed by name with their reason. */
export interface ExpectedPolicy {
  readonly table: string;
  readonly command: 'ALL' | 'SELECT';
  readonly role: string;
  readonly using: string;
  readonly withCheck: string | null;
}

const OWN = `(NULLIF(current_setting('app.organisation_id'::text, true), ''::text))::uuid`;
const OWN_USER = `(NULLIF(current_setting('app.user_id'::text, true), ''::text))::uuid`;
export const OWN_ROWS = `(organisation_id = ${OWN})`;

export const tenantPolicy = (table: string): ExpectedPolicy => ({
  table,
  command: 'ALL',
  role: ROLE_NAMES.tenant,
  using: OWN_ROWS,
  withCheck: OWN_ROWS,
});

export const FURTHER_POLICIES: readonly ExpectedPolicy[] = [
  // The list of tenants: a request sees its own row, sign-in looks any of them up.
  {
    table: 'organisations',
    command: 'SELECT',
    role: ROLE_NAMES.tenant,
    using: `(id = ${OWN})`,
    withCheck: null,
  },
  { table: 'organisations', command: 'SELECT', role: ROLE_NAMES.platform, using: 'true', withCheck: null },
  // Sign-in reads the places of the one person who is signing in.
  {
    table: 'memberships',
    command: 'SELECT',
    role: ROLE_NAMES.platform,
    using: `(user_id = ${OWN_USER})`,
    withCheck: null,
  },
];

/** Foreign keys of tenant tables to people, who stand outside tenants. */
export const KEYS_OUTSIDE: readonly string[] = ['memberships_user_id_users_id_fk'];
