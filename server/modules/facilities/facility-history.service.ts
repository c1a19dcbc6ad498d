import type { FacilityEvidence, FacilityVersion, TestedModel } from '#shared/contracts/facilities';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { demandFound } from '../../rules/refusals';
import { fieldsOfFacility } from './facilities.policy';
import { findFacility } from './facilities.repository';
import { largestModels, resultsByProgramme } from './facility-evidence.repository';
import { addedAt, listVersions } from './facility-versions.repository';

async function demandFacility(work: Work, id: string): Promise<void> {
  demandFound(await findFacility(work.tx, id));
}

/** The versions, newest first; a facility that never changed stands at its first, as it was added. */
export async function versionsOf(work: Work, id: string): Promise<readonly FacilityVersion[]> {
  const facility = demandFound(await findFacility(work.tx, id));
  const versions = await listVersions(work.tx, id);
  if (versions.length > 0) return versions;
  const at = (await addedAt(work.tx, id)) ?? fail('not-found');
  return [{ number: 1, fields: fieldsOfFacility(facility), at: at.toISOString() }];
}

export async function evidenceOf(work: Work, id: string): Promise<readonly FacilityEvidence[]> {
  await demandFacility(work, id);
  return resultsByProgramme(work.tx, id);
}

export async function modelsOf(work: Work, id: string): Promise<readonly TestedModel[]> {
  await demandFacility(work, id);
  return largestModels(work.tx, id);
}
