import type { ServerModule } from '../../http/module';
import { rankingsRoutes } from './rankings.routes';

export const rankingsModule: ServerModule = { name: 'rankings', routes: rankingsRoutes };
