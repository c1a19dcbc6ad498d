import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { concatLatestFrom, mapResponse } from '@ngrx/operators';
import { Store } from '@ngrx/store';
import { debounceTime, filter, map, switchMap, tap } from 'rxjs';
import { asApiProblem } from '../../core/api/api-problem';
import { RankingsApi } from './rankings-api';
import { RankingPageActions, RankingsApiActions, TryingActions } from './rankings.actions';
import { rankingsFeature } from './rankings.feature';
import { TriedChanges } from './tried-changes';

/** A control that is moved again within this time asks once [ms]. */
export const VIEW_DEBOUNCE_MS = 150;

/** Opening the page fetches the inputs, once; no control ever does, unless there are none yet. The latest programme wins. */
export const loadSources = createEffect(
  (actions = inject(Actions), store = inject(Store), api = inject(RankingsApi)) =>
    actions.pipe(
      ofType(RankingPageActions.opened, RankingPageActions.addressChanged, RankingPageActions.retryPressed),
      concatLatestFrom(() => store.select(rankingsFeature.selectRankingsState)),
      filter(([{ type }, { sources }]) => type !== RankingPageActions.addressChanged.type || !sources),
      map(([, state]) => state),
      filter(({ mode, programmeId }) => mode === 'computes' && programmeId !== ''),
      switchMap(({ programmeId, address }) =>
        api.sources(programmeId, address.area).pipe(
          mapResponse({
            next: (sources) => RankingsApiActions.sourcesLoaded({ programmeId, sources }),
            error: (thrown) =>
              RankingsApiActions.sourcesFailed({ programmeId, problem: asApiProblem(thrown) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

/** Those who may not hold the inputs ask the server for each view; only the answer to the latest choice counts. */
export const loadView = createEffect(
  (actions = inject(Actions), store = inject(Store), api = inject(RankingsApi)) =>
    actions.pipe(
      ofType(RankingPageActions.opened, RankingPageActions.addressChanged, RankingPageActions.retryPressed),
      debounceTime(VIEW_DEBOUNCE_MS),
      concatLatestFrom(() => store.select(rankingsFeature.selectRankingsState)),
      map(([, state]) => state),
      filter(({ mode, programmeId }) => mode === 'is-given' && programmeId !== ''),
      switchMap(({ programmeId, address }) =>
        api.view(programmeId, address).pipe(
          mapResponse({
            next: (view) => RankingsApiActions.viewLoaded({ programmeId, view }),
            error: (thrown) => RankingsApiActions.viewFailed({ programmeId, problem: asApiProblem(thrown) }),
          }),
        ),
      ),
    ),
  { functional: true },
);

/** What was tried in this tab before it was loaded anew is tried again. */
export const recallTried = createEffect(
  (actions = inject(Actions), memory = inject(TriedChanges)) =>
    actions.pipe(
      ofType(RankingPageActions.opened),
      filter(({ mode }) => mode === 'computes'),
      map(({ programmeId }) => TryingActions.changed({ programmeId, changes: memory.of(programmeId) })),
    ),
  { functional: true },
);

export const keepTried = createEffect(
  (actions = inject(Actions), memory = inject(TriedChanges)) =>
    actions.pipe(
      ofType(TryingActions.changed),
      tap(({ programmeId, changes }) => memory.keep(programmeId, changes)),
    ),
  { functional: true, dispatch: false },
);
