import type { FacilityInput, RankingInput, ResultInput, VariantInput } from '../ranking/ranking-input';

/** Inputs for tests of the core: a programme without section 6, and entities with everything that they need. */
const CONDITION = { ground: 'five-belts', wheels: 'rotating' };

export function aFacility(id: string, changes: Partial<FacilityInput> = {}): FacilityInput {
  return {
    id,
    kind: 'closed',
    areaM2: 46,
    blockage: { method: 'area-ratio', uFractionOfCorrection: 0.5 },
    biasURelative: 0.01,
    sessionUM2: 0.002,
    installationUM2: 0.001,
    repeatabilityURelative: 0.002,
    ...changes,
  };
}

export function aVariant(id: string, changes: Partial<VariantInput> = {}): VariantInput {
  return {
    id,
    frontalAreaM2: 2.24,
    frontalAreaUM2: 0.008,
    massKg: 1500,
    rollingResistance: 0.008,
    ...changes,
  };
}

export function aResult(id: string, variantId: string, changes: Partial<ResultInput> = {}): ResultInput {
  return {
    id,
    variantId,
    facilityId: 'tunnel',
    testDate: '2031-03-01',
    quantity: 'coefficient',
    scale: 1,
    quotedAreaM2: 2.24,
    quotedAreaScale: 'full',
    speedKmh: 140,
    air: { temperatureC: 20, pressurePa: 100000, relativeHumidity: 0.5 },
    condition: CONDITION,
    points: [{ value: 0.28, s: 0.0005, n: 5 }],
    ...changes,
  };
}

export function aRanking(changes: Partial<RankingInput> = {}): RankingInput {
  return {
    programme: {
      referenceSpeedKmh: 120,
      referenceAir: { state: 'iso-2533-sea-level' },
      characteristicLengthM: 4.5,
      commonAreaM2: 2.24,
      referenceCondition: CONDITION,
      policies: { frictionLine: 'off', frictionShare: 0, frictionShareU: 0 },
    },
    facilities: [aFacility('tunnel')],
    variants: [aVariant('a')],
    results: [aResult('r-a', 'a')],
    ...changes,
  };
}
