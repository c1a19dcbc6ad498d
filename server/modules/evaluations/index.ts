import type { ServerModule } from '../../http/module';
import { evaluationsRoutes } from './evaluations.routes';

export { replayOf, type Evaluate, type StoredEvaluation } from './evaluation-record';
export { storeEvaluations, storeMissingEvaluations } from './evaluations.service';

export const evaluationsModule: ServerModule = { name: 'evaluations', routes: evaluationsRoutes };
