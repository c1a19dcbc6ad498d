import type { CheckMeasurement, CheckMeasurementFields } from '#shared/contracts/test-sessions';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { latestPastDay } from '../../rules/clock';
import { demandFound, refuseUnusable } from '../../rules/refusals';
import { differences, recordAudit } from '../audit';
import { findFacility } from '../facilities';
import {
  findMeasurement,
  insertMeasurement,
  listMeasurements,
  markStruck,
} from './check-measurements.repository';
import { checkMeasurementIssues } from './test-sessions.policy';
import { lockSession, widenSession } from './test-sessions.repository';

export async function allMeasurements(work: Work, facilityId: string): Promise<readonly CheckMeasurement[]> {
  demandFound(await findFacility(work.tx, facilityId));
  return listMeasurements(work.tx, facilityId);
}

/** Keeps a measurement of the body that the facility names now. Nothing of it changes; a mistake is struck out. */
export async function enterMeasurement(
  work: Work,
  facilityId: string,
  fields: CheckMeasurementFields,
): Promise<CheckMeasurement> {
  const { checkBody } = demandFound(await findFacility(work.tx, facilityId));
  const session = await lockSession(work.tx, facilityId, fields.testSessionId);
  if (session === undefined) {
    fail('unusable-input', {
      where: 'testSessionId',
      detail: 'There is no such session in this facility. Choose one of its sessions, or add it first.',
    });
  }
  if (checkBody === undefined) {
    fail('wrong-state', {
      detail: 'The facility has no check body yet. Name it first, then enter its measurements.',
    });
  }
  refuseUnusable(checkMeasurementIssues(fields, session, latestPastDay(work.now)));

  const id = await insertMeasurement(work, facilityId, checkBody.name, fields);
  await widenSession(work.tx, session.id, fields.measuredOn);
  await recordAudit(work, {
    action: 'check-measurement.entered',
    entityKind: 'check-measurement',
    entityId: id,
    summary: [{ field: 'facilityId', after: facilityId }, ...differences({}, fields)],
  });
  return demandFound(await findMeasurement(work.tx, facilityId, id));
}

export async function strikeMeasurement(
  work: Work,
  facilityId: string,
  id: string,
  reason: string,
): Promise<CheckMeasurement> {
  const known = demandFound(await findMeasurement(work.tx, facilityId, id));
  if (!(await markStruck(work, id, reason))) {
    const by = known.struck === undefined ? '' : `, by ${known.struck.by}`;
    fail('wrong-state', { detail: `This measurement was struck out already${by}.` });
  }
  await recordAudit(work, {
    action: 'check-measurement.struck',
    entityKind: 'check-measurement',
    entityId: id,
    summary: [{ field: 'reason', after: reason }],
  });
  return demandFound(await findMeasurement(work.tx, facilityId, id));
}
