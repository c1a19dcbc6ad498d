import { REFERENCE_CONDITION } from './conditions';
import type {
  ScenarioAdjustment,
  ScenarioCorrelation,
  ScenarioJudgement,
  ScenarioPlan,
  ScenarioPolicies,
} from './scenario-types';

/** What Aldermere holds for acceptable, changed once. */
export const ALDERMERE_POLICIES: readonly ScenarioPolicies[] = [
  {
    date: '2025-01-15',
    changes: { reynoldsToleranceM2: 0.004 },
    comment: 'Under two counts on the Liftback: more than that a milestone cannot bear.',
  },
];

/** With these the Liftback’s figure over the fixed floor counts; Crossback’s still does not. */
export const ALDERMERE_ADJUSTMENTS: Readonly<Record<string, ScenarioAdjustment>> = {
  floor: {
    name: 'Fixed floor to belts, low cars',
    item: 'ground',
    fromValue: 'fixed-floor',
    toValue: 'several-belts',
    deltaDragAreaM2: -0.01,
    uM2: 0.004,
    degreesOfFreedom: 6,
    bodyShapes: ['liftback', 'coupe'],
    evidence: 'Seven cars measured at Burnholt and at Halmere with the wheels at rest, 2023 to 2025.',
  },
  wheels: {
    name: 'Wheels at rest to turning, low cars',
    item: 'wheels',
    fromValue: 'stationary',
    toValue: 'rotating',
    deltaDragAreaM2: -0.009,
    uM2: 0.003,
    degreesOfFreedom: 4,
    bodyShapes: ['liftback', 'coupe'],
    evidence: 'Five cars at Halmere, wheels at rest against turning, in one session each.',
  },
};

/** Simulation brought to the tunnel of the sign-off: four bodies at first, seven with the second clay. */
export const ALDERMERE_CORRELATIONS: Readonly<Record<string, ScenarioCorrelation>> = {
  merle: {
    name: 'Merle to Halmere',
    facility: 'merle',
    referenceFacility: 'halmere',
    versions: [
      {
        date: '2025-12-04',
        effectiveDate: '2025-12-04',
        pairs: [
          ['M-25-011', 'H-2511-03'],
          ['M-25-012', 'H-2511-07'],
          ['M-25-014', 'H-2511-12'],
          ['M-25-015', 'H-2511-16'],
        ],
        comment: 'First clay against its simulations: four bodies, so an offset only.',
      },
      {
        date: '2026-07-01',
        effectiveDate: '2026-07-01',
        pairs: [
          ['M-25-011', 'H-2511-03'],
          ['M-25-012', 'H-2511-07'],
          ['M-25-014', 'H-2511-12'],
          ['M-25-015', 'H-2511-16'],
          ['M-26-011', 'H-2606-02'],
          ['M-26-012', 'H-2606-05'],
          ['M-26-014', 'H-2606-11'],
        ],
        comment: 'Second clay added: seven pairs, a line.',
      },
    ],
  },
};

export const DUNLIN_JUDGEMENTS: readonly ScenarioJudgement[] = [
  {
    result: 'S-2604-01',
    date: '2026-04-16',
    reynolds: { sweepOf: 'S-2604-03' },
    comment: 'The sweep of the same model is flat: better than the friction line’s estimate.',
  },
  {
    result: 'M-24-103',
    date: '2024-06-03',
    setAsideReason: 'The rear wheel houses were closed by mistake in the surface model.',
  },
  {
    result: 'R-2610-01',
    date: '2026-10-08',
    includedReason: 'Belts and the road agreed within 1 % on the predecessor, with the same tyres.',
  },
];

/** Looked through, though nothing rests on them yet. */
export const DUNLIN_CHECKED = ['M-26-031', 'H-2609-09', 'S-2604-03'] as const;

export const DUNLIN_PLANS: Readonly<Record<string, ScenarioPlan>> = {
  sport: {
    name: 'Sport, 40 %, winter',
    variant: 'sport',
    facility: 'stennick',
    date: '2026-11-24',
    expected: true,
    inputs: {
      scale: 0.4,
      target: { basis: 'typed', reynolds: 7.5e6 },
      tunnelTemperatureC: 20,
      tunnelPressurePa: 100_000,
      maximumSpeedKmh: 280,
      maximumForceN: 900,
      frontalAreaM2: 2.086,
      dragCoefficient: 0.287,
      turbulence: true,
      condition: { ...REFERENCE_CONDITION, beltSpeedRatio: 1 },
      remark: 'With the new diffuser; trips as in August.',
    },
  },
  crossback: {
    name: 'Crossback, 25 %, roof rails',
    variant: 'crossback',
    facility: 'corrie',
    date: '2026-11-26',
    expected: false,
    inputs: {
      scale: 0.25,
      target: { basis: 'reference' },
      tunnelTemperatureC: 24,
      tunnelPressurePa: 100_500,
      maximumSpeedKmh: 390,
      maximumForceN: 350,
      frontalAreaM2: 2.459,
      dragCoefficient: 0.3,
      condition: REFERENCE_CONDITION,
      remark: 'Refused as it stands: the reference asks for more speed than Mach 0.3 allows.',
    },
  },
};
