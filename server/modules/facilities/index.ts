import type { ServerModule } from '../../http/module';
import { facilitiesRoutes } from './facilities.routes';

export { facilityIssues } from './facilities.policy';
export { findFacility, knownFacilityIds, listFacilities } from './facilities.repository';
export { currentVersions } from './facility-versions.repository';

export const facilitiesModule: ServerModule = { name: 'facilities', routes: facilitiesRoutes };
