import type { RankingContext } from '../core/ranking/ranking-context';
import type { FacilityInput, RankingInput, ResultInput, VariantInput } from '../core/ranking/ranking-input';

/** What a ranking is computed from, invented: for tests of the core, the server and the client. */
export interface RankingScenario {
  readonly inputs: RankingInput;
  readonly context: RankingContext;
}

const AIR = { temperatureC: 20, pressurePa: 100000, relativeHumidity: 0.5 };
const REFERENCE_CONDITION = { ground: 'one-belt', wheels: 'rotating', cooling: 'open' };

export const BELT_TUNNEL: FacilityInput = {
  id: 'belt',
  name: 'Halmere belt tunnel',
  kind: 'closed',
  areaM2: 41,
  blockage: { method: 'area-ratio', uFractionOfCorrection: 0.3 },
  biasURelative: 0.006,
  sessionURelative: 0.002,
  repeatabilityURelative: 0.001,
  repeatabilityDegreesOfFreedom: 30,
};

const SIMULATION: FacilityInput = {
  id: 'solver',
  name: 'Wake solver set-up',
  kind: 'simulation',
  biasURelative: 0.01,
  repeatabilityURelative: 0.004,
};

interface Shape {
  readonly id: string;
  readonly name: string;
  readonly coefficient: number;
  readonly areaM2: number;
  readonly massKg: number;
}

const SHAPES: readonly Shape[] = [
  { id: 'liftback', name: 'Liftback', coefficient: 0.249, areaM2: 2.19, massKg: 1650 },
  { id: 'hatch', name: 'Hatch', coefficient: 0.274, areaM2: 2.17, massKg: 1480 },
  { id: 'sport', name: 'Sport', coefficient: 0.287, areaM2: 2.09, massKg: 1720 },
  { id: 'tourer', name: 'Tourer', coefficient: 0.286, areaM2: 2.21, massKg: 1700 },
  { id: 'crossback', name: 'Crossback', coefficient: 0.303, areaM2: 2.46, massKg: 1790 },
];

function variantOf({ id, name, areaM2, massKg }: Shape): VariantInput {
  return { id, name, frontalAreaM2: areaM2, frontalAreaUM2: 0.01, massKg, rollingResistance: 0.0085 };
}

/** A yaw sweep of five angles, as coefficients on the variant's own area at full scale. */
export function sweepResult(shape: Shape, id: string, testDate: string, entrySequence: number): ResultInput {
  const at = (yawDeg: number, factor: number) => ({
    yawDeg,
    value: shape.coefficient * factor,
    s: 0.0006,
    n: 5,
  });
  return {
    id,
    name: `VT-${entrySequence.toString().padStart(4, '0')}`,
    variantId: shape.id,
    facilityId: 'belt',
    sessionId: 'autumn',
    testDate,
    entrySequence,
    quantity: 'coefficient',
    scale: 1,
    quotedAreaM2: shape.areaM2,
    quotedAreaScale: 'full',
    speedKmh: 140,
    air: AIR,
    condition: REFERENCE_CONDITION,
    points: [at(0, 1), at(5, 1.03), at(-5, 1.032), at(10, 1.09), at(-10, 1.094)],
  };
}

/** A short own cycle: start, cruise, stop. */
export const SHORT_CYCLE = {
  key: 'short',
  name: 'Short run',
  source: 'invented',
  timeS: [0, 10, 40, 50, 60],
  speedKmh: [0, 50, 90, 60, 0],
};

function contextOf(inputs: RankingInput): RankingContext {
  return {
    programme: {
      id: 'dunlin',
      name: 'Dunlin',
      commonArea: { kind: 'variant', variantId: inputs.variants[0]?.id ?? '' },
      characteristicLengthName: 'overall length',
      milestones: [],
    },
    variants: inputs.variants.map((variant) => ({
      id: variant.id,
      name: variant.name ?? variant.id,
      bodyShape: 'other',
      frontalAreaMethod: 'laser',
      frontalAreaDate: '2026-01-10',
      configurations: [
        {
          id: `${variant.id}-electric`,
          name: 'Electric',
          massKg: variant.massKg ?? 1500,
          rollingResistance: 0.0085,
          salesShare: 1,
        },
      ],
    })),
    adoptions: [],
    setAside: [],
    included: [],
    policyNumber: null,
    sessions: [{ id: 'autumn', name: 'Autumn entry' }],
    facilityVersions: [{ facilityId: 'belt', number: 1 }],
    correlations: [],
    cycles: [SHORT_CYCLE],
  };
}

function inputsOf(variants: readonly VariantInput[], results: readonly ResultInput[]): RankingInput {
  return {
    programme: {
      name: 'Dunlin',
      referenceSpeedKmh: 140,
      referenceAir: { state: 'un-gtr-15' },
      characteristicLengthM: 4.4,
      commonAreaM2: variants[0]?.frontalAreaM2 ?? 2,
      confidence: 0.95,
      referenceCondition: REFERENCE_CONDITION,
      windSpeedMs: 3.12928,
      policies: { frictionLine: 'off', frictionShare: 0, frictionShareU: 0 },
    },
    facilities: [BELT_TUNNEL, SIMULATION],
    models: [],
    variants,
    results,
  };
}

/**
 * Five variants of one programme. Order by drag area: liftback, hatch, sport, tourer, crossback; on own areas tourer
 * comes before sport. One result was taken over a fixed floor, one has no drag force after tare.
 */
export function fiveVariants(): RankingScenario {
  const sweeps = SHAPES.map((shape, index) => sweepResult(shape, `r-${shape.id}`, '2026-10-01', 10 + index));
  const [first] = sweeps;
  if (first === undefined) throw new Error('The scenario has no result.');
  const fixedFloor: ResultInput = {
    ...first,
    id: 'r-fixed',
    name: 'VT-0003',
    variantId: 'crossback',
    testDate: '2026-11-03',
    entrySequence: 30,
    condition: { ...REFERENCE_CONDITION, ground: 'fixed-floor' },
  };
  const noDrag: ResultInput = {
    ...first,
    id: 'r-tare',
    name: 'VT-0004',
    variantId: 'tourer',
    entrySequence: 31,
    quantity: 'force',
    tareAlreadySubtracted: false,
    tareN: 900,
    points: [{ yawDeg: 0, value: 540 }],
  };
  const inputs = inputsOf(SHAPES.map(variantOf), [...sweeps, fixedFloor, noDrag]);
  return { inputs, context: contextOf(inputs) };
}

/** Many variants that differ a little, with one sweep each. */
export function manyVariants(count: number): RankingScenario {
  const shapes = Array.from({ length: count }, (_, index): Shape => {
    // A fixed scatter without a generator: steps of an irrational number.
    const part = (index * Math.SQRT2) % 1;
    const other = (index * Math.sqrt(3)) % 1;
    return {
      id: `v${index.toString().padStart(4, '0')}`,
      name: `Variant ${index + 1}`,
      coefficient: 0.24 + 0.08 * part,
      areaM2: 2 + 0.5 * other,
      massKg: 1400 + 500 * ((part + other) % 1),
    };
  });
  const results = shapes.map((shape, index) => sweepResult(shape, `r-${shape.id}`, '2026-10-01', index + 1));
  const inputs = inputsOf(shapes.map(variantOf), results);
  return { inputs, context: contextOf(inputs) };
}
