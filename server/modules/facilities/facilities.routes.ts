import {
  facilityCreate,
  facilityList,
  facilityRead,
  facilityRetire,
  facilityUpdate,
} from '#shared/contracts/facilities';
import { route, type Route } from '../../http/module';
import {
  addFacility,
  allFacilities,
  changeFacility,
  oneFacility,
  retireFacility,
} from './facilities.service';

export const facilitiesRoutes: readonly Route[] = [
  route(facilityList, async (_input, work) => ({ facilities: [...(await allFacilities(work))] })),
  route(facilityRead, async ({ params }, work) => oneFacility(work, params.facilityId)),
  route(facilityCreate, async ({ body }, work) => addFacility(work, body)),
  route(facilityUpdate, async ({ params, body, expectedVersion }, work) =>
    changeFacility(work, params.facilityId, body, expectedVersion),
  ),
  route(facilityRetire, async ({ params, body, expectedVersion }, work) =>
    retireFacility(work, params.facilityId, body.retired, expectedVersion),
  ),
];
