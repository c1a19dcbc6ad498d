import { changedCorrections } from '#shared/core/reduction/facility-corrections';
import type { Facility, FacilityChange, FacilityFields } from '#shared/contracts/facilities';
import type { Work } from '../../http/context';
import { demandFound, demandFreeName, demandVersion, refuseUnusable } from '../../rules/refusals';
import { differences, recordAudit } from '../audit';
import { hasResults } from './facility-evidence.repository';
import { appendFirstVersion, appendVersion } from './facility-versions.repository';
import { changeIssues, facilityIssues, fieldsOfFacility } from './facilities.policy';
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
  const id = await insertFacility(work.tx, fields);
  await appendVersion(work, id, { number: 1, fields });
  await recordAudit(work, {
    action: 'facility.added',
    entityKind: 'facility',
    entityId: id,
    summary: differences({}, fields),
  });
  return oneFacility(work, id);
}

/** Changed corrections or uncertainties become a new version; everything else is merely written anew. */
export async function changeFacility(
  work: Work,
  id: string,
  { comment, ...fields }: FacilityChange,
  expectedVersion: number,
): Promise<Facility> {
  const before = demandFound(await lockFacility(work.tx, id));
  demandVersion(before, expectedVersion);
  refuseUnusable([
    ...facilityIssues(fields),
    ...changeIssues({
      before,
      fields,
      comment,
      hasResults: before.kind !== fields.kind && (await hasResults(work.tx, id)),
    }),
  ]);
  demandFreeName(await facilityOfName(work.tx, fields.name), id, fields.name);
  await updateFacility(work.tx, id, fields);
  if (changedCorrections(before, fields).length > 0) {
    await appendFirstVersion(work, id, fieldsOfFacility(before));
    await appendVersion(work, id, { number: before.versionNumber + 1, fields, comment });
  }
  const after = await oneFacility(work, id);
  await recordAudit(work, {
    action: 'facility.changed',
    entityKind: 'facility',
    entityId: id,
    summary: [
      ...differences(before, after),
      ...(comment === undefined ? [] : [{ field: 'comment', after: comment }]),
    ],
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
  await setFacilityRetired(work.tx, id, retired ? work.now : null);
  const after = await oneFacility(work, id);
  await recordAudit(work, {
    action: retired ? 'facility.retired' : 'facility.brought-back',
    entityKind: 'facility',
    entityId: id,
    summary: differences(before, after),
  });
  return after;
}
