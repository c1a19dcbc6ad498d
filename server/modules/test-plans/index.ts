import type { ServerModule } from '../../http/module';
import { testPlansRoutes } from './test-plans.routes';

export const testPlansModule: ServerModule = { name: 'test-plans', routes: testPlansRoutes };
