import { TestBed } from '@angular/core/testing';
import { provideEffects } from '@ngrx/effects';
import { Store, provideStore } from '@ngrx/store';
import { NEVER } from 'rxjs';
import type { JudgementChange } from '#shared/contracts/proposals';
import { fiveVariants, type RankingScenario } from '#shared/testing/ranking-scenario';
import { provideRankings } from '../../../data/rankings/provide-rankings';
import {
  RankingPageActions,
  RankingsApiActions,
  TryingActions,
} from '../../../data/rankings/rankings.actions';
import { RankingsApi } from '../../../data/rankings/rankings-api';
import { selectRankingView } from '../../../data/rankings/rankings.selectors';
import { FigureDerivations } from './figure-derivations';

/** The five variants, of which one rests on the weighted mean of two results. */
function withWeightedMean(variantId: string): RankingScenario {
  const { inputs, context } = fiveVariants();
  const first = inputs.results.find((result) => result.variantId === variantId);
  if (!first) throw new Error('The variant has no result.');
  const second = { ...first, id: 'second', name: 'Second entry', sessionId: 'winter' };
  const adoption = {
    id: 'adoption',
    variantId,
    resultIds: [first.id, second.id],
    rule: 'weighted-mean' as const,
    at: '2026-03-01T09:00:00+00:00',
    by: 'Ines Quill',
  };
  return {
    inputs: { ...inputs, results: [...inputs.results, second] },
    context: { ...context, adoptions: [adoption] },
  };
}

function derive(
  kind: Parameters<FigureDerivations['of']>[0],
  basis = 'zero-yaw',
  sources: RankingScenario = fiveVariants(),
  changes: readonly JudgementChange[] = [],
) {
  TestBed.configureTestingModule({
    providers: [
      provideStore(),
      provideEffects(),
      provideRankings(),
      { provide: RankingsApi, useValue: { sources: () => NEVER, view: () => NEVER } },
    ],
  });
  const store = TestBed.inject(Store);
  const address = { cycle: 'short', basis };
  store.dispatch(RankingPageActions.opened({ programmeId: 'p', mode: 'computes', address }));
  store.dispatch(RankingsApiActions.sourcesLoaded({ programmeId: 'p', sources }));
  store.dispatch(TryingActions.changed({ programmeId: 'p', changes }));
  const view = store.selectSignal(selectRankingView)();
  const row = view?.rows.find(({ variantId }) => variantId === 'sport');
  if (!view || !row) throw new Error('There is no ranking.');
  return { row, derivation: TestBed.inject(FigureDerivations).of(kind, row, view) };
}

describe('the derivation of a figure, for those who hold the inputs', () => {
  it('goes down to the raw reading, and its last drag area is the figure', () => {
    const { row, derivation } = derive('drag-area');
    expect(derivation.steps.some(({ values }) => values.shown.includes('0.287'))).toBe(true);
    expect(derivation.steps.every(({ formulaText, source, method }) => formulaText && source && method)).toBe(
      true,
    );
    const full = derivation.steps.find(({ method }) => method === 'full-scale-drag-area@1');
    expect(Number.parseFloat(full?.result.plain ?? '')).toBeCloseTo(row.figure.dragAreaM2, 6);
  });

  it('says so where something is tried on the ranking, and carries the budget with degrees of freedom', () => {
    const change = { kind: 'facility', facilityId: 'belt', biasURelative: 0.02 } as const;
    const { derivation } = derive('drag-area', 'zero-yaw', fiveVariants(), [change]);
    expect(derivation.summary).toMatch(/^Tried, not saved\. Sport/);
    TestBed.resetTestingModule();
    expect(derive('drag-area').derivation.summary).toMatch(/^Sport/);
    const bias = derivation.budget.find(({ label }) => label.startsWith('facility bias'));
    expect(bias).toMatchObject({ freedom: '∞' });
    expect(bias?.share).toBeGreaterThan(0.5);
  });

  it('ends in the wind average on that basis, but energy keeps to zero yaw', () => {
    expect(derive('drag-area', 'wind-averaged').derivation.steps.map(({ method }) => method)).toContain(
      'wind-averaged-drag-area@1',
    );
    TestBed.resetTestingModule();
    const methods = derive('energy', 'wind-averaged').derivation.steps.map(({ method }) => method);
    expect(methods).not.toContain('wind-averaged-drag-area@1');
    expect(methods).toContain('cycle-energy-gtr-15@1');
  });

  it('ends in the coefficient on the area asked for', () => {
    expect(derive('common-area').derivation.steps.at(-1)?.method).toBe('common-area-coefficient@1');
    TestBed.resetTestingModule();
    expect(derive('own-area').derivation.steps.at(-1)?.method).toBe('own-area-coefficient@1');
  });

  it('of a weighted mean goes down to the readings of every result, and says how they agree', () => {
    const { row, derivation } = derive('drag-area', 'zero-yaw', withWeightedMean('sport'));
    const steps = derivation.steps.map(({ method }) => method);
    expect(steps.filter((method) => method === 'full-scale-drag-area@1')).toHaveLength(2);
    expect(steps).toContain('birge-ratio@1');
    const mean = derivation.steps.find(({ method }) => method === 'weighted-mean@1');
    expect(Number.parseFloat(mean?.result.plain ?? '')).toBeCloseTo(row.figure.dragAreaM2, 6);
  });
});
