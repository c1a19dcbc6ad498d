import type pg from 'pg';
import { DEMO_ORGANISATIONS, DEMO_PEOPLE } from './people';

/** Writes the demo's organisations, people and memberships. For the maintenance login, in its transaction. */
export async function seedPeople(client: Pick<pg.ClientBase, 'query'>, passwordHash: string): Promise<void> {
  for (const { id, kind, name, slug } of DEMO_ORGANISATIONS) {
    await client.query(
      'insert into organisations (id, kind, name, slug, demo) values ($1, $2, $3, $4, true)',
      [id, kind, name, slug],
    );
  }
  for (const [position, person] of DEMO_PEOPLE.entries()) {
    // Spread in time, so that the order on the sign-in page is the order of the list.
    await client.query(
      `insert into users (id, email, display_name, password_hash, demo, task, created_at)
       values ($1, $2, $3, $4, true, $5, now() + make_interval(secs => $6::double precision / 1000))`,
      [person.id, person.email, person.displayName, passwordHash, person.task, position],
    );
    for (const [order, place] of person.places.entries()) {
      await client.query(
        `insert into memberships (organisation_id, user_id, organisation_kind, role, display_name, email, created_at)
         values ($1, $2, $3, $4, $5, $6, now() + make_interval(secs => $7::double precision / 1000))`,
        [
          place.organisation.id,
          person.id,
          place.organisation.kind,
          place.role,
          person.displayName,
          person.email,
          order,
        ],
      );
    }
  }
}
