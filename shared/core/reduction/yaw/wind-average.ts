import { evenSlopesInto, evenValueAt } from './even-interpolant';

/** One direction of the wind: its weight M_j (square of the resultant over the vehicle's speed) and yaw angle ψ_j [°]. */
export interface WindNode {
  readonly weight: number;
  readonly yawDeg: number;
}

/** One wind direction φ [°] for r, wind speed over vehicle speed: M = 1 + r² + 2·r·cos φ, ψ = atan(r·sin φ/(1 + r·cos φ)). */
export function windNode(windRatio: number, directionDeg: number): WindNode {
  const phi = (directionDeg * Math.PI) / 180;
  return {
    weight: 1 + windRatio * windRatio + 2 * windRatio * Math.cos(phi),
    yawDeg: (Math.atan2(windRatio * Math.sin(phi), 1 + windRatio * Math.cos(phi)) * 180) / Math.PI,
  };
}

/** The six wind directions of SAE J1252 (memory): φ_j = 30°·j − 15°, j = 1…6. */
export function windNodes(windRatio: number): WindNode[] {
  return [1, 2, 3, 4, 5, 6].map((j) => windNode(windRatio, 30 * j - 15));
}

/** C̄ = (1/6)·Σ M_j·C(ψ_j). ΣM_j = 6·(1 + r²), so a body indifferent to yaw scores C·(1 + r²). */
export function windAverage(nodes: readonly WindNode[], at: (yawDeg: number) => number): number {
  return nodes.reduce((sum, node) => sum + node.weight * at(node.yawDeg), 0) / nodes.length;
}

/** The same of an even sweep given at angles x with values y; `slopes` is room for its slopes. */
export function windAverageOfSweep(
  nodes: readonly WindNode[],
  x: readonly number[],
  y: readonly number[],
  slopes: number[],
): number {
  evenSlopesInto(slopes, x, y);
  let sum = 0;
  for (const { weight, yawDeg } of nodes) sum += weight * evenValueAt(yawDeg, x, y, slopes);
  return sum / nodes.length;
}
