import type { Adjustment, AdjustmentFields } from '#shared/contracts/adjustments';
import type { Work } from '../../http/context';
import { demandFound, demandFreeName, demandVersion, refuseUnusable } from '../../rules/refusals';
import { hasAttachment } from '../attachments';
import { differences, recordAudit } from '../audit';
import { adjustmentIssues, inOrderOfUse, overlapIssues } from './adjustments.policy';
import {
  adjustmentOfName,
  findAdjustment,
  insertAdjustment,
  listAdjustments,
  lockAdjustments,
  setAdjustmentRetired,
  updateAdjustment,
} from './adjustments.repository';

/** In the order in which the first that fits is used, then those out of use. */
export async function allAdjustments({ tx }: Work): Promise<readonly Adjustment[]> {
  return inOrderOfUse(await listAdjustments(tx));
}

export async function oneAdjustment({ tx }: Work, id: string): Promise<Adjustment> {
  return demandFound(await findAdjustment(tx, id));
}

/** Refuses what cannot be used, or would fit where another fits already. */
async function demandUsable(work: Work, fields: AdjustmentFields, ownId?: string): Promise<void> {
  const attachmentFound =
    fields.attachmentId === undefined || (await hasAttachment(work.tx, fields.attachmentId, 'evidence'));
  const others = (await listAdjustments(work.tx)).filter(({ id }) => id !== ownId);
  refuseUnusable([
    ...adjustmentIssues(fields),
    ...overlapIssues(fields, others),
    ...(attachmentFound
      ? []
      : [{ where: 'attachmentId', detail: 'There is no such file of evidence. Bring it in first.' }]),
  ]);
}

export async function addAdjustment(work: Work, fields: AdjustmentFields): Promise<Adjustment> {
  await lockAdjustments(work.tx);
  await demandUsable(work, fields);
  demandFreeName(await adjustmentOfName(work.tx, fields.name), undefined, fields.name);
  const id = await insertAdjustment(work, fields);
  await recordAudit(work, {
    action: 'adjustment.added',
    entityKind: 'adjustment',
    entityId: id,
    summary: differences({}, fields),
  });
  return oneAdjustment(work, id);
}

export async function changeAdjustment(
  work: Work,
  id: string,
  fields: AdjustmentFields,
  expectedVersion: number,
): Promise<Adjustment> {
  await lockAdjustments(work.tx);
  const before = demandFound(await findAdjustment(work.tx, id));
  demandVersion(before, expectedVersion);
  await demandUsable(work, fields, id);
  demandFreeName(await adjustmentOfName(work.tx, fields.name), id, fields.name);
  await updateAdjustment(work.tx, id, fields);
  const after = await oneAdjustment(work, id);
  await recordAudit(work, {
    action: 'adjustment.changed',
    entityKind: 'adjustment',
    entityId: id,
    summary: differences(before, after),
  });
  return after;
}

/** Retired adjustments bring no result in any more; figures that were adopted with them keep what they were. */
export async function retireAdjustment(
  work: Work,
  id: string,
  retired: boolean,
  expectedVersion: number,
): Promise<Adjustment> {
  await lockAdjustments(work.tx);
  const before = demandFound(await findAdjustment(work.tx, id));
  demandVersion(before, expectedVersion);
  if (!retired) {
    const others = (await listAdjustments(work.tx)).filter((other) => other.id !== id);
    refuseUnusable(overlapIssues(before, others));
  }
  await setAdjustmentRetired(work.tx, id, retired ? work.now : null);
  const after = await oneAdjustment(work, id);
  await recordAudit(work, {
    action: retired ? 'adjustment.retired' : 'adjustment.brought-back',
    entityKind: 'adjustment',
    entityId: id,
    summary: differences(before, after),
  });
  return after;
}
