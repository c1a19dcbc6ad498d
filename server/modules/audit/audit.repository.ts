import { and, desc, eq, lt } from 'drizzle-orm';
import type { Work } from '../../http/context';
import { auditEvents, type Difference } from '../../db/tables/work';
import { memberships } from '../../db/tables/organisations';
import type { Tx } from '../../db/pools';

export interface AuditEntry {
  /** What happened, as `<thing>.<deed>` in the past: `programme.changed`. */
  readonly action: string;
  readonly entityKind: string;
  readonly entityId?: string;
  readonly summary: readonly Difference[];
}

/** Writes the trail in the transaction of the change itself: both stand or neither. */
export async function recordAudit(work: Work, entry: AuditEntry): Promise<void> {
  await work.tx.insert(auditEvents).values({
    organisationId: work.organisationId,
    actorUserId: work.userId,
    action: entry.action,
    entityKind: entry.entityKind,
    entityId: entry.entityId,
    summary: entry.summary,
    requestId: work.requestId,
  });
}

export interface AuditFilter {
  readonly before: Date | undefined;
  readonly entityId: string | undefined;
}

export async function readAudit(tx: Tx, filter: AuditFilter, limit: number) {
  return tx
    .select({
      id: auditEvents.id,
      at: auditEvents.at,
      actorName: memberships.displayName,
      action: auditEvents.action,
      entityKind: auditEvents.entityKind,
      entityId: auditEvents.entityId,
      summary: auditEvents.summary,
      requestId: auditEvents.requestId,
    })
    .from(auditEvents)
    .leftJoin(
      memberships,
      and(
        eq(memberships.organisationId, auditEvents.organisationId),
        eq(memberships.userId, auditEvents.actorUserId),
      ),
    )
    .where(
      and(
        filter.before ? lt(auditEvents.at, filter.before) : undefined,
        filter.entityId ? eq(auditEvents.entityId, filter.entityId) : undefined,
      ),
    )
    .orderBy(desc(auditEvents.at), desc(auditEvents.id))
    .limit(limit);
}
