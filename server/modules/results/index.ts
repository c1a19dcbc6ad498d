import type { ServerModule } from '../../http/module';
import { resultsRoutes } from './results.routes';

export { resultIssues } from './results.policy';
export { takeEntrySequence } from './results.repository';

export const resultsModule: ServerModule = { name: 'results', routes: resultsRoutes };
