import type { Adoption, AdoptionOrder } from '#shared/contracts/adoptions';
import type { Judgement, JudgementOrder } from '#shared/contracts/judgements';
import type { Result } from '#shared/contracts/results';

/** What a person decides about results, one or many at once; always with words of why. */
export type EvidenceDecision =
  | {
      readonly kind: 'check';
      readonly resultIds: readonly string[];
      readonly state: 'entered' | 'checked';
      readonly comment: string;
    }
  | { readonly kind: 'judge'; readonly judgements: readonly JudgementOrder[]; readonly comment?: string }
  | { readonly kind: 'adopt'; readonly adoptions: readonly AdoptionOrder[]; readonly comment: string }
  | { readonly kind: 'withdraw'; readonly resultIds: readonly string[]; readonly reason: string };

/** What came of it. */
export type EvidenceDone =
  | { readonly kind: 'checked'; readonly results: readonly Result[]; readonly state: 'entered' | 'checked' }
  | { readonly kind: 'judged'; readonly judgements: readonly (Judgement & { readonly resultId: string })[] }
  | { readonly kind: 'adopted'; readonly adoptions: readonly Adoption[] }
  | { readonly kind: 'withdrawn'; readonly results: readonly Result[] };
