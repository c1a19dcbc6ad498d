import type { ImportDetail } from '#shared/contracts/imports';
import { facilityDrafts, troubleOf, variantDrafts, withNames } from './names-draft';

const ID = '018f0000-0000-7000-8000-000000000001';
const DETAIL = {
  unknownVariants: [
    { text: 'Speedster', rows: 3 },
    { text: 'Lift back', rows: 1, suggestedId: ID },
  ],
  unknownFacilities: [{ text: 'Halmere 2', rows: 4, suggestedId: ID }],
  mapping: { columns: [], constants: [], variants: [], facilities: [] },
} as unknown as ImportDetail;

describe('The names step', () => {
  it('proposes a match where a name is alike, and leaves the rest open', () => {
    expect(variantDrafts(DETAIL).map(({ action, variantId }) => [action, variantId])).toEqual([
      ['open', ''],
      ['match', ID],
    ]);
  });

  it('says what a variant to be created still needs', () => {
    const [first] = variantDrafts(DETAIL);
    if (first === undefined) throw new Error('no draft');
    const create = { ...first, action: 'create' as const };
    expect(troubleOf(create)).toContain('frontal area');
    expect(troubleOf({ ...create, area: '2,17' })).toBeUndefined();
    expect(troubleOf({ ...create, area: '2.17', mass: '1400' })).toContain('together');
    expect(troubleOf({ ...create, area: '2.17', areaU: 'about' })).toContain('digits');
  });

  it('sends what was chosen, with numbers, and nothing for what is open', () => {
    const [first, second] = variantDrafts(DETAIL);
    if (first === undefined || second === undefined) throw new Error('no draft');
    const mapping = withNames(
      DETAIL.mapping,
      [{ ...first, action: 'create', area: '1,98', areaU: '0.01', bodyShape: 'coupe' }, second],
      facilityDrafts(DETAIL),
    );
    expect(mapping.variants).toEqual([
      {
        action: 'create',
        text: 'Speedster',
        name: 'Speedster',
        bodyShape: 'coupe',
        frontalAreaM2: 1.98,
        frontalAreaUM2: 0.01,
      },
      { action: 'match', text: 'Lift back', variantId: ID },
    ]);
    expect(mapping.facilities).toEqual([{ text: 'Halmere 2', facilityId: ID }]);
    expect(withNames(DETAIL.mapping, [first], []).variants).toEqual([]);
  });
});
