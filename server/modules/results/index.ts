import type { ServerModule } from '../../http/module';
import { resultsRoutes } from './results.routes';

export { currentAdoptions, listAdoptions } from './adoptions.repository';
export { resultIssues, type ResultSurroundings } from './results.policy';
export { listResults, resultOfName, sessionOf, takeEntrySequence } from './results.repository';

export const resultsModule: ServerModule = { name: 'results', routes: resultsRoutes };
