import {
  adjustmentCreate,
  adjustmentList,
  adjustmentRead,
  adjustmentRetire,
  adjustmentUpdate,
} from '#shared/contracts/adjustments';
import { route, type Route } from '../../http/module';
import {
  addAdjustment,
  allAdjustments,
  changeAdjustment,
  oneAdjustment,
  retireAdjustment,
} from './adjustments.service';

export const adjustmentsRoutes: readonly Route[] = [
  route(adjustmentList, async (_input, work) => ({ adjustments: [...(await allAdjustments(work))] })),
  route(adjustmentRead, async ({ params }, work) => oneAdjustment(work, params.adjustmentId)),
  route(adjustmentCreate, async ({ body }, work) => addAdjustment(work, body)),
  route(adjustmentUpdate, async ({ params, body, expectedVersion }, work) =>
    changeAdjustment(work, params.adjustmentId, body, expectedVersion),
  ),
  route(adjustmentRetire, async ({ params, body, expectedVersion }, work) =>
    retireAdjustment(work, params.adjustmentId, body.retired, expectedVersion),
  ),
];
