import { rankByEnergy } from '#shared/core/ranking/energy-ranking';
import { bareLoop, BENCH_DENSITY_KG_M3, benchCycle, benchFleet, loadedFleet } from './core-fleet';
import type { BenchPart } from './bench-part';
import { sideBySide } from './side-by-side';

const VARIANTS = 1000;
const GOAL = 3;

/**
 * What a screen does when a control of the energy ranking moves: energies with exchange rates, uncertainties by key,
 * order, brackets and neighbours' probabilities; measured in bare loops over the same variants and cycle.
 */
export const coreRanking: BenchPart = {
  name: 'core-ranking',
  run: () => {
    const fleet = benchFleet(VARIANTS);
    const conditions = { cycle: benchCycle(), airDensityKgM3: BENCH_DENSITY_KG_M3 };
    let neighbours = 0;
    let total = 0;
    const yardstick = bareLoop(conditions.cycle, loadedFleet(fleet));
    const { subjectMs, ratio } = sideBySide(
      () => {
        neighbours = rankByEnergy(fleet, conditions, 0.95).energyProbabilityLowerThanNext.length;
      },
      () => {
        total = yardstick();
      },
    );
    if (neighbours !== VARIANTS - 1 || !(total > 0)) throw new Error('the ranking is not complete');
    return Promise.resolve([
      {
        what: `ranking ${VARIANTS} variants on an ${conditions.cycle.durationS} s cycle with keyed uncertainties and separability`,
        measured: `${subjectMs.toFixed(1)} ms, ${ratio.toFixed(2)} bare loops`,
        goal: { words: `under ${GOAL}`, met: ratio < GOAL },
      },
    ]);
  },
};
