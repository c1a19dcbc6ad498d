import type {
  FacilityInput,
  RankingInput,
  ResultInput,
  VariantInput,
} from '#shared/core/ranking/ranking-input';
import { uniformNumbers } from '#shared/core/uncertainty/sfc32';

/** Angles of every invented result: symmetrical, the outer ones far enough for the wind. */
export const BENCH_ANGLES_DEG = [0, 5, -5, 10, -10] as const;
export const BENCH_READINGS = 3;

const REFERENCE_CONDITION = { ground: 'several-belts', wheels: 'rotating', cooling: 'open' };

/** A closed tunnel for models, corrected by area ratio, and an open jet for cars, by its own factor. */
const FACILITIES: readonly FacilityInput[] = [
  {
    id: 'closed',
    kind: 'closed',
    areaM2: 11,
    blockage: { method: 'area-ratio', uFractionOfCorrection: 0.3 },
    biasURelative: 0.01,
    sessionURelative: 0.003,
    sessionDegreesOfFreedom: 9,
    installationURelative: 0.002,
    installationDegreesOfFreedom: 5,
  },
  {
    id: 'jet',
    kind: 'open-jet',
    areaM2: 24,
    blockage: { method: 'factor', factor: 1.012, uFractionOfCorrection: 0.3 },
    biasURelative: 0.006,
    sessionURelative: 0.002,
    sessionDegreesOfFreedom: 12,
    installationURelative: 0.001,
    installationDegreesOfFreedom: 6,
  },
];

function variantsOf(count: number, uniform: () => number): readonly VariantInput[] {
  return Array.from({ length: count }, (_, i) => ({
    id: `v${String(i).padStart(4, '0')}`,
    name: `Variant ${String(i + 1)}`,
    frontalAreaM2: 2.1 + 0.3 * uniform(),
    frontalAreaUM2: 0.008,
  }));
}

function resultOf(variant: VariantInput, index: number, uniform: () => number): ResultInput {
  const model = index % 2 === 0;
  const coefficient = 0.25 + 0.06 * uniform();
  return {
    id: `r${String(index).padStart(5, '0')}`,
    name: `R-${String(index + 1)}`,
    variantId: variant.id,
    facilityId: model ? 'closed' : 'jet',
    sessionId: `s${String(Math.floor(index / 20))}-${model ? 'c' : 'j'}`,
    installationId: `i${String(index)}`,
    testDate: `2026-${String(1 + (index % 12)).padStart(2, '0')}-15`,
    entrySequence: index + 1,
    quantity: 'coefficient',
    scale: model ? 0.4 : 1,
    quotedAreaM2: variant.frontalAreaM2,
    quotedAreaScale: 'full',
    speedKmh: model ? 200 + 20 * uniform() : 140,
    air: {
      temperatureC: 18 + 6 * uniform(),
      pressurePa: 98_000 + 3000 * uniform(),
      relativeHumidity: uniform(),
    },
    condition: REFERENCE_CONDITION,
    turbulenceGenerationOrTrips: true,
    points: BENCH_ANGLES_DEG.map((yawDeg) => ({
      yawDeg,
      value: coefficient * (1 + (yawDeg / 40) ** 2) + 0.0004 * uniform(),
      s: 0.0005 + 0.0003 * uniform(),
      n: BENCH_READINGS,
    })),
  };
}

/** An invented programme: every variant has its share of results, models and cars in turn, each with five angles. */
export function benchProgramme(variantCount: number, resultCount: number): RankingInput {
  const uniform = uniformNumbers(26);
  const variants = variantsOf(variantCount, uniform);
  const results = Array.from({ length: resultCount }, (_, index) => {
    const variant = variants[index % variantCount];
    if (variant === undefined) throw new Error('there is no variant');
    return resultOf(variant, index, uniform);
  });
  return {
    programme: {
      name: 'Bench',
      referenceSpeedKmh: 120,
      referenceAir: { state: 'un-gtr-15' },
      characteristicLengthM: 4.5,
      commonAreaM2: 2.19,
      confidence: 0.95,
      referenceCondition: REFERENCE_CONDITION,
      windSpeedMs: 3.12928,
      policies: { policyId: 'v1', frictionLine: 'on', frictionShare: 0.12, frictionShareU: 0.06 },
    },
    facilities: FACILITIES,
    variants,
    results,
  };
}
