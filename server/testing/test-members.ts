import { randomUUID } from 'node:crypto';
import { type OrganisationKind, type Role, rolesOfKind } from '#shared/access/roles';
import type { TestDatabase } from './test-database';

export interface TestOrganisation {
  readonly id: string;
  readonly name: string;
  readonly slug: string;
  readonly kind: OrganisationKind;
  /** One person per role of the organisation's kind. */
  readonly userIds: ReadonlyMap<Role, string>;
}

/** Founds an organisation with one person in every role. */
export async function addOrganisation(
  database: TestDatabase,
  name: string,
  kind: OrganisationKind = 'maker',
): Promise<TestOrganisation> {
  const id = randomUUID();
  const slug = `${name.toLowerCase().replace(/\W+/g, '-')}-${id.slice(0, 4)}`;
  await database.query(
    'maintenance',
    'insert into organisations (id, kind, name, slug) values ($1, $2, $3, $4)',
    [id, kind, name, slug],
  );
  const userIds = new Map<Role, string>();
  for (const role of rolesOfKind(kind)) {
    const userId = randomUUID();
    const email = `${role}@${slug}.example`;
    await database.query(
      'maintenance',
      `with person as (insert into users (id, email, display_name) values ($1, $2, $3) returning id)
       insert into memberships (organisation_id, user_id, organisation_kind, role, display_name, email)
       values ($4, (select id from person), $5, $6, $3, $2)`,
      [userId, email, `${role} of ${name}`, id, kind, role],
    );
    userIds.set(role, userId);
  }
  return { id, name, slug, kind, userIds };
}
