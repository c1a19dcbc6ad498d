import type { TestSession, TestSessionFields } from '#shared/contracts/test-sessions';
import type { Work } from '../../http/context';
import { demandFound, demandFreeName, demandVersion, refuseUnusable } from '../../rules/refusals';
import { differences, recordAudit } from '../audit';
import { findFacility } from '../facilities';
import { sessionIssues } from './test-sessions.policy';
import {
  findSession,
  insertSession,
  listSessions,
  lockSession,
  measuredDays,
  sessionOfName,
  updateSession,
} from './test-sessions.repository';

export async function allSessions(work: Work, facilityId: string): Promise<readonly TestSession[]> {
  demandFound(await findFacility(work.tx, facilityId));
  return listSessions(work.tx, facilityId);
}

export async function oneSession(work: Work, facilityId: string, id: string): Promise<TestSession> {
  return demandFound(await findSession(work.tx, facilityId, id));
}

export async function addSession(
  work: Work,
  facilityId: string,
  fields: TestSessionFields,
): Promise<TestSession> {
  demandFound(await findFacility(work.tx, facilityId));
  refuseUnusable(sessionIssues(fields, undefined));
  demandFreeName(await sessionOfName(work.tx, facilityId, fields.name), undefined, fields.name);
  const id = await insertSession(work.tx, facilityId, fields);
  await recordAudit(work, {
    action: 'test-session.added',
    entityKind: 'test-session',
    entityId: id,
    summary: [{ field: 'facilityId', after: facilityId }, ...differences({}, fields)],
  });
  return oneSession(work, facilityId, id);
}

export async function changeSession(
  work: Work,
  facilityId: string,
  id: string,
  fields: TestSessionFields,
  expectedVersion: number,
): Promise<TestSession> {
  const before = demandFound(await lockSession(work.tx, facilityId, id));
  demandVersion(before, expectedVersion);
  refuseUnusable(sessionIssues(fields, await measuredDays(work.tx, id)));
  demandFreeName(await sessionOfName(work.tx, facilityId, fields.name), id, fields.name);
  await updateSession(work.tx, id, fields);
  const after = await oneSession(work, facilityId, id);
  await recordAudit(work, {
    action: 'test-session.changed',
    entityKind: 'test-session',
    entityId: id,
    summary: differences(before, after),
  });
  return after;
}
