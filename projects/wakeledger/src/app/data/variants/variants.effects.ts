import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { mapResponse } from '@ngrx/operators';
import { type Observable, catchError, exhaustMap, map, of, switchMap } from 'rxjs';
import type { Action } from '@ngrx/store';
import type { Variant } from '#shared/contracts/variants';
import { asApiProblem } from '../../core/api/api-problem';
import { VariantsApi } from './variants-api';
import {
  VariantFormPageActions,
  VariantListPageActions,
  VariantNamesActions,
  VariantsApiActions,
} from './variants.actions';

/** The last question counts: a person who moves on to another programme does not wait for the first. */
export const loadVariants = createEffect(
  (actions = inject(Actions), api = inject(VariantsApi)) =>
    actions.pipe(
      ofType(
        VariantListPageActions.opened,
        VariantListPageActions.askedAgain,
        VariantFormPageActions.opened,
        VariantNamesActions.needed,
      ),
      switchMap(({ programmeId }) =>
        api.list(programmeId).pipe(
          mapResponse({
            next: (variants) => VariantsApiActions.loaded({ programmeId, variants }),
            error: (error) => VariantsApiActions.loadingFailed({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

/** One at a time: a second press while the first is under way is the same wish. */
export const createVariant = createEffect(
  (actions = inject(Actions), api = inject(VariantsApi)) =>
    actions.pipe(
      ofType(VariantFormPageActions.creationConfirmed),
      exhaustMap(({ programmeId, fields, commandKey }) =>
        api.create(programmeId, fields, commandKey).pipe(
          mapResponse({
            next: (variant) => VariantsApiActions.saved({ variant }),
            error: (error) => VariantsApiActions.refused({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

export const changeVariant = createEffect(
  (actions = inject(Actions), api = inject(VariantsApi)) =>
    actions.pipe(
      ofType(VariantFormPageActions.changeConfirmed),
      exhaustMap(({ variant, fields, commandKey }) =>
        api.update(variant, fields, commandKey).pipe(
          map((saved): Action => VariantsApiActions.saved({ variant: saved })),
          catchError((error: unknown) => refusalOf(error, variant, api)),
        ),
      ),
    ),
  { functional: true },
);

export const retireVariant = createEffect(
  (actions = inject(Actions), api = inject(VariantsApi)) =>
    actions.pipe(
      ofType(VariantFormPageActions.retirementConfirmed, VariantListPageActions.retirementConfirmed),
      exhaustMap(({ variant, retired }) =>
        api.retire(variant, retired).pipe(
          map((saved): Action => VariantsApiActions.retired({ variant: saved })),
          catchError((error: unknown) => refusalOf(error, variant, api)),
        ),
      ),
    ),
  { functional: true },
);

/** With a conflict, what stands now is fetched, so that both versions can be shown. */
function refusalOf(error: unknown, variant: Variant, api: VariantsApi): Observable<Action> {
  const problem = asApiProblem(error);
  if (problem.code !== 'conflict') return of(VariantsApiActions.refused({ problem }));
  return api.read(variant.programmeId, variant.id).pipe(
    mapResponse({
      next: (theirs) => VariantsApiActions.conflictFound({ theirs }),
      error: (unread) => VariantsApiActions.refused({ problem: asApiProblem(unread) }),
    }),
  );
}
