import type { Facility } from '#shared/contracts/facilities';
import { DEFAULT_LIMITS, policiesInputOf } from '#shared/core/checks/limits';
import { reductionContextOf } from '#shared/core/reduction/reduction-context';
import { nameKey, type CheckContext, type KnownVariant } from '../checking/check-context';

/** The programme that the files of the corpus are checked against: invented, and always the same. */
const VARIANTS: readonly (KnownVariant & { readonly aliases: readonly string[] })[] = [
  {
    key: '018f0000-0000-7000-8000-000000000001',
    name: 'Liftback',
    bodyShape: 'liftback',
    frontalAreaM2: 2.2,
    aliases: ['LB 5-door'],
  },
  {
    key: '018f0000-0000-7000-8000-000000000002',
    name: 'Hatch',
    bodyShape: 'hatch',
    frontalAreaM2: 2.17,
    aliases: ['Hatch – long', 'Hatch - long'],
  },
  {
    key: '018f0000-0000-7000-8000-000000000003',
    name: 'Tourer',
    bodyShape: 'estate',
    frontalAreaM2: 2.24,
    aliases: [],
  },
];

const FACILITIES: readonly Facility[] = [
  {
    id: '018f0000-0000-7000-8000-0000000000a1',
    version: 1,
    versionNumber: 1,
    name: 'Halmere',
    kind: 'open-jet',
    areaM2: 22.4,
    blockage: { method: 'none' },
    usualCondition: { ground: 'several-belts', wheels: 'rotating' },
    repeatabilityURelative: 0.002,
  },
  {
    id: '018f0000-0000-7000-8000-0000000000a2',
    version: 1,
    versionNumber: 1,
    name: 'Stillmoor',
    kind: 'closed',
    areaM2: 5.6,
    blockage: { method: 'area-ratio' },
    usualCondition: { ground: 'one-belt', wheels: 'rotating' },
    repeatabilityURelative: 0.003,
  },
  {
    id: '018f0000-0000-7000-8000-0000000000a3',
    version: 1,
    versionNumber: 1,
    name: 'Coldharbour',
    kind: 'road',
    usualCondition: { ground: 'road', wheels: 'rotating' },
  },
];

const variantsByName = new Map<string, KnownVariant | 'skip'>([
  ...VARIANTS.flatMap((variant) =>
    [variant.name, ...variant.aliases].map((known): [string, KnownVariant] => [nameKey(known), variant]),
  ),
  ['mule 7', 'skip'],
  ['speedster', { key: 'new:speedster', name: 'Speedster', bodyShape: 'coupe', frontalAreaM2: 1.98 }],
]);
const facilitiesByName = new Map(FACILITIES.map((facility) => [nameKey(facility.name), facility]));

export const CORPUS_SURROUNDINGS: CheckContext = {
  latestPastDay: '2026-12-31',
  variantOf: (text) => variantsByName.get(nameKey(text)),
  facilityOf: (text) => facilitiesByName.get(nameKey(text)),
  isNameTaken: (name) => nameKey(name) === 'r-001',
  checks: {
    limits: DEFAULT_LIMITS,
    context: reductionContextOf({
      programme: {
        referenceSpeedKmh: 140,
        referenceAir: { state: 'iso-2533-sea-level' },
        characteristicLengthM: 4.5,
        commonAreaM2: 2.2,
        referenceCondition: { wheels: 'rotating' },
        policies: policiesInputOf(DEFAULT_LIMITS, 0, 'on'),
      },
      facilities: [],
      variants: [],
      results: [],
    }),
  },
};
