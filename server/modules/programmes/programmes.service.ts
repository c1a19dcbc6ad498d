import type { Programme, ProgrammeFields, ProgrammeSummary } from '#shared/contracts/programmes';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { dayOf } from '../../rules/clock';
import { demandFound, demandFreeName, demandVersion, refuseUnusable } from '../../rules/refusals';
import { differences, recordAudit } from '../audit';
import { knownFacilityIds } from '../facilities';
import { countProgrammes } from './programme-summary.repository';
import { programmeIssues, type ProgrammeSurroundings } from './programmes.policy';
import {
  findProgramme,
  insertProgramme,
  lockProgramme,
  nextMilestones,
  programmeExists,
  programmeOfName,
  setProgrammeRetired,
  updateProgramme,
  variantIdsOf,
} from './programmes.repository';
import { rememberOpening } from './recent-programmes.repository';

export async function allProgrammes(work: Work): Promise<readonly ProgrammeSummary[]> {
  const counts = await countProgrammes(work.tx);
  const next = await nextMilestones(
    work.tx,
    counts.map((programme) => programme.id),
    dayOf(work.now),
  );
  return counts.map(({ retiredAt, latestResultDate, ...rest }) => ({
    ...rest,
    nextMilestone: next.get(rest.id),
    latestResultDate: latestResultDate ?? undefined,
    retiredAt: retiredAt?.toISOString(),
  }));
}

export async function oneProgramme(work: Work, id: string): Promise<Programme> {
  return demandFound(await findProgramme(work.tx, id));
}

export async function openedProgramme(work: Work, id: string): Promise<void> {
  if (!(await programmeExists(work.tx, id))) fail('not-found');
  await rememberOpening(work, id);
}

export async function addProgramme(work: Work, fields: ProgrammeFields): Promise<Programme> {
  refuseUnusable(programmeIssues(fields, await surroundingsOf(work, fields, undefined)));
  demandFreeName(await programmeOfName(work.tx, fields.name), undefined, fields.name);
  const programme = await insertProgramme(work.tx, fields);
  await rememberOpening(work, programme.id);
  await recordAudit(work, {
    action: 'programme.opened',
    entityKind: 'programme',
    entityId: programme.id,
    summary: differences({}, fields),
  });
  return programme;
}

export async function changeProgramme(
  work: Work,
  id: string,
  fields: ProgrammeFields,
  expectedVersion: number,
): Promise<Programme> {
  const before = demandFound(await lockProgramme(work.tx, id));
  demandVersion(before, expectedVersion);
  refuseUnusable(programmeIssues(fields, await surroundingsOf(work, fields, before)));
  demandFreeName(await programmeOfName(work.tx, fields.name), id, fields.name);
  const after = await updateProgramme(work.tx, id, fields);
  await recordAudit(work, {
    action: 'programme.changed',
    entityKind: 'programme',
    entityId: id,
    summary: differences(before, after),
  });
  return after;
}

/** A retired programme stays readable with all that belongs to it; it only leaves the list of those in work. */
export async function retireProgramme(
  work: Work,
  id: string,
  retired: boolean,
  expectedVersion: number,
): Promise<Programme> {
  const before = demandFound(await lockProgramme(work.tx, id));
  demandVersion(before, expectedVersion);
  const after = await setProgrammeRetired(work.tx, id, retired ? work.now : null);
  await recordAudit(work, {
    action: retired ? 'programme.retired' : 'programme.brought-back',
    entityKind: 'programme',
    entityId: id,
    summary: differences(before, after),
  });
  return after;
}

async function surroundingsOf(
  work: Work,
  fields: ProgrammeFields,
  before: Programme | undefined,
): Promise<ProgrammeSurroundings> {
  return {
    variantIds: before === undefined ? new Set() : await variantIdsOf(work.tx, before.id),
    facilityIds: await knownFacilityIds(
      work.tx,
      fields.referenceFacilityId === undefined ? [] : [fields.referenceFacilityId],
    ),
    milestoneIds: new Set(before?.milestones.map((milestone) => milestone.id)),
  };
}
