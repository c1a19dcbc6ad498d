import { cycleCreate, cycleList, cycleRead, cycleRetire } from '#shared/contracts/cycles';
import { route, type Route } from '../../http/module';
import { allCycles, bringInCycle, oneCycle, retireCycle } from './cycles.service';

export const cyclesRoutes: readonly Route[] = [
  route(cycleList, async (_input, work) => ({ cycles: [...(await allCycles(work))] })),
  route(cycleRead, async ({ params }, work) => oneCycle(work, params.cycleKey)),
  route(cycleCreate, async ({ body }, work) => bringInCycle(work, body)),
  route(cycleRetire, async ({ params, body }, work) => retireCycle(work, params.cycleKey, body.retired)),
];
