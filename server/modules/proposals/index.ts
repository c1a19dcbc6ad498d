import type { ServerModule } from '../../http/module';
import { proposalsRoutes } from './proposals.routes';

export const proposalsModule: ServerModule = { name: 'proposals', routes: proposalsRoutes };
