import type { Result, ResultFields } from '#shared/contracts/results';
import type { Variant } from '#shared/contracts/variants';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { latestPastDay } from '../../rules/clock';
import type { Issue } from '../../rules/issue';
import { demandFound, demandFreeName, refuseUnusable } from '../../rules/refusals';
import { hasAttachment } from '../attachments';
import { differences, recordAudit } from '../audit';
import { findFacility } from '../facilities';
import { programmeExists } from '../programmes';
import { findVariant } from '../variants';
import { resultIssues } from './results.policy';
import { findResult, insertResult, listResults, resultOfName, takeEntrySequence } from './results.repository';

export async function allResults(work: Work, programmeId: string): Promise<readonly Result[]> {
  if (!(await programmeExists(work.tx, programmeId))) fail('not-found');
  return listResults(work.tx, programmeId);
}

export async function oneResult(work: Work, programmeId: string, id: string): Promise<Result> {
  return demandFound(await findResult(work.tx, programmeId, id));
}

/** Keeps a result as it came. Nothing of it changes afterwards; a mistake is withdrawn and entered anew. */
export async function enterResult(work: Work, programmeId: string, fields: ResultFields): Promise<Result> {
  if (!(await programmeExists(work.tx, programmeId))) fail('not-found');
  refuseUnusable(await issuesOf(work, programmeId, fields));

  const entrySequence = await takeEntrySequence(work.tx);
  demandFreeName(await resultOfName(work.tx, programmeId, fields.name), undefined, fields.name);
  const result = await insertResult(work, programmeId, fields, entrySequence);
  await recordAudit(work, {
    action: 'result.entered',
    entityKind: 'result',
    entityId: result.id,
    summary: differences({}, fields),
  });
  return result;
}

async function issuesOf(work: Work, programmeId: string, fields: ResultFields): Promise<readonly Issue[]> {
  const variant = await findVariant(work.tx, programmeId, fields.variantId);
  const facility = await findFacility(work.tx, fields.facilityId);
  const attached =
    fields.attachmentId === undefined || (await hasAttachment(work.tx, fields.attachmentId, 'evidence'));
  const unknown: Issue[] = [];
  if (variant === undefined) {
    unknown.push({
      where: 'variantId',
      detail: 'There is no such variant in this programme. Choose one of its variants.',
    });
  }
  if (facility === undefined) {
    unknown.push({
      where: 'facilityId',
      detail: 'There is no such facility. Choose one of the organisation’s facilities.',
    });
  }
  if (!attached) {
    unknown.push({
      where: 'attachmentId',
      detail: 'There is no such evidence. Bring the file in as evidence first, or leave it out.',
    });
  }
  if (variant === undefined || facility === undefined) return unknown;
  return [
    ...unknown,
    ...resultIssues(fields, {
      latestPastDay: latestPastDay(work.now),
      facility,
      frontalAreaM2: newestArea(variant),
    }),
  ];
}

/** The contract demands one area at least; a variant without any could fill no test section. */
function newestArea(variant: Variant): number {
  const [newest] = variant.frontalAreas;
  return newest?.areaM2 ?? 0;
}
