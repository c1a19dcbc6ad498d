import type { Adoption, AdoptionOrder } from '#shared/contracts/adoptions';
import { adoptionRefusal } from './adoptions.policy';

const ORDER: AdoptionOrder = { variantId: 'hatch', resultIds: ['r1'], rule: 'newest' };
const STANDING: Adoption = {
  id: 'a1',
  variantId: 'hatch',
  resultIds: ['r1', 'r2'],
  rule: 'weighted-mean',
  comment: 'Both repeats',
  at: '2026-10-01T08:00:00Z',
  by: 'Ines',
};
const result = (id: string, change: object = {}) => ({
  id,
  name: id.toUpperCase(),
  variantId: 'hatch',
  ...change,
});
const RESULTS = [result('r1'), result('r2')];

describe('a choice of evidence', () => {
  it('is taken where nothing stands, and of results that stand', () => {
    expect(adoptionRefusal(ORDER, undefined, RESULTS)).toBeUndefined();
  });

  it('conflicts where another adoption stands than the one that was seen, and says whose', () => {
    const refusal = adoptionRefusal(ORDER, STANDING, RESULTS);
    expect(refusal).toMatchObject({ reason: 'conflict', where: 'expectedAdoptionId' });
    expect(refusal?.detail).toContain('Ines');
    expect(adoptionRefusal({ ...ORDER, expectedAdoptionId: 'a0' }, undefined, RESULTS)?.reason).toBe(
      'conflict',
    );
    expect(adoptionRefusal({ ...ORDER, expectedAdoptionId: 'a1' }, STANDING, RESULTS)).toBeUndefined();
  });

  it('is refused where the same results stand by the same rule, in whatever order, and taken by another rule', () => {
    const same = { ...ORDER, resultIds: ['r2', 'r1'], expectedAdoptionId: 'a1' };
    expect(adoptionRefusal({ ...same, rule: 'weighted-mean' }, STANDING, RESULTS)?.reason).toBe(
      'wrong-state',
    );
    expect(adoptionRefusal({ ...same, rule: 'newest' }, STANDING, RESULTS)).toBeUndefined();
  });

  it('names each result once', () => {
    const twice = adoptionRefusal({ ...ORDER, resultIds: ['r1', 'r1'] }, undefined, RESULTS);
    expect(twice?.detail).toContain('twice');
  });

  it.each([
    ['another variant’s', { variantId: 'sport' }, 'another variant'],
    ['a withdrawn', { withdrawn: { at: '', by: 'Ines', reason: 'Belt stood still.' } }, 'Belt stood still.'],
    [
      'a set-aside',
      {
        judgement: {
          id: 'j',
          reynolds: { kind: 'friction-line' },
          setAsideReason: 'Drifted',
          at: '',
          by: 'Ines',
        },
      },
      'Drifted',
    ],
  ] as const)('does not take %s result, and says why and which', (_what, change, words) => {
    const refusal = adoptionRefusal({ ...ORDER, resultIds: ['r1', 'r2'] }, undefined, [
      result('r1'),
      result('r2', change),
    ]);
    expect(refusal).toMatchObject({ reason: 'wrong-state', where: 'resultIds.1' });
    expect(refusal?.detail).toContain(words);
  });

  it('releases what stands, and refuses to where nothing does', () => {
    const release = { ...ORDER, resultIds: [] };
    expect(adoptionRefusal({ ...release, expectedAdoptionId: 'a1' }, STANDING, [])).toBeUndefined();
    expect(adoptionRefusal(release, undefined, [])?.reason).toBe('wrong-state');
  });
});
