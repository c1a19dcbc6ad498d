import { airOf } from '../air/air';
import { KMH_PER_MS } from '../constants';
import { blockageRatio, blockageVerdict } from '../reduction/blockage';
import { positive } from '../requirement';
import { dynamicPressureOf, machNumber, machVerdict, reynoldsNumber } from '../similarity/flow';
import { forceAt, speedAtMach, speedAtReynolds } from './limits';
import { planningSettingOf, type PlanInput, type PlanningSetting } from './planning-setting';
import { waysOutOf, type WaysOut } from './ways-out';

export type PlanMachVerdict = 'passes' | 'caution' | 'refused';

/** What a Reynolds number asks of the tunnel at the plan's scale and air. */
export interface Demand {
  readonly requiredSpeedMs: number;
  readonly requiredSpeedKmh: number;
  readonly mach: number;
  readonly machVerdict: PlanMachVerdict;
  readonly dynamicPressurePa: number;
  /** Drag on the balance [N], uncorrected for blockage. */
  readonly expectedForceN: number;
}

/** What the facility gives: at the lower of its maximum speed and the Mach limit. */
export interface Attainable {
  readonly withinFacilitySpeed: boolean;
  readonly attainableSpeedMs: number;
  readonly attainableReynolds: number;
  readonly attainableMach: number;
  readonly attainableDynamicPressurePa: number;
  readonly attainableForceN: number;
  readonly attainableBelowMinimumReynolds: boolean;
}

/** What a Reynolds number that a sweep says can be accepted asks for instead. */
export interface Accepted extends Demand {
  readonly reynolds: number;
  /** Null: the facility's maximum speed is not stated. */
  readonly withinFacilitySpeed: boolean | null;
}

export interface PlanOutput extends Demand, Partial<Attainable> {
  readonly targetReynolds: number;
  readonly tunnelAirDensityKgM3: number;
  readonly tunnelKinematicViscosityM2S: number;
  readonly blockageRatio: number;
  readonly blockageVerdict: 'passes' | 'caution' | 'excluded';
  readonly speedAtMachLimitMs: number;
  readonly reynoldsAtMachLimit: number;
  /** Only where the Mach number is refused. */
  readonly waysOut?: WaysOut;
  /** Only where the input names a Reynolds number that can be accepted. */
  readonly accepted?: Accepted;
}

function targetOf(input: PlanInput): number {
  positive(input.referenceSpeedKmh, 'referenceSpeedKmh');
  const air = airOf(input.referenceAir, 'referenceAir');
  if (input.targetReynolds != null) {
    positive(input.targetReynolds, 'targetReynolds');
    return input.targetReynolds;
  }
  const speedMs = input.referenceSpeedKmh / KMH_PER_MS;
  return reynoldsNumber(speedMs, input.characteristicLengthM, 1, air.kinematicViscosityM2S);
}

function planMachVerdict(setting: PlanningSetting, mach: number): PlanMachVerdict {
  const verdict = machVerdict(mach, { machCaution: setting.machCaution, machExcluded: setting.machLimit });
  return verdict === 'excluded' ? 'refused' : verdict;
}

/** U = Re·ν_k/(L·s), M = U/a, q = ½·ρ·U², F = q·C_D·A·s² at the plan's scale and air. */
export function demandOf(setting: PlanningSetting, reynolds: number): Demand {
  const speedMs = speedAtReynolds(setting, reynolds, setting.scale);
  const mach = machNumber(speedMs, setting.speedOfSoundMs);
  return {
    requiredSpeedMs: speedMs,
    requiredSpeedKmh: speedMs * KMH_PER_MS,
    mach,
    machVerdict: planMachVerdict(setting, mach),
    dynamicPressurePa: dynamicPressureOf(speedMs, setting.densityKgM3),
    expectedForceN: forceAt(setting, speedMs, setting.scale),
  };
}

const reynoldsAt = (setting: PlanningSetting, speedMs: number): number =>
  reynoldsNumber(speedMs, setting.characteristicLengthM, setting.scale, setting.kinematicViscosityM2S);

function attainableOf(setting: PlanningSetting, maximumSpeedMs: number, requiredMs: number): Attainable {
  const speedMs = Math.min(maximumSpeedMs, speedAtMach(setting, setting.machLimit));
  const reynolds = reynoldsAt(setting, speedMs);
  return {
    withinFacilitySpeed: requiredMs <= maximumSpeedMs,
    attainableSpeedMs: speedMs,
    attainableReynolds: reynolds,
    attainableMach: machNumber(speedMs, setting.speedOfSoundMs),
    attainableDynamicPressurePa: dynamicPressureOf(speedMs, setting.densityKgM3),
    attainableForceN: forceAt(setting, speedMs, setting.scale),
    attainableBelowMinimumReynolds: reynolds < setting.minimumReynolds,
  };
}

function acceptedOf(setting: PlanningSetting, reynolds: number): Accepted {
  positive(reynolds, 'acceptedReynolds');
  const demand = demandOf(setting, reynolds);
  const { maximumSpeedMs } = setting.facility;
  return {
    reynolds,
    ...demand,
    withinFacilitySpeed: maximumSpeedMs === null ? null : demand.requiredSpeedMs <= maximumSpeedMs,
  };
}

/**
 * The operation `plan`: what a target Reynolds number asks of a facility at a scale, what the facility gives, and the ways out where the
 * speed is out of reach by its Mach number (method section 15).
 *
 * @throws {Refused} scale-out-of-range, model-larger-than-section, not-positive, and the codes of air
 */
export function evaluatePlan(input: PlanInput): PlanOutput {
  const setting = planningSettingOf(input);
  const { facility } = setting;
  const ratio = blockageRatio(setting.scale, setting.frontalAreaM2, facility.areaM2);
  const targetReynolds = targetOf(input);
  const demand = demandOf(setting, targetReynolds);
  const speedAtMachLimitMs = speedAtMach(setting, setting.machLimit);
  return {
    targetReynolds,
    tunnelAirDensityKgM3: setting.densityKgM3,
    tunnelKinematicViscosityM2S: setting.kinematicViscosityM2S,
    ...demand,
    blockageRatio: ratio,
    blockageVerdict: blockageVerdict(facility.kind, ratio, setting.blockageLimits),
    speedAtMachLimitMs,
    reynoldsAtMachLimit: reynoldsAt(setting, speedAtMachLimitMs),
    ...(facility.maximumSpeedMs !== null &&
      attainableOf(setting, facility.maximumSpeedMs, demand.requiredSpeedMs)),
    ...(demand.machVerdict === 'refused' && {
      waysOut: waysOutOf(setting, demand.mach, input.coolingGas ?? 'air'),
    }),
    ...(input.acceptedReynolds != null && { accepted: acceptedOf(setting, input.acceptedReynolds) }),
  };
}
