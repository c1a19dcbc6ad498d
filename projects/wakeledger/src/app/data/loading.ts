import type { ApiProblem } from '../core/api/api-problem';

/** How far the loading of a list has come. What was loaded before stays while it is loaded anew. */
export type Loading =
  | { readonly kind: 'not-asked' }
  | { readonly kind: 'loading' }
  | { readonly kind: 'ready' }
  | { readonly kind: 'failed'; readonly problem: ApiProblem };

export const NOT_ASKED = { kind: 'not-asked' } as const satisfies Loading;
