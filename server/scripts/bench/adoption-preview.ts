import { COVERAGE_PROBABILITY } from '#shared/core/constants';
import { probabilityLowerOf } from '#shared/core/ranking/comparables';
import { DEFAULT_CHOICES } from '#shared/core/ranking/ranking-choices';
import { compareRankings, type RankingComparison } from '#shared/core/ranking/ranking-comparison';
import type { ContextAdoption, RankingContext } from '#shared/core/ranking/ranking-context';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { buildRankingView, reducedForChoices } from '#shared/core/ranking/ranking-view-build';
import { dragStage, evidenceStage } from '#shared/core/ranking/ranking-view-stages';
import type { ReducedSet } from '#shared/core/reduction/reduce';
import { studentQuantile } from '#shared/core/uncertainty/student';
import type { BenchPart } from './bench-part';
import { bareReduction } from './reduction-bare';
import { benchProgramme } from './reduction-programme';
import { sideBySide } from './side-by-side';

const VARIANTS = 300;
const RESULTS = 5000;
/**
 * Nearly all of a preview's arithmetic is the reduction, which the screen has done when it opened; what is left is picking among
 * 5 000 results twice, naming 300 rows with some 2 500 amounts, brackets, and listing what moved. It is an answer at once, a tenth
 * of a second on one core, as long as it stays within this many bare loops of the whole.
 */
const GOAL = 10;

function contextOf(inputs: RankingInput, adoptions: readonly ContextAdoption[]): RankingContext {
  return {
    programme: {
      id: 'bench',
      name: 'Bench',
      commonArea: { kind: 'fixed', areaM2: inputs.programme.commonAreaM2 },
      characteristicLengthName: 'overall length',
      milestones: [],
    },
    variants: [],
    adoptions,
    setAside: [],
    included: [],
    policyNumber: 1,
    facilityVersions: [],
    correlations: [],
    sessions: [],
    cycles: [],
  };
}

/** Every variant but the first rests on its first result; the first is about to rest on the mean of all of its own. */
function adoptionsOf(
  inputs: RankingInput,
): readonly [before: readonly ContextAdoption[], after: readonly ContextAdoption[]] {
  const adoption = (variantId: string, resultIds: readonly string[]): ContextAdoption => ({
    id: variantId,
    variantId,
    resultIds,
    rule: resultIds.length > 1 ? 'weighted-mean' : 'newest',
    at: '2026-12-01T08:00:00Z',
    by: 'Ines',
  });
  const own = (variantId: string): readonly string[] =>
    inputs.results.filter((result) => result.variantId === variantId).map(({ id }) => id);
  const [first, ...others] = inputs.variants;
  if (first === undefined) throw new Error('there is no variant');
  const before = others.map(({ id }) => adoption(id, own(id).slice(0, 1)));
  return [before, [...before, adoption(first.id, own(first.id))]];
}

/**
 * The rankings' part of the yardstick: each figure's u, ν, Student factor and each neighbour's probability, before and after, in bare loops over flat
 * arrays laid out beforehand. It answers the sum of them all.
 */
function bareFigures(
  inputs: RankingInput,
  contexts: readonly RankingContext[],
  reduced: ReducedSet,
): () => number {
  const sets = contexts.map(
    (context) => dragStage(evidenceStage(inputs.variants, reduced, context, 'adopted', 'zero-yaw')).set,
  );
  return () => {
    let total = 0;
    for (const set of sets) {
      const { offsets, amounts, inverseNu, values } = set;
      for (let row = 0; row < values.length; row++) {
        let [variance, denominator] = [0, 0];
        for (let at = offsets[row] as number; at < (offsets[row + 1] as number); at++) {
          const square = (amounts[at] as number) ** 2;
          variance += square;
          denominator += square * square * (inverseNu[at] as number);
        }
        total +=
          studentQuantile(COVERAGE_PROBABILITY, (variance * variance) / denominator) * Math.sqrt(variance);
        if (row > 0) total += probabilityLowerOf(set, row - 1, row);
      }
    }
    return total;
  };
}

/** What an aerodynamicist waits for before an adoption is confirmed: the ranking with it beside the ranking without, what moved listed. */
export const adoptionPreview: BenchPart = {
  name: 'adoption-preview',
  run: () => {
    const inputs = benchProgramme(VARIANTS, RESULTS);
    const [before, after] = adoptionsOf(inputs).map((adoptions) => contextOf(inputs, adoptions)) as [
      RankingContext,
      RankingContext,
    ];
    const reduced = reducedForChoices(inputs, DEFAULT_CHOICES);
    const bareResults = bareReduction(inputs);
    const bareRankings = bareFigures(inputs, [before, after], reduced);
    let comparison: RankingComparison | undefined;
    let total = 0;
    const { subjectMs, ratio } = sideBySide(
      () => {
        comparison = compareRankings(
          buildRankingView(inputs, before, DEFAULT_CHOICES, reduced),
          buildRankingView(inputs, after, DEFAULT_CHOICES, reduced),
        );
      },
      () => {
        total = bareResults() + bareRankings();
      },
      30,
    );
    const moved = comparison?.moves.find(({ variantId }) => variantId === inputs.variants[0]?.id);
    if (comparison?.moves.length !== VARIANTS || moved?.after?.evidence.length === 1 || !(total > 0)) {
      throw new Error('the preview is not complete');
    }
    return Promise.resolve([
      {
        what: `previewing an adoption among ${String(VARIANTS)} variants and ${String(RESULTS)} results at the reference: both rankings, and what moves`,
        measured: `${subjectMs.toFixed(0)} ms, ${ratio.toFixed(1)} bare loops of the arithmetic from readings to figures`,
        goal: { words: `at most ${String(GOAL)}`, met: ratio <= GOAL },
      },
    ]);
  },
};
