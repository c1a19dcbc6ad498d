import type { ServerModule } from '../../http/module';
import { adjustmentsRoutes } from './adjustments.routes';

export { adjustmentInputs } from './adjustment-inputs';

export const adjustmentsModule: ServerModule = { name: 'adjustments', routes: adjustmentsRoutes };
