import { DEFAULT_ROTATING_FACTOR, EXCHANGE_RATE_STEP_M2 } from '../constants';
import type { PreparedCycle, StepsByAcceleration } from '../cycles/cycle';
import { f2OfDragArea, type RoadLoad } from './road-load';

/** A vehicle as a cycle sees it. */
export interface LoadedVehicle {
  readonly load: RoadLoad;
  readonly massKg: number;
}

/** Energies of many vehicles on one cycle: one entry a vehicle, in the order in which they came. */
export interface EnergiesOnCycle {
  /** Σ F·d over F > 0 [J]. */
  readonly wheelEnergyJ: Float64Array;
  /** Σ |F|·d over F < 0 [J]. */
  readonly brakingEnergyJ: Float64Array;
  /** Central difference of the wheel energy by the drag area at ±0.001 m² [J/m²]. */
  readonly exchangeRateJPerM2: Float64Array;
  readonly distanceM: number;
}

/** Work [J] in each step that a drag area of EXCHANGE_RATE_STEP_M2 costs in air of a density [kg/m³]. */
function workOfStepInDragArea(
  { meanSpeedKmh, stepDistanceM }: StepsByAcceleration,
  airDensityKgM3: number,
): Float64Array {
  const f2 = f2OfDragArea(EXCHANGE_RATE_STEP_M2, airDensityKgM3);
  return meanSpeedKmh.map((speed, i) => f2 * speed * speed * (stepDistanceM[i] as number));
}

/** Steps [0, drivenBefore) drive every vehicle of a fleet, steps [brakedFrom, steps) brake every one. */
interface CommonSigns {
  readonly drivenBefore: number;
  readonly brakedFrom: number;
  /** Work [J] of 0.001 m² over the driven steps: half the central difference of any vehicle there. */
  readonly drivenChangeJ: number;
}

const least = (values: readonly number[]): number => values.reduce((a, b) => Math.min(a, b), Infinity);
const most = (values: readonly number[]): number => values.reduce((a, b) => Math.max(a, b), -Infinity);

/**
 * In the order of acceleration the first steps drive and the last ones brake whatever the vehicle. Bounds over the fleet say
 * how far that holds with 0.001 m² to spare: speeds are never below 0, and rounding keeps the order of equal expressions.
 */
function commonSigns(
  { meanSpeedKmh, accelerationMs2, stepDistanceM }: StepsByAcceleration,
  changeJ: Float64Array,
  vehicles: readonly LoadedVehicle[],
  rotatingFactor: number,
): CommonSigns {
  const column = (of: (vehicle: LoadedVehicle) => number): readonly [least: number, most: number] => {
    const values = vehicles.map(of);
    return [least(values), most(values)];
  };
  const f0 = column(({ load }) => load.f0N);
  const f1 = column(({ load }) => load.f1NPerKmh);
  const f2 = column(({ load }) => load.f2NPerKmh2);
  const inertia = column(({ massKg }) => rotatingFactor * massKg);
  const workBound = (i: number, side: 0 | 1): number => {
    const speed = meanSpeedKmh[i] as number;
    const acceleration = accelerationMs2[i] as number;
    const heavyOrLight = acceleration < 0 ? inertia[1 - side] : inertia[side];
    const force = f0[side] + speed * (f1[side] + speed * f2[side]) + (heavyOrLight as number) * acceleration;
    return force * (stepDistanceM[i] as number);
  };
  const steps = changeJ.length;
  let drivenBefore = 0;
  let drivenChangeJ = 0;
  while (drivenBefore < steps && workBound(drivenBefore, 0) >= (changeJ[drivenBefore] as number)) {
    drivenChangeJ += changeJ[drivenBefore] as number;
    drivenBefore++;
  }
  let brakedFrom = steps;
  while (brakedFrom > drivenBefore && workBound(brakedFrom - 1, 1) <= -(changeJ[brakedFrom - 1] as number)) {
    brakedFrom--;
  }
  return { drivenBefore, brakedFrom, drivenChangeJ };
}

/**
 * Wheel energy, braking energy and exchange rate of many vehicles in one pass over the cycle for each two of them. The
 * energies are those of `cycleEnergy` to the last bit.
 *
 * The rate needs no second and third pass. With w the work of a step and b what 0.001 m² adds to it, half the central
 * difference ½·(max(w + b, 0) − max(w − b, 0)) is b where w ≥ b, ½·(w + b) where |w| < b, and 0 below: the whole
 * calculation at ±0.001 m², step by step. Two vehicles a pass keep the processor busy while sums wait for each other, and
 * where all vehicles are driven, or all braked, nothing needs to be asked.
 *
 * @param airDensityKgM3 density that a change of the drag area counts in (the reference air)
 */
