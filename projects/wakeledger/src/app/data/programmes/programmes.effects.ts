import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { mapResponse } from '@ngrx/operators';
import { type RouterNavigatedAction, routerNavigatedAction } from '@ngrx/router-store';
import { type Action, Store } from '@ngrx/store';
import {
  EMPTY,
  type Observable,
  catchError,
  distinctUntilChanged,
  exhaustMap,
  filter,
  map,
  of,
  switchMap,
  tap,
} from 'rxjs';
import type { Programme } from '#shared/contracts/programmes';
import { asApiProblem } from '../../core/api/api-problem';
import { ProgrammeInView } from '../../core/shell/programme-in-view';
import { programmeIdIn } from './programme-address';
import { ProgrammesApi } from './programmes-api';
import {
  ProgrammeAddressActions,
  ProgrammeFormPageActions,
  ProgrammesApiActions,
  ProgrammesPageActions,
} from './programmes.actions';
import { programmesFeature } from './programmes.feature';

export const followAddress = createEffect(
  (actions = inject(Actions)) =>
    actions.pipe(
      ofType(routerNavigatedAction),
      map(({ payload }: RouterNavigatedAction) => programmeIdIn(payload.event.urlAfterRedirects)),
      distinctUntilChanged(),
      map((programmeId) =>
        programmeId === undefined
          ? ProgrammeAddressActions.left()
          : ProgrammeAddressActions.entered({ programmeId }),
      ),
    ),
  { functional: true },
);

/** The last question counts: its answer is the newest. What was saved changes milestones and names in the list too. */
export const loadProgrammes = createEffect(
  (actions = inject(Actions), api = inject(ProgrammesApi)) =>
    actions.pipe(
      ofType(
        ProgrammesPageActions.opened,
        ProgrammesPageActions.askedAgain,
        ProgrammeAddressActions.entered,
        ProgrammesApiActions.saved,
        ProgrammesApiActions.retired,
      ),
      switchMap(() =>
        api.list().pipe(
          mapResponse({
            next: (summaries) => ProgrammesApiActions.loaded({ summaries }),
            error: (error) => ProgrammesApiActions.loadingFailed({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

/** A convenience for the next sign-in: its failure hurts nobody and is not shown. */
export const rememberOpened = createEffect(
  (actions = inject(Actions), api = inject(ProgrammesApi)) =>
    actions.pipe(
      ofType(ProgrammeAddressActions.entered),
      switchMap(({ programmeId }) => api.opened(programmeId).pipe(catchError(() => EMPTY))),
    ),
  { functional: true, dispatch: false },
);

export const showInShell = createEffect(
  (store = inject(Store), shell = inject(ProgrammeInView)) =>
    store.select(programmesFeature.selectInView).pipe(tap((programme) => shell.show(programme))),
  { functional: true, dispatch: false },
);

export const openProgramme = createEffect(
  (actions = inject(Actions), api = inject(ProgrammesApi)) =>
    actions.pipe(
      ofType(ProgrammeFormPageActions.opened),
      map(({ programmeId }) => programmeId),
      filter((programmeId) => programmeId !== undefined),
      switchMap((programmeId) =>
        api.read(programmeId).pipe(
          mapResponse({
            next: (programme) => ProgrammesApiActions.programmeLoaded({ programme }),
            error: (error) => ProgrammesApiActions.programmeLoadingFailed({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

/** One at a time: a second press while the first is under way is the same wish. */
export const createProgramme = createEffect(
  (actions = inject(Actions), api = inject(ProgrammesApi)) =>
    actions.pipe(
      ofType(ProgrammeFormPageActions.creationConfirmed),
      exhaustMap(({ fields, commandKey }) =>
        api.create(fields, commandKey).pipe(
          mapResponse({
            next: (programme) => ProgrammesApiActions.saved({ programme }),
            error: (error) => ProgrammesApiActions.refused({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

export const changeProgramme = createEffect(
  (actions = inject(Actions), api = inject(ProgrammesApi)) =>
    actions.pipe(
      ofType(ProgrammeFormPageActions.changeConfirmed),
      exhaustMap(({ programme, fields, commandKey }) =>
        api.update(programme, fields, commandKey).pipe(
          map((saved): Action => ProgrammesApiActions.saved({ programme: saved })),
          catchError((error: unknown) => refusalOf(error, programme, api)),
        ),
      ),
    ),
  { functional: true },
);

export const retireProgramme = createEffect(
  (actions = inject(Actions), api = inject(ProgrammesApi)) =>
    actions.pipe(
      ofType(ProgrammeFormPageActions.retirementConfirmed),
      exhaustMap(({ programme, retired }) =>
        api.retire(programme, retired).pipe(
          map((saved): Action => ProgrammesApiActions.retired({ programme: saved })),
          catchError((error: unknown) => refusalOf(error, programme, api)),
        ),
      ),
    ),
  { functional: true },
);

/** With a conflict, what stands now is fetched, so that both versions can be shown. */
function refusalOf(error: unknown, programme: Programme, api: ProgrammesApi): Observable<Action> {
  const problem = asApiProblem(error);
  if (problem.code !== 'conflict') return of(ProgrammesApiActions.refused({ problem }));
  return api.read(programme.id).pipe(
    mapResponse({
      next: (theirs) => ProgrammesApiActions.conflictFound({ theirs }),
      error: (unread) => ProgrammesApiActions.refused({ problem: asApiProblem(unread) }),
    }),
  );
}
