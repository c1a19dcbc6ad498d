/** One direction of the wind: its weight M_j (square of the resultant over the vehicle's speed) and yaw angle ψ_j [°]. */
export interface WindNode {
  readonly weight: number;
  readonly yawDeg: number;
}

const DIRECTIONS = [1, 2, 3, 4, 5, 6] as const;

/**
 * The six wind directions of SAE J1252 (memory) for r, wind speed over vehicle speed: φ_j = 30°·j − 15°,
 * M_j = 1 + r² + 2·r·cos φ_j, ψ_j = atan(r·sin φ_j/(1 + r·cos φ_j)).
 */
export function windNodes(windRatio: number): WindNode[] {
  return DIRECTIONS.map((j) => {
    const phi = ((30 * j - 15) * Math.PI) / 180;
    const along = 1 + windRatio * Math.cos(phi);
    return {
      weight: 1 + windRatio * windRatio + 2 * windRatio * Math.cos(phi),
      yawDeg: (Math.atan2(windRatio * Math.sin(phi), along) * 180) / Math.PI,
    };
  });
}

/** C̄ = (1/6)·Σ M_j·C(ψ_j). ΣM_j = 6·(1 + r²), so a body indifferent to yaw scores C·(1 + r²). */
export function windAverage(nodes: readonly WindNode[], at: (yawDeg: number) => number): number {
  return nodes.reduce((sum, node) => sum + node.weight * at(node.yawDeg), 0) / nodes.length;
}
