import { KILO } from '../constants';
import type { PreparedCycle } from '../cycles/cycle';
import { refuse } from '../refusal';
import { cycleEnergy, whPerKm } from './cycle-energy';
import type { RoadLoad } from './road-load';

/** An electric powertrain; efficiencies as fractions. All are the programme's own inputs. */
export interface ElectricPowertrain {
  /** Battery to wheel. */
  readonly driveEfficiency: number;
  /** Wheel to battery, including the share of the braking energy that is recovered at all. */
  readonly regenerationEfficiency: number;
  /** Highest braking power at the wheel that is recovered [W]. */
  readonly regenerationPowerLimitW: number;
  readonly auxiliaryPowerW: number;
  /** Mains to battery. */
  readonly chargingEfficiency: number;
  readonly usableEnergyKWh: number;
}

export interface Fuel {
  /** Lower heating value [J/kg]. */
  readonly heatingValueJPerKg: number;
  readonly densityKgPerL: number;
  /** CO2 per fuel burnt [kg/kg]. */
  readonly co2KgPerKg: number;
}

/** A combustion powertrain on a Willans line: fuel power = (power + P_0)/e while the engine burns. */
export interface CombustionPowertrain {
  /** Engine to wheel, as a fraction. */
  readonly driveEfficiency: number;
  /** e: slope of the line as a fraction, not the mean efficiency of the engine. */
  readonly willansSlopeEfficiency: number;
  /** P_0: what the engine would take to turn itself at zero output [W]. */
  readonly zeroOutputPowerW: number;
  /** No fuel while the road load and inertia drive the wheels (F < 0). */
  readonly overrunCut: boolean;
  /** No fuel in steps that begin and end at 0 km/h. */
  readonly stopStart: boolean;
  readonly fuel: Fuel;
}

/** A vehicle under way: what the powertrain has to overcome. */
export interface Demand {
  readonly cycle: PreparedCycle;
  readonly load: RoadLoad;
  readonly massKg: number;
  readonly rotatingFactor: number;
}

export interface ElectricConsumption {
  readonly batteryEnergyWhPerKm: number;
  readonly plugEnergyWhPerKm: number;
  readonly rangeKm: number;
}

export interface CombustionConsumption {
  readonly fuelEnergyMjPerKm: number;
  readonly litresPer100Km: number;
  readonly co2GPerKm: number;
  /** T_on [s]. */
  readonly engineOnS: number;
}

/** F of step i [N]: the same expression as in the energy of the cycle. */
function forceInStep({ cycle, load, massKg, rotatingFactor }: Demand, i: number): number {
  const speed = cycle.meanSpeedKmh[i] as number;
  const inertia = rotatingFactor * massKg * (cycle.accelerationMs2[i] as number);
  return load.f0N + speed * (load.f1NPerKmh + speed * load.f2NPerKmh2) + inertia;
}

/** Σ over F < 0 of min(|F|·d, P·Δt) [J]: the braking energy at the wheel that a power limit [W] lets through. */
export function recoverableEnergyJ(demand: Demand, powerLimitW: number): number {
  const { cycle } = demand;
  let energyJ = 0;
  for (let i = 0; i < cycle.steps; i++) {
    const force = forceInStep(demand, i);
    if (force < 0) {
      energyJ += Math.min(
        -force * (cycle.stepDistanceM[i] as number),
        powerLimitW * (cycle.stepS[i] as number),
      );
    }
  }
  return energyJ;
}

/** T_on = ΣΔt [s] without the steps with F < 0 (overrun cut) and those that begin and end at 0 km/h (stop–start). */
export function engineOnTimeS(demand: Demand, overrunCut: boolean, stopStart: boolean): number {
  const { cycle } = demand;
  let seconds = 0;
  for (let i = 0; i < cycle.steps; i++) {
    const off = (stopStart && cycle.standing[i] === 1) || (overrunCut && forceInStep(demand, i) < 0);
    if (!off) seconds += cycle.stepS[i] as number;
  }
  return seconds;
}

/**
 * E_battery = E/η_drive − η_regen·Σ_{F<0} min(|F|·d, P_regen·Δt) + P_aux·T; plug = E_battery/η_charge;
 * range = usable energy/(E_battery per distance). Source: method section 13.
 *
 * @throws {Refused} not-positive (more energy would come back than goes out, so that there is no range)
 */
export function electricConsumption(demand: Demand, electric: ElectricPowertrain): ElectricConsumption {
  const { cycle, load, massKg, rotatingFactor } = demand;
  const { wheelEnergyJ } = cycleEnergy(cycle, load, massKg, rotatingFactor);
  const recovered =
    electric.regenerationEfficiency * recoverableEnergyJ(demand, electric.regenerationPowerLimitW);
  const batteryJ =
    wheelEnergyJ / electric.driveEfficiency - recovered + electric.auxiliaryPowerW * cycle.durationS;
  if (!(batteryJ > 0)) {
    refuse(
      'not-positive',
      'electric',
      'With these inputs the cycle takes no energy from the battery: there is no range.',
    );
  }
  const batteryEnergyWhPerKm = whPerKm(batteryJ, cycle.distanceM);
  return {
    batteryEnergyWhPerKm,
    plugEnergyWhPerKm: batteryEnergyWhPerKm / electric.chargingEfficiency,
    rangeKm: (KILO * electric.usableEnergyKWh) / batteryEnergyWhPerKm,
  };
}

/**
 * Fuel energy = E/(e·η_drive) + (P_0/e)·T_on; litres and CO2 by the fuel's values. Source: method section 13
 * (Willans line; see UN GTR No. 15, Annex 6, Appendix 2 for typical slopes).
 */
export function combustionConsumption(
  demand: Demand,
  combustion: CombustionPowertrain,
): CombustionConsumption {
  const { cycle, load, massKg, rotatingFactor } = demand;
  const { fuel, willansSlopeEfficiency } = combustion;
  const { wheelEnergyJ } = cycleEnergy(cycle, load, massKg, rotatingFactor);
  const engineOnS = engineOnTimeS(demand, combustion.overrunCut, combustion.stopStart);
  const fuelJ =
    wheelEnergyJ / (willansSlopeEfficiency * combustion.driveEfficiency) +
    (combustion.zeroOutputPowerW / willansSlopeEfficiency) * engineOnS;
  const fuelJPerM = fuelJ / cycle.distanceM;
  const fuelKgPerM = fuelJPerM / fuel.heatingValueJPerKg;
  return {
    fuelEnergyMjPerKm: fuelJPerM / 1e3,
    litresPer100Km: (1e5 * fuelKgPerM) / fuel.densityKgPerL,
    co2GPerKm: 1e6 * fuelKgPerM * fuel.co2KgPerKg,
    engineOnS,
  };
}
