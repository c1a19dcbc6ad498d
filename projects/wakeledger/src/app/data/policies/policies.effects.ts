import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { mapResponse } from '@ngrx/operators';
import { catchError, exhaustMap, map, of, switchMap } from 'rxjs';
import { asApiProblem } from '../../core/api/api-problem';
import { PoliciesApi } from './policies-api';
import { ResultEntryPageActions, ResultListPageActions, ResultPageActions } from '../results/results.actions';
import { PoliciesApiActions, PoliciesPageActions } from './policies.actions';

/** Asked by the pages that show the limits or check results against them; the last question counts: its answer is the newest. */
export const loadPolicies = createEffect(
  (actions = inject(Actions), api = inject(PoliciesApi)) =>
    actions.pipe(
      ofType(
        PoliciesPageActions.opened,
        PoliciesPageActions.askedAgain,
        ResultListPageActions.opened,
        ResultPageActions.opened,
        ResultEntryPageActions.opened,
      ),
      switchMap(() =>
        api.list().pipe(
          mapResponse({
            next: (versions) => PoliciesApiActions.loaded({ versions }),
            error: (error) => PoliciesApiActions.loadingFailed({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

/** One change at a time: a second press while the first is under way is the same wish. */
export const changePolicies = createEffect(
  (actions = inject(Actions), api = inject(PoliciesApi)) =>
    actions.pipe(
      ofType(PoliciesPageActions.changeConfirmed),
      exhaustMap(({ change, commandKey }) =>
        api.change(change, commandKey).pipe(
          map((version) => PoliciesApiActions.changed({ version })),
          catchError((error: unknown) => {
            const problem = asApiProblem(error);
            if (problem.code !== 'conflict') return of(PoliciesApiActions.refused({ problem }));
            return api.list().pipe(
              mapResponse({
                next: (versions) => PoliciesApiActions.changedMeanwhile({ versions }),
                error: () => PoliciesApiActions.refused({ problem }),
              }),
            );
          }),
        ),
      ),
    ),
  { functional: true },
);
