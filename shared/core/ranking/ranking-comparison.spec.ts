import { fiveVariants, SHORT_CYCLE, type RankingScenario } from '../../testing/ranking-scenario';
import { probabilityLowerOf } from './comparables';
import { DEFAULT_CHOICES } from './ranking-choices';
import { compareRankings } from './ranking-comparison';
import type { ResultInput } from './ranking-input';
import { buildRankingView } from './ranking-view-build';
import { dragStage, evidenceStage, reduceStage } from './ranking-view-stages';

const view = ({ inputs, context }: RankingScenario) =>
  buildRankingView(inputs, context, { ...DEFAULT_CHOICES, cycle: SHORT_CYCLE.key });

const withResults = (scenario: RankingScenario, results: readonly ResultInput[]): RankingScenario => ({
  ...scenario,
  inputs: { ...scenario.inputs, results },
});

/** The liftback measured anew, so much higher that it falls behind the hatch. */
function liftbackMeasuredAnew(scenario: RankingScenario, factor: number): RankingScenario {
  const own = scenario.inputs.results.find(({ id }) => id === 'r-liftback')!;
  const anew = {
    ...own,
    id: 'r-anew',
    name: 'VT-0040',
    testDate: '2026-11-20',
    points: own.points!.map((point) => ({ ...point, value: point.value! * factor })),
  };
  return withResults(scenario, [...scenario.inputs.results, anew]);
}

describe('two rankings compared', () => {
  it('say nothing where nothing changed', () => {
    const same = compareRankings(view(fiveVariants()), view(fiveVariants()));
    expect(same.changed).toBe(false);
    expect(same.moves.map(({ moved, places, shiftM2 }) => [moved, places, shiftM2])).toEqual(
      Array.from({ length: 5 }, () => [false, 0, 0]),
    );
    expect([same.probabilities, same.entering, same.leaving, same.exclusionsGained]).toEqual([
      [],
      [],
      [],
      [],
    ]);
  });

  it('name who moved by how many places, the figure and its uncertainty before and after', () => {
    const [before, after] = [view(fiveVariants()), view(liftbackMeasuredAnew(fiveVariants(), 1.095))];
    const { moves, changed } = compareRankings(before, after);
    const [first, second] = moves;
    expect(changed).toBe(true);
    expect([first?.name, first?.places, second?.name, second?.places]).toEqual(['Hatch', 1, 'Liftback', -1]);
    expect(second?.before?.figure).toEqual(before.rows[0]?.figure);
    expect(second?.after?.figure).toEqual(after.rows[1]?.figure);
    expect(second?.shiftM2).toBeCloseTo(0.095 * before.rows[0]!.figure.dragAreaM2, 12);
    expect([second?.before?.coefficient, second?.after?.coefficient]).toEqual([
      before.rows[0]?.onCommonArea.value,
      after.rows[1]?.onCommonArea.value,
    ]);
  });

  it('name the results that enter and leave the evidence', () => {
    const { entering, leaving } = compareRankings(
      view(fiveVariants()),
      view(liftbackMeasuredAnew(fiveVariants(), 1.01)),
    );
    expect(entering.map(({ variantName, evidence }) => [variantName, evidence.name])).toEqual([
      ['Liftback', 'VT-0040'],
    ]);
    expect(leaving.map(({ evidence }) => evidence.resultId)).toEqual(['r-liftback']);
  });

  it('give the probability of each pair of new neighbours before and after, as the ranking itself has it', () => {
    const changed = liftbackMeasuredAnew(fiveVariants(), 1.1);
    const { probabilities } = compareRankings(view(fiveVariants()), view(changed));
    const pair = probabilities.find(({ lowerId, higherId }) => `${lowerId} ${higherId}` === 'hatch liftback');
    const probabilityIn = ({ inputs, context }: RankingScenario): number => {
      const reduced = reduceStage(inputs, inputs.programme.referenceAir);
      const evidence = evidenceStage(inputs.variants, reduced, context, 'adopted', 'zero-yaw');
      const { set } = dragStage(evidence);
      return probabilityLowerOf(set, set.ids.indexOf('hatch'), set.ids.indexOf('liftback'));
    };
    expect(pair?.before).toBeCloseTo(probabilityIn(fiveVariants()), 12);
    expect(pair?.after).toBeCloseTo(probabilityIn(changed), 12);
    expect(pair!.before!).toBeLessThan(pair!.after);
  });

  it('list the brackets that come and go', () => {
    const before = view(fiveVariants());
    // 1.089 brings the liftback's drag area to within a count of the hatch's.
    const factor = (0.274 * 2.17) / (0.249 * 2.19);
    const { bracketsGained, bracketsLost } = compareRankings(
      before,
      view(liftbackMeasuredAnew(fiveVariants(), factor)),
    );
    expect(bracketsGained.map(({ names }) => [...names].sort().slice(0, 2))).toContainEqual([
      'Hatch',
      'Liftback',
    ]);
    expect(
      compareRankings(view(liftbackMeasuredAnew(fiveVariants(), factor)), before).bracketsGained,
    ).toEqual(bracketsLost);
  });

  it('keep a variant that is ranked on one side only, at the end and without a shift', () => {
    const without = withResults(
      fiveVariants(),
      fiveVariants().inputs.results.filter(({ variantId }) => variantId !== 'sport'),
    );
    const { moves, leaving } = compareRankings(view(fiveVariants()), view(without));
    expect(moves.at(-1)).toMatchObject({ name: 'Sport', after: null, shiftM2: null, places: 0, moved: true });
    expect(leaving.map(({ variantId }) => variantId)).toEqual(['sport']);
    const back = compareRankings(view(without), view(fiveVariants()));
    expect(back.moves.find(({ variantId }) => variantId === 'sport')?.before).toBeNull();
    const pair = back.probabilities.find(({ higherId }) => higherId === 'sport');
    expect(pair?.before).toBeNull();
  });

  it('list what is kept out anew, and what is let in', () => {
    const scenario = fiveVariants();
    const comparable = withResults(
      scenario,
      scenario.inputs.results.map((result) =>
        result.id === 'r-fixed'
          ? { ...result, condition: scenario.inputs.programme.referenceCondition }
          : result,
      ),
    );
    const { exclusionsLost, exclusionsGained } = compareRankings(view(scenario), view(comparable));
    expect(exclusionsLost.map(({ name }) => name)).toEqual(['VT-0003']);
    expect(exclusionsGained).toEqual([]);
  });
});
