import { TestBed } from '@angular/core/testing';
import { resultFields, testPlanFields } from '#shared/testing/domain-fields';
import type { Result } from '#shared/contracts/results';
import type { TestPlan } from '#shared/contracts/test-plans';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { planDifferences, resultsOfPlan } from './plan-differences';

const ids = { variantId: 'v', facilityId: 'f' };
const plan: TestPlan = {
  ...testPlanFields(ids, { speedKmh: 180, tunnelTemperatureC: 22, tunnelPressurePa: 99_100 }),
  id: 'p',
  programmeId: 'g',
  version: 2,
  createdAt: '2026-09-01T08:00:00Z',
  createdBy: 'Ingrid',
  expectedSince: '2026-09-10T08:00:00Z',
};
const resultOf = (change: Partial<Result> = {}): Result => ({
  ...resultFields(ids, { scale: 0.4, speedKmh: 181, condition: plan.inputs.condition }),
  id: 'r',
  programmeId: 'g',
  entrySequence: 1,
  enteredAt: '2026-09-14T10:00:00Z',
  enteredBy: 'Ingrid',
  state: 'entered',
  adopted: false,
  ...change,
});

describe('a result beside its plan', () => {
  const differencesOf = (change: Partial<Result>) =>
    planDifferences(plan, resultOf(change), TestBed.inject(QuantityFormat), 'en-GB');

  it('went as planned where scale, speed, air and condition agree', () => {
    expect(differencesOf({})).toEqual([]);
  });

  it.each([
    [{ scale: 0.25 }, 'scale 0.250 instead of 0.400'],
    [{ speedKmh: 150 }, '150\u202fkm/h instead of 180\u202fkm/h'],
    [{ air: { temperatureC: 35, pressurePa: 99_100, relativeHumidity: 0.4 } }, 'air at 35'],
    [{ air: { temperatureC: 22, pressurePa: 90_000, relativeHumidity: 0.4 } }, 'instead of 99,100'],
    [{ turbulenceGenerationOrTrips: true }, 'with turbulence or trips, not planned'],
    [{ condition: { ground: 'fixed-floor', wheels: 'rotating' } }, 'Ground fixed floor instead of one belt'],
    [{ speedKmh: undefined, air: undefined }, 'no speed stated'],
  ] satisfies readonly (readonly [Partial<Result>, string])[])(
    'with %j differs in words',
    (change, words) => {
      const differences = differencesOf(change);
      expect(differences).toHaveLength(1);
      expect(differences[0]).toContain(words);
    },
  );

  it('that was a sweep went as planned where the planned speed lies within it', () => {
    const points = [150, 165, 180, 200].map((speedKmh) => ({ yawDeg: 0, value: 0.27, speedKmh }));
    expect(differencesOf({ points, speedKmh: undefined })).toEqual([]);
    const slower = points.filter(({ speedKmh }) => speedKmh < 170);
    expect(differencesOf({ points: slower, speedKmh: undefined })[0]).toMatch(/^150.*to 165.*instead of 180/);
  });

  it('is told its speed from the dynamic pressure where no speed is stated', () => {
    // q = ½·ρ·U²; dry air of 22 °C and 99 100 Pa has 1.1697 kg/m³; 50 m/s are 180 km/h.
    const q = 0.5 * 1.1697 * 50 ** 2;
    expect(differencesOf({ speedKmh: undefined, dynamicPressurePa: q })).toEqual([]);
    expect(differencesOf({ speedKmh: undefined, dynamicPressurePa: q / 2 })[0]).toContain('instead of 180');
  });

  it('counts only of the variant in the facility, entered since results are expected, and not withdrawn', () => {
    const results = [
      resultOf({ id: 'before', enteredAt: '2026-09-09T08:00:00Z' }),
      resultOf({ id: 'first' }),
      resultOf({ id: 'second', entrySequence: 2 }),
      resultOf({ id: 'elsewhere', facilityId: 'other' }),
      resultOf({ id: 'another', variantId: 'other' }),
      resultOf({ id: 'gone', withdrawn: { at: '2026-09-15T08:00:00Z', by: 'Ingrid', reason: 'mistyped' } }),
    ];
    expect(resultsOfPlan(plan, results).map(({ id }) => id)).toEqual(['second', 'first']);
    expect(resultsOfPlan({ ...plan, expectedSince: undefined }, results)).toEqual([]);
  });
});
