import { DEFAULT_ROTATING_FACTOR } from '../constants';
import { prepareCycle } from '../cycles/cycle';
import { traceOf, type BuiltInCycles, type CycleInput } from '../cycles/cycle-input';
import { positive } from '../requirement';
import { cycleEnergy, whPerKm, type CycleEnergy } from './cycle-energy';
import type { RoadLoad } from './road-load';

/** Input of the operation `cycle-energy`. */
export interface CycleEnergyInput extends RoadLoad {
  readonly cycle: CycleInput;
  readonly massKg: number;
  /** Dimensionless; 1.03 where it is not given. */
  readonly rotatingFactor?: number | null | undefined;
}

export interface CycleEnergyOutput extends CycleEnergy {
  readonly durationS: number;
  readonly wheelEnergyWhPerKm: number;
}

/**
 * The operation `cycle-energy`: energy at the wheel of a given road load and mass on a cycle.
 *
 * @throws {Refused} not-positive, and the codes of the cycle
 */
export function evaluateCycleEnergy(input: CycleEnergyInput, builtIn: BuiltInCycles): CycleEnergyOutput {
  positive(input.massKg, 'massKg');
  const cycle = prepareCycle(traceOf(input.cycle, builtIn));
  const energy = cycleEnergy(cycle, input, input.massKg, input.rotatingFactor ?? DEFAULT_ROTATING_FACTOR);
  return {
    ...energy,
    durationS: cycle.durationS,
    wheelEnergyWhPerKm: whPerKm(energy.wheelEnergyJ, energy.distanceM),
  };
}
