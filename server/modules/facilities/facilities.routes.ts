import {
  facilityCreate,
  facilityEvidenceList,
  facilityList,
  facilityModelList,
  facilityRead,
  facilityRetire,
  facilityUpdate,
  facilityVersionList,
} from '#shared/contracts/facilities';
import { route, type Route } from '../../http/module';
import {
  addFacility,
  allFacilities,
  changeFacility,
  oneFacility,
  retireFacility,
} from './facilities.service';
import { evidenceOf, modelsOf, versionsOf } from './facility-history.service';

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
  route(facilityVersionList, async ({ params }, work) => ({
    versions: [...(await versionsOf(work, params.facilityId))],
  })),
  route(facilityEvidenceList, async ({ params }, work) => ({
    programmes: [...(await evidenceOf(work, params.facilityId))],
  })),
  route(facilityModelList, async ({ params }, work) => ({
    models: [...(await modelsOf(work, params.facilityId))],
  })),
];
