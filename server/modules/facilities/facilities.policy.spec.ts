import type { FacilityFields } from '#shared/contracts/facilities';
import { facilityIssues } from './facilities.policy';

const tunnel: FacilityFields = {
  name: 'Halmere',
  kind: 'open-jet',
  areaM2: 24,
  blockage: { method: 'factor', factor: 1.01, uFractionOfCorrection: 0.3 },
  usualCondition: { ground: 'several-belts', wheels: 'rotating' },
  biasURelative: 0.005,
  sessionURelative: 0.002,
  sessionDegreesOfFreedom: 8,
};
const wheresOf = (facility: FacilityFields) => facilityIssues(facility).map((issue) => issue.where);

describe('a facility', () => {
  it('passes as a tunnel with area and blockage method, as a road or a simulation without', () => {
    expect(facilityIssues(tunnel)).toEqual([]);
    for (const kind of ['road', 'simulation'] as const) {
      expect(facilityIssues({ name: 'Other', kind, usualCondition: {} })).toEqual([]);
    }
  });

  it.each(['closed', 'open-jet', 'slotted'] as const)(
    'of the kind %s needs its area and its blockage method',
    (kind) => {
      expect(wheresOf({ name: 'T', kind, usualCondition: {} })).toEqual(['areaM2', 'blockage']);
    },
  );

  it('outside tunnels has neither', () => {
    expect(wheresOf({ ...tunnel, kind: 'simulation' })).toEqual(['areaM2', 'blockage']);
  });

  it.each([
    [{ method: 'maskell' }, ['blockage.theta']],
    [{ method: 'maskell', theta: 2.5 }, []],
    [{ method: 'maskell', theta: 2.5, factor: 1.1 }, ['blockage.factor']],
    [{ method: 'factor' }, ['blockage.factor']],
    [{ method: 'factor', factor: 1.1 }, []],
    [{ method: 'area-ratio' }, []],
    [{ method: 'area-ratio', theta: 1 }, ['blockage.theta']],
    [{ method: 'area-ratio', uRelative: 0.01 }, ['blockage.uRelative']],
    [{ method: 'none', uRelative: 0.01 }, []],
    [{ method: 'none', uFractionOfCorrection: 0.3 }, ['blockage.uFractionOfCorrection']],
  ] as const)('with the blockage method %j is refused at %j', (blockage, wheres) => {
    expect(wheresOf({ ...tunnel, blockage })).toEqual(wheres);
  });

  it('is refused where degrees of freedom belong to no uncertainty', () => {
    expect(wheresOf({ ...tunnel, sessionURelative: undefined, repeatabilityDegreesOfFreedom: 5 })).toEqual([
      'sessionDegreesOfFreedom',
      'repeatabilityDegreesOfFreedom',
    ]);
    expect(wheresOf({ ...tunnel, sessionURelative: undefined, sessionUM2: 0.001 })).toEqual([]);
  });

  it('has a road as its ground only where it is one', () => {
    expect(wheresOf({ ...tunnel, usualCondition: { ground: 'road' } })).toEqual(['usualCondition.ground']);
    expect(wheresOf({ name: 'R', kind: 'road', usualCondition: { ground: 'one-belt' } })).toEqual([
      'usualCondition.ground',
    ]);
    expect(wheresOf({ name: 'R', kind: 'road', usualCondition: { ground: 'road' } })).toEqual([]);
  });

  it('has no belt that moves under a fixed floor', () => {
    expect(wheresOf({ ...tunnel, usualCondition: { ground: 'fixed-floor', beltSpeedRatio: 1 } })).toEqual([
      'usualCondition.beltSpeedRatio',
    ]);
  });
});
