import {
  checkMeasurementEnter,
  checkMeasurementList,
  checkMeasurementStrike,
  testSessionCreate,
  testSessionList,
  testSessionRead,
  testSessionUpdate,
} from '#shared/contracts/test-sessions';
import { route, type Route } from '../../http/module';
import { allMeasurements, enterMeasurement, strikeMeasurement } from './check-measurements.service';
import { addSession, allSessions, changeSession, oneSession } from './test-sessions.service';

export const testSessionsRoutes: readonly Route[] = [
  route(testSessionList, async ({ params }, work) => ({
    sessions: [...(await allSessions(work, params.facilityId))],
  })),
  route(testSessionRead, async ({ params }, work) =>
    oneSession(work, params.facilityId, params.testSessionId),
  ),
  route(testSessionCreate, async ({ params, body }, work) => addSession(work, params.facilityId, body)),
  route(testSessionUpdate, async ({ params, body, expectedVersion }, work) =>
    changeSession(work, params.facilityId, params.testSessionId, body, expectedVersion),
  ),
  route(checkMeasurementList, async ({ params }, work) => ({
    measurements: [...(await allMeasurements(work, params.facilityId))],
  })),
  route(checkMeasurementEnter, async ({ params, body }, work) =>
    enterMeasurement(work, params.facilityId, body),
  ),
  route(checkMeasurementStrike, async ({ params, body }, work) =>
    strikeMeasurement(work, params.facilityId, params.checkMeasurementId, body.reason),
  ),
];
