import { adoptionList, evidenceAdopt } from '#shared/contracts/adoptions';
import { judgementList, resultsJudge } from '#shared/contracts/judgements';
import {
  resultEnter,
  resultHistory,
  resultList,
  resultRead,
  resultsCheck,
  resultsWithdraw,
  resultWithdraw,
} from '#shared/contracts/results';
import { route, type Route } from '../../http/module';
import { demandFound } from '../../rules/refusals';
import { adoptEvidence, allAdoptions } from './adoptions.service';
import { historyOf } from './history.service';
import { judgementsOfResult, judgeResults } from './judgements.service';
import { allResults, enterResult, oneResult } from './results.service';
import { checkResults, withdrawResults } from './states.service';

export const resultsRoutes: readonly Route[] = [
  route(resultList, async ({ params }, work) => ({
    results: [...(await allResults(work, params.programmeId))],
  })),
  route(resultRead, async ({ params }, work) => oneResult(work, params.programmeId, params.resultId)),
  route(resultEnter, async ({ params, body }, work) => enterResult(work, params.programmeId, body)),
  route(resultHistory, async ({ params }, work) => ({
    events: [...(await historyOf(work, params.programmeId, params.resultId))],
  })),
  route(resultWithdraw, async ({ params, body }, work) => {
    const [result] = await withdrawResults(work, params.programmeId, [params.resultId], body.reason);
    return demandFound(result);
  }),
  route(resultsWithdraw, async ({ params, body }, work) => ({
    results: [...(await withdrawResults(work, params.programmeId, body.resultIds, body.reason))],
  })),
  route(resultsCheck, async ({ params, body }, work) => ({
    results: [...(await checkResults(work, params.programmeId, body.resultIds, body.state, body.comment))],
  })),
  route(judgementList, async ({ params }, work) => ({
    judgements: [...(await judgementsOfResult(work, params.programmeId, params.resultId))],
  })),
  route(resultsJudge, async ({ params, body }, work) => ({
    judgements: [...(await judgeResults(work, params.programmeId, body.judgements, body.comment))],
  })),
  route(adoptionList, async ({ params }, work) => ({
    adoptions: [...(await allAdoptions(work, params.programmeId))],
  })),
  route(evidenceAdopt, async ({ params, body }, work) => ({
    adoptions: [...(await adoptEvidence(work, params.programmeId, body.adoptions, body.comment))],
  })),
];
