import { ANGLE_TOLERANCE_DEG } from '../../constants';

/** One reading of a yaw sweep: angle [°], drag area [m²], its standard uncertainty [m²] and ν. */
export interface YawPoint {
  readonly yawDeg: number;
  readonly dragAreaM2: number;
  readonly uM2: number;
  /** Absent or null: infinite. */
  readonly degreesOfFreedom?: number | null | undefined;
}

/** A point of the folded sweep; |ψ| in degrees, ν infinite where nothing limits it. */
export interface FoldedPoint {
  readonly yawDeg: number;
  readonly dragAreaM2: number;
  readonly uM2: number;
  readonly degreesOfFreedom: number;
}

export interface FoldedSweep {
  /** Ascending by |ψ|. */
  readonly points: readonly FoldedPoint[];
  /** An angle was measured on one side only while pairs elsewhere differ by more than their uncertainty explains. */
  readonly unpairedInUnsymmetricalSweep: boolean;
}

export const isZeroYaw = (yawDeg: number): boolean => Math.abs(yawDeg) <= ANGLE_TOLERANCE_DEG;

/** ν of a sum of independent amounts: Welch–Satterthwaite. Infinity where there is no amount or no finite ν. */
export function combinedDegreesOfFreedom(
  parts: readonly { readonly amount: number; readonly degreesOfFreedom: number }[],
): number {
  let squares = 0;
  let denominator = 0;
  for (const { amount, degreesOfFreedom } of parts) {
    squares += amount * amount;
    denominator += amount ** 4 / degreesOfFreedom;
  }
  return denominator > 0 ? (squares * squares) / denominator : Infinity;
}

/** Mean of readings taken as independent. */
function meanOf(points: readonly FoldedPoint[], yawDeg: number): FoldedPoint {
  const n = points.length;
  const only = points[0] as FoldedPoint;
  if (n === 1) return only.yawDeg === yawDeg ? only : { ...only, yawDeg };
  let sum = 0;
  let squares = 0;
  let denominator = 0;
  for (const { dragAreaM2, uM2, degreesOfFreedom } of points) {
    const square = (uM2 / n) ** 2;
    sum += dragAreaM2;
    squares += square;
    denominator += (square * square) / degreesOfFreedom;
  }
  return {
    yawDeg,
    dragAreaM2: sum / n,
    uM2: Math.sqrt(squares),
    degreesOfFreedom: denominator > 0 ? (squares * squares) / denominator : Infinity,
  };
}

const sides = (a: FoldedPoint, b: FoldedPoint): number => a.yawDeg - b.yawDeg;
const angles = (a: FoldedPoint, b: FoldedPoint): number => Math.abs(a.yawDeg) - Math.abs(b.yawDeg);

/** Neighbours in a list in order that are one angle within 1e-9° come together. */
function groupsByAngle(
  points: readonly FoldedPoint[],
  order: (a: FoldedPoint, b: FoldedPoint) => number,
): FoldedPoint[][] {
  const groups: FoldedPoint[][] = [];
  let group: FoldedPoint[] = [];
  for (const point of points.toSorted(order)) {
    const [first] = group;
    if (first === undefined || order(point, first) > ANGLE_TOLERANCE_DEG) {
      group = [];
      groups.push(group);
    }
    group.push(point);
  }
  return groups;
}

/** Repeats at one signed angle are averaged first, then ±ψ pairs; a side without its pair is used as it is (method section 7). */
export function foldSweep(points: readonly YawPoint[]): FoldedSweep {
  const readings = points.map((point): FoldedPoint => ({
    yawDeg: isZeroYaw(point.yawDeg) ? 0 : point.yawDeg,
    dragAreaM2: point.dragAreaM2,
    uM2: point.uM2,
    degreesOfFreedom: point.degreesOfFreedom ?? Infinity,
  }));
  const signed = groupsByAngle(readings, sides).map((group) =>
    meanOf(group, (group[0] as FoldedPoint).yawDeg),
  );
  let unpaired = false;
  let unsymmetrical = false;
  const folded = groupsByAngle(signed, angles).map((group) => {
    const [first, second] = group;
    if (first !== undefined && second !== undefined) {
      const explained = 2 * Math.hypot(first.uM2, second.uM2);
      if (Math.abs(first.dragAreaM2 - second.dragAreaM2) > explained) unsymmetrical = true;
    } else if (first !== undefined && first.yawDeg !== 0) unpaired = true;
    return meanOf(group, Math.abs((first as FoldedPoint).yawDeg));
  });
  return { points: folded, unpairedInUnsymmetricalSweep: unpaired && unsymmetrical };
}
