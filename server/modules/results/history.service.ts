import type { Adoption } from '#shared/contracts/adoptions';
import type { ResultEvent } from '#shared/contracts/results';
import type { Work } from '../../http/context';
import { demandFound } from '../../rules/refusals';
import { listAdoptionsOfVariant } from './adoptions.repository';
import { listJudgements } from './judgements.repository';
import { findResult } from './results.repository';
import { listStateChanges } from './states.repository';

/** What the choices of a variant's evidence, newest first, meant for one of its results. */
export function adoptionEvents(resultId: string, adoptions: readonly Adoption[]): readonly ResultEvent[] {
  return adoptions.flatMap((adoption, position): readonly ResultEvent[] => {
    const { id: adoptionId, at, by, comment, resultIds } = adoption;
    const event = { adoptionId, at, by, comment };
    if (resultIds.includes(resultId)) return [{ kind: 'adopted', ...event }];
    const left = adoptions[position + 1]?.resultIds.includes(resultId) ?? false;
    if (!left) return [];
    return [{ kind: resultIds.length === 0 ? 'released' : 'superseded', ...event }];
  });
}

/** What happened to a result, the newest first. */
export async function historyOf(
  work: Work,
  programmeId: string,
  resultId: string,
): Promise<readonly ResultEvent[]> {
  const result = demandFound(await findResult(work.tx, programmeId, resultId));
  const states = await listStateChanges(work.tx, resultId);
  const judgements = await listJudgements(work.tx, resultId);
  const adoptions = await listAdoptionsOfVariant(work.tx, result.variantId);
  const events: readonly ResultEvent[] = [
    ...(result.withdrawn === undefined
      ? []
      : [
          {
            kind: 'withdrawn' as const,
            at: result.withdrawn.at,
            by: result.withdrawn.by,
            comment: result.withdrawn.reason,
          },
        ]),
    ...adoptionEvents(resultId, adoptions),
    ...judgements.map((judgement) => ({
      kind: 'judged' as const,
      at: judgement.at,
      by: judgement.by,
      comment: judgement.comment,
      judgement,
    })),
    ...states.map(({ state, ...rest }) => ({
      kind: state === 'checked' ? ('checked' as const) : ('check-taken-back' as const),
      ...rest,
    })),
    { kind: 'entered', at: result.enteredAt, by: result.enteredBy },
  ];
  // Of what was written within one moment, the later deed stands in front: it is listed so above.
  return events.toSorted((a, b) => (a.at < b.at ? 1 : a.at > b.at ? -1 : 0));
}
