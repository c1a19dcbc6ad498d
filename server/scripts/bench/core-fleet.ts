import { DEFAULT_ROTATING_FACTOR } from '#shared/core/constants';
import { prepareCycle, type PreparedCycle } from '#shared/core/cycles/cycle';
import type { EnergyCandidate } from '#shared/core/ranking/energy-ranking';
import { roadLoadOf } from '#shared/core/road-load/road-load';
import type { LoadedVehicle } from '#shared/core/road-load/energies-on-cycle';
import { keyedFigureOf } from '#shared/core/uncertainty/budget';
import { uniformNumbers } from '#shared/core/uncertainty/sfc32';
import { builtInCycle } from '../../../seeds/reference/cycles/built-in-cycles';

/** The 1 800 s cycle that the core's benchmarks run on. */
export const benchCycle = (): PreparedCycle => prepareCycle(builtInCycle('wltc-class-3b'));
export const BENCH_DENSITY_KG_M3 = 1.189;

/**
 * Invented variants as they are in a programme: three facilities, a session for every ten variants, an installation for
 * every one; drag areas so close that most neighbours need their keys to be told apart.
 */
export function benchFleet(count: number): readonly EnergyCandidate[] {
  const uniform = uniformNumbers(20);
  return Array.from({ length: count }, (_, i) => {
    const id = `v${String(i).padStart(4, '0')}`;
    const dragAreaM2 = 0.56 + 0.14 * uniform();
    const facility = i % 3;
    return {
      variant: {
        id,
        frontalAreaM2: 2.1 + 0.3 * uniform(),
        massKg: 1350 + 500 * uniform(),
        rollingResistance: 0.008 + 0.002 * uniform(),
      },
      zeroYaw: keyedFigureOf({
        dragAreaM2,
        contributions: [
          { key: `facility:f${facility}`, amountM2: 0.01 * dragAreaM2 },
          { key: `session:s${facility}-${Math.floor(i / 10)}`, amountM2: 0.003, degreesOfFreedom: 9 },
          { key: `installation:${id}`, amountM2: 0.002, degreesOfFreedom: 5 },
          { key: `repeatability:${id}`, amountM2: 0.001 * (1 + uniform()), degreesOfFreedom: 4 },
          { key: `blockage:f${facility}`, amountM2: 0.002 * dragAreaM2 },
        ],
      }),
    };
  });
}

/** The same variants as the cycle sees them. */
export const loadedFleet = (fleet: readonly EnergyCandidate[]): readonly LoadedVehicle[] =>
  fleet.map(({ variant, zeroYaw }) => {
    const vehicle = { massKg: variant.massKg ?? NaN, rollingResistance: variant.rollingResistance };
    return {
      load: roadLoadOf(vehicle, zeroYaw.dragAreaM2, BENCH_DENSITY_KG_M3),
      massKg: vehicle.massKg,
    };
  });

/**
 * The yardstick: a bare loop over typed arrays with the arithmetic of the energy and nothing around it, written out on its
 * own. It answers wheel less braking energy, so that no compiler may leave the work out.
 */
function bareEnergy(
  f0: number,
  f1: number,
  f2: number,
  inertia: number,
  speed: Float64Array,
  acceleration: Float64Array,
  distance: Float64Array,
): number {
  let wheel = 0;
  let braking = 0;
  for (let i = 0; i < speed.length; i++) {
    const v = speed[i] as number;
    const force = f0 + v * (f1 + v * f2) + inertia * (acceleration[i] as number);
    const work = force * (distance[i] as number);
    if (work > 0) wheel += work;
    else braking -= work;
  }
  return wheel - braking;
}

/** The bare loop over a fleet, its columns laid out beforehand; it answers the sum over all. */
export function bareLoop(cycle: PreparedCycle, vehicles: readonly LoadedVehicle[]): () => number {
  const { meanSpeedKmh, accelerationMs2, stepDistanceM } = cycle;
  const f0 = Float64Array.from(vehicles, ({ load }) => load.f0N);
  const f1 = Float64Array.from(vehicles, ({ load }) => load.f1NPerKmh);
  const f2 = Float64Array.from(vehicles, ({ load }) => load.f2NPerKmh2);
  const inertia = Float64Array.from(vehicles, ({ massKg }) => DEFAULT_ROTATING_FACTOR * massKg);
  return () => {
    let total = 0;
    for (let n = 0; n < f0.length; n++) {
      total += bareEnergy(
        f0[n] as number,
        f1[n] as number,
        f2[n] as number,
        inertia[n] as number,
        meanSpeedKmh,
        accelerationMs2,
        stepDistanceM,
      );
    }
    return total;
  };
}
