/** What a silhouette is drawn from, in millimetres. */
export interface BodyDimensions {
  readonly bodyShape: BodyShape;
  readonly lengthMm: number;
  readonly heightMm: number;
  readonly wheelbaseMm: number;
}

export type BodyShape =
  'hatch' | 'liftback' | 'saloon' | 'estate' | 'crossover' | 'coupe' | 'van' | 'pickup' | 'other';

export interface Silhouette {
  readonly width: number;
  readonly height: number;
  readonly body: string;
  readonly glass: string;
  readonly wheels: readonly { readonly x: number; readonly y: number; readonly radius: number }[];
}

type Point = readonly [number, number];

/** Upper outlines as parts of length (from the nose) and of height (from the ground); our own drawing. */
const NOSE: readonly Point[] = [
  [0, 0.3],
  [0.008, 0.44],
  [0.05, 0.53],
  [0.27, 0.64],
];
const TALL_NOSE: readonly Point[] = [
  [0, 0.34],
  [0.006, 0.5],
  [0.04, 0.6],
  [0.25, 0.68],
];
const OUTLINES: Readonly<Record<BodyShape, readonly Point[]>> = {
  hatch: [
    ...NOSE,
    [0.43, 0.95],
    [0.56, 1],
    [0.78, 0.96],
    [0.93, 0.82],
    [0.985, 0.6],
    [1, 0.46],
    [0.99, 0.28],
  ],
  liftback: [
    ...NOSE,
    [0.43, 0.95],
    [0.55, 1],
    [0.72, 0.94],
    [0.9, 0.73],
    [0.975, 0.62],
    [1, 0.5],
    [0.99, 0.28],
  ],
  saloon: [
    ...NOSE,
    [0.42, 0.95],
    [0.54, 1],
    [0.67, 0.96],
    [0.82, 0.72],
    [0.97, 0.66],
    [1, 0.5],
    [0.99, 0.28],
  ],
  estate: [
    ...NOSE,
    [0.42, 0.95],
    [0.55, 1],
    [0.8, 0.98],
    [0.93, 0.93],
    [0.985, 0.64],
    [1, 0.46],
    [0.99, 0.28],
  ],
  crossover: [
    ...TALL_NOSE,
    [0.41, 0.96],
    [0.54, 1],
    [0.78, 0.98],
    [0.92, 0.88],
    [0.985, 0.64],
    [1, 0.48],
    [0.99, 0.32],
  ],
  coupe: [...NOSE, [0.46, 0.95], [0.57, 1], [0.7, 0.95], [0.88, 0.74], [0.97, 0.66], [1, 0.5], [0.99, 0.28]],
  van: [
    [0, 0.3],
    [0.01, 0.44],
    [0.06, 0.54],
    [0.14, 0.62],
    [0.28, 0.95],
    [0.4, 1],
    [0.8, 1],
    [0.97, 0.97],
    [0.995, 0.7],
    [1, 0.4],
    [0.99, 0.25],
  ],
  pickup: [
    ...TALL_NOSE,
    [0.38, 0.96],
    [0.48, 1],
    [0.58, 0.98],
    [0.64, 0.68],
    [0.8, 0.67],
    [0.985, 0.66],
    [1, 0.5],
    [0.99, 0.32],
  ],
  other: [...NOSE, [0.43, 0.95], [0.56, 1], [0.75, 0.97], [0.92, 0.8], [0.985, 0.6], [1, 0.46], [0.99, 0.28]],
};

const GROUND_CLEARANCE = 0.11;
const WHEEL_RADIUS = 0.215;

export const isBodyShape = (shape: string): shape is BodyShape => Object.hasOwn(OUTLINES, shape);

/** The side view of a body, nose to the left, from its shape and three dimensions. y grows downwards, as in SVG. */
export function silhouette({ bodyShape, lengthMm, heightMm, wheelbaseMm }: BodyDimensions): Silhouette {
  const outline = OUTLINES[bodyShape].map(([x, y]): Point => [x * lengthMm, (1 - y) * heightMm]);
  const radius = Math.min(WHEEL_RADIUS * heightMm, 0.14 * wheelbaseMm);
  const base = Math.min(wheelbaseMm, lengthMm - 2.4 * radius);
  const front = (lengthMm - base) * 0.44;
  const axles = [front, front + base];
  const sill = heightMm * (1 - GROUND_CLEARANCE);
  const wheelY = heightMm - radius;
  const arch = radius * 1.18;
  const reach = Math.sqrt(Math.max(0, arch ** 2 - (sill - wheelY) ** 2));

  const [start] = outline;
  const path = [`M${round(start?.[0] ?? 0)} ${round(start?.[1] ?? 0)}`, smooth(outline)];
  path.push(`L${round(lengthMm * 0.97)} ${round(sill)}`);
  for (const axle of axles.toReversed()) {
    path.push(
      `L${round(axle + reach)} ${round(sill)}A${round(arch)} ${round(arch)} 0 1 0 ${round(axle - reach)} ${round(sill)}`,
    );
  }
  path.push(`L${round(lengthMm * 0.02)} ${round(sill)}Z`);
  return {
    width: lengthMm,
    height: heightMm,
    body: path.join(''),
    glass: glassOf(outline, heightMm, lengthMm),
    wheels: axles.map((x) => ({ x, y: wheelY, radius })),
  };
}

/** The side windows: the part of the outline above the waist, drawn in by a margin. */
function glassOf(outline: readonly Point[], heightMm: number, lengthMm: number): string {
  const waist = heightMm * 0.37;
  const margin = heightMm * 0.055;
  const above = outline.filter(([, y]) => y < waist - margin);
  const [first] = above;
  const last = above.at(-1);
  if (!first || !last) return '';
  const top = above.map(([x, y]): Point => [x, y + margin]);
  const from: Point = [first[0] - lengthMm * 0.085, waist];
  const to: Point = [Math.min(last[0] + lengthMm * 0.03, lengthMm * 0.95), waist];
  return `M${round(from[0])} ${round(from[1])}${smooth([from, ...top, to], 0.5)}Z`;
}

/** A smooth line through the points (Catmull-Rom, written as cubic Béziers), after the first has been moved to. */
function smooth(points: readonly Point[], tension = 0.8): string {
  const at = (index: number): Point => points[Math.min(Math.max(index, 0), points.length - 1)] ?? [0, 0];
  const k = tension / 6;
  return points
    .slice(1)
    .map((to, index) => {
      const [before, from, after] = [at(index - 1), at(index), at(index + 2)];
      const c1: Point = [from[0] + (to[0] - before[0]) * k, from[1] + (to[1] - before[1]) * k];
      const c2: Point = [to[0] - (after[0] - from[0]) * k, to[1] - (after[1] - from[1]) * k];
      return `C${[...c1, ...c2, ...to].map(round).join(' ')}`;
    })
    .join('');
}

const round = (value: number): number => Math.round(value);
