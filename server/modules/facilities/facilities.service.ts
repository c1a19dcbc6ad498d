import type { Facility, FacilityFields } from '#shared/contracts/facilities';
import type { Work } from '../../http/context';
import { demandFound, demandFreeName, demandVersion, refuseUnusable } from '../../rules/refusals';
import { differences, recordAudit } from '../audit';
import { facilityIssues } from './facilities.policy';
import {
  facilityOfName,
  findFacility,
  insertFacility,
  listFacilities,
  lockFacility,
  setFacilityRetired,
  updateFacility,
} from './facilities.repository';

export async function allFacilities(work: Work): Promise<readonly Facility[]> {
  return listFacilities(work.tx);
}

export async function oneFacility(work: Work, id: string): Promise<Facility> {
  return demandFound(await findFacility(work.tx, id));
}

export async function addFacility(work: Work, fields: FacilityFields): Promise<Facility> {
  refuseUnusable(facilityIssues(fields));
  demandFreeName(await facilityOfName(work.tx, fields.name), undefined, fields.name);
  const facility = await insertFacility(work.tx, fields);
  await recordAudit(work, {
    action: 'facility.added',
    entityKind: 'facility',
    entityId: facility.id,
    summary: differences({}, fields),
  });
  return facility;
}

export async function changeFacility(
  work: Work,
  id: string,
  fields: FacilityFields,
  expectedVersion: number,
): Promise<Facility> {
  const before = demandFound(await lockFacility(work.tx, id));
  demandVersion(before, expectedVersion);
  refuseUnusable(facilityIssues(fields));
  demandFreeName(await facilityOfName(work.tx, fields.name), id, fields.name);
  const after = await updateFacility(work.tx, id, fields);
  await recordAudit(work, {
    action: 'facility.changed',
    entityKind: 'facility',
    entityId: id,
    summary: differences(before, after),
  });
  return after;
}

/** Retired facilities stay with their results; they are only no longer offered for new ones. */
export async function retireFacility(
  work: Work,
  id: string,
  retired: boolean,
  expectedVersion: number,
): Promise<Facility> {
  const before = demandFound(await lockFacility(work.tx, id));
  demandVersion(before, expectedVersion);
  const after = await setFacilityRetired(work.tx, id, retired ? work.now : null);
  await recordAudit(work, {
    action: retired ? 'facility.retired' : 'facility.brought-back',
    entityKind: 'facility',
    entityId: id,
    summary: differences(before, after),
  });
  return after;
}
