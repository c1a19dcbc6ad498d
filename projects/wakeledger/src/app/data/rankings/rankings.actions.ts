import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { JudgementChange } from '#shared/contracts/proposals';
import type { ChoiceQuery } from '#shared/core/ranking/ranking-choices';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import type { ApiProblem } from '../../core/api/api-problem';
import type { RankingSources } from './rankings-api';

/** Whether this person's browser computes the ranking, or is given the server's. */
export type RankingMode = 'computes' | 'is-given';

export const RankingPageActions = createActionGroup({
  source: 'Ranking Page',
  events: {
    Opened: props<{ programmeId: string; mode: RankingMode; address: ChoiceQuery }>(),
    'Address Changed': props<{ address: ChoiceQuery }>(),
    'Retry Pressed': emptyProps(),
  },
});

/** Changes of judgement that are tried in this browser; nothing of them is stored on the server. */
export const TryingActions = createActionGroup({
  source: 'Trying',
  events: {
    Changed: props<{ programmeId: string; changes: readonly JudgementChange[] }>(),
  },
});

export const RankingsApiActions = createActionGroup({
  source: 'Rankings API',
  events: {
    'Sources Loaded': props<{ programmeId: string; sources: RankingSources }>(),
    'Sources Failed': props<{ programmeId: string; problem: ApiProblem }>(),
    'View Loaded': props<{ programmeId: string; view: RankingView }>(),
    'View Failed': props<{ programmeId: string; problem: ApiProblem }>(),
  },
});
