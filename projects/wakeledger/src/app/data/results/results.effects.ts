import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { mapResponse } from '@ngrx/operators';
import { exhaustMap, map, switchMap } from 'rxjs';
import { asApiProblem } from '../../core/api/api-problem';
import { FacilityNamesActions } from '../facilities/facilities.actions';
import { VariantNamesActions } from '../variants/variants.actions';
import { ResultsApi } from './results-api';
import {
  ResultEntryPageActions,
  ResultListPageActions,
  ResultPageActions,
  ResultsApiActions,
} from './results.actions';

/**
 * Opening a page asks; so does every deed, since what a result is reduced with is the server's to say. The last question
 * counts.
 */
export const loadEvidence = createEffect(
  (actions = inject(Actions), api = inject(ResultsApi)) =>
    actions.pipe(
      ofType(
        ResultListPageActions.opened,
        ResultListPageActions.askedAgain,
        ResultPageActions.opened,
        ResultEntryPageActions.opened,
        ResultsApiActions.entered,
        ResultsApiActions.decided,
      ),
      switchMap(({ programmeId }) =>
        api.evidence(programmeId).pipe(
          mapResponse({
            next: (answer) => ResultsApiActions.loaded({ programmeId, answer }),
            error: (error) => ResultsApiActions.loadingFailed({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

/** Results are shown with the names of their variants … */
export const nameVariants = createEffect(
  (actions = inject(Actions)) =>
    actions.pipe(
      ofType(ResultListPageActions.opened, ResultPageActions.opened, ResultEntryPageActions.opened),
      map(({ programmeId }) => VariantNamesActions.needed({ programmeId })),
    ),
  { functional: true },
);

/** … and of the facilities that they come from. */
export const nameFacilities = createEffect(
  (actions = inject(Actions)) =>
    actions.pipe(
      ofType(ResultListPageActions.opened, ResultPageActions.opened, ResultEntryPageActions.opened),
      map(() => FacilityNamesActions.needed()),
    ),
  { functional: true },
);

/** One at a time: a second press while the first is under way is the same wish. */
export const enterResult = createEffect(
  (actions = inject(Actions), api = inject(ResultsApi)) =>
    actions.pipe(
      ofType(ResultEntryPageActions.entryConfirmed),
      exhaustMap(({ programmeId, fields, commandKey }) =>
        api.enter(programmeId, fields, commandKey).pipe(
          mapResponse({
            next: (result) => ResultsApiActions.entered({ programmeId, result }),
            error: (error) => ResultsApiActions.refused({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

/** Whatever is decided about results: checked, judged, adopted, withdrawn. One at a time, as above. */
export const decideOnEvidence = createEffect(
  (actions = inject(Actions), api = inject(ResultsApi)) =>
    actions.pipe(
      ofType(ResultPageActions.decisionConfirmed, ResultListPageActions.decisionConfirmed),
      exhaustMap(({ programmeId, decision }) =>
        api.decide(programmeId, decision).pipe(
          mapResponse({
            next: (done) => ResultsApiActions.decided({ programmeId, done }),
            error: (error) => ResultsApiActions.refused({ problem: asApiProblem(error) }),
          }),
        ),
      ),
    ),
  { functional: true },
);
