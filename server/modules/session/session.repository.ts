import { createHash } from 'node:crypto';
import { and, asc, desc, eq, isNull, sql } from 'drizzle-orm';
import type { Tx } from '../../db/pools';
import {
  memberships,
  organisations,
  passwordTokens,
  users,
  webSessions,
} from '../../db/tables/organisations';
import { programmes, recentProgrammes } from '../../db/tables/programmes';

export async function findPerson(tx: Tx, email: string) {
  const [row] = await tx
    .select({ userId: users.id, passwordHash: users.passwordHash })
    .from(users)
    .where(eq(sql`lower(${users.email})`, email.toLowerCase()));
  return row;
}

export async function findOrganisationId(tx: Tx, slug: string): Promise<string | undefined> {
  const [row] = await tx
    .select({ id: organisations.id })
    .from(organisations)
    .where(eq(sql`lower(${organisations.slug})`, slug.toLowerCase()));
  return row?.id;
}

/** A person's places that have not ended. Only those of the platform transaction's own person are visible. */
export async function readMemberships(tx: Tx) {
  return tx
    .select({
      organisationId: memberships.organisationId,
      organisationName: organisations.name,
      organisationSlug: organisations.slug,
      kind: memberships.organisationKind,
      role: memberships.role,
      displayName: memberships.displayName,
      email: memberships.email,
    })
    .from(memberships)
    .innerJoin(organisations, eq(organisations.id, memberships.organisationId))
    .where(isNull(memberships.endedAt))
    .orderBy(asc(memberships.createdAt), asc(organisations.name));
}

/** Makes another person's memberships visible to this platform transaction. */
export async function lookAtPerson(tx: Tx, userId: string): Promise<void> {
  await tx.execute(sql`select set_config('app.user_id', ${userId}, true)`);
}

export async function readDemoUsers(tx: Tx) {
  return tx
    .select({ userId: users.id, displayName: users.displayName, task: users.task })
    .from(users)
    .where(eq(users.demo, true))
    .orderBy(asc(users.createdAt), asc(users.displayName));
}

export async function isDemoUser(tx: Tx, userId: string): Promise<boolean> {
  const rows = await tx
    .select({ id: users.id })
    .from(users)
    .where(and(eq(users.id, userId), eq(users.demo, true)));
  return rows.length > 0;
}

export async function findLatestProgramme(tx: Tx, userId: string): Promise<string | undefined> {
  const [row] = await tx
    .select({ id: recentProgrammes.programmeId })
    .from(recentProgrammes)
    .innerJoin(
      programmes,
      and(
        eq(programmes.organisationId, recentProgrammes.organisationId),
        eq(programmes.id, recentProgrammes.programmeId),
      ),
    )
    .where(and(eq(recentProgrammes.userId, userId), isNull(programmes.retiredAt)))
    .orderBy(desc(recentProgrammes.at))
    .limit(1);
  return row?.id;
}

/** Only the hash of a token is stored: who reads the table cannot use it. */
export const tokenHash = (token: string) => createHash('sha256').update(token).digest('hex');

/** Uses a token up, if it is good; the second of two attempts at once finds it used. */
export async function useToken(tx: Tx, token: string, now: Date) {
  const [row] = await tx
    .update(passwordTokens)
    .set({ usedAt: now })
    .where(
      and(
        eq(passwordTokens.tokenHash, tokenHash(token)),
        isNull(passwordTokens.usedAt),
        sql`${passwordTokens.expiresAt} > ${now.toISOString()}::timestamptz`,
      ),
    )
    .returning({ userId: passwordTokens.userId });
  return row?.userId;
}

export async function storePassword(tx: Tx, userId: string, passwordHash: string): Promise<void> {
  await tx.update(users).set({ passwordHash }).where(eq(users.id, userId));
  await tx.delete(webSessions).where(eq(sql`${webSessions.sess} ->> 'userId'`, userId));
}
