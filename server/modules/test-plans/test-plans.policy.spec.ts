import type { Facility } from '#shared/contracts/facilities';
import { facilityFields, testPlanFields } from '#shared/testing/domain-fields';
import { planIssues, reasonNotToExpect } from './test-plans.policy';

const tunnel: Facility = {
  ...facilityFields({ kind: 'closed', areaM2: 2.4 }),
  id: '00000000-0000-4000-8000-000000000001',
  version: 1,
  versionNumber: 1,
};
const ids = { variantId: '00000000-0000-4000-8000-000000000002', facilityId: tunnel.id };
const around = { variantFound: true, facility: tunnel, sweepFound: true };
const issuesOf = (
  change: Parameters<typeof testPlanFields>[1],
  surroundings: Partial<Parameters<typeof planIssues>[1]> = {},
) => planIssues(testPlanFields(ids, change), { ...around, ...surroundings });

describe('a planned test', () => {
  it('passes where the model fits, the air is air and the speed is within reach', () => {
    expect(issuesOf({ speedKmh: 220, maximumSpeedKmh: 220 })).toEqual([]);
  });

  it('is refused at the variant, the facility and the sweep that the programme does not have', () => {
    const strange = { variantFound: false, facility: undefined, sweepFound: false };
    expect(issuesOf({}, strange).map((issue) => issue.where)).toEqual([
      'variantId',
      'facilityId',
      'inputs.target.resultId',
    ]);
  });

  it.each(['road', 'simulation'] as const)('is refused in a facility of the kind %s', (kind) => {
    const facility: Facility = { ...tunnel, kind, areaM2: undefined };
    expect(issuesOf({}, { facility }).map((issue) => issue.where)).toEqual(['facilityId']);
  });

  it('is refused where the model is larger than the section, with the scale that would be accepted', () => {
    // 2.17 m² at full scale in 2.4 m² fits; 3 m² does not, up to √(2.4/3) = 0.89.
    expect(issuesOf({ scale: 1 })).toEqual([]);
    expect(issuesOf({ scale: 1, frontalAreaM2: 3 })).toEqual([
      {
        where: 'inputs.scale',
        reason: 'model-larger-than-section',
        detail: expect.stringContaining('below 0.89 is accepted'),
      },
    ]);
  });

  it('asks whether 293 °C was kelvin, and names what would be accepted', () => {
    expect(issuesOf({ tunnelTemperatureC: 293 })).toEqual([
      {
        where: 'inputs.tunnelTemperatureC',
        reason: 'temperature-out-of-range',
        detail: '293 °C: is it kelvin? 19.9 °C would be accepted.',
      },
    ]);
    expect(issuesOf({ tunnelTemperatureC: 100 })[0]?.detail).toContain('From −40 to 60 °C');
  });

  it.each([
    [1000, '1000 Pa: is it hPa? 100000 Pa would be accepted.'],
    [1.5, '1.5 Pa: is it bar? 150000 Pa would be accepted.'],
    [5, '5 Pa: is it bar? 500000 Pa would be accepted.'],
    [20_000, '20000 Pa looks mistyped. From 30 000 to 1 000 000 Pa is accepted.'],
  ])('asks at a pressure of %d Pa in which unit it was', (tunnelPressurePa, detail) => {
    expect(issuesOf({ tunnelPressurePa })).toEqual([
      { where: 'inputs.tunnelPressurePa', reason: 'pressure-out-of-range', detail },
    ]);
  });

  it('is refused at a speed beyond what the facility reaches, and on a road', () => {
    expect(issuesOf({ speedKmh: 221, maximumSpeedKmh: 220 }).map((issue) => issue.where)).toEqual([
      'inputs.speedKmh',
    ]);
    expect(issuesOf({ condition: { ground: 'road' } }).map((issue) => issue.where)).toEqual([
      'inputs.condition.ground',
    ]);
  });

  it('is expected only with a speed that is settled on, and not while it is retired', () => {
    const plan = {
      ...testPlanFields(ids, { speedKmh: 180 }),
      id: ids.variantId,
      programmeId: ids.variantId,
      version: 1,
      createdAt: '2026-03-01T00:00:00Z',
      createdBy: 'Ingrid',
    };
    expect(reasonNotToExpect(plan, 0.3)).toBeUndefined();
    expect(reasonNotToExpect({ ...plan, inputs: { ...plan.inputs, speedKmh: undefined } }, 0.3)).toContain(
      'No speed',
    );
    expect(reasonNotToExpect({ ...plan, retiredAt: '2026-03-02T00:00:00Z' }, 0.3)).toContain('retired');
    // √(1.4·287.05287·293.15) = 343.23 m/s: 600 km/h are Mach 0.49.
    expect(reasonNotToExpect({ ...plan, inputs: { ...plan.inputs, speedKmh: 600 } }, 0.3)).toBe(
      '600 km/h is Mach 0.49. Up to Mach 0.30 is accepted.',
    );
  });
});
