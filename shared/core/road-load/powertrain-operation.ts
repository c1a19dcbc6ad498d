import { COUNT, DEFAULT_ROTATING_FACTOR, EXCHANGE_RATE_STEP_M2 } from '../constants';
import { prepareCycle, type PreparedCycle } from '../cycles/cycle';
import { traceOf, type BuiltInCycles, type CycleInput } from '../cycles/cycle-input';
import { positive } from '../requirement';
import { cycleEnergy, whPerKm } from './cycle-energy';
import {
  combustionConsumption,
  electricConsumption,
  type CombustionConsumption,
  type CombustionPowertrain,
  type ElectricConsumption,
  type ElectricPowertrain,
} from './powertrain';
import { roadLoadOf, type RoadLoad, type RoadLoadVehicle } from './road-load';

/** A vehicle on a cycle with its powertrains: the operation `powertrain` once air and cycle are resolved. */
export interface PowertrainCase {
  readonly airDensityKgM3: number;
  /** The area that a count is taken on [m²]. */
  readonly commonAreaM2: number;
  readonly variant: RoadLoadVehicle;
  readonly dragAreaM2: number;
  readonly rotatingFactor?: number | null | undefined;
  readonly electric?: ElectricPowertrain | null | undefined;
  readonly combustion?: CombustionPowertrain | null | undefined;
}

/** Input of the operation `powertrain`; the reference air comes resolved, as its density. */
export interface PowertrainInput extends PowertrainCase {
  readonly cycle: CycleInput;
}

/** Figures that have an exchange rate; which are there depends on the powertrains given. */
export type ConsumptionFigures = { readonly wheelEnergyWhPerKm: number } & Partial<ElectricConsumption> &
  Partial<Omit<CombustionConsumption, 'engineOnS'>>;

export type PowertrainOutput = RoadLoad &
  ConsumptionFigures &
  Partial<Pick<CombustionConsumption, 'engineOnS'>> & {
    readonly wheelEnergyJ: number;
    readonly exchangeRatesPerM2: ConsumptionFigures;
    readonly exchangeRatesPerCount: ConsumptionFigures;
  };

type WithoutRates = Omit<PowertrainOutput, 'exchangeRatesPerM2' | 'exchangeRatesPerCount'>;

const RATED = [
  'wheelEnergyWhPerKm',
  'batteryEnergyWhPerKm',
  'plugEnergyWhPerKm',
  'rangeKm',
  'fuelEnergyMjPerKm',
  'litresPer100Km',
  'co2GPerKm',
] as const satisfies readonly (keyof ConsumptionFigures)[];

/** The whole calculation at one drag area [m²]. */
function consumptionAt(dragAreaM2: number, given: PowertrainCase, cycle: PreparedCycle): WithoutRates {
  const { massKg } = given.variant;
  const rotatingFactor = given.rotatingFactor ?? DEFAULT_ROTATING_FACTOR;
  const load = roadLoadOf(given.variant, dragAreaM2, given.airDensityKgM3);
  const { wheelEnergyJ, distanceM } = cycleEnergy(cycle, load, massKg, rotatingFactor);
  const demand = { cycle, load, massKg, rotatingFactor };
  return {
    ...load,
    wheelEnergyJ,
    wheelEnergyWhPerKm: whPerKm(wheelEnergyJ, distanceM),
    ...(given.electric && electricConsumption(demand, given.electric)),
    ...(given.combustion && combustionConsumption(demand, given.combustion)),
  };
}

/** Central differences [per m²] of every rated figure that both sides have, times a factor. */
function ratesBetween(above: WithoutRates, below: WithoutRates, factor: number): ConsumptionFigures {
  const scale = factor / (2 * EXCHANGE_RATE_STEP_M2);
  const rates: Partial<Record<(typeof RATED)[number], number>> = {};
  for (const name of RATED) {
    const high = above[name];
    const low = below[name];
    if (high !== undefined && low !== undefined) rates[name] = (high - low) * scale;
  }
  return { ...rates, wheelEnergyWhPerKm: (above.wheelEnergyWhPerKm - below.wheelEnergyWhPerKm) * scale };
}

/**
 * Consumption of a vehicle on a prepared cycle and what a change of its drag area is worth: per m², and per count on the
 * common area (0.001 of it). Rates are central differences of the whole calculation at ±0.001 m²; they hold for this
 * vehicle, cycle and mass. Source: method section 13.
 *
 * @throws {Refused} not-positive, missing-input
 */
export function powertrainOnCycle(given: PowertrainCase, cycle: PreparedCycle): PowertrainOutput {
  const above = consumptionAt(given.dragAreaM2 + EXCHANGE_RATE_STEP_M2, given, cycle);
  const below = consumptionAt(given.dragAreaM2 - EXCHANGE_RATE_STEP_M2, given, cycle);
  return {
    ...consumptionAt(given.dragAreaM2, given, cycle),
    exchangeRatesPerM2: ratesBetween(above, below, 1),
    exchangeRatesPerCount: ratesBetween(above, below, COUNT * given.commonAreaM2),
  };
}

function checkPositive({ commonAreaM2, variant, dragAreaM2, electric, combustion }: PowertrainCase): void {
  positive(commonAreaM2, 'commonAreaM2');
  positive(variant.massKg, 'variant.massKg');
  const reference = variant.roadLoadReference;
  if (reference) {
    positive(reference.massKg, 'variant.roadLoadReference.massKg');
    positive(reference.dragAreaM2, 'variant.roadLoadReference.dragAreaM2');
    positive(reference.airDensityKgM3, 'variant.roadLoadReference.airDensityKgM3');
  }
  positive(dragAreaM2, 'dragAreaM2');
  if (electric) {
    positive(electric.driveEfficiency, 'electric.driveEfficiency');
    positive(electric.chargingEfficiency, 'electric.chargingEfficiency');
    positive(electric.usableEnergyKWh, 'electric.usableEnergyKWh');
  }
  if (combustion) {
    positive(combustion.driveEfficiency, 'combustion.driveEfficiency');
    positive(combustion.willansSlopeEfficiency, 'combustion.willansSlopeEfficiency');
    positive(combustion.fuel.heatingValueJPerKg, 'combustion.fuel.heatingValueJPerKg');
    positive(combustion.fuel.densityKgPerL, 'combustion.fuel.densityKgPerL');
  }
}

/**
 * The operation `powertrain`. The air is resolved before, because its model is a matter of its own.
 *
 * @throws {Refused} not-positive, missing-input (no way to a road load), and the codes of the cycle
 */
export function evaluatePowertrain(input: PowertrainInput, builtIn: BuiltInCycles): PowertrainOutput {
  checkPositive(input);
  return powertrainOnCycle(input, prepareCycle(traceOf(input.cycle, builtIn)));
}
