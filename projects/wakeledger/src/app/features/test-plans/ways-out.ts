import {
  AIR_LIMITS,
  CELSIUS_ZERO_K,
  COLDEST_PLANNED_GAS_K,
  KMH_PER_MS,
  SWEEP_MIN_RATIO,
} from '#shared/core/constants';
import { scaleAtBlockage } from '#shared/core/planning/limits';
import { waysOutOf } from '#shared/core/planning/ways-out';
import { dryAirDensity, dynamicViscosity, speedOfSound } from '#shared/core/air/gas-properties';
import type { PlanTarget } from '#shared/contracts/test-plans';
import type { SweptResult } from './swept-results';
import type { Planned } from './planned';

/** What a person can change to bring a test within reach; what trying it puts into the form. */
export interface Trial {
  readonly scale?: number;
  readonly tunnelPressurePa?: number;
  readonly tunnelTemperatureC?: number;
  readonly turbulence?: boolean;
  readonly target?: PlanTarget;
}

export type WayOut =
  | {
      readonly kind: 'smaller';
      /** The largest scale that the blockage limit of the section allows. */
      readonly scale: number;
      readonly limit: number;
      readonly trial: Trial;
    }
  | {
      readonly kind: 'scale';
      /** Null: the model would have to be larger than the vehicle. */
      readonly scale: number | null;
      /** β at that scale and how it compares with the limits of the section. */
      readonly blockage: {
        readonly ratio: number;
        readonly verdict: 'passes' | 'caution' | 'excluded';
      } | null;
      readonly trial: Trial | undefined;
    }
  | {
      readonly kind: 'pressure';
      readonly ratio: number;
      readonly pressurePa: number;
      readonly trial: Trial | undefined;
    }
  | {
      readonly kind: 'temperature';
      readonly gas: 'air' | 'nitrogen';
      /** Null: below 100 K, where nothing is said. */
      readonly temperatureK: number | null;
      /** The coldest that can be tried here, and the highest Reynolds number it gives under the same Mach number. */
      readonly coldest: { readonly temperatureC: number; readonly reynolds: number } | null;
      readonly trial: Trial | undefined;
    }
  | {
      readonly kind: 'sweep';
      /** The measured sweep that accepts least; absent: there is none yet. */
      readonly sweep: SweptResult | undefined;
      readonly sweepSpeedKmh: number | undefined;
      /** Where a sweep would have to be run: from … to [km/h], Re up to. */
      readonly fromKmh: number;
      readonly toKmh: number;
      readonly upToReynolds: number;
      readonly trial: Trial;
    }
  | {
      readonly kind: 'turbulence';
      readonly reynolds: number;
      readonly minimumReynolds: number;
      /** Under the minimum Reynolds number transition may sit in the wrong place: then it helps. */
      readonly helps: boolean;
      readonly planned: boolean;
      readonly trial: Trial | undefined;
    };

const ceilTo = (value: number, step: number): number =>
  Number((Math.ceil(value / step - 1e-9) * step).toPrecision(12));
const floorTo = (value: number, step: number): number =>
  Number((Math.floor(value / step + 1e-9) * step).toPrecision(12));

/**
 * Every way by itself, for a test that does not reach what it has to, or whose model fills too much of the section. The limit is
 * what the Mach number and the facility's speed allow; a colder gas keeps the Mach number, so that its speed stays within
 * that of the facility (method section 15).
 */
export function waysOut(plan: Planned, sweeps: readonly SweptResult[]): readonly WayOut[] {
  return [
    ...smallerWays(plan),
    ...(plan.needed.speedKmh > plan.attainable.speedKmh ? fasterWays(plan, sweeps) : []),
  ];
}

function smallerWays({ output, limits, setting }: Planned): readonly WayOut[] {
  if (output.blockageVerdict !== 'excluded') return [];
  const { blockageLimits, facility } = setting;
  const scale = floorTo(limits.blockageExcludedScale, 0.001);
  const limit = facility.kind === 'open-jet' ? blockageLimits.openJetLimit : blockageLimits.blockageExcluded;
  return scale > 0 ? [{ kind: 'smaller', scale, limit, trial: { scale } }] : [];
}

