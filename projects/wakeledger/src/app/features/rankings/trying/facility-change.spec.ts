import type { FacilityInput } from '#shared/core/ranking/ranking-input';
import { facilityChange, type TypedCorrections } from './facility-change';

const FACILITY: FacilityInput = {
  id: 'halmere',
  kind: 'closed',
  areaM2: 41,
  blockage: { method: 'maskell', theta: 2.4, uFractionOfCorrection: 0.3 },
  biasURelative: 0.006,
};
const AS_HELD: TypedCorrections = { method: 'maskell', amount: '2.4', bias: '0.6', session: '' };
const typed = (part: Partial<TypedCorrections>) => facilityChange(FACILITY, { ...AS_HELD, ...part });
const change = { kind: 'facility', facilityId: 'halmere' };

describe('corrections that are typed for a try', () => {
  it('are no change where they are as they are held', () => {
    expect(typed({})).toBe('unchanged');
  });

  it.each([
    [{ bias: '0,8' }, { biasURelative: 0.008 }],
    [{ session: '0.2' }, { sessionURelative: 0.002 }],
    [{ amount: '2.5' }, { blockage: { method: 'maskell', theta: 2.5, uFractionOfCorrection: 0.3 } }],
    [{ method: 'none', amount: '' }, { blockage: { method: 'none' } }],
    [{ method: 'area-ratio' }, { blockage: { method: 'area-ratio', uFractionOfCorrection: 0.3 } }],
    [
      { method: 'factor', amount: '1.01' },
      { blockage: { method: 'factor', factor: 1.01, uFractionOfCorrection: 0.3 } },
    ],
  ] satisfies readonly (readonly [Partial<TypedCorrections>, object])[])(
    'with %j carry %j',
    (part, carried) => {
      const made = typed(part);
      expect(JSON.parse(JSON.stringify(made))).toEqual({ ...change, ...carried });
    },
  );

  it.each([
    { bias: '' },
    { bias: 'much' },
    { bias: '101' },
    { amount: '' },
    { amount: '-1' },
  ] satisfies readonly Partial<TypedCorrections>[])('with %j cannot be used', (part) => {
    expect(typed(part)).toBe('unusable');
  });
});
