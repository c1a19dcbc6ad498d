import { policiesChange, policiesRead } from '#shared/contracts/policies';
import { route, type Route } from '../../http/module';
import { allVersions, changePolicies } from './policies.service';

export const policiesRoutes: readonly Route[] = [
  route(policiesRead, async (_input, work) => ({ versions: [...(await allVersions(work))] })),
  route(policiesChange, async ({ body }, work) => changePolicies(work, body)),
];
