import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { Result, ResultFields } from '#shared/contracts/results';
import type { ApiProblem } from '../../core/api/api-problem';
import type { EvidenceAnswer } from './results-api';
import type { EvidenceDecision, EvidenceDone } from './evidence-decision';

export const ResultListPageActions = createActionGroup({
  source: 'Result List Page',
  events: {
    Opened: props<{ programmeId: string }>(),
    'Asked Again': props<{ programmeId: string }>(),
    'Decision Confirmed': props<{ programmeId: string; decision: EvidenceDecision }>(),
    'Outcome Seen': emptyProps(),
  },
});

export const ResultPageActions = createActionGroup({
  source: 'Result Page',
  events: {
    Opened: props<{ programmeId: string }>(),
    'Decision Confirmed': props<{ programmeId: string; decision: EvidenceDecision }>(),
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
    Decided: props<{ programmeId: string; done: EvidenceDone }>(),
    Refused: props<{ problem: ApiProblem }>(),
  },
});
