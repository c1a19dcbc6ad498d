import type { Adoption, AdoptionOrder } from '#shared/contracts/adoptions';
import type { Result } from '#shared/contracts/results';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { demandFound } from '../../rules/refusals';
import { recordAudit } from '../audit';
import { storeEvaluations } from '../evaluations';
import { programmeExists } from '../programmes';
import { lockVariant } from '../variants';
import { adoptionRefusal, type AdoptionRefusal } from './adoptions.policy';
import {
  insertAdoption,
  listAdoptions,
  standingAdoptions,
  type AdoptionToStore,
} from './adoptions.repository';
import { findResults } from './results.repository';
import { insertStates } from './states.repository';

export async function allAdoptions(work: Work, programmeId: string): Promise<readonly Adoption[]> {
  if (!(await programmeExists(work.tx, programmeId))) fail('not-found');
  return listAdoptions(work.tx, programmeId);
}

/**
 * Adoptions, withdrawals and setting aside of a variant's results wait for each other here; in the order of the ids, so
 * that nobody waits in a circle. @throws {ProblemError} not-found
 */
export async function lockVariants(
  work: Work,
  programmeId: string,
  variantIds: readonly string[],
): Promise<void> {
  for (const id of [...new Set(variantIds)].sort()) {
    demandFound(await lockVariant(work.tx, programmeId, id));
  }
}

/** @throws {ProblemError} conflict where somebody decided meanwhile, else wrong-state, with every refusal */
function refuseAdoptions(refusals: readonly AdoptionRefusal[]): void {
  const first = refusals.find(({ reason }) => reason === 'conflict') ?? refusals[0];
  if (first === undefined) return;
  fail(first.reason, { where: first.where, detail: first.detail, issues: [...refusals] });
}

function refusalsOf(
  orders: readonly AdoptionOrder[],
  standing: ReadonlyMap<string, Adoption>,
  results: readonly Result[],
): readonly AdoptionRefusal[] {
  const seen = new Set<string>();
  return orders.flatMap((order, position): readonly AdoptionRefusal[] => {
    const twice = seen.has(order.variantId);
    seen.add(order.variantId);
    const refusal = twice
      ? ({
          reason: 'wrong-state',
          where: 'variantId',
          detail: 'This variant stands twice in the list.',
        } as const)
      : adoptionRefusal(order, standing.get(order.variantId), results);
    return refusal === undefined ? [] : [{ ...refusal, where: `adoptions.${position}.${refusal.where}` }];
  });
}

/**
 * Lets variants rest on sets of results, or, without results, on their newest again; all of it or nothing. What was only
 * entered counts as checked by it. Each adoption stores its evaluation.
 */
export async function adoptEvidence(
  work: Work,
  programmeId: string,
  orders: readonly AdoptionOrder[],
  comment: string,
): Promise<readonly Adoption[]> {
  const variantIds = orders.map(({ variantId }) => variantId);
  await lockVariants(work, programmeId, variantIds);
  const standing = await standingAdoptions(work.tx, variantIds);
  const wanted = [...new Set(orders.flatMap(({ resultIds }) => resultIds))];
  const results = await findResults(work.tx, programmeId, wanted);
  if (results.length < wanted.length) fail('not-found');
  refuseAdoptions(refusalsOf(orders, standing, results));

  const unchecked = results.filter(({ state }) => state === 'entered').map(({ id }) => id);
  await insertStates(work, unchecked, 'checked', comment);
  return store(work, programmeId, orders, standing, comment);
}

async function store(
  work: Work,
  programmeId: string,
  choices: readonly AdoptionToStore[],
  standing: ReadonlyMap<string, Adoption>,
  comment: string,
): Promise<readonly Adoption[]> {
  const stored: Adoption[] = [];
  for (const choice of choices) {
    const before = standing.get(choice.variantId);
    const adoption = await insertAdoption(work, choice, comment);
    stored.push(adoption);
    await recordAudit(work, {
      action: choice.resultIds.length === 0 ? 'adoption.released' : 'result.adopted',
      entityKind: 'variant',
      entityId: choice.variantId,
      summary: [
        { field: 'resultIds', before: before?.resultIds, after: adoption.resultIds },
        {
          field: 'rule',
          before: before?.rule,
          after: choice.resultIds.length === 0 ? undefined : choice.rule,
        },
        { field: 'comment', after: comment },
      ],
    });
  }
  await storeEvaluations(
    work,
    programmeId,
    stored.filter(({ resultIds }) => resultIds.length > 0),
  );
  return stored;
}

/**
 * Takes results that no longer count out of the adoptions that hold them: a variant goes on with those that are left, and
 * with none left it rests on its newest again. The variants are locked already.
 */
export async function leaveAdoptions(
  work: Work,
  programmeId: string,
  gone: readonly Pick<Result, 'id' | 'variantId' | 'name'>[],
  because: string,
): Promise<void> {
  const standing = await standingAdoptions(work.tx, [...new Set(gone.map(({ variantId }) => variantId))]);
  for (const adoption of standing.values()) {
    const leaving = gone.filter(({ id }) => adoption.resultIds.includes(id));
    if (leaving.length === 0) continue;
    const resultIds = adoption.resultIds.filter((id) => leaving.every((result) => result.id !== id));
    const names = leaving.map(({ name }) => name).join(', ');
    const choice = { variantId: adoption.variantId, resultIds, rule: adoption.rule };
    await store(work, programmeId, [choice], standing, `${names} ${because}`);
  }
}
