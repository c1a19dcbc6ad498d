import type { Action } from '@ngrx/store';
import type { Adoption } from '#shared/contracts/adoptions';
import type { Result } from '#shared/contracts/results';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { ApiProblem } from '../../core/api/api-problem';
import { reducedEvidence } from './reduced-evidence';
import type { EvidenceAnswer } from './results-api';
import { ResultListPageActions, ResultPageActions, ResultsApiActions } from './results.actions';
import { type ResultsState, resultsFeature } from './results.feature';

const result = (id: string, change: Partial<Result> = {}): Result =>
  ({ id, variantId: 'hatch', adopted: false, ...change }) as Result;
const adoption = (resultId: string | undefined, variantId = 'hatch'): Adoption => ({
  id: `adoption of ${resultId}`,
  variantId,
  resultIds: resultId === undefined ? [] : [resultId],
  rule: 'newest',
  comment: 'seen',
  at: '2026-09-15T08:00:00Z',
  by: 'Ingrid Falk',
});
const answer = (change: Partial<EvidenceAnswer> = {}): EvidenceAnswer =>
  ({
    programme: {},
    results: [result('old', { adopted: true }), result('new')],
    adoptions: [adoption('old')],
    inputs: null,
    inputsProblem: null,
    ...change,
  }) as EvidenceAnswer;
const after = (...actions: Action[]): ResultsState =>
  actions.reduce<ResultsState>(
    (state, action) => resultsFeature.reducer(state, action),
    resultsFeature.reducer(undefined, { type: 'start' }),
  );
const opened = ResultListPageActions.opened({ programmeId: 'dunlin' });
const loaded = ResultsApiActions.loaded({ programmeId: 'dunlin', answer: answer() });

describe('the results’ slice', () => {
  it('shows a new adoption at once: one result per variant', () => {
    const state = after(
      opened,
      loaded,
      ResultsApiActions.decided({
        programmeId: 'dunlin',
        done: { kind: 'adopted', adoptions: [adoption('new')] },
      }),
    );
    expect(state.results.map(({ id, adopted }) => [id, adopted])).toEqual([
      ['old', false],
      ['new', true],
    ]);
    expect(resultsFeature.selectStanding({ results: state }).get('hatch')?.resultIds).toEqual(['new']);
  });

  it('takes a released adoption for none', () => {
    const state = after(
      opened,
      loaded,
      ResultsApiActions.decided({
        programmeId: 'dunlin',
        done: { kind: 'adopted', adoptions: [adoption(undefined)] },
      }),
    );
    expect(state.results.some(({ adopted }) => adopted)).toBe(false);
    expect(resultsFeature.selectStanding({ results: state }).get('hatch')).toBeUndefined();
  });

  it('takes no late answer for another programme', () => {
    const state = after(opened, loaded, ResultPageActions.opened({ programmeId: 'other' }), loaded);
    expect(state.results).toEqual([]);
  });

  it('keeps a refusal until it was seen', () => {
    const problem = new ApiProblem('conflict');
    const refused = after(opened, loaded, ResultsApiActions.refused({ problem }));
    expect(refused.deed).toEqual({ kind: 'refused', problem });
    expect(resultsFeature.reducer(refused, ResultPageActions.outcomeSeen()).deed).toEqual({ kind: 'none' });
  });
});

describe('reducedEvidence', () => {
  it('says what refuses the whole set instead of failing', () => {
    const inputs = {
      programme: { referenceSpeedKmh: 120, referenceAir: { state: 'nowhere' }, characteristicLengthM: 4.5 },
      facilities: [],
      variants: [],
      results: [],
    } as unknown as RankingInput;
    expect(reducedEvidence(inputs).refusal?.code).toBe('unknown-air-state');
  });

  it('reduces nothing without inputs', () => {
    expect(reducedEvidence(null).reductions.size).toBe(0);
  });
});
