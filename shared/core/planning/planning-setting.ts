import { statedPressure, statedTemperature } from '../air/air';
import type { AirInput } from '../air/air-input';
import { dryAirDensity, dynamicViscosity, speedOfSound } from '../air/gas-properties';
import { CELSIUS_ZERO_K, DEFAULT_POLICIES, KMH_PER_MS } from '../constants';
import type { TunnelKind } from '../ranking/ranking-input';
import type { BlockageLimits } from '../reduction/blockage';
import { checkScale } from '../reduction/scale';
import { positive } from '../requirement';

/** Air in the tunnel: dry, an ideal gas (method section 15). */
export interface TunnelAirInput {
  /** −40 to 60 °C. */
  readonly temperatureC: number;
  /** Static, 30 000 to 1 000 000 Pa. */
  readonly pressurePa: number;
}

export type CoolingGas = 'air' | 'nitrogen';

/** Input of the operation `plan`. What the machine entry does not know is said. */
export interface PlanInput {
  /** Model length over full length, above 0, at most 1. */
  readonly scale: number;
  /** At full scale [m]. */
  readonly characteristicLengthM: number;
  readonly referenceSpeedKmh: number;
  readonly referenceAir: AirInput;
  /** Absent: that of the full-size vehicle at the reference speed and air. */
  readonly targetReynolds?: number | null | undefined;
  readonly tunnelAir: TunnelAirInput;
  readonly facility: {
    readonly kind: TunnelKind;
    /** Section area (closed, slotted) or nozzle area (open jet) [m²]. */
    readonly areaM2: number;
    readonly maximumSpeedKmh?: number | null | undefined;
  };
  /** At full scale [m²]. */
  readonly frontalAreaM2: number;
  readonly dragCoefficient: number;
  /** At full scale [m²]; absent: the frontal area. */
  readonly coefficientAreaM2?: number | null | undefined;
  readonly machCaution?: number | null | undefined;
  readonly machLimit?: number | null | undefined;
  readonly minimumReynolds?: number | null | undefined;
  /** The gas of a cooled tunnel; it changes the temperature that would do, nothing else. */
  readonly coolingGas?: CoolingGas | null | undefined;
  /** The organisation's blockage limits; the machine entry always takes the defaults. */
  readonly blockageLimits?: BlockageLimits | undefined;
  /** What a measured sweep says can be accepted instead of the target; not a field of the machine entry. */
  readonly acceptedReynolds?: number | null | undefined;
}

/** A plan's input as its equations use it: SI, defaults in place, everything checked. */
export interface PlanningSetting {
  readonly scale: number;
  readonly characteristicLengthM: number;
  readonly frontalAreaM2: number;
  /** C_D times its area, at full scale [m²]. */
  readonly dragAreaM2: number;
  readonly facility: {
    readonly kind: TunnelKind;
    readonly areaM2: number;
    /** Null: not stated. */
    readonly maximumSpeedMs: number | null;
  };
  readonly temperatureK: number;
  readonly pressurePa: number;
  readonly densityKgM3: number;
  readonly kinematicViscosityM2S: number;
  readonly speedOfSoundMs: number;
  readonly machCaution: number;
  readonly machLimit: number;
  readonly minimumReynolds: number;
  readonly blockageLimits: BlockageLimits;
}

function positiveOr(value: number | null | undefined, fallback: number, where: string): number {
  const used = value ?? fallback;
  positive(used, where);
  return used;
}

/**
 * Checks a plan's input and brings it to SI. The tunnel's air is a dry ideal gas, R = 287.05287 J/(kg·K); its viscosity is Sutherland's.
 *
 * @throws {Refused} scale-out-of-range, not-positive, missing-input, temperature-out-of-range, pressure-out-of-range
 */
export function planningSettingOf(input: PlanInput): PlanningSetting {
  const { scale, facility, tunnelAir } = input;
  checkScale(scale);
  positive(facility.areaM2, 'facility.areaM2');
  positive(input.characteristicLengthM, 'characteristicLengthM');
  positive(input.frontalAreaM2, 'frontalAreaM2');
  positive(input.dragCoefficient, 'dragCoefficient');
  const temperatureK = statedTemperature(tunnelAir.temperatureC, 'tunnelAir.temperatureC') + CELSIUS_ZERO_K;
  const pressurePa = statedPressure(tunnelAir.pressurePa, 'tunnelAir.pressurePa');
  const densityKgM3 = dryAirDensity(temperatureK, pressurePa);
  const { maximumSpeedKmh } = facility;
  if (maximumSpeedKmh != null) positive(maximumSpeedKmh, 'facility.maximumSpeedKmh');
  return {
    scale,
    characteristicLengthM: input.characteristicLengthM,
    frontalAreaM2: input.frontalAreaM2,
    dragAreaM2:
      input.dragCoefficient * positiveOr(input.coefficientAreaM2, input.frontalAreaM2, 'coefficientAreaM2'),
    facility: {
      kind: facility.kind,
      areaM2: facility.areaM2,
      maximumSpeedMs: maximumSpeedKmh == null ? null : maximumSpeedKmh / KMH_PER_MS,
    },
    temperatureK,
    pressurePa,
    densityKgM3,
    kinematicViscosityM2S: dynamicViscosity(temperatureK) / densityKgM3,
    speedOfSoundMs: speedOfSound(temperatureK),
    machCaution: input.machCaution ?? DEFAULT_POLICIES.machCaution,
    machLimit: positiveOr(input.machLimit, DEFAULT_POLICIES.machExcluded, 'machLimit'),
    minimumReynolds: input.minimumReynolds ?? DEFAULT_POLICIES.minimumReynolds,
    blockageLimits: input.blockageLimits ?? DEFAULT_POLICIES,
  };
}
