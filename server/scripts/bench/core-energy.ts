import { cycleEnergy } from '#shared/core/road-load/cycle-energy';
import { energiesOnCycle } from '#shared/core/road-load/energies-on-cycle';
import { bareLoop, BENCH_DENSITY_KG_M3, benchCycle, benchFleet, loadedFleet } from './core-fleet';
import type { BenchLine, BenchPart } from './bench-part';
import { sideBySide } from './side-by-side';

const VARIANTS = 1000;
const GOAL = 0.7;

/** Variant-seconds per second of the energy calculation, beside a bare typed-array loop doing the same arithmetic. */
export const coreEnergy: BenchPart = {
  name: 'core-energy',
  run: () => {
    const cycle = benchCycle();
    const vehicles = loadedFleet(benchFleet(VARIANTS));
    const yardstick = bareLoop(cycle, vehicles);
    // Sums are kept and compared: the same work was done, and none of it was optimised away.
    let bare = 0;
    let kept = 0;
    const bareWork = (): void => {
      bare = yardstick();
    };
    const oneByOne = (): void => {
      kept = 0;
      for (const { load, massKg } of vehicles) {
        const { wheelEnergyJ, brakingEnergyJ } = cycleEnergy(cycle, load, massKg);
        kept += wheelEnergyJ - brakingEnergyJ;
      }
    };
    const together = (): void => {
      const { wheelEnergyJ, brakingEnergyJ } = energiesOnCycle(cycle, vehicles, BENCH_DENSITY_KG_M3);
      kept = wheelEnergyJ.reduce((sum, wheel, i) => sum + wheel - (brakingEnergyJ[i] as number), 0);
    };

    const line = (what: string, work: () => void): BenchLine & { readonly speed: number } => {
      const { subjectMs, ratio } = sideBySide(work, bareWork);
      if (Math.abs(kept / bare - 1) > 1e-9) throw new Error(`${what} does not agree with the bare loop`);
      const perSecond = (VARIANTS * cycle.durationS) / (subjectMs / 1000);
      const speed = 1 / ratio;
      return {
        what,
        measured: `${(perSecond / 1e6).toFixed(0)} million variant-seconds per second, ${speed.toFixed(2)} of the bare loop`,
        speed,
      };
    };
    const energy = line('energy of one variant at a time', oneByOne);
    return Promise.resolve([
      { ...energy, goal: { words: `at least ${GOAL}`, met: energy.speed >= GOAL } },
      // More arithmetic than the bare loop does, which has no exchange rate: for information.
      line('energy with its exchange rate, all variants together', together),
    ]);
  },
};
