import type { AdjustmentFields } from '#shared/contracts/adjustments';
import type { FacilityFields } from '#shared/contracts/facilities';
import type { ProgrammeFields } from '#shared/contracts/programmes';
import type { ResultFields } from '#shared/contracts/results';
import type { TestPlanFields, TestPlanInputs } from '#shared/contracts/test-plans';
import type { VariantFields } from '#shared/contracts/variants';

/** A programme as it is usually opened; change what a test is about. */
export function programmeFields(change: Partial<ProgrammeFields> = {}): ProgrammeFields {
  return {
    name: 'Dunlin',
    referenceSpeedKmh: 120,
    referenceAir: { state: 'un-gtr-15' },
    referenceCondition: { ground: 'several-belts', wheels: 'rotating' },
    characteristicLengthM: 4.5,
    characteristicLengthName: 'overall length',
    commonArea: { kind: 'fixed', areaM2: 2.19 },
    confidence: 0.95,
    windSpeedMs: 3.12928,
    milestones: [{ name: 'Clay freeze', date: '2027-03-14' }],
    ...change,
  };
}

/** A body variant with one configuration. */
export function variantFields(change: Partial<VariantFields> = {}): VariantFields {
  return {
    name: 'Dunlin Hatch',
    bodyShape: 'hatch',
    lengthMm: 4330,
    widthMm: 1820,
    heightMm: 1460,
    wheelbaseMm: 2660,
    aliases: [],
    frontalAreas: [{ areaM2: 2.17, uM2: 0.006, method: 'projected-image', date: '2026-02-11' }],
    configurations: [{ name: 'Electric', massKg: 1680, rollingResistance: 0.0085, salesShare: 1 }],
    ...change,
  };
}

/** A full-size open-jet tunnel with belts. */
export function facilityFields(change: Partial<FacilityFields> = {}): FacilityFields {
  return {
    name: 'Halmere',
    kind: 'open-jet',
    areaM2: 24,
    blockage: { method: 'factor', factor: 1.01, uFractionOfCorrection: 0.3 },
    usualCondition: { ground: 'several-belts', wheels: 'rotating' },
    biasURelative: 0.006,
    repeatabilityURelative: 0.002,
    repeatabilityDegreesOfFreedom: 12,
    ...change,
  };
}

/** A coefficient at zero yaw, formed with a full-scale area. */
export function resultFields(
  ids: Pick<ResultFields, 'variantId' | 'facilityId'>,
  change: Partial<ResultFields> = {},
): ResultFields {
  return {
    ...ids,
    name: 'H-0412',
    testDate: '2026-09-14',
    quantity: 'coefficient',
    scale: 1,
    quotedAreaM2: 2.19,
    quotedAreaScale: 'full',
    speedKmh: 140,
    air: { temperatureC: 22, pressurePa: 99_100, relativeHumidity: 0.4 },
    condition: { ground: 'several-belts', wheels: 'rotating' },
    points: [{ yawDeg: 0, value: 0.2712, s: 0.0006, n: 3 }],
    ...change,
  };
}

/** A model of two fifths at what a closed tunnel reaches. */
export function testPlanFields(
  ids: Pick<TestPlanFields, 'variantId' | 'facilityId'>,
  change: Partial<TestPlanInputs> = {},
  name = 'Two fifths in spring',
): TestPlanFields {
  return {
    ...ids,
    name,
    inputs: {
      scale: 0.4,
      target: { basis: 'reference' },
      tunnelTemperatureC: 20,
      tunnelPressurePa: 100_000,
      frontalAreaM2: 2.17,
      dragCoefficient: 0.27,
      condition: { ground: 'one-belt', wheels: 'rotating' },
      ...change,
    },
  };
}

/** What a fixed floor is worth against moving belts, for every body shape. */
export function adjustmentFields(change: Partial<AdjustmentFields> = {}): AdjustmentFields {
  return {
    name: 'Fixed floor to belts',
    item: 'ground',
    fromValue: 'fixed-floor',
    toValue: 'several-belts',
    deltaDragAreaM2: 0.012,
    uM2: 0.004,
    degreesOfFreedom: 5,
    bodyShapes: [],
    evidence: 'Six cars measured both ways in Halmere, report H-114',
    ...change,
  };
}
