import type { ServerModule } from '../../http/module';
import { cyclesRoutes } from './cycles.routes';

export const cyclesModule: ServerModule = { name: 'cycles', routes: cyclesRoutes };
