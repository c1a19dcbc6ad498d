import { randomUUID } from 'node:crypto';
import { may } from '#shared/access/permissions';
import { MAKER_ROLES, type Role } from '#shared/access/roles';
import type { Endpoint } from '#shared/contracts/endpoint';
import type { Route } from '../../http/module';
import type { ApiHarness } from '../api-harness';
import type { CallInput } from '../as-member';
import type { RowsByTable } from './one-row-each';
import { sampleOf } from './sample-input';

/** The table behind an id's name in an address or a body. */
const TABLE_OF_ID: Readonly<Record<string, string>> = {
  programmeId: 'programmes',
  variantId: 'variants',
  facilityId: 'facilities',
  referenceFacilityId: 'facilities',
  testSessionId: 'test_sessions',
  checkMeasurementId: 'check_measurements',
  adjustmentId: 'adjustments',
  correlationId: 'correlations',
  resultId: 'results',
  resultIds: 'results',
  referenceResultId: 'results',
  testPlanId: 'test_plans',
  proposalId: 'proposals',
  importId: 'imports',
  attachmentId: 'attachments',
  pictureAttachmentId: 'attachments',
  cycleKey: 'cycles',
  cycle: 'cycles',
  configurationId: 'configurations',
  organisationId: 'memberships',
  userId: 'memberships',
  entityId: 'programmes',
  jobId: 'jobs',
};

export interface Walk {
  readonly api: ApiHarness;
  readonly routes: readonly Route[];
  readonly victim: RowsByTable;
  readonly intruder: RowsByTable;
  /** Stands in every text of the victim's rows. */
  readonly marker: string;
}

/**
 * Calls every operation as a member of the second organisation, once per id that it takes: with that id of the first
 * organisation, and with one that does not exist; all other ids are the caller's own. The two answers must be alike,
 * and no answer may carry a text of the first organisation. Returns what was found; empty is good.
 */
export async function walkRoutes(walk: Walk): Promise<readonly string[]> {
  const leaks: string[] = [];
  for (const { endpoint } of walk.routes) {
    const ids = idsOf(endpoint);
    for (const name of ids.length === 0 ? [undefined] : ids) {
      const foreign = await answer(walk, endpoint, name, idFrom(walk.victim, name));
      const unknown = await answer(walk, endpoint, name, randomUUID());
      const where = `${endpoint.method} ${endpoint.path}${name === undefined ? '' : ` (${name})`}`;
      // A reading of the own row must succeed, or the two refusals above would prove nothing.
      const own =
        endpoint.method === 'GET' ? await answer(walk, endpoint, name, idFrom(walk.intruder, name)) : '';
      if (endpoint.method === 'GET' && !own.startsWith('200'))
        leaks.push(`${where}: the own id is refused: ${own}`);
      if (foreign.includes(walk.marker)) leaks.push(`${where}: answers with the other’s text: ${foreign}`);
      if (name !== undefined && foreign !== unknown) {
        leaks.push(`${where}: a foreign id is answered\n  ${foreign}\nan unknown one\n  ${unknown}`);
      }
      if (foreign.startsWith('500')) leaks.push(`${where}: fails unexpectedly`);
    }
  }
  return leaks;
}

/** Status and text of the answer, without what differs from call to call anyway. */
async function answer(
  walk: Walk,
  endpoint: Endpoint,
  name: string | undefined,
  id: string | undefined,
): Promise<string> {
  const choose = (property: string): string | undefined =>
    property === name ? id : idFrom(walk.intruder, property);
  const path = pathIds(endpoint);
  const input: CallInput = {
    params: Object.fromEntries(path.map((param) => [param, choose(param) ?? '1'])),
    query: asQuery(sampleOf(endpoint.query, choose, 'lean')),
    ...(endpoint.kind === 'upload'
      ? { file: { name: 'sample.csv', content: 'a,b\n1,2\n' } }
      : { body: sampleOf(endpoint.body, choose) }),
    ...(endpoint.versioned ? { ifMatch: 1 } : {}),
  };
  // Signed in anew each time: some operations change or end the session itself.
  const member = await walk.api.asMember(roleFor(endpoint), walk.api.second);
  const { status, text } = await member.call(endpoint, input);
  return `${status} ${text}`
    .replace(/[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}/g, '<id>')
    .replace(/\d{4}-\d\d-\d\dT[\d:.]+Z/g, '<time>')
    .replace(/sample [0-9a-f<][\w<>-]*/g, '<text>');
}

function idsOf(endpoint: Endpoint): readonly string[] {
  const found = new Set(pathIds(endpoint));
  const note = (property: string) => {
    if (property in TABLE_OF_ID) found.add(property);
    return undefined;
  };
  sampleOf(endpoint.body, note);
  sampleOf(endpoint.query, note);
  return [...found].filter((name) => name in TABLE_OF_ID || missing(endpoint, name));
}

function pathIds(endpoint: Endpoint): readonly string[] {
  return [...endpoint.path.matchAll(/:(\w+)/g)].map((match) => match[1] ?? '');
}

/** A number of a row is no id; anything else in an address must be known to this test. */
function missing(endpoint: Endpoint, name: string): boolean {
  if (/number$/i.test(name)) return false;
  throw new Error(`${endpoint.path}: say in TABLE_OF_ID which table ${name} names`);
}

function idFrom(rows: RowsByTable, name: string | undefined): string | undefined {
  const table = name === undefined ? undefined : TABLE_OF_ID[name];
  const row = table === undefined ? undefined : rows.get(table);
  const column = name === 'organisationId' ? 'organisation_id' : name === 'userId' ? 'user_id' : 'id';
  const value = row?.[column];
  return typeof value === 'string' ? value : undefined;
}

function asQuery(value: unknown): Readonly<Record<string, string>> {
  const entries = Object.entries(value as Readonly<Record<string, unknown>>);
  return Object.fromEntries(entries.map(([name, inner]) => [name, String(inner)]));
}

function roleFor(endpoint: Endpoint): Role {
  const preferred: readonly Role[] = ['aerodynamicist', ...MAKER_ROLES];
  const { access } = endpoint;
  if (access === 'public' || access === 'signed-in') return 'aerodynamicist';
  const role = preferred.find((candidate) => may(candidate, access));
  if (role === undefined) throw new Error(`${endpoint.path}: no role of a maker holds ${access}`);
  return role;
}
