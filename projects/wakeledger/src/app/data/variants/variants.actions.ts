import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { Variant, VariantFields } from '#shared/contracts/variants';
import type { ApiProblem } from '../../core/api/api-problem';

export const VariantListPageActions = createActionGroup({
  source: 'Variant List Page',
  events: {
    Opened: props<{ programmeId: string }>(),
    'Asked Again': props<{ programmeId: string }>(),
    'Retirement Confirmed': props<{ variant: Variant; retired: boolean }>(),
  },
});

export const VariantFormPageActions = createActionGroup({
  source: 'Variant Form Page',
  events: {
    Opened: props<{ programmeId: string }>(),
    'Creation Confirmed': props<{ programmeId: string; fields: VariantFields; commandKey: string }>(),
    'Change Confirmed': props<{ variant: Variant; fields: VariantFields; commandKey: string }>(),
    'Retirement Confirmed': props<{ variant: Variant; retired: boolean }>(),
    'Outcome Seen': emptyProps(),
    Left: emptyProps(),
  },
});

/** Pages of other domains that show variants by name. */
export const VariantNamesActions = createActionGroup({
  source: 'Variant Names',
  events: { Needed: props<{ programmeId: string }>() },
});

export const VariantsApiActions = createActionGroup({
  source: 'Variants API',
  events: {
    Loaded: props<{ programmeId: string; variants: readonly Variant[] }>(),
    'Loading Failed': props<{ problem: ApiProblem }>(),
    Saved: props<{ variant: Variant }>(),
    Retired: props<{ variant: Variant }>(),
    'Conflict Found': props<{ theirs: Variant }>(),
    Refused: props<{ problem: ApiProblem }>(),
  },
});
