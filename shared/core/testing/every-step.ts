import type { PointInput, RankingInput } from '../ranking/ranking-input';
import { aFacility, aRanking, aResult, aVariant } from './ranking-builders';

/** What is varied. */
export interface Chosen {
  readonly value: number;
  readonly speedKmh: number;
  readonly share: number;
  readonly theta: number;
  readonly method: string;
}
const points: readonly PointInput[] = [-8, -4, 4, 8].map((yawDeg) => ({
  yawDeg,
  value: 1 + Math.abs(yawDeg) / 60 + yawDeg / 2000,
  s: 0.0006,
  n: 3,
}));

/** A model in a closed section with every step: blockage, friction line, two adjustments, a correlation, a yaw sweep. */
export function everyStep({ value, speedKmh, share, theta, method }: Chosen): RankingInput {
  return aRanking({
    programme: {
      ...aRanking().programme,
      referenceFacilityId: 'tunnel',
      referenceCondition: { ground: 'five-belts', rideHeightFrontMm: 0 },
      policies: { frictionShare: share, frictionShareU: 0.06 },
    },
    facilities: [
      aFacility('tunnel', { biasURelative: 0.007, biasUM2: 0.001 }),
      aFacility('hall', {
        areaM2: 8.2,
        blockage: { method, theta, factor: 1.012, uFractionOfCorrection: 0.4, uRelative: 0.004 },
        sessionURelative: 0.003,
      }),
    ],
    models: [{ id: 'm', scaleU: 0.0004 }],
    variants: [aVariant('a')],
    adjustments: [
      {
        id: 'floor',
        item: 'ground',
        fromValue: 'five-belts',
        toValue: 'fixed-floor',
        deltaDragAreaM2: 0.015,
        uM2: 0.004,
      },
      { id: 'height', item: 'rideHeightFrontMm', perUnitDragAreaM2: 0.0006, uPerUnitM2: 0.00015 },
    ],
    correlations: [
      {
        id: 'c',
        facilityId: 'hall',
        referenceFacilityId: 'tunnel',
        pairs: [0.3, 0.5, 0.7, 0.9, 1.1, 1.4].map((x, i) => ({
          dragAreaM2: x,
          uM2: 0.003,
          referenceDragAreaM2: 0.02 + 0.96 * x + 0.006 * (i % 2),
          referenceUM2: 0.002,
        })),
      },
    ],
    results: [
      aResult('r', 'a', {
        facilityId: 'hall',
        modelId: 'm',
        scale: 0.4,
        speedKmh,
        quotedAreaScale: 'model',
        quotedAreaM2: 0.36,
        quotedAreaUM2: 0.001,
        condition: { ground: 'fixed-floor', rideHeightFrontMm: 7 },
        points: [
          { value, s: 0.0005, n: 5 },
          ...points.map((point) => ({ ...point, value: (point.value ?? NaN) * value })),
        ],
      }),
    ],
  });
}
