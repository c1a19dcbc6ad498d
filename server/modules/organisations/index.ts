import type { ServerModule } from '../../http/module';
import { organisationsRoutes } from './organisations.routes';

export const organisationsModule: ServerModule = { name: 'organisations', routes: organisationsRoutes };
