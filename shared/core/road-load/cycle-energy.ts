import { DEFAULT_ROTATING_FACTOR, JOULES_PER_WATT_HOUR, KILO } from '../constants';
import type { PreparedCycle } from '../cycles/cycle';
import type { RoadLoad } from './road-load';

/** Energies at the wheel over one run of a cycle [J], and its distance [m]. */
export interface CycleEnergy {
  /** Σ F·d over the steps with F > 0. */
  readonly wheelEnergyJ: number;
  /** Σ |F|·d over the steps with F < 0. */
  readonly brakingEnergyJ: number;
  readonly distanceM: number;
}

/** Energy [J] over distance [m] as Wh over km. */
export function whPerKm(energyJ: number, distanceM: number): number {
  return (energyJ / JOULES_PER_WATT_HOUR / distanceM) * KILO;
}

/**
 * Demand of a cycle at the wheel: F_i = f0 + f1·v̄ + f2·v̄² + k·m·a, summed over F > 0 and F < 0 apart.
 * One pass, no allocation but the answer. Mass in kg, k dimensionless.
 *
 * Source: UN GTR No. 15, Annex 7, paragraph 5 (memory of the printed equation; the figures agree).
 */
export function cycleEnergy(
  cycle: PreparedCycle,
  load: RoadLoad,
  massKg: number,
  rotatingFactor: number = DEFAULT_ROTATING_FACTOR,
): CycleEnergy {
  const { meanSpeedKmh, accelerationMs2, stepDistanceM } = cycle.byAcceleration;
  const { steps } = cycle;
  const { f0N, f1NPerKmh, f2NPerKmh2 } = load;
  const inertiaKg = rotatingFactor * massKg;
  let wheelEnergyJ = 0;
  let brakingEnergyJ = 0;
  for (let i = 0; i < steps; i++) {
    const speed = meanSpeedKmh[i] as number;
    const force = f0N + speed * (f1NPerKmh + speed * f2NPerKmh2) + inertiaKg * (accelerationMs2[i] as number);
    const work = force * (stepDistanceM[i] as number);
    if (work > 0) wheelEnergyJ += work;
    else brakingEnergyJ -= work;
  }
  return { wheelEnergyJ, brakingEnergyJ, distanceM: cycle.distanceM };
}
