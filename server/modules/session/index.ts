import type { ServerModule } from '../../http/module';
import { sessionRoutes } from './session.routes';

export { hashPassword } from './passwords';
export { tokenHash } from './session.repository';

export const sessionModule: ServerModule = { name: 'session', routes: sessionRoutes };
