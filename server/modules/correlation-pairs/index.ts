import { candidatePairList } from '#shared/contracts/correlations';
import { route, type ServerModule } from '../../http/module';
import { listCandidatePairs } from './correlation-pairs.service';

/** Apart from the correlations, which the ranking reads: pairs are reduced from what the ranking reads. */
export const correlationPairsModule: ServerModule = {
  name: 'correlation-pairs',
  routes: [route(candidatePairList, async ({ query }, work) => listCandidatePairs(work, query))],
};
