import { TestBed } from '@angular/core/testing';
import type { FacilityVersion } from '#shared/contracts/facilities';
import { facilityFields } from '#shared/testing/domain-fields';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { facilityComparison } from './facility-comparison';
import { versionLines } from './version-words';

describe('the versions of a facility', () => {
  it('say what changed from one to the next, and which came first', () => {
    const fields = facilityComparison(TestBed.inject(QuantityFormat), 'en-GB');
    const at = '2026-03-03T10:00:00Z';
    const versions: readonly FacilityVersion[] = [
      {
        number: 2,
        at,
        fields: facilityFields({ sessionURelative: 0.002, sessionDegreesOfFreedom: 4, biasURelative: 0.004 }),
        comment: 'From the check body',
      },
      { number: 1, at, fields: facilityFields() },
    ];
    const [second, first] = versionLines(versions, fields);
    expect(second?.differences).toEqual([
      'Bias: 0.60\u202f% → 0.40\u202f%',
      'Session: nothing → 0.20\u202f%, ν 4',
    ]);
    expect(first).toMatchObject({ first: true, differences: [] });
  });
});
