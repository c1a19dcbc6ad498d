import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideEffects } from '@ngrx/effects';
import { Store, provideStore } from '@ngrx/store';
import type { JudgementChange } from '#shared/contracts/proposals';
import { fiveVariants } from '#shared/testing/ranking-scenario';
import { provideRankings } from './provide-rankings';
import { RankingPageActions, RankingsApiActions, TryingActions } from './rankings.actions';
import {
  selectRankingRefusal,
  selectRankingView,
  selectTriedComparison,
  selectTriedRankings,
  selectWithoutSubject,
} from './rankings.selectors';

const PROGRAMME = '11111111-1111-4111-8111-111111111111';
const OTHER = '22222222-2222-4222-8222-222222222222';
const OFF: JudgementChange = { kind: 'friction-line', frictionLine: 'on' };
const LIMITS: JudgementChange = { kind: 'policies', values: { frictionShare: 0.12, frictionShareU: 0.06 } };

function opened(programmeId = PROGRAMME, mode: 'computes' | 'is-given' = 'computes') {
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
  store.dispatch(RankingPageActions.opened({ programmeId, mode, address: { cycle: 'short' } }));
  if (mode === 'computes') {
    store.dispatch(RankingsApiActions.sourcesLoaded({ programmeId, sources: fiveVariants() }));
  }
  const read = <T>(selector: (state: object) => T): T => store.selectSignal(selector)();
  const hold = (...changes: readonly JudgementChange[]) =>
    store.dispatch(TryingActions.changed({ programmeId, changes }));
  return { read, hold, http: TestBed.inject(HttpTestingController) };
}

describe('a change that is tried on the ranking', () => {
  beforeEach(() => sessionStorage.clear());

  it('moves the ranking at once, says what moved and asks the server nothing', () => {
    const { read, hold, http } = opened();
    const before = read(selectRankingView);
    expect(read(selectTriedComparison)).toBeNull();
    http.match(() => true);
    hold(OFF, LIMITS);
    const after = read(selectRankingView);
    expect(after?.rows[0]?.figure.dragAreaM2).not.toBe(before?.rows[0]?.figure.dragAreaM2);
    expect(read(selectTriedRankings)).toEqual({ before, after });
    expect(read(selectTriedComparison)).toMatchObject({ changed: true });
    http.verify();
    hold();
    expect(read(selectRankingView)).toEqual(before);
    expect(read(selectTriedComparison)).toBeNull();
  });

  it('outlives a reload of the page, in its own programme only', () => {
    opened().hold(OFF);
    TestBed.resetTestingModule();
    expect(opened().read(selectTriedComparison)).not.toBeNull();
    TestBed.resetTestingModule();
    expect(opened(OTHER).read(selectTriedComparison)).toBeNull();
  });

  it('is not recalled from what cannot be read, nor by those who are given the ranking', () => {
    sessionStorage.setItem(`wakeledger.tried.${PROGRAMME}`, '[{"kind":"sabotage"}]');
    expect(opened().read(selectTriedComparison)).toBeNull();
    TestBed.resetTestingModule();
    sessionStorage.setItem(`wakeledger.tried.${PROGRAMME}`, JSON.stringify([OFF]));
    expect(opened(PROGRAMME, 'is-given').read(selectTriedRankings)).toBeNull();
  });

  it('is named where its subject is gone, and does nothing', () => {
    const { read, hold } = opened();
    const gone: JudgementChange = { kind: 'bring-back', resultId: OTHER };
    hold(gone);
    expect(read(selectWithoutSubject)).toEqual([gone]);
    expect(read(selectTriedComparison)).toMatchObject({ changed: false });
    expect(read(selectRankingRefusal)).toBeNull();
  });
});
