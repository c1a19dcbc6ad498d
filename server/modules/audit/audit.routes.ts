import { auditList } from '#shared/contracts/organisations';
import { route } from '../../http/module';
import { readAudit } from './audit.repository';

const PAGE = 100;

export const auditRoutes = [
  route(auditList, async ({ query }, { tx }) => {
    const before = query.before === undefined ? undefined : new Date(query.before);
    const rows = await readAudit(tx, { before, entityId: query.entityId }, PAGE);
    return {
      events: rows.map(({ at, summary, actorName, entityId, requestId, ...event }) => ({
        ...event,
        at: at.toISOString(),
        actorName: actorName ?? undefined,
        entityId: entityId ?? undefined,
        requestId: requestId ?? undefined,
        // JSON leaves out what is undefined, so a field that came or went has one side only.
        differences: JSON.parse(JSON.stringify(summary)) as { field: string }[],
      })),
    };
  }),
];
