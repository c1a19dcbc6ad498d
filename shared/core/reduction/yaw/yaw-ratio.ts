import { AMOUNT_FLOOR_M2, ANGLE_TOLERANCE_DEG, DEFAULT_WIND_SPEED_MS, KMH_PER_MS } from '../../constants';
import { refuse } from '../../refusal';
import { evenInterpolant } from './even-interpolant';
import { windAverage, windNodes, type WindNode } from './wind-average';
import { combinedDegreesOfFreedom, foldSweep, type FoldedPoint, type YawPoint } from './yaw-points';

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

function checkSweep(points: readonly FoldedPoint[], windRatio: number, nodes: readonly WindNode[]): void {
  if (points.length < 3) {
    refuse('yaw-too-few-angles', 'points', 'A wind average needs at least three angles |ψ|, 0 among them.');
  }
  if (points[0]?.yawDeg !== 0) refuse('yaw-no-zero', 'points', 'There is no point at zero yaw.');
  if (!(windRatio < 1)) {
    refuse('wind-ratio', 'windSpeedMs', 'The wind must be slower than the vehicle at its reference speed.');
  }
  const reach = points.at(-1)?.yawDeg ?? 0;
  const needed = Math.max(...nodes.map((node) => Math.abs(node.yawDeg)));
  if (needed > reach + ANGLE_TOLERANCE_DEG) {
    refuse(
      'yaw-extrapolation',
      'points',
      `The wind average needs ${needed.toFixed(3)}°, the sweep ends at ${reach}°; nothing is extrapolated.`,
    );
  }
}

/**
 * Wind average and yaw ratio k_ψ = C̄/C(0) of one sweep, after SAE J1252 (memory), with its uncertainty by half-differences
 * [k_ψ(y_i + u_i) − k_ψ(y_i − u_i)]/2 of each folded point. The operation `yaw`.
 *
 * @throws {Refused} yaw-too-few-angles, yaw-no-zero, wind-ratio (r ≥ 1), yaw-extrapolation; tested in this order
 */
export function evaluateYaw(input: YawInput): YawOutput {
  const { points: folded, unpairedInUnsymmetricalSweep } = foldSweep(input.points);
  const windRatio = ((input.windSpeedMs ?? DEFAULT_WIND_SPEED_MS) * KMH_PER_MS) / input.referenceSpeedKmh;
  const nodes = windNodes(windRatio);
  checkSweep(folded, windRatio, nodes);

  const angles = folded.map((point) => point.yawDeg);
  const values = folded.map((point) => point.dragAreaM2);
  const averageOf = (y: readonly number[]): number => windAverage(nodes, evenInterpolant(angles, y));
  const ratioOf = (y: readonly number[]): number => averageOf(y) / (y[0] as number);
  const ratioWith = (index: number, change: number): number =>
    ratioOf(values.map((value, i) => (i === index ? value + change : value)));

  const parts = folded.map((point, i) => ({
    amount: withoutRounding((ratioWith(i, point.uM2) - ratioWith(i, -point.uM2)) / 2),
    degreesOfFreedom: point.degreesOfFreedom,
  }));
  const [zero, ...others] = parts;
  const zeroPointAmount = zero?.amount ?? 0;
  return {
    foldedYawDeg: angles,
    foldedDragAreaM2: values,
    windAveragedDragAreaM2: averageOf(values),
    yawRatio: ratioOf(values),
    zeroPointAmount,
    zeroPointDegreesOfFreedom: zeroPointAmount === 0 ? null : orNull(zero?.degreesOfFreedom ?? Infinity),
    otherPointsAmount: Math.hypot(...others.map((part) => part.amount)),
    otherPointsDegreesOfFreedom: orNull(combinedDegreesOfFreedom(others)),
    cautions: unpairedInUnsymmetricalSweep ? ['unpaired-yaw-in-unsymmetrical-sweep'] : [],
    nodes,
  };
}