export function energiesOnCycle(
  cycle: PreparedCycle,
  vehicles: readonly LoadedVehicle[],
  airDensityKgM3: number,
  rotatingFactor: number = DEFAULT_ROTATING_FACTOR,
): EnergiesOnCycle {
  const count = vehicles.length;
  const wheelEnergyJ = new Float64Array(count);
  const brakingEnergyJ = new Float64Array(count);
  const exchangeRateJPerM2 = new Float64Array(count);
  const { meanSpeedKmh, accelerationMs2, stepDistanceM } = cycle.byAcceleration;
  const { steps } = cycle;
  const stepWorkJ = workOfStepInDragArea(cycle.byAcceleration, airDensityKgM3);
  const signs = commonSigns(cycle.byAcceleration, stepWorkJ, vehicles, rotatingFactor);
  const { drivenBefore, brakedFrom, drivenChangeJ } = signs;

  for (let left = 0; left < count; left += 2) {
    // An odd last vehicle goes together with itself.
    const right = Math.min(left + 1, count - 1);
    const a = vehicles[left] as LoadedVehicle;
    const b = vehicles[right] as LoadedVehicle;
    const { f0N: a0, f1NPerKmh: a1, f2NPerKmh2: a2 } = a.load;
    const { f0N: b0, f1NPerKmh: b1, f2NPerKmh2: b2 } = b.load;
    const inertiaA = rotatingFactor * a.massKg;
    const inertiaB = rotatingFactor * b.massKg;
    let wheelA = 0;
    let wheelB = 0;
    let brakingA = 0;
    let brakingB = 0;
    let halfDifferenceA = drivenChangeJ;
    let halfDifferenceB = drivenChangeJ;
    for (let i = 0; i < drivenBefore; i++) {
      const speed = meanSpeedKmh[i] as number;
      const acceleration = accelerationMs2[i] as number;
      const distance = stepDistanceM[i] as number;
      wheelA += (a0 + speed * (a1 + speed * a2) + inertiaA * acceleration) * distance;
      wheelB += (b0 + speed * (b1 + speed * b2) + inertiaB * acceleration) * distance;
    }
    for (let i = drivenBefore; i < brakedFrom; i++) {
      const speed = meanSpeedKmh[i] as number;
      const acceleration = accelerationMs2[i] as number;
      const distance = stepDistanceM[i] as number;
      const change = stepWorkJ[i] as number;
      const workA = (a0 + speed * (a1 + speed * a2) + inertiaA * acceleration) * distance;
      if (workA > 0) {
        wheelA += workA;
        halfDifferenceA += change;
        if (workA < change) halfDifferenceA -= (change - workA) / 2;
      } else {
        brakingA -= workA;
        if (workA + change > 0) halfDifferenceA += (workA + change) / 2;
      }
      const workB = (b0 + speed * (b1 + speed * b2) + inertiaB * acceleration) * distance;
      if (workB > 0) {
        wheelB += workB;
        halfDifferenceB += change;
        if (workB < change) halfDifferenceB -= (change - workB) / 2;
      } else {
        brakingB -= workB;
        if (workB + change > 0) halfDifferenceB += (workB + change) / 2;
      }
    }
    for (let i = brakedFrom; i < steps; i++) {
      const speed = meanSpeedKmh[i] as number;
      const acceleration = accelerationMs2[i] as number;
      const distance = stepDistanceM[i] as number;
      brakingA -= (a0 + speed * (a1 + speed * a2) + inertiaA * acceleration) * distance;
      brakingB -= (b0 + speed * (b1 + speed * b2) + inertiaB * acceleration) * distance;
    }
    wheelEnergyJ[left] = wheelA;
    wheelEnergyJ[right] = wheelB;
    brakingEnergyJ[left] = brakingA;
    brakingEnergyJ[right] = brakingB;
    exchangeRateJPerM2[left] = halfDifferenceA / EXCHANGE_RATE_STEP_M2;
    exchangeRateJPerM2[right] = halfDifferenceB / EXCHANGE_RATE_STEP_M2;
  }
  return { wheelEnergyJ, brakingEnergyJ, exchangeRateJPerM2, distanceM: cycle.distanceM };
}