function fasterWays(plan: Planned, sweeps: readonly SweptResult[]): readonly WayOut[] {
  const { setting, needed, inputs } = plan;
  const facilityMach =
    setting.facility.maximumSpeedMs === null
      ? Number.POSITIVE_INFINITY
      : setting.facility.maximumSpeedMs / setting.speedOfSoundMs;
  const machLimit = Math.min(setting.machLimit, facilityMach);
  const bounded = { ...setting, machLimit };
  // Where only the balance holds the speed down, a colder gas or more pressure would raise the force further.
  if (needed.mach <= machLimit) return [sweepWay(plan, sweeps, plan.attainable.mach), turbulenceWay(plan)];
  const ways = waysOutOf(bounded, needed.mach, inputs.coolingGas ?? 'air');
  return [
    scaleWay(plan, ways.scaleAtMachLimit),
    pressureWay(ways.pressureRatioAtMachLimit, ways.pressureAtMachLimitPa),
    temperatureWay(plan, ways.temperatureAtMachLimitK, machLimit),
    sweepWay(plan, sweeps, machLimit),
    turbulenceWay(plan),
  ];
}

function scaleWay(plan: Planned, scale: number | null): WayOut {
  if (scale === null) return { kind: 'scale', scale, blockage: null, trial: undefined };
  const { setting, limits } = plan;
  const rounded = Math.min(1, ceilTo(scale, 0.001));
  const ratio = (rounded / scaleAtBlockage(setting, 1)) ** 2;
  const { blockageCautionScale, blockageExcludedScale } = limits;
  const verdict =
    rounded > blockageExcludedScale
      ? 'excluded'
      : blockageCautionScale !== null && rounded > blockageCautionScale
        ? 'caution'
        : 'passes';
  return {
    kind: 'scale',
    scale: rounded,
    blockage: { ratio, verdict },
    trial: ratio < 1 ? { scale: rounded } : undefined,
  };
}

function pressureWay(ratio: number, pressurePa: number): WayOut {
  const rounded = ceilTo(pressurePa, 100);
  return {
    kind: 'pressure',
    ratio,
    pressurePa: rounded,
    trial: rounded <= AIR_LIMITS.maxPa ? { tunnelPressurePa: rounded } : undefined,
  };
}

function temperatureWay(plan: Planned, temperatureK: number | null, machLimit: number): WayOut {
  const { setting, inputs } = plan;
  const gas = inputs.coolingGas ?? 'air';
  const needed = temperatureK === null ? COLDEST_PLANNED_GAS_K : temperatureK;
  const neededC = needed - CELSIUS_ZERO_K;
  if (temperatureK !== null && neededC >= AIR_LIMITS.minC) {
    const trial = { tunnelTemperatureC: floorTo(neededC, 0.1) };
    return { kind: 'temperature', gas, temperatureK, coldest: null, trial };
  }
  const coldestC = AIR_LIMITS.minC;
  if (inputs.tunnelTemperatureC <= coldestC) {
    return { kind: 'temperature', gas, temperatureK, coldest: null, trial: undefined };
  }
  const coldestK = coldestC + CELSIUS_ZERO_K;
  const viscosity = dynamicViscosity(coldestK) / dryAirDensity(coldestK, setting.pressurePa);
  const speedMs = machLimit * speedOfSound(coldestK);
  const reynolds = (speedMs * setting.characteristicLengthM * setting.scale) / viscosity;
  return {
    kind: 'temperature',
    gas,
    temperatureK,
    coldest: { temperatureC: coldestC, reynolds },
    trial: { tunnelTemperatureC: coldestC },
  };
}

function sweepWay(plan: Planned, sweeps: readonly SweptResult[], machLimit: number): WayOut {
  const { setting, wantedReynolds } = plan;
  const perKmh = (setting.characteristicLengthM * setting.scale) / setting.kinematicViscosityM2S / KMH_PER_MS;
  const toKmh = machLimit * setting.speedOfSoundMs * KMH_PER_MS;
  const upToReynolds = toKmh * perKmh;
  const [sweep] = [...sweeps]
    .filter(({ lowestReynolds }) => lowestReynolds < wantedReynolds)
    .sort((one, other) => one.lowestReynolds - other.lowestReynolds);
  return {
    kind: 'sweep',
    sweep,
    sweepSpeedKmh: sweep && sweep.lowestReynolds / perKmh,
    fromKmh: toKmh / SWEEP_MIN_RATIO,
    toKmh,
    upToReynolds,
    trial: {
      target: sweep
        ? { basis: 'sweep', reynolds: Math.ceil(sweep.lowestReynolds), resultId: sweep.resultId }
        : { basis: 'typed', reynolds: floorTo(upToReynolds, 10_000) },
    },
  };
}

function turbulenceWay({ attainable, setting, inputs }: Planned): WayOut {
  const already = inputs.turbulence === true;
  return {
    kind: 'turbulence',
    reynolds: attainable.reynolds,
    minimumReynolds: setting.minimumReynolds,
    helps: attainable.belowMinimumReynolds,
    planned: already,
    trial: already ? undefined : { turbulence: true },
  };
}
