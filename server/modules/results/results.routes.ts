import {
  adoptionList,
  resultAdopt,
  resultEnter,
  resultList,
  resultRead,
  resultWithdraw,
} from '#shared/contracts/results';
import { route, type Route } from '../../http/module';
import { adopt, allAdoptions } from './adoptions.service';
import { allResults, enterResult, oneResult, withdrawResult } from './results.service';

export const resultsRoutes: readonly Route[] = [
  route(resultList, async ({ params }, work) => ({
    results: [...(await allResults(work, params.programmeId))],
  })),
  route(resultRead, async ({ params }, work) => oneResult(work, params.programmeId, params.resultId)),
  route(resultEnter, async ({ params, body }, work) => enterResult(work, params.programmeId, body)),
  route(resultWithdraw, async ({ params, body }, work) =>
    withdrawResult(work, params.programmeId, params.resultId, body.reason),
  ),
  route(adoptionList, async ({ params }, work) => ({
    adoptions: [...(await allAdoptions(work, params.programmeId))],
  })),
  route(resultAdopt, async ({ params, body }, work) => adopt(work, params.programmeId, body)),
];
