import type * as z from 'zod';
import type { Adoption, resultAdopt } from '#shared/contracts/results';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { demandFound } from '../../rules/refusals';
import { recordAudit } from '../audit';
import { programmeExists } from '../programmes';
import { lockVariant } from '../variants';
import { currentAdoptions, insertAdoption, listAdoptions } from './adoptions.repository';
import { adoptionRefusal } from './adoptions.policy';
import { findResult } from './results.repository';

type Choice = z.output<(typeof resultAdopt)['body']>;

export async function allAdoptions(work: Work, programmeId: string): Promise<readonly Adoption[]> {
  if (!(await programmeExists(work.tx, programmeId))) fail('not-found');
  return listAdoptions(work.tx, programmeId);
}

/** Lets a variant rest on one result, or, without a result, on its newest again. */
export async function adopt(work: Work, programmeId: string, choice: Choice): Promise<Adoption> {
  // Adoptions and withdrawals of one variant wait for each other here.
  const variant = demandFound(await lockVariant(work.tx, programmeId, choice.variantId));
  const current = (await currentAdoptions(work.tx, [variant.id])).get(variant.id)?.resultId;
  const result =
    choice.resultId === undefined
      ? undefined
      : demandFound(await findResult(work.tx, programmeId, choice.resultId));
  const refusal = adoptionRefusal(choice, current, result);
  if (refusal !== undefined) fail(refusal.code, { where: refusal.where, detail: refusal.detail });

  const adoption = await insertAdoption(work, variant.id, choice.resultId, choice.comment);
  await recordAudit(work, {
    action: choice.resultId === undefined ? 'adoption.released' : 'result.adopted',
    entityKind: 'variant',
    entityId: variant.id,
    summary: [
      { field: 'resultId', before: current, after: choice.resultId },
      { field: 'comment', after: choice.comment },
    ],
  });
  return adoption;
}
