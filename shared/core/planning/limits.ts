import { dynamicPressureOf } from '../similarity/flow';
import type { PlanningSetting } from './planning-setting';

/**
 * The lines of a map of speed against scale: speeds as functions of the scale, and scales that do not depend on the speed (method
 * section 15; definitions of Re, M, q and β).
 */

/** U = Re·ν_k/(L·s) [m/s]: a hyperbola in the scale. */
export function speedAtReynolds(setting: PlanningSetting, reynolds: number, scale: number): number {
  return (reynolds * setting.kinematicViscosityM2S) / (setting.characteristicLengthM * scale);
}

/** U = M·a [m/s]: the same at every scale. */
export function speedAtMach(setting: PlanningSetting, mach: number): number {
  return mach * setting.speedOfSoundMs;
}

/** F = q·C_D·A·s² [N], uncorrected for blockage. */
export function forceAt(setting: PlanningSetting, speedMs: number, scale: number): number {
  return dynamicPressureOf(speedMs, setting.densityKgM3) * setting.dragAreaM2 * scale * scale;
}

/** The speed [m/s] at which the expected drag is a force [N]: U = √(2F/(ρ·C_D·A))/s, a hyperbola in the scale. */
export function speedAtForce(setting: PlanningSetting, forceN: number, scale: number): number {
  return Math.sqrt((2 * forceN) / (setting.densityKgM3 * setting.dragAreaM2)) / scale;
}

/** s = √(β·A_t/A_frontal): the scale at which the model fills a fraction of the section. It may be above 1. */
export function scaleAtBlockage(setting: PlanningSetting, blockageRatio: number): number {
  return Math.sqrt((blockageRatio * setting.facility.areaM2) / setting.frontalAreaM2);
}

/**
 * The smallest scale at which a Reynolds number is reached within a speed [m/s]: s = Re·ν_k/(L·U). It may be above 1: then no model is
 * large enough.
 */
export function smallestScaleWithin(setting: PlanningSetting, reynolds: number, speedMs: number): number {
  return (reynolds * setting.kinematicViscosityM2S) / (setting.characteristicLengthM * speedMs);
}

/** Everything that a map of speed against scale draws for one facility and target. */
export interface PlanningLimits {
  /** Horizontal lines [m/s]. */
  readonly machCautionMs: number;
  readonly machLimitMs: number;
  /** Null: the facility's maximum speed is not stated. */
  readonly facilityMaximumMs: number | null;
  /** Vertical lines: scales, possibly above 1; null where the kind of section has no such limit. */
  readonly blockageCautionScale: number | null;
  readonly blockageExcludedScale: number;
  /** Curves: speed [m/s] at a scale. */
  readonly targetReynolds: (scale: number) => number;
  readonly minimumReynolds: (scale: number) => number;
  /** Null: no sweep says what can be accepted. */
  readonly acceptedReynolds: ((scale: number) => number) | null;
  /** Null: the balance's range is not stated. */
  readonly balanceRange: ((scale: number) => number) | null;
}

export interface PlanningLimitsInput {
  readonly targetReynolds: number;
  readonly acceptedReynolds?: number | null | undefined;
  /** Largest drag that the balance measures [N]. */
  readonly balanceRangeN?: number | null | undefined;
}

/** The lines of the map. Scales in the curves are above 0. */
export function planningLimits(setting: PlanningSetting, input: PlanningLimitsInput): PlanningLimits {
  const { acceptedReynolds, balanceRangeN } = input;
  const { facility, blockageLimits } = setting;
  const openJet = facility.kind === 'open-jet';
  return {
    machCautionMs: speedAtMach(setting, setting.machCaution),
    machLimitMs: speedAtMach(setting, setting.machLimit),
    facilityMaximumMs: facility.maximumSpeedMs,
    blockageCautionScale: openJet ? null : scaleAtBlockage(setting, blockageLimits.blockageCaution),
    blockageExcludedScale: scaleAtBlockage(
      setting,
      openJet ? blockageLimits.openJetLimit : blockageLimits.blockageExcluded,
    ),
    targetReynolds: (scale) => speedAtReynolds(setting, input.targetReynolds, scale),
    minimumReynolds: (scale) => speedAtReynolds(setting, setting.minimumReynolds, scale),
    acceptedReynolds:
      acceptedReynolds == null ? null : (scale) => speedAtReynolds(setting, acceptedReynolds, scale),
    balanceRange: balanceRangeN == null ? null : (scale) => speedAtForce(setting, balanceRangeN, scale),
  };
}
