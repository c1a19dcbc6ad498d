import type { ApiProblem } from '../core/api/api-problem';

/** How far a form's saving has come. */
export type Saving<T> =
  | { readonly kind: 'idle' }
  | { readonly kind: 'saving' }
  | { readonly kind: 'saved'; readonly entity: T }
  | { readonly kind: 'refused'; readonly problem: ApiProblem }
  /** A colleague saved first; `theirs` is what stands now. */
  | { readonly kind: 'conflict'; readonly theirs: T };

export const NOT_SAVING = { kind: 'idle' } as const satisfies Saving<never>;
