import type { Facility } from '#shared/contracts/facilities';
import type { PolicyValues } from '#shared/contracts/policies';
import type { Programme } from '#shared/contracts/programmes';
import type { TestPlanInputs } from '#shared/contracts/test-plans';
import { KMH_PER_MS } from '#shared/core/constants';
import {
  forceAt,
  planningLimits,
  speedAtForce,
  speedAtMach,
  type PlanningLimits,
} from '#shared/core/planning/limits';
import { evaluatePlan, type PlanMachVerdict, type PlanOutput } from '#shared/core/planning/plan';
import {
  planningSettingOf,
  type PlanInput,
  type PlanningSetting,
} from '#shared/core/planning/planning-setting';
import { TUNNEL_KINDS, type TunnelKind } from '#shared/core/ranking/ranking-input';
import { Refused } from '#shared/core/refusal';
import { dynamicPressureOf, machNumber, machVerdict, reynoldsNumber } from '#shared/core/similarity/flow';

/** A facility that a model can be tested in: a tunnel with its area. */
export type Tunnel = Facility & { readonly kind: TunnelKind; readonly areaM2: number };

export function isTunnel(facility: Facility | undefined): facility is Tunnel {
  return facility?.areaM2 !== undefined && TUNNEL_KINDS.some((kind) => kind === facility.kind);
}

/** What a test is planned against. */
export interface PlanSetting {
  readonly programme: Programme;
  readonly policies: PolicyValues;
  readonly tunnel: Tunnel;
}

/** The flow about the model at one speed. */
export interface FlowAt {
  readonly speedKmh: number;
  readonly mach: number;
  readonly machVerdict: PlanMachVerdict;
  readonly reynolds: number;
  readonly dynamicPressurePa: number;
  readonly forceN: number;
  /** Null: what the force balance carries is not stated. */
  readonly withinBalance: boolean | null;
  readonly belowMinimumReynolds: boolean;
}

/** What holds the speed down first. */
export type Ceiling = 'mach' | 'facility' | 'balance';

export interface Planned {
  readonly kind: 'planned';
  readonly inputs: TestPlanInputs;
  readonly input: PlanInput;
  readonly setting: PlanningSetting;
  readonly output: PlanOutput;
  readonly limits: PlanningLimits;
  /** What the test must reach: the accepted Reynolds number where there is one, else the target. */
  readonly wantedReynolds: number;
  readonly needed: FlowAt;
  /** At the highest speed within every limit of this scale. */
  readonly attainable: FlowAt & { readonly ceiling: Ceiling };
  /** At the speed that is settled on. */
  readonly settled: FlowAt | undefined;
  readonly reachable: boolean;
}

export type PlanState =
  /** Something is not typed yet, or cannot be used: the fields say what. */
  { readonly kind: 'waiting' } | { readonly kind: 'refused'; readonly refusal: Refused } | Planned;

/** The input of the operation `plan` as the screen, the sheet and the machine entry understand it. */
export function planInputOf(inputs: TestPlanInputs, { programme, policies, tunnel }: PlanSetting): PlanInput {
  const { target } = inputs;
  return {
    scale: inputs.scale,
    characteristicLengthM: programme.characteristicLengthM,
    referenceSpeedKmh: programme.referenceSpeedKmh,
    referenceAir: programme.referenceAir,
    ...(target.basis === 'typed' ? { targetReynolds: target.reynolds } : {}),
    ...(target.basis === 'sweep' ? { acceptedReynolds: target.reynolds } : {}),
    tunnelAir: { temperatureC: inputs.tunnelTemperatureC, pressurePa: inputs.tunnelPressurePa },
    facility: { kind: tunnel.kind, areaM2: tunnel.areaM2, maximumSpeedKmh: inputs.maximumSpeedKmh },
    frontalAreaM2: inputs.frontalAreaM2,
    dragCoefficient: inputs.dragCoefficient,
    coefficientAreaM2: inputs.coefficientAreaM2,
    machCaution: policies.machCaution,
    machLimit: policies.machExcluded,
    minimumReynolds: policies.minimumReynolds,
    coolingGas: inputs.coolingGas,
    blockageLimits: policies,
  };
}

