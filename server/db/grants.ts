/**
 * What each request role may do, table by table. The migrations carry the GRANT statements; `check-rls` compares the
 * catalogue with this map, so a table that nobody thought about turns it red.
 */
export type Verb = 'SELECT' | 'INSERT' | 'UPDATE' | 'DELETE';

const READ: readonly Verb[] = ['SELECT'];
const APPEND: readonly Verb[] = ['SELECT', 'INSERT'];
const EDIT: readonly Verb[] = ['SELECT', 'INSERT', 'UPDATE'];
const REPLACE: readonly Verb[] = ['SELECT', 'INSERT', 'UPDATE', 'DELETE'];

/** Tables that hold one organisation's rows, with the tenant role's verbs. */
export const TENANT_TABLES: Readonly<Record<string, readonly Verb[]>> = {
  memberships: READ,
  audit_events: APPEND,
  commands: APPEND,
  jobs: EDIT,
  outbox: EDIT,
  counters: EDIT,
  programmes: EDIT,
  milestones: REPLACE,
  recent_programmes: REPLACE,
  facilities: EDIT,
  test_sessions: EDIT,
  variants: EDIT,
  frontal_areas: REPLACE,
  configurations: REPLACE,
  cycles: EDIT,
  attachments: APPEND,
  imports: EDIT,
  import_rows: REPLACE,
  import_mappings: REPLACE,
  // Results are immutable: withdrawal and adoption are rows of their own.
  results: APPEND,
  result_points: APPEND,
  result_withdrawals: APPEND,
  adoptions: APPEND,
  adoption_results: APPEND,
  result_states: APPEND,
  result_judgements: APPEND,
  evaluations: APPEND,
  // Versions and decisions are history: nothing in it is changed.
  facility_versions: APPEND,
  policy_versions: APPEND,
  correlation_versions: APPEND,
  correlation_adoptions: APPEND,
  proposals: APPEND,
  proposal_decisions: APPEND,
  check_measurements: EDIT,
  adjustments: EDIT,
  correlations: EDIT,
  test_plans: EDIT,
};

/** Tables outside tenants, with the tenant role's verbs. */
export const OUTSIDE_TENANTS: Readonly<Record<string, readonly Verb[]>> = {
  organisations: READ,
  reference_cycles: READ,
  users: [],
  user_settings: [],
  password_tokens: [],
  web_sessions: [],
  sign_in_limits: [],
};

/** What the platform role may do; it sees of `memberships` only the person's that it looks up. */
export const PLATFORM_GRANTS: Readonly<Record<string, readonly Verb[]>> = {
  organisations: READ,
  memberships: READ,
  users: READ,
  user_settings: EDIT,
  password_tokens: READ,
  web_sessions: REPLACE,
  sign_in_limits: REPLACE,
};

/** Single columns that the platform role may change beyond that. */
export const PLATFORM_COLUMN_UPDATES: Readonly<Record<string, readonly string[]>> = {
  users: ['password_hash'],
  password_tokens: ['used_at'],
};
