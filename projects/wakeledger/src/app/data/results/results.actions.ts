import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { Adoption } from '#shared/contracts/adoptions';
import type { Result, ResultFields } from '#shared/contracts/results';
import type { ApiProblem } from '../../core/api/api-problem';
import type { AdoptionDecision, EvidenceAnswer } from './results-api';

export const ResultListPageActions = createActionGroup({
  source: 'Result List Page',
  events: {
    Opened: props<{ programmeId: string }>(),
    'Asked Again': props<{ programmeId: string }>(),
  },
});

export const ResultPageActions = createActionGroup({
  source: 'Result Page',
  events: {
    Opened: props<{ programmeId: string }>(),
    'Adoption Confirmed': props<{ programmeId: string; order: AdoptionDecision }>(),
    'Withdrawal Confirmed': props<{ programmeId: string; resultId: string; reason: string }>(),
    'Outcome Seen': emptyProps(),
  },
});

export const ResultEntryPageActions = createActionGroup({
  source: 'Result Entry Page',
  events: {
    Opened: props<{ programmeId: string }>(),
    'Entry Confirmed': props<{ programmeId: string; fields: ResultFields; commandKey: string }>(),
    'Outcome Seen': emptyProps(),
  },
});

export const ResultsApiActions = createActionGroup({
  source: 'Results API',
  events: {
    Loaded: props<{ programmeId: string; answer: EvidenceAnswer }>(),
    'Loading Failed': props<{ problem: ApiProblem }>(),
    Entered: props<{ programmeId: string; result: Result }>(),
    Adopted: props<{ programmeId: string; adoptions: readonly Adoption[] }>(),
    Withdrawn: props<{ programmeId: string; result: Result }>(),
    Refused: props<{ problem: ApiProblem }>(),
  },
});
