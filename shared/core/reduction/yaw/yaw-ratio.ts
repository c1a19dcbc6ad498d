import { AMOUNT_FLOOR_M2, ANGLE_TOLERANCE_DEG, DEFAULT_WIND_SPEED_MS, KMH_PER_MS } from '../../constants';
import { refuse } from '../../refusal';
import { windAverageOfSweep, windNodes, type WindNode } from './wind-average';
import { foldSweep, type FoldedPoint, type YawPoint } from './yaw-points';

/** Input of the operation `yaw`. */
export interface YawInput {
  readonly points: readonly YawPoint[];
  readonly referenceSpeedKmh: number;
  readonly windSpeedMs?: number | null | undefined;
}

/** Output of the operation `yaw`; amounts are of the ratio, dimensionless; ν null is infinite. */
export interface YawOutput {
  readonly foldedYawDeg: readonly number[];
  readonly foldedDragAreaM2: readonly number[];
  readonly windAveragedDragAreaM2: number;
  readonly yawRatio: number;
  /** Signed half-difference at ψ = 0. */
  readonly zeroPointAmount: number;
  readonly zeroPointDegreesOfFreedom: number | null;
  /** Root sum of squares of the half-differences of the others. */
  readonly otherPointsAmount: number;
  readonly otherPointsDegreesOfFreedom: number | null;
  readonly cautions: readonly 'unpaired-yaw-in-unsymmetrical-sweep'[];
  readonly nodes: readonly WindNode[];
}

const orNull = (degreesOfFreedom: number): number | null =>
  degreesOfFreedom === Infinity ? null : degreesOfFreedom;

/** Rounding error is no amount: without wind every ratio is 1, whatever a reading is changed by. */
const withoutRounding = (amount: number): number => (Math.abs(amount) < AMOUNT_FLOOR_M2 ? 0 : amount);

/** The wind of a programme: it is the same for all of its sweeps. */
export interface Wind {
  /** Wind over vehicle speed. */
  readonly ratio: number;
  readonly nodes: readonly WindNode[];
  /** The largest yaw angle [°] that the nodes ask for. */
  readonly reachDeg: number;
}

export function windOf({ windSpeedMs, referenceSpeedKmh }: Omit<YawInput, 'points'>): Wind {
  const ratio = ((windSpeedMs ?? DEFAULT_WIND_SPEED_MS) * KMH_PER_MS) / referenceSpeedKmh;
  const nodes = windNodes(ratio);
  return { ratio, nodes, reachDeg: Math.max(...nodes.map((node) => Math.abs(node.yawDeg))) };
}

function checkSweep(points: readonly FoldedPoint[], { ratio, reachDeg }: Wind): void {
  if (points.length < 3) {
    refuse('yaw-too-few-angles', 'points', 'A wind average needs at least three angles |ψ|, 0 among them.');
  }
  if (points[0]?.yawDeg !== 0) refuse('yaw-no-zero', 'points', 'There is no point at zero yaw.');
  if (!(ratio < 1)) {
    refuse('wind-ratio', 'windSpeedMs', 'The wind must be slower than the vehicle at its reference speed.');
  }
  const reach = points.at(-1)?.yawDeg ?? 0;
  if (reachDeg > reach + ANGLE_TOLERANCE_DEG) {
    refuse(
      'yaw-extrapolation',
      'points',
      `The wind average needs ${reachDeg.toFixed(3)}°, the sweep ends at ${reach}°; nothing is extrapolated.`,
    );
  }
}

/**
 * Wind average and yaw ratio k_ψ = C̄/C(0) of one sweep, after SAE J1252 (memory), with its uncertainty by half-differences
 * [k_ψ(y_i + u_i) − k_ψ(y_i − u_i)]/2 of each folded point. The operation `yaw`.
 *
 * @throws {Refused} yaw-too-few-angles, yaw-no-zero, wind-ratio (r ≥ 1), yaw-extrapolation; tested in this order
 */
export function evaluateYaw(input: YawInput, wind: Wind = windOf(input)): YawOutput {
  const { points: folded, unpairedInUnsymmetricalSweep } = foldSweep(input.points);
  const { nodes } = wind;
  checkSweep(folded, wind);

  const angles = folded.map((point) => point.yawDeg);
  const values = folded.map((point) => point.dragAreaM2);
  const slopes: number[] = [];
  const windAveragedDragAreaM2 = windAverageOfSweep(nodes, angles, values, slopes);
  const changed = [...values];
  let zeroPointAmount = 0;
  let squares = 0;
  let denominator = 0;
  for (let i = 0; i < folded.length; i++) {
    const { uM2, degreesOfFreedom } = folded[i] as FoldedPoint;
    const value = values[i] as number;
    changed[i] = value + uM2;
    const above = windAverageOfSweep(nodes, angles, changed, slopes) / (changed[0] as number);
    changed[i] = value - uM2;
    const below = windAverageOfSweep(nodes, angles, changed, slopes) / (changed[0] as number);
    changed[i] = value;
    const amount = withoutRounding((above - below) / 2);
    if (i === 0) zeroPointAmount = amount;
    else {
      const square = amount * amount;
      squares += square;
      denominator += (square * square) / degreesOfFreedom;
    }
  }
  return {
    foldedYawDeg: angles,
    foldedDragAreaM2: values,
    windAveragedDragAreaM2,
    yawRatio: windAveragedDragAreaM2 / (values[0] as number),
    zeroPointAmount,
    zeroPointDegreesOfFreedom:
      zeroPointAmount === 0 ? null : orNull((folded[0] as FoldedPoint).degreesOfFreedom),
    otherPointsAmount: Math.sqrt(squares),
    otherPointsDegreesOfFreedom: orNull(denominator > 0 ? (squares * squares) / denominator : Infinity),
    cautions: unpairedInUnsymmetricalSweep ? ['unpaired-yaw-in-unsymmetrical-sweep'] : [],
    nodes,
  };
}
