import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { mapResponse } from '@ngrx/operators';
import { concatMap, switchMap } from 'rxjs';
import { asApiProblem } from '../../core/api/api-problem';
import { CyclesApi } from './cycles-api';
import { CyclesApiActions, CyclesPageActions } from './cycles.actions';

/** The last question counts: its answer is the newest. */
export const loadCycles = createEffect(
  (actions = inject(Actions), api = inject(CyclesApi)) =>
    actions.pipe(
      ofType(CyclesPageActions.opened, CyclesPageActions.askedAgain),
      switchMap(() =>
        api.list().pipe(
          mapResponse({
            next: (cycles) => CyclesApiActions.loaded({ cycles }),
            error: (error) => CyclesApiActions.loadingFailed({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

/** In turn: an undo right after a retirement must come second. */
export const retireCycle = createEffect(
  (actions = inject(Actions), api = inject(CyclesApi)) =>
    actions.pipe(
      ofType(CyclesPageActions.retirementConfirmed),
      concatMap(({ cycleKey, retired }) =>
        api.retire(cycleKey, retired).pipe(
          mapResponse({
            next: (cycle) => CyclesApiActions.retired({ cycle }),
            error: (error) => CyclesApiActions.refused({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);
