import type { ServerModule } from '../../http/module';
import { correlationsRoutes } from './correlations.routes';

export { correlationsInUse, type CorrelationInUse } from './correlation-inputs';

export const correlationsModule: ServerModule = { name: 'correlations', routes: correlationsRoutes };
