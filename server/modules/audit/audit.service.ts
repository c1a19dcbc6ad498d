import type { Tx } from '../../db/pools';
import { type AuditFilter, readAudit } from './audit.repository';

/** How much of the trail one answer holds. */
const PAGE = 100;

/** The latest events of the trail, as the contract writes them. */
export async function latestEvents(tx: Tx, filter: AuditFilter) {
  const rows = await readAudit(tx, filter, PAGE);
  return rows.map(({ at, summary, actorName, entityId, requestId, ...event }) => ({
    ...event,
    at: at.toISOString(),
    actorName: actorName ?? undefined,
    entityId: entityId ?? undefined,
    requestId: requestId ?? undefined,
    // JSON leaves out what is undefined, so a field that came or went has one side only.
    differences: JSON.parse(JSON.stringify(summary)) as { field: string }[],
  }));
}
