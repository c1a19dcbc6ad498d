import type { Result } from '#shared/contracts/results';

export interface AdoptionRefusal {
  readonly code: 'conflict' | 'wrong-state';
  readonly where: string;
  readonly detail: string;
}

export interface AdoptionChoice {
  readonly variantId: string;
  readonly resultId?: string;
  readonly expectedCurrentResultId?: string;
}

/** Why a choice of evidence cannot be made, or undefined where it can. */
export function adoptionRefusal(
  choice: AdoptionChoice,
  currentResultId: string | undefined,
  result: Pick<Result, 'variantId' | 'name' | 'withdrawn'> | undefined,
): AdoptionRefusal | undefined {
  if (choice.expectedCurrentResultId !== currentResultId) {
    return {
      code: 'conflict',
      where: 'expectedCurrentResultId',
      detail: 'Somebody changed what this variant rests on since you looked. Look again, then decide.',
    };
  }
  if (choice.resultId === currentResultId) {
    return {
      code: 'wrong-state',
      where: 'resultId',
      detail:
        currentResultId === undefined
          ? 'No result is adopted for this variant, so there is none to release.'
          : 'This result is adopted already.',
    };
  }
  if (result !== undefined && result.variantId !== choice.variantId) {
    return {
      code: 'wrong-state',
      where: 'resultId',
      detail: `${result.name} belongs to another variant. Choose one of this variant’s own results.`,
    };
  }
  if (result?.withdrawn !== undefined) {
    return {
      code: 'wrong-state',
      where: 'resultId',
      detail: `${result.name} was withdrawn: ${result.withdrawn.reason} Choose a result that stands.`,
    };
  }
  return undefined;
}
