import { auditList } from '#shared/contracts/organisations';
import { route } from '../../http/module';
import { latestEvents } from './audit.service';

export const auditRoutes = [
  route(auditList, async ({ query }, { tx }) => {
    const before = query.before === undefined ? undefined : new Date(query.before);
    return { events: await latestEvents(tx, { before, entityId: query.entityId }) };
  }),
];
