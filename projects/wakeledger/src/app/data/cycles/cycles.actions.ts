import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { CycleSummary } from '#shared/contracts/cycles';
import type { ApiProblem } from '../../core/api/api-problem';

export const CyclesPageActions = createActionGroup({
  source: 'Cycles Page',
  events: {
    Opened: emptyProps(),
    'Asked Again': emptyProps(),
    'Retirement Confirmed': props<{ cycleKey: string; retired: boolean }>(),
  },
});

export const CycleUploadPageActions = createActionGroup({
  source: 'Cycle Upload Page',
  events: { Stored: props<{ cycle: CycleSummary }>() },
});

export const CyclesApiActions = createActionGroup({
  source: 'Cycles API',
  events: {
    Loaded: props<{ cycles: readonly CycleSummary[] }>(),
    'Loading Failed': props<{ problem: ApiProblem }>(),
    Retired: props<{ cycle: CycleSummary }>(),
    Refused: props<{ problem: ApiProblem }>(),
  },
});
