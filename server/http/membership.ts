import { and, eq, isNull } from 'drizzle-orm';
import { memberships } from '../db/tables/organisations';
import type { Tx } from '../db/pools';
import type { Member } from './context';

/** The person's standing in the transaction's organisation now; undefined once it has ended. */
export async function findMember(tx: Tx, userId: string): Promise<Member | undefined> {
  const [row] = await tx
    .select({
      userId: memberships.userId,
      displayName: memberships.displayName,
      email: memberships.email,
      role: memberships.role,
      organisationKind: memberships.organisationKind,
    })
    .from(memberships)
    .where(and(eq(memberships.userId, userId), isNull(memberships.endedAt)));
  return row;
}
