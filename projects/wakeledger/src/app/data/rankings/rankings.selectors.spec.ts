import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { Store, provideStore } from '@ngrx/store';
import { provideEffects } from '@ngrx/effects';
import { DEFAULT_CHOICES, queryOfChoices } from '#shared/core/ranking/ranking-choices';
import { buildRankingView } from '#shared/core/ranking/ranking-view-build';
import { fiveVariants, manyVariants } from '#shared/testing/ranking-scenario';
import { provideRankings } from './provide-rankings';
import { RankingPageActions, RankingsApiActions } from './rankings.actions';
import {
  selectDrag,
  selectEnergy,
  selectEvidence,
  selectRankingRefusal,
  selectRankingView,
  selectReduced,
} from './rankings.selectors';

const PROGRAMME = '11111111-1111-4111-8111-111111111111';

function openedStore(sources = fiveVariants()) {
  TestBed.configureTestingModule({
    providers: [
      provideStore(),
      provideEffects(),
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRankings(),
    ],
  });
  const store = TestBed.inject(Store);
  store.dispatch(
    RankingPageActions.opened({ programmeId: PROGRAMME, mode: 'computes', address: { cycle: 'short' } }),
  );
  store.dispatch(RankingsApiActions.sourcesLoaded({ programmeId: PROGRAMME, sources }));
  const http = TestBed.inject(HttpTestingController);
  const read = <T>(selector: (state: object) => T): T => store.selectSignal(selector)();
  const move = (address: Record<string, string>) =>
    store.dispatch(RankingPageActions.addressChanged({ address: { cycle: 'short', ...address } }));
  return { store, http, read, move };
}

describe('the ranking that the browser works out', () => {
  it('is the one that the core builds for the choices in the address', () => {
    const sources = fiveVariants();
    const { read, move } = openedStore(sources);
    const choices = { ...DEFAULT_CHOICES, cycle: 'short', order: 'energy', confidence: 0.99 } as const;
    move(Object.fromEntries(Object.entries(queryOfChoices(choices)).filter(([, text]) => text)) as never);
    expect(read(selectRankingView)).toEqual(buildRankingView(sources.inputs, sources.context, choices));
  });

  it.each([
    ['area', { area: '2.4' }, [selectReduced, selectEvidence, selectDrag, selectEnergy]],
    ['confidence', { confidence: '0.8' }, [selectReduced, selectEvidence, selectDrag, selectEnergy]],
    ['order', { order: 'energy' }, [selectReduced, selectEvidence, selectDrag, selectEnergy]],
    ['configuration', { configuration: 'Petrol' }, [selectReduced, selectEvidence, selectDrag]],
    ['basis', { basis: 'wind-averaged' }, [selectReduced]],
    ['evidence', { evidence: 'newest' }, [selectReduced]],
  ] as const)('leaves alone what %s does not touch', (_name, address, untouched) => {
    const { read, move } = openedStore();
    read(selectRankingView);
    const before = untouched.map((selector) => read(selector as (state: object) => unknown));
    move(address);
    read(selectRankingView);
    untouched.forEach((selector, index) => {
      expect(read(selector as (state: object) => unknown)).toBe(before[index]);
    });
  });

  it('re-ranks 300 variants at every control without a request', async () => {
    const { http, read, move } = openedStore(manyVariants(300));
    // The two that opening the page sends; answers come from the action above.
    http.match(() => true);
    expect(read(selectRankingView)?.rows).toHaveLength(300);
    const times: Record<string, number> = {};
    const moves: Record<string, Record<string, string>> = {
      order: { order: 'energy' },
      area: { area: '2.2' },
      air: { air: 'sae-j2263' },
      evidence: { evidence: 'newest' },
      basis: { basis: 'wind-averaged' },
      configuration: { configuration: 'Electric' },
      cycle: { cycle: 'other' },
      confidence: { confidence: '0.8' },
    };
    for (const [name, address] of Object.entries(moves)) {
      const began = performance.now();
      move(address);
      expect(read(selectRankingView)?.rows).toHaveLength(300);
      times[name] = performance.now() - began;
      move({});
      read(selectRankingView);
    }
    await new Promise((resolve) => setTimeout(resolve, 300));
    expect(http.match(() => true)).toEqual([]);
    // Generous, for a loaded machine: a hand on a control must not wait.
    expect(Math.max(...Object.values(times))).toBeLessThan(1500);
  });

  it('is replaced by the words of a refusal where the method refuses all of it', () => {
    const { inputs, context } = fiveVariants();
    const [first] = inputs.results;
    const doubled = { ...inputs, results: [...inputs.results, ...(first ? [first] : [])] };
    const { read } = openedStore({ inputs: doubled, context });
    expect(read(selectRankingView)).toBeNull();
    expect(read(selectReduced)).toMatchObject({ code: 'duplicate-id' });
  });

  it('is replaced by the words of a refusal where a weighted mean has nothing to weigh with', () => {
    const { inputs, context } = fiveVariants();
    const [result] = inputs.results;
    if (!result) throw new Error('the scenario has results');
    const exact = { ...result, points: [{ value: 0.25, s: 0, n: 2 }], installationId: 'one' };
    const twice = [exact, { ...exact, id: 'again' }];
    const adopted = {
      id: 'adopted',
      variantId: result.variantId,
      at: '2031-03-01T09:00:00+00:00',
      by: 'Ines Quill',
      rule: 'weighted-mean' as const,
      resultIds: twice.map(({ id }) => id),
    };
    const { read, move } = openedStore({
      inputs: { ...inputs, results: [...twice, ...inputs.results.filter(({ id }) => id !== result.id)] },
      context: { ...context, adoptions: [adopted] },
    });
    move({ evidence: 'adopted' });
    expect(read(selectRankingView)).toBeNull();
    expect(read(selectRankingRefusal)).toMatchObject({ code: 'uncertainty-zero' });
  });
});
