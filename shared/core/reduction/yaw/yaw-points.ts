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
  const parts = points.map((point) => ({
    amount: point.uM2 / n,
    degreesOfFreedom: point.degreesOfFreedom,
  }));
  return {
    yawDeg,
    dragAreaM2: points.reduce((sum, point) => sum + point.dragAreaM2, 0) / n,
    uM2: Math.hypot(...parts.map((part) => part.amount)),
    degreesOfFreedom: n === 1 ? (points[0] as FoldedPoint).degreesOfFreedom : combinedDegreesOfFreedom(parts),
  };
}

/** Neighbours in a sorted list that are one angle within 1e-9° come together. */
function groupsByAngle(
  points: readonly FoldedPoint[],
  angleOf: (point: FoldedPoint) => number,
): FoldedPoint[][] {
  const sorted = [...points].sort((a, b) => angleOf(a) - angleOf(b));
  const groups: FoldedPoint[][] = [];
  let groupAngle = -Infinity;
  for (const point of sorted) {
    const angle = angleOf(point);
    if (angle - groupAngle <= ANGLE_TOLERANCE_DEG) groups.at(-1)?.push(point);
    else {
      groups.push([point]);
      groupAngle = angle;
    }
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
  const signed = groupsByAngle(readings, (point) => point.yawDeg).map((group) =>
    meanOf(group, (group[0] as FoldedPoint).yawDeg),
  );
  let unpaired = false;
  let unsymmetrical = false;
  const folded = groupsByAngle(signed, (point) => Math.abs(point.yawDeg)).map((sides) => {
    const [first, second] = sides;
    if (first !== undefined && second !== undefined) {
      const explained = 2 * Math.hypot(first.uM2, second.uM2);
      if (Math.abs(first.dragAreaM2 - second.dragAreaM2) > explained) unsymmetrical = true;
    } else if (first !== undefined && first.yawDeg !== 0) unpaired = true;
    return meanOf(sides, Math.abs((first as FoldedPoint).yawDeg));
  });
  return { points: folded, unpairedInUnsymmetricalSweep: unpaired && unsymmetrical };
}
