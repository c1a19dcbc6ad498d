import type { ServerModule } from '../../http/module';
import { cyclesRoutes } from './cycles.routes';

export { findBuiltInCycle, findOwnCycle, listCycles } from './cycles.repository';

export const cyclesModule: ServerModule = { name: 'cycles', routes: cyclesRoutes };
