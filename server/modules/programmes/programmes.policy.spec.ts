import type { ProgrammeFields } from '#shared/contracts/programmes';
import { programmeIssues } from './programmes.policy';

const VARIANT = '3f0f7c86-9a4e-4c5f-9f0b-3a6f3c0f8a01';
const FACILITY = '3f0f7c86-9a4e-4c5f-9f0b-3a6f3c0f8a02';
const MILESTONE = '3f0f7c86-9a4e-4c5f-9f0b-3a6f3c0f8a04';
const surroundings = {
  variantIds: new Set([VARIANT]),
  facilityIds: new Set([FACILITY]),
  milestoneIds: new Set([MILESTONE]),
};

const fields: ProgrammeFields = {
  name: 'Dunlin',
  referenceSpeedKmh: 120,
  referenceAir: { state: 'un-gtr-15' },
  referenceCondition: { ground: 'several-belts', wheels: 'rotating' },
  characteristicLengthM: 4.5,
  characteristicLengthName: 'overall length',
  commonArea: { kind: 'variant', variantId: VARIANT },
  confidence: 0.95,
  windSpeedMs: 3.12928,
  referenceFacilityId: FACILITY,
  milestones: [
    { name: 'Clay freeze', date: '2027-03-14' },
    { name: 'Launch', date: '2028-05-01' },
  ],
};
const issuesOf = (change: Partial<ProgrammeFields>) =>
  programmeIssues({ ...fields, ...change }, surroundings);

describe('a programme', () => {
  it('passes when everything that it points to is there', () => {
    expect(issuesOf({})).toEqual([]);
    expect(issuesOf({ commonArea: { kind: 'fixed', areaM2: 2.19 }, referenceFacilityId: undefined })).toEqual(
      [],
    );
  });

  it('is refused where two milestones have one name, capital letters aside', () => {
    const milestones = [...fields.milestones, { name: 'clay FREEZE ', date: '2027-04-01' }];
    expect(issuesOf({ milestones })).toEqual([
      { where: 'milestones.2.name', detail: expect.stringContaining('a name of its own') },
    ]);
  });

  it('keeps the ids of its own milestones and refuses others, and one that stands twice', () => {
    const own = { id: MILESTONE, name: 'Clay freeze', date: '2027-03-14' };
    expect(issuesOf({ milestones: [own] })).toEqual([]);
    expect(
      issuesOf({ milestones: [own, { ...own, name: 'Launch' }, { ...own, id: VARIANT, name: 'Start' }] }).map(
        (issue) => issue.where,
      ),
    ).toEqual(['milestones.1.id', 'milestones.2.id']);
  });

  it('is refused where the wind is as fast as the car', () => {
    expect(issuesOf({ referenceSpeedKmh: 36, windSpeedMs: 10 })).toEqual([
      {
        where: 'windSpeedMs',
        detail: expect.stringContaining('less than 10.0 m/s'),
        reason: 'wind-ratio',
      },
    ]);
    expect(issuesOf({ referenceSpeedKmh: 36, windSpeedMs: 9.99 })).toEqual([]);
  });

  it('is refused where the common area is a variant of another programme', () => {
    expect(issuesOf({ commonArea: { kind: 'variant', variantId: FACILITY } })[0]?.where).toBe(
      'commonArea.variantId',
    );
  });

  it('is refused where the reference facility does not exist', () => {
    expect(issuesOf({ referenceFacilityId: VARIANT })[0]?.where).toBe('referenceFacilityId');
  });

  it('is refused where the reference air is incomplete', () => {
    expect(issuesOf({ referenceAir: { temperatureC: 20 } }).map((issue) => issue.where)).toEqual([
      'referenceAir.pressurePa',
      'referenceAir.relativeHumidity',
    ]);
  });

  it('is refused where the reference condition has a belt that moves under a fixed floor', () => {
    expect(issuesOf({ referenceCondition: { ground: 'fixed-floor', beltSpeedRatio: 1 } })[0]?.where).toBe(
      'referenceCondition.beltSpeedRatio',
    );
  });
});
