import { REFERENCE_CONDITION } from './conditions';
import { campaign, straight, sweep, type Scenario } from './scenario-types';
import { electric } from './powertrains';

/** A second maker with a small programme, present to show that one maker never learns of the other. */
export const VELTHORPE_SCENARIO: Scenario = {
  formerVersions: [],
  checks: [],
  facilities: {
    ashgill: {
      name: 'Ashgill',
      kind: 'open-jet',
      areaM2: 22,
      blockage: { method: 'factor', factor: 1.015, uFractionOfCorrection: 0.3 },
      usualCondition: REFERENCE_CONDITION,
      biasURelative: 0.006,
      sessionURelative: 0.002,
      sessionDegreesOfFreedom: 8,
      repeatabilityURelative: 0.0015,
      repeatabilityDegreesOfFreedom: 18,
    },
  },
  programme: {
    name: 'Wherry',
    referenceSpeedKmh: 130,
    referenceAir: { state: 'iso-2533-sea-level' },
    referenceCondition: REFERENCE_CONDITION,
    characteristicLengthM: 4.9,
    characteristicLengthName: 'overall length, Saloon',
    commonAreaOf: 'saloon',
    confidence: 0.95,
    windSpeedMs: 3.12928,
    referenceFacility: 'ashgill',
    milestones: [{ name: 'Surface release', date: '2027-05-21' }],
  },
  variants: {
    saloon: {
      name: 'Wherry Saloon',
      bodyShape: 'saloon',
      description: 'four-door saloon',
      lengthMm: 4900,
      widthMm: 1880,
      heightMm: 1440,
      wheelbaseMm: 2920,
      aliases: [],
      frontalAreas: [{ areaM2: 2.29, uM2: 0.006, method: 'laser', date: '2026-04-20' }],
      configurations: [
        { name: 'Electric', massKg: 2050, rollingResistance: 0.0083, electric: electric(82), salesShare: 1 },
      ],
    },
    estate: {
      name: 'Wherry Estate',
      bodyShape: 'estate',
      description: 'estate',
      lengthMm: 4930,
      widthMm: 1880,
      heightMm: 1465,
      wheelbaseMm: 2920,
      aliases: [],
      frontalAreas: [{ areaM2: 2.31, uM2: 0.006, method: 'laser', date: '2026-04-21' }],
      configurations: [
        { name: 'Electric', massKg: 2110, rollingResistance: 0.0084, electric: electric(82), salesShare: 1 },
      ],
    },
  },
  results: campaign(
    {
      facility: 'ashgill',
      quantity: 'coefficient',
      scale: 1,
      quotedAreaScale: 'full',
      speedKmh: 140,
      air: { temperatureC: 21.5, pressurePa: 100_700, relativeHumidity: 0.4 },
      condition: REFERENCE_CONDITION,
      session: 'May 2026',
    },
    [
      {
        variant: 'saloon',
        name: 'A-11',
        testDate: '2026-05-04',
        quotedAreaM2: 2.29,
        points: straight(0.2385, 0.0004, 3),
      },
      {
        variant: 'estate',
        name: 'A-14',
        testDate: '2026-05-05',
        quotedAreaM2: 2.31,
        points: straight(0.2571, 0.0004, 3),
      },
      {
        variant: 'saloon',
        name: 'A-23',
        testDate: '2026-10-12',
        quotedAreaM2: 2.29,
        points: sweep([0, 0.2352], [5, 0.2421], [-5, 0.2419], [10, 0.2566], [-10, 0.2563]),
        session: 'October 2026',
      },
    ],
  ),
  withdrawals: [],
  adoptions: [{ result: 'A-23', date: '2026-10-15', comment: 'Surface as it goes into release.' }],
};
