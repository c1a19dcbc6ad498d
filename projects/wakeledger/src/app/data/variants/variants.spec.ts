import { TestBed } from '@angular/core/testing';
import { Actions } from '@ngrx/effects';
import { provideMockActions } from '@ngrx/effects/testing';
import type { Action } from '@ngrx/store';
import { type Observable, firstValueFrom, of, throwError } from 'rxjs';
import type { Variant, VariantFields } from '#shared/contracts/variants';
import { ApiProblem } from '../../core/api/api-problem';
import { VariantsApi } from './variants-api';
import { VariantFormPageActions, VariantListPageActions, VariantsApiActions } from './variants.actions';
import { changeVariant, loadVariants, retireVariant } from './variants.effects';
import { type VariantsState, variantsFeature } from './variants.feature';

const variant = (id: string, change: Partial<Variant> = {}): Variant =>
  ({ id, programmeId: 'dunlin', name: id, version: 1, ...change }) as Variant;
const after = (...actions: Action[]): VariantsState =>
  actions.reduce<VariantsState>(
    (state, action) => variantsFeature.reducer(state, action),
    variantsFeature.reducer(undefined, { type: 'start' }),
  );
const opened = VariantListPageActions.opened({ programmeId: 'dunlin' });
const loaded = VariantsApiActions.loaded({
  programmeId: 'dunlin',
  variants: [variant('hatch'), variant('old', { retiredAt: '2026-01-01T00:00:00Z' })],
});

function effect(
  run: (actions: Actions, api: VariantsApi) => Observable<Action>,
  action: Action,
  api: Partial<VariantsApi>,
): Promise<Action> {
  TestBed.configureTestingModule({
    providers: [provideMockActions(() => of(action)), { provide: VariantsApi, useValue: api }],
  });
  return TestBed.runInInjectionContext(() =>
    firstValueFrom(run(TestBed.inject(Actions), TestBed.inject(VariantsApi))),
  );
}

describe('the variants’ slice', () => {
  it('sets retired variants apart', () => {
    const state = { variants: after(opened, loaded) };
    expect(variantsFeature.selectActive(state).map(({ id }) => id)).toEqual(['hatch']);
    expect(variantsFeature.selectRetired(state).map(({ id }) => id)).toEqual(['old']);
  });

  it('forgets another programme’s variants at once, and takes no late answer for it', () => {
    const state = after(opened, loaded, VariantListPageActions.opened({ programmeId: 'other' }), loaded);
    expect(state.variants).toEqual([]);
    expect(state.loading).toEqual({ kind: 'loading' });
  });

  it('keeps the list in view while it is asked for anew', () => {
    const state = after(opened, loaded, opened);
    expect(state.loading).toEqual({ kind: 'ready' });
    expect(state.variants).toHaveLength(2);
  });

  it('holds what a colleague saved, so that both versions can be shown', () => {
    const theirs = variant('hatch', { name: 'Hatch 5', version: 2 });
    const state = after(opened, loaded, VariantsApiActions.conflictFound({ theirs }));
    expect(state.saving).toEqual({ kind: 'conflict', theirs });
    expect(variantsFeature.selectById({ variants: state }).get('hatch')?.version).toBe(2);
  });
});

describe('the variants’ effects', () => {
  const change = VariantFormPageActions.changeConfirmed({
    variant: variant('hatch'),
    fields: {} as VariantFields,
    commandKey: 'key',
  });

  it('load the variants of the programme that was opened', async () => {
    const list = jest.fn(() => of([variant('hatch')]));
    await expect(effect(loadVariants, opened, { list })).resolves.toEqual(
      VariantsApiActions.loaded({ programmeId: 'dunlin', variants: [variant('hatch')] }),
    );
    expect(list).toHaveBeenCalledWith('dunlin');
  });

  it('fetch what stands now when a colleague saved first', async () => {
    const theirs = variant('hatch', { version: 2 });
    const outcome = await effect(changeVariant, change, {
      update: () => throwError(() => new ApiProblem('conflict')),
      read: () => of(theirs),
    });
    expect(outcome).toEqual(VariantsApiActions.conflictFound({ theirs }));
  });

  it('pass every other refusal on as it came', async () => {
    const problem = new ApiProblem('unusable-input');
    const outcome = await effect(
      retireVariant,
      VariantListPageActions.retirementConfirmed({ variant: variant('hatch'), retired: true }),
      { retire: () => throwError(() => problem) },
    );
    expect(outcome).toEqual(VariantsApiActions.refused({ problem }));
  });
});
