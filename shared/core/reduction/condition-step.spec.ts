import { aProgramme, reduced, rulesOf, stepNames } from '../testing/one-result';
import { aRanking } from '../testing/ranking-builders';
import { reduceResults } from './reduce';

const CONDITION = { ground: 'five-belts', wheels: 'rotating' };

describe('The condition', () => {
  const floor = {
    id: 'floor',
    item: 'ground',
    fromValue: 'fixed-floor',
    toValue: 'five-belts',
    deltaDragAreaM2: -0.012,
    uM2: 0.003,
  };
  const ground = (value: string | null) => ({ condition: { ...CONDITION, ground: value } });
  const withFloor = { adjustments: [floor] };

  it('is adjusted forwards, and backwards with the sign turned', () => {
    const plain = reduced({});
    const forwards = reduced(ground('fixed-floor'), withFloor);
    const backwards = reduced(ground('fixed-floor'), {
      adjustments: [{ ...floor, fromValue: 'five-belts', toValue: 'fixed-floor', deltaDragAreaM2: 0.012 }],
    });
    for (const found of [forwards, backwards]) {
      expect(found.zeroYaw.dragAreaM2).toBeCloseTo(plain.zeroYaw.dragAreaM2 - 0.012, 13);
      expect(stepNames(found)).toEqual(['full-scale-drag-area', 'reynolds', 'condition-adjustments']);
      expect(found.excludedBy).toEqual([]);
    }
    expect(forwards.amounts.get('adjustment:floor')).toBe(0.003);
    expect(backwards.amounts.get('adjustment:floor')).toBe(-0.003);
  });

  it('is adjusted by the first that fits, and only for the variants that it holds for', () => {
    const second = { ...floor, id: 'second', deltaDragAreaM2: -0.02 };
    const found = reduced(ground('fixed-floor'), { adjustments: [floor, second] });
    expect(found.amounts.has('adjustment:second')).toBe(false);
    const other = reduced(ground('fixed-floor'), {
      adjustments: [
        { ...floor, variantIds: ['b'] },
        { ...second, variantIds: ['a', 'b'] },
      ],
    });
    expect(other.amounts.has('adjustment:floor')).toBe(false);
    expect(other.amounts.get('adjustment:second')).toBe(0.003);
  });

  it('of a number is adjusted per unit, times reference minus test', () => {
    const found = reduced(
      { condition: { ...CONDITION, rideHeightFrontMm: 12 } },
      {
        programme: aProgramme({ referenceCondition: { ...CONDITION, rideHeightFrontMm: 2 } }),
        adjustments: [
          {
            id: 'height',
            item: 'rideHeightFrontMm',
            perUnitDragAreaM2: 0.0004,
            uPerUnitM2: 0.0001,
            degreesOfFreedom: 5,
          },
        ],
      },
    );
    expect(found.zeroYaw.dragAreaM2 - reduced({}).zeroYaw.dragAreaM2).toBeCloseTo(-0.004, 12);
    expect(found.amounts.get('adjustment:height')).toBeCloseTo(-0.001, 14);
  });

  it('that nothing adjusts keeps a result out: another value, an item not stated, a number as text', () => {
    expect(reduced(ground('one-belt'), withFloor).excludedBy).toEqual(['not-comparable']);
    expect(reduced(ground(null), withFloor).excludedBy).toEqual(['not-comparable']);
    expect(rulesOf(ground('fixed-floor'))).toEqual(['not-comparable']);
  });

  it('that is adjusted in one item and differs in another is adjusted and stays out', () => {
    const found = reduced({ condition: { ground: 'fixed-floor', wheels: 'stationary' } }, withFloor);
    expect(found.amounts.get('adjustment:floor')).toBe(0.003);
    expect(found.excludedBy).toEqual(['not-comparable']);
  });

  it('is included with a written reason, which is a caution; a blank one is none', () => {
    const found = reduced({ ...ground('one-belt'), includedWithReason: 'the only run of this clay' });
    expect(found).toMatchObject({ cautions: ['included-with-reason'], excludedBy: [] });
    expect(reduced({ ...ground('one-belt'), includedWithReason: '  ' }).excludedBy).toEqual([
      'not-comparable',
    ]);
    expect(reduced({ includedWithReason: 'not needed' }).cautions).toEqual([]);
  });

  it.each([
    [{ id: 'x', item: 'ground' }, 'adjustments.0.fromValue'],
    [{ ...floor, uM2: null }, 'adjustments.0.uM2'],
    [{ ...floor, deltaDragAreaM2: null }, 'adjustments.0.deltaDragAreaM2'],
    [{ id: 'x', item: 'rideHeightFrontMm', perUnitDragAreaM2: 0.001 }, 'adjustments.0.uPerUnitM2'],
  ])('is not adjusted by half an adjustment: %j', (adjustment, where) => {
    expect(() => reduceResults(aRanking({ adjustments: [adjustment] }))).toThrow(
      expect.objectContaining({ code: 'missing-input', where }),
    );
  });
});
