import { rankingContextRead, rankingInputsRead, rankingViewRead } from '#shared/contracts/rankings';
import { route } from '../../http/module';
import { readRankingContext, readRankingInputs, readRankingView } from './rankings.service';

export const rankingsRoutes = [
  route(rankingInputsRead, ({ params, query }, context) =>
    readRankingInputs(context, params.programmeId, query.area, query.evidence ?? 'adopted'),
  ),
  route(rankingContextRead, ({ params, query }, context) =>
    readRankingContext(context, params.programmeId, query),
  ),
  route(rankingViewRead, ({ params, query }, context) => readRankingView(context, params.programmeId, query)),
];
