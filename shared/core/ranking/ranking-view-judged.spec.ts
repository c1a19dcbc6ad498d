import { fiveVariants, type RankingScenario } from '../../testing/ranking-scenario';
import { DEFAULT_CHOICES } from './ranking-choices';
import type { AdjustmentInput, CorrelationInput, RankingInput } from './ranking-input';
import { buildRankingView } from './ranking-view-build';

const GROUND: AdjustmentInput = {
  id: 'floor',
  name: 'Fixed floor to belt',
  item: 'ground',
  fromValue: 'fixed-floor',
  toValue: 'one-belt',
  deltaDragAreaM2: 0.011,
  uM2: 0.004,
};
const CORRELATION: CorrelationInput = {
  id: 'v2',
  name: 'Belt to road, version 2, in use since 2026-05-01',
  facilityId: 'belt',
  referenceFacilityId: 'home',
  pairs: [0.2, 0.5, 0.8, 1.1, 1.4].map((x, i) => ({
    dragAreaM2: x,
    uM2: 0.004,
    referenceDragAreaM2: x + (i % 2 === 0 ? 0.03 : -0.01),
    referenceUM2: 0.003,
  })),
};

const shown = ({ inputs, context }: RankingScenario, changes: Partial<RankingInput>) =>
  buildRankingView({ ...inputs, ...changes }, context, {
    ...DEFAULT_CHOICES,
    cycle: 'short',
    evidence: 'newest',
  });

describe('what was judged, in the ranking as it is shown', () => {
  it('brings a result in that an adjustment fits, and names the adjustment in its budget', () => {
    const scenario = fiveVariants();
    const fixed = scenario.inputs.results.find(({ name }) => name === 'VT-0003')!;
    const only = {
      results: scenario.inputs.results.filter(
        ({ variantId, id }) => variantId !== fixed.variantId || id === fixed.id,
      ),
    };
    expect(shown(scenario, only).stayedOut.map(({ resultId }) => resultId)).toContain(fixed.id);
    const view = shown(scenario, { ...only, adjustments: [GROUND] });
    expect(view.stayedOut.map(({ resultId }) => resultId)).not.toContain(fixed.id);
    const row = view.rows.find(({ variantId }) => variantId === fixed.variantId);
    expect(row?.contributions.find(({ kind }) => kind === 'adjustment')?.of).toBe('Fixed floor to belt');
  });

  it('says of a result that stayed out only what nothing answers for', () => {
    const scenario = fiveVariants();
    const results = scenario.inputs.results.map((result) =>
      result.name === 'VT-0003'
        ? { ...result, condition: { ...result.condition, wheels: 'stationary' } }
        : result,
    );
    const itemsOf = (changes: Partial<RankingInput>) =>
      shown(scenario, { results, ...changes })
        .stayedOut.find(({ name }) => name === 'VT-0003')
        ?.rules.flatMap(({ items }) => items.map(({ item }) => item));
    const both = itemsOf({});
    expect(both).toContain('ground');
    expect(itemsOf({ adjustments: [GROUND] })).toEqual(both?.filter((item) => item !== 'ground'));
  });

  it('names the version and the date of a correlation in the budget, and the body that its scatter belongs to', () => {
    const scenario = fiveVariants();
    const view = shown(scenario, {
      programme: { ...scenario.inputs.programme, referenceFacilityId: 'home' },
      facilities: [...scenario.inputs.facilities, { id: 'home', name: 'Home', kind: 'road', biasUM2: 0.003 }],
      correlations: [CORRELATION],
    });
    const budget = view.rows[0]?.contributions ?? [];
    expect(budget.find(({ kind }) => kind === 'correlation-level')?.of).toBe(CORRELATION.name);
    expect(budget.find(({ kind }) => kind === 'facility-bias')?.of).toBe('Home');
    const scatter = budget.find(({ kind }) => kind === 'correlation-scatter');
    expect(scatter?.of).toBe(`${CORRELATION.name}, ${view.rows[0]?.name}`);
  });
});