/** Plans a test; the numbers that a form cannot give (NaN) leave it waiting. */
export function planned(inputs: TestPlanInputs, surroundings: PlanSetting): PlanState {
  if (Object.values(inputs).some((value) => Number.isNaN(value))) {
    return { kind: 'waiting' };
  }
  const { target } = inputs;
  if (target.basis !== 'reference' && !(target.reynolds > 0)) return { kind: 'waiting' };
  try {
    return evaluated(inputs, planInputOf(inputs, surroundings));
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return { kind: 'refused', refusal: error };
  }
}

function evaluated(inputs: TestPlanInputs, input: PlanInput): Planned {
  const setting = planningSettingOf(input);
  const output = evaluatePlan(input);
  const { maximumForceN, speedKmh } = inputs;
  const limits = planningLimits(setting, {
    targetReynolds: output.targetReynolds,
    acceptedReynolds: input.acceptedReynolds,
    balanceRangeN: maximumForceN,
  });
  const wantedReynolds = output.accepted?.reynolds ?? output.targetReynolds;
  const neededKmh = output.accepted?.requiredSpeedKmh ?? output.requiredSpeedKmh;
  const needed = flowAt(setting, neededKmh, maximumForceN);
  const highest = ceilingOf(setting, maximumForceN);
  return {
    kind: 'planned',
    inputs,
    input,
    setting,
    output,
    limits,
    wantedReynolds,
    needed,
    attainable: { ...flowAt(setting, highest.speedKmh, maximumForceN), ceiling: highest.ceiling },
    settled: speedKmh === undefined ? undefined : flowAt(setting, speedKmh, maximumForceN),
    reachable: neededKmh <= highest.speedKmh && output.blockageVerdict !== 'excluded',
  };
}

/** The flow about the model at a speed [km/h], by the definitions of Re, M, q and F. */
export function flowAt(
  setting: PlanningSetting,
  speedKmh: number,
  maximumForceN: number | undefined,
): FlowAt {
  const speedMs = speedKmh / KMH_PER_MS;
  const mach = machNumber(speedMs, setting.speedOfSoundMs);
  const verdict = machVerdict(mach, { machCaution: setting.machCaution, machExcluded: setting.machLimit });
  const forceN = forceAt(setting, speedMs, setting.scale);
  const reynolds = reynoldsNumber(
    speedMs,
    setting.characteristicLengthM,
    setting.scale,
    setting.kinematicViscosityM2S,
  );
  return {
    speedKmh,
    mach,
    machVerdict: verdict === 'excluded' ? 'refused' : verdict,
    reynolds,
    dynamicPressurePa: dynamicPressureOf(speedMs, setting.densityKgM3),
    forceN,
    withinBalance: maximumForceN === undefined ? null : forceN <= maximumForceN,
    belowMinimumReynolds: reynolds < setting.minimumReynolds,
  };
}

function ceilingOf(
  setting: PlanningSetting,
  maximumForceN: number | undefined,
): { readonly ceiling: Ceiling; readonly speedKmh: number } {
  const { maximumSpeedMs } = setting.facility;
  const ceilings: readonly { readonly ceiling: Ceiling; readonly speedMs: number }[] = [
    { ceiling: 'mach', speedMs: speedAtMach(setting, setting.machLimit) },
    ...(maximumSpeedMs === null ? [] : [{ ceiling: 'facility' as const, speedMs: maximumSpeedMs }]),
    ...(maximumForceN === undefined
      ? []
      : [{ ceiling: 'balance' as const, speedMs: speedAtForce(setting, maximumForceN, setting.scale) }]),
  ];
  const lowest = ceilings.reduce((one, other) => (other.speedMs < one.speedMs ? other : one));
  return { ceiling: lowest.ceiling, speedKmh: lowest.speedMs * KMH_PER_MS };
}
