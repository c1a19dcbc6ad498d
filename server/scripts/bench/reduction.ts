import { reduceResults } from '#shared/core/reduction/reduce';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import type { BenchPart } from './bench-part';
import { bareReduction } from './reduction-bare';
import { benchProgramme } from './reduction-programme';
import { sideBySide } from './side-by-side';

const VARIANTS = 300;
const RESULTS = 5000;
const GOAL = 2;
/** The two sums are of the same numbers in another order. */
const AGREEMENT = 1e-9;

/** Everything that the bare loop adds up, taken from the product's own reductions. */
export function sumOfReductions(input: RankingInput): number {
  const { reductions } = reduceResults(input);
  let total = 0;
  for (const { output, windAverage } of reductions) {
    const { zeroYaw, mach, reynolds, windAveragedDragAreaM2, windAveragedStandardUncertaintyM2 } = output;
    total +=
      zeroYaw.dragAreaM2 +
      zeroYaw.expandedUncertaintyM2 +
      (windAveragedDragAreaM2 ?? NaN) +
      (windAveragedStandardUncertaintyM2 ?? NaN) +
      (mach ?? NaN) +
      1e-9 * (reynolds ?? NaN) +
      1e-6 * (windAverage.yaw?.otherPointsDegreesOfFreedom ?? NaN);
  }
  return total;
}

/** The whole reduction of a large programme's results, from readings to figures on both bases, in bare loops of its arithmetic. */
export const reduction: BenchPart = {
  name: 'reduction',
  run: () => {
    const input = benchProgramme(VARIANTS, RESULTS);
    const yardstick = bareReduction(input);
    const [found, expected] = [sumOfReductions(input), yardstick()];
    if (!(Math.abs(found / expected - 1) < AGREEMENT)) {
      throw new Error(`the bare loop computes something else: ${String(expected)}, not ${String(found)}`);
    }
    let [kept, total] = [0, 0];
    const { subjectMs, ratio } = sideBySide(
      () => {
        kept = reduceResults(input).reductions.length;
      },
      () => {
        total = yardstick();
      },
      30,
    );
    if (kept !== RESULTS || !(total > 0)) throw new Error('the reduction is not complete');
    return Promise.resolve([
      {
        what: `reducing ${String(RESULTS)} results of five angles each, with keys, steps and wind averages`,
        measured: `${subjectMs.toFixed(0)} ms, ${ratio.toFixed(2)} bare loops of the same arithmetic`,
        goal: { words: `at most ${String(GOAL)}`, met: ratio <= GOAL },
      },
    ]);
  },
};
