import { TestBed } from '@angular/core/testing';
import { provideEffects } from '@ngrx/effects';
import { Store, provideStore } from '@ngrx/store';
import { NEVER, Subject, of, throwError } from 'rxjs';
import { DEFAULT_CHOICES } from '#shared/core/ranking/ranking-choices';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { buildRankingView } from '#shared/core/ranking/ranking-view-build';
import { fiveVariants } from '#shared/testing/ranking-scenario';
import { ApiProblem } from '../../core/api/api-problem';
import { provideRankings } from './provide-rankings';
import { RankingPageActions } from './rankings.actions';
import { RankingsApi } from './rankings-api';
import { VIEW_DEBOUNCE_MS } from './rankings.effects';
import { rankingsFeature } from './rankings.feature';
import { selectRankingView } from './rankings.selectors';

const sources = fiveVariants();
const view = buildRankingView(sources.inputs, sources.context, { ...DEFAULT_CHOICES, cycle: 'short' });

function storeOver(api: Partial<RankingsApi>) {
  TestBed.configureTestingModule({
    providers: [
      provideStore(),
      provideEffects(),
      provideRankings(),
      { provide: RankingsApi, useValue: { sources: () => NEVER, view: () => NEVER, ...api } },
    ],
  });
  const store = TestBed.inject(Store);
  return { store, state: store.selectSignal(rankingsFeature.selectRankingsState) };
}

describe('the ranking’s effects', () => {
  beforeEach(() => jest.useFakeTimers());
  afterEach(() => jest.useRealTimers());

  it('fetch the inputs once when the page opens, and nothing when the address changes', () => {
    const fetched = jest.fn(() => of(sources));
    const given = jest.fn(() => of(view));
    const { store, state } = storeOver({ sources: fetched, view: given });
    store.dispatch(RankingPageActions.opened({ programmeId: 'p', mode: 'computes', address: {} }));
    for (const area of ['2.1', '2.2', '2.3']) {
      store.dispatch(RankingPageActions.addressChanged({ address: { area } }));
    }
    jest.advanceTimersByTime(10 * VIEW_DEBOUNCE_MS);
    expect(fetched).toHaveBeenCalledTimes(1);
    expect(given).not.toHaveBeenCalled();
    expect(state().loading.kind).toBe('ready');
  });

  it('ask for the server’s view once a hand has come to rest, and take the answer to the latest choice', () => {
    const answers: Subject<RankingView>[] = [];
    const asked = jest.fn(() => {
      const answer = new Subject<RankingView>();
      answers.push(answer);
      return answer;
    });
    const { store } = storeOver({ view: asked as never });
    store.dispatch(RankingPageActions.opened({ programmeId: 'p', mode: 'is-given', address: {} }));
    store.dispatch(RankingPageActions.addressChanged({ address: { order: 'energy' } }));
    jest.advanceTimersByTime(VIEW_DEBOUNCE_MS);
    expect(asked.mock.calls).toEqual([['p', { order: 'energy' }]]);
    store.dispatch(RankingPageActions.addressChanged({ address: { area: '2' } }));
    jest.advanceTimersByTime(VIEW_DEBOUNCE_MS);
    answers[0]?.next({ ...view, commonAreaM2: 1 });
    answers[1]?.next({ ...view, commonAreaM2: 2 });
    expect(store.selectSignal(selectRankingView)()?.commonAreaM2).toBe(2);
  });

  it('fetch the inputs anew on an area in the address where they were refused without one', () => {
    const fetched = jest.fn();
    fetched
      .mockReturnValueOnce(throwError(() => new ApiProblem('unusable-input')))
      .mockReturnValueOnce(of(sources));
    const { store, state } = storeOver({ sources: fetched });
    store.dispatch(RankingPageActions.opened({ programmeId: 'p', mode: 'computes', address: {} }));
    store.dispatch(RankingPageActions.addressChanged({ address: { area: '2.25' } }));
    expect(fetched.mock.calls).toEqual([
      ['p', undefined],
      ['p', '2.25'],
    ]);
    expect(state().loading).toEqual({ kind: 'ready' });
  });

  it('keep a failure as a problem and try again when asked to', () => {
    const problem = new ApiProblem('not-ready');
    const fetched = jest.fn();
    fetched.mockReturnValueOnce(throwError(() => problem)).mockReturnValueOnce(of(sources));
    const { store, state } = storeOver({ sources: fetched });
    store.dispatch(RankingPageActions.opened({ programmeId: 'p', mode: 'computes', address: {} }));
    expect(state().loading).toEqual({ kind: 'failed', problem });
    store.dispatch(RankingPageActions.retryPressed());
    expect(state().loading).toEqual({ kind: 'ready' });
  });
});
