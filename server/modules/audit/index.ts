import type { ServerModule } from '../../http/module';
import { auditRoutes } from './audit.routes';

export { recordAudit } from './audit.repository';
export { differences } from './differences';

export const auditModule: ServerModule = { name: 'audit', routes: auditRoutes };
