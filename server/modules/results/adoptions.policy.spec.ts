import { adoptionRefusal } from './adoptions.policy';

const LIFTBACK = 'variant-liftback';
const result = { variantId: LIFTBACK, name: 'H-0412' };
const withdrawn = { at: '2026-11-02T10:00:00Z', by: 'Ines Farrow', reason: 'Belt was not running.' };

describe('adopting a result', () => {
  it('is possible where the person saw what stands now', () => {
    expect(adoptionRefusal({ variantId: LIFTBACK, resultId: 'b' }, undefined, result)).toBeUndefined();
    expect(
      adoptionRefusal({ variantId: LIFTBACK, resultId: 'b', expectedCurrentResultId: 'a' }, 'a', result),
    ).toBeUndefined();
    expect(
      adoptionRefusal({ variantId: LIFTBACK, expectedCurrentResultId: 'a' }, 'a', undefined),
    ).toBeUndefined();
  });

  it.each([
    [undefined, 'a'],
    ['a', undefined],
    ['a', 'c'],
  ])('is a conflict where %s was seen and %s stands', (expectedCurrentResultId, current) => {
    expect(
      adoptionRefusal({ variantId: LIFTBACK, resultId: 'b', expectedCurrentResultId }, current, result)?.code,
    ).toBe('conflict');
  });

  it('is refused for what is adopted already, and where there is nothing to release', () => {
    expect(
      adoptionRefusal({ variantId: LIFTBACK, resultId: 'a', expectedCurrentResultId: 'a' }, 'a', result),
    ).toMatchObject({ code: 'wrong-state', detail: 'This result is adopted already.' });
    expect(adoptionRefusal({ variantId: LIFTBACK }, undefined, undefined)?.code).toBe('wrong-state');
  });

  it('is refused for a result of another variant and for a withdrawn one, with the reason', () => {
    expect(
      adoptionRefusal({ variantId: LIFTBACK, resultId: 'b' }, undefined, { ...result, variantId: 'other' }),
    ).toMatchObject({ code: 'wrong-state', detail: expect.stringContaining('another variant') });
    expect(
      adoptionRefusal({ variantId: LIFTBACK, resultId: 'b' }, undefined, { ...result, withdrawn }),
    ).toMatchObject({ code: 'wrong-state', detail: expect.stringContaining('Belt was not running.') });
  });
});
