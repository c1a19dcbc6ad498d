import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { mapResponse } from '@ngrx/operators';
import { type Observable, catchError, exhaustMap, map, of, switchMap } from 'rxjs';
import type { Action } from '@ngrx/store';
import type { Facility } from '#shared/contracts/facilities';
import { asApiProblem } from '../../core/api/api-problem';
import { FacilitiesApi } from './facilities-api';
import {
  FacilityFormPageActions,
  FacilityListPageActions,
  FacilityNamesActions,
  FacilityPageActions,
  FacilitiesApiActions,
} from './facilities.actions';

/** The last question counts: its answer is the newest. */
export const loadFacilities = createEffect(
  (actions = inject(Actions), api = inject(FacilitiesApi)) =>
    actions.pipe(
      ofType(
        FacilityListPageActions.opened,
        FacilityListPageActions.askedAgain,
        FacilityFormPageActions.opened,
        FacilityPageActions.opened,
        FacilityNamesActions.needed,
      ),
      switchMap(() =>
        api.list().pipe(
          mapResponse({
            next: (facilities) => FacilitiesApiActions.loaded({ facilities }),
            error: (error) => FacilitiesApiActions.loadingFailed({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

/** One at a time: a second press while the first is under way is the same wish. */
export const createFacility = createEffect(
  (actions = inject(Actions), api = inject(FacilitiesApi)) =>
    actions.pipe(
      ofType(FacilityFormPageActions.creationConfirmed),
      exhaustMap(({ fields, commandKey }) =>
        api.create(fields, commandKey).pipe(
          mapResponse({
            next: (facility) => FacilitiesApiActions.saved({ facility }),
            error: (error) => FacilitiesApiActions.refused({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

export const changeFacility = createEffect(
  (actions = inject(Actions), api = inject(FacilitiesApi)) =>
    actions.pipe(
      ofType(FacilityFormPageActions.changeConfirmed),
      exhaustMap(({ facility, fields, commandKey }) =>
        api.update(facility, fields, commandKey).pipe(
          map((saved): Action => FacilitiesApiActions.saved({ facility: saved })),
          catchError((error: unknown) => refusalOf(error, facility, api)),
        ),
      ),
    ),
  { functional: true },
);

export const retireFacility = createEffect(
  (actions = inject(Actions), api = inject(FacilitiesApi)) =>
    actions.pipe(
      ofType(FacilityFormPageActions.retirementConfirmed, FacilityListPageActions.retirementConfirmed),
      exhaustMap(({ facility, retired }) =>
        api.retire(facility, retired).pipe(
          map((saved): Action => FacilitiesApiActions.retired({ facility: saved })),
          catchError((error: unknown) => refusalOf(error, facility, api)),
        ),
      ),
    ),
  { functional: true },
);

/** With a conflict, what stands now is fetched, so that both versions can be shown. */
function refusalOf(error: unknown, facility: Facility, api: FacilitiesApi): Observable<Action> {
  const problem = asApiProblem(error);
  if (problem.code !== 'conflict') return of(FacilitiesApiActions.refused({ problem }));
  return api.read(facility.id).pipe(
    mapResponse({
      next: (theirs) => FacilitiesApiActions.conflictFound({ theirs }),
      error: (unread) => FacilitiesApiActions.refused({ problem: asApiProblem(unread) }),
    }),
  );
}
