import type { Adoption, AdoptionOrder } from '#shared/contracts/adoptions';
import type { Result } from '#shared/contracts/results';
import type { Issue } from '../../rules/issue';

export interface AdoptionRefusal extends Issue {
  readonly reason: 'conflict' | 'wrong-state';
}

type KnownResult = Pick<Result, 'id' | 'variantId' | 'name' | 'withdrawn' | 'judgement'>;

const sameSet = (a: readonly string[], b: readonly string[]): boolean =>
  a.length === b.length && a.every((id) => b.includes(id));

/** Why one result cannot be what this variant rests on. */
function resultRefusal(variantId: string, result: KnownResult): string | undefined {
  if (result.variantId !== variantId) {
    return `${result.name} belongs to another variant. Choose one of this variant’s own results.`;
  }
  if (result.withdrawn !== undefined) {
    return `${result.name} was withdrawn: ${result.withdrawn.reason} Choose a result that stands.`;
  }
  const aside = result.judgement?.setAsideReason;
  return aside === undefined
    ? undefined
    : `${result.name} is set aside: ${aside} Bring it back first, or choose another result.`;
}

function standingRefusal(order: AdoptionOrder, standing: Adoption | undefined): string | undefined {
  if (order.resultIds.length === 0) {
    return standing === undefined
      ? 'No result is adopted for this variant, so there is none to release.'
      : undefined;
  }
  if (new Set(order.resultIds).size !== order.resultIds.length) {
    return 'A result stands twice in this choice. Name each once.';
  }
  const same =
    standing !== undefined && standing.rule === order.rule && sameSet(order.resultIds, standing.resultIds);
  return same ? 'These results are adopted already, by the same rule.' : undefined;
}

/** Why a choice of evidence cannot be made, or undefined where it can. `results` are those that it names. */
export function adoptionRefusal(
  order: AdoptionOrder,
  standing: Adoption | undefined,
  results: readonly KnownResult[],
): AdoptionRefusal | undefined {
  if (order.expectedAdoptionId !== standing?.id) {
    const who = standing === undefined ? 'The adoption was released' : `${standing.by} chose its evidence`;
    return {
      reason: 'conflict',
      where: 'expectedAdoptionId',
      detail: `${who} since you looked. Look again, then decide.`,
    };
  }
  const detail = standingRefusal(order, standing);
  if (detail !== undefined) return { reason: 'wrong-state', where: 'resultIds', detail };
  for (const [position, id] of order.resultIds.entries()) {
    const result = results.find((each) => each.id === id);
    const refused = result && resultRefusal(order.variantId, result);
    if (refused !== undefined) {
      return { reason: 'wrong-state', where: `resultIds.${position}`, detail: refused };
    }
  }
  return undefined;
}
