import { asc } from 'drizzle-orm';
import type { Tx } from '../../db/pools';
import { memberships, organisations } from '../../db/tables/organisations';

/** The transaction's own organisation: row-level security leaves no other. */
export async function readOwnOrganisation(tx: Tx) {
  const [row] = await tx
    .select({
      id: organisations.id,
      name: organisations.name,
      slug: organisations.slug,
      kind: organisations.kind,
      demo: organisations.demo,
    })
    .from(organisations);
  return row;
}

export async function readMembers(tx: Tx) {
  return tx
    .select({
      userId: memberships.userId,
      displayName: memberships.displayName,
      email: memberships.email,
      role: memberships.role,
      since: memberships.createdAt,
      endedAt: memberships.endedAt,
    })
    .from(memberships)
    .orderBy(asc(memberships.displayName), asc(memberships.userId));
}
