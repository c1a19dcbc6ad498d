import type { Variant, VariantFields } from '#shared/contracts/variants';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { latestPastDay } from '../../rules/clock';
import { demandFound, demandFreeName, demandVersion, refuseUnusable } from '../../rules/refusals';
import { hasAttachment } from '../attachments';
import { differences, recordAudit } from '../audit';
import { programmeExists } from '../programmes';
import { variantIssues, type VariantSurroundings } from './variants.policy';
import {
  findVariant,
  insertVariant,
  listVariants,
  lockVariant,
  setVariantRetired,
  takenNames,
  updateVariant,
  variantOfName,
} from './variants.repository';

export async function allVariants(work: Work, programmeId: string): Promise<readonly Variant[]> {
  await demandProgramme(work, programmeId);
  return listVariants(work.tx, programmeId);
}

export async function oneVariant(work: Work, programmeId: string, id: string): Promise<Variant> {
  return demandFound(await findVariant(work.tx, programmeId, id));
}

export async function addVariant(work: Work, programmeId: string, fields: VariantFields): Promise<Variant> {
  await demandProgramme(work, programmeId);
  refuseUnusable(variantIssues(fields, await surroundingsOf(work, programmeId, fields, undefined)));
  demandFreeName(await variantOfName(work.tx, programmeId, fields.name), undefined, fields.name);
  const variant = await insertVariant(work.tx, programmeId, fields);
  await recordAudit(work, {
    action: 'variant.added',
    entityKind: 'variant',
    entityId: variant.id,
    summary: differences({}, fields),
  });
  return variant;
}

export async function changeVariant(
  work: Work,
  programmeId: string,
  id: string,
  fields: VariantFields,
  expectedVersion: number,
): Promise<Variant> {
  const before = demandFound(await lockVariant(work.tx, programmeId, id));
  demandVersion(before, expectedVersion);
  refuseUnusable(variantIssues(fields, await surroundingsOf(work, programmeId, fields, before)));
  demandFreeName(await variantOfName(work.tx, programmeId, fields.name), id, fields.name);
  const after = await updateVariant(work.tx, id, fields);
  await recordAudit(work, {
    action: 'variant.changed',
    entityKind: 'variant',
    entityId: id,
    summary: differences(before, after),
  });
  return after;
}

/** A retired variant keeps its results and leaves the ranking. */
export async function retireVariant(
  work: Work,
  programmeId: string,
  id: string,
  retired: boolean,
  expectedVersion: number,
): Promise<Variant> {
  const before = demandFound(await lockVariant(work.tx, programmeId, id));
  demandVersion(before, expectedVersion);
  const after = await setVariantRetired(work.tx, id, retired ? work.now : null);
  await recordAudit(work, {
    action: retired ? 'variant.retired' : 'variant.brought-back',
    entityKind: 'variant',
    entityId: id,
    summary: differences(before, after),
  });
  return after;
}

async function demandProgramme(work: Work, programmeId: string): Promise<void> {
  if (!(await programmeExists(work.tx, programmeId))) fail('not-found');
}

async function surroundingsOf(
  work: Work,
  programmeId: string,
  fields: VariantFields,
  before: Variant | undefined,
): Promise<VariantSurroundings> {
  const picture = fields.pictureAttachmentId;
  return {
    latestPastDay: latestPastDay(work.now),
    takenNames: await takenNames(work.tx, programmeId, before?.id),
    configurationIds: new Set(before?.configurations.map((configuration) => configuration.id)),
    pictureFound: picture === undefined || (await hasAttachment(work.tx, picture, 'picture')),
  };
}
