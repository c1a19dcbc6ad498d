import {
  correlationAdopt,
  correlationCreate,
  correlationEnd,
  correlationList,
  correlationRead,
  correlationVersionAdd,
} from '#shared/contracts/correlations';
import { route, type Route } from '../../http/module';
import { addCorrelation, addVersion, allCorrelations, oneCorrelation } from './correlations.service';
import { adoptVersion, endUse } from './correlation-use.service';

export const correlationsRoutes: readonly Route[] = [
  route(correlationList, async (_input, work) => ({ correlations: [...(await allCorrelations(work))] })),
  route(correlationRead, async ({ params }, work) => oneCorrelation(work, params.correlationId)),
  route(correlationCreate, async ({ body }, work) => addCorrelation(work, body)),
  route(correlationVersionAdd, async ({ params, body }, work) =>
    addVersion(work, params.correlationId, body),
  ),
  route(correlationAdopt, async ({ params, body }, work) => adoptVersion(work, params.correlationId, body)),
  route(correlationEnd, async ({ params, body }, work) => endUse(work, params.correlationId, body)),
];
