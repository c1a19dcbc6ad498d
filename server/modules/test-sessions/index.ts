import type { ServerModule } from '../../http/module';
import { testSessionsRoutes } from './test-sessions.routes';

export const testSessionsModule: ServerModule = { name: 'test-sessions', routes: testSessionsRoutes };
