import { evaluationList } from '#shared/contracts/adoptions';
import { route, type Route } from '../../http/module';
import { evaluationsOf } from './evaluations.service';

export const evaluationsRoutes: readonly Route[] = [
  route(evaluationList, async ({ params }, work) => ({
    evaluations: [...(await evaluationsOf(work, params.programmeId, params.variantId))],
  })),
];
