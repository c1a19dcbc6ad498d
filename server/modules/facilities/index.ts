import type { ServerModule } from '../../http/module';
import { facilitiesRoutes } from './facilities.routes';

export { facilityIssues, fieldsOfFacility } from './facilities.policy';
export { findFacility, knownFacilityIds, listFacilities } from './facilities.repository';
export { changeFacility } from './facilities.service';
export { currentVersions } from './facility-versions.repository';

export const facilitiesModule: ServerModule = { name: 'facilities', routes: facilitiesRoutes };
