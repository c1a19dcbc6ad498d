import type { Role } from '#shared/access/roles';
import { withClient } from './database';

interface DemoPerson {
  readonly role: Role;
  readonly display_name: string;
  readonly email: string;
}

/** One line: where it is, and in the demo who one can be. */
export async function readyLine(
  address: string,
  demo: { readonly maintenanceUrl: string; readonly password: string } | undefined,
): Promise<string> {
  if (demo === undefined) return `Wakeledger is ready at ${address}`;
  const people = await withClient(demo.maintenanceUrl, async (client) => {
    const { rows } = await client.query<DemoPerson>(
      `select role, display_name, email from (
         select distinct on (u.id) m.role, u.display_name, u.email, u.created_at
         from users u join memberships m on m.user_id = u.id
         where u.demo and m.ended_at is null order by u.id, m.created_at
       ) person order by created_at, display_name`,
    );
    return rows;
  });
  const signIns = people.map((person) => `${person.role}: ${person.display_name} <${person.email}>`);
  return `Wakeledger is ready at ${address} · demo sign-ins (continue as, or password ${demo.password}): ${signIns.join(', ')}`;
}
