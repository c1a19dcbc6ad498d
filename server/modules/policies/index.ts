import type { ServerModule } from '../../http/module';
import { policiesRoutes } from './policies.routes';

export { changePolicies, policiesInForce } from './policies.service';

export const policiesModule: ServerModule = { name: 'policies', routes: policiesRoutes };
