import type { ServerModule } from '../../http/module';
import { resultsRoutes } from './results.routes';

export { standingAdoptions } from './adoptions.repository';
export { adoptEvidence, lockVariants } from './adoptions.service';
export { judgeResults } from './judgements.service';
export { resultIssues } from './results.policy';
export { findResults, takeEntrySequence } from './results.repository';
export { checkResults, withdrawResults } from './states.service';

export const resultsModule: ServerModule = { name: 'results', routes: resultsRoutes };
