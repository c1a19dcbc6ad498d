import type { Adjustment, AdjustmentFields } from '#shared/contracts/adjustments';
import { adjustmentFields } from '#shared/testing/domain-fields';
import { adjustmentIssues, inOrderOfUse, overlapIssues } from './adjustments.policy';

const NUMERIC: AdjustmentFields = {
  name: 'Ride height',
  item: 'rideHeightFrontMm',
  perUnitDragAreaM2: 0.0006,
  uPerUnitM2: 0.0002,
  bodyShapes: [],
  evidence: 'Five heights measured in Halmere',
};

const stored = (fields: AdjustmentFields, change: Partial<Adjustment> = {}): Adjustment => ({
  ...fields,
  id: 'a',
  version: 1,
  addedAt: '2026-03-01T10:00:00.000Z',
  addedBy: 'Ingrid',
  ...change,
});
const wheres = (fields: AdjustmentFields): readonly string[] =>
  adjustmentIssues(fields).map(({ where }) => where);

describe('what is wrong with an adjustment', () => {
  it('is nothing for a word from one value to another, or a number per unit', () => {
    expect(adjustmentIssues(adjustmentFields())).toEqual([]);
    expect(adjustmentIssues(NUMERIC)).toEqual([]);
    expect(adjustmentIssues(adjustmentFields({ deltaDragAreaM2: 0 }))).toEqual([]);
  });

  it('is an uncertainty of zero, which is never known, and one that is missing', () => {
    expect(adjustmentIssues(adjustmentFields({ uM2: 0 }))).toEqual([
      { where: 'uM2', reason: 'uncertainty-zero', detail: expect.stringContaining('never known') },
    ]);
    expect(adjustmentIssues(adjustmentFields({ uM2: undefined }))).toEqual([
      { where: 'uM2', reason: 'missing-input', detail: expect.stringContaining('above 0') },
    ]);
    expect(wheres({ ...NUMERIC, uPerUnitM2: 0 })).toEqual(['uPerUnitM2']);
  });

  it('is from and to being the same', () => {
    expect(adjustmentIssues(adjustmentFields({ toValue: 'fixed-floor' }))).toEqual([
      expect.objectContaining({ where: 'toValue', reason: 'same-value' }),
    ]);
  });

  it('is a value that the item does not have', () => {
    expect(wheres(adjustmentFields({ fromValue: 'water' }))).toEqual(['fromValue']);
    expect(
      wheres(adjustmentFields({ item: 'wheelVentilationInForce', fromValue: true, toValue: 'no' })),
    ).toEqual(['toValue']);
  });

  it('is the wrong kind for the item, at each field of the other kind', () => {
    expect(wheres(adjustmentFields({ item: 'payloadKg' }))).toEqual([
      'perUnitDragAreaM2',
      'uPerUnitM2',
      'fromValue',
      'toValue',
      'deltaDragAreaM2',
      'uM2',
    ]);
    expect(wheres({ ...NUMERIC, item: 'cooling' })).toEqual([
      'fromValue',
      'toValue',
      'deltaDragAreaM2',
      'uM2',
      'perUnitDragAreaM2',
      'uPerUnitM2',
    ]);
  });
});

describe('two adjustments for one difference', () => {
  it('are refused in either direction, for each is used backwards as well', () => {
    const backwards = adjustmentFields({ fromValue: 'several-belts', toValue: 'fixed-floor' });
    expect(overlapIssues(backwards, [stored(adjustmentFields())])).toEqual([
      expect.objectContaining({ where: 'item', reason: 'fits-already' }),
    ]);
    expect(overlapIssues(NUMERIC, [stored(NUMERIC)])).toHaveLength(1);
  });

  it('may stand side by side where one holds for named body shapes only, or the other is retired', () => {
    const forEstates = adjustmentFields({ bodyShapes: ['estate'] });
    expect(overlapIssues(forEstates, [stored(adjustmentFields())])).toEqual([]);
    expect(
      overlapIssues(adjustmentFields(), [
        stored(adjustmentFields(), { retiredAt: '2026-03-01T10:00:00.000Z' }),
      ]),
    ).toEqual([]);
    expect(overlapIssues(adjustmentFields({ bodyShapes: ['estate', 'van'] }), [stored(forEstates)])).toEqual([
      expect.objectContaining({ where: 'bodyShapes' }),
    ]);
    expect(overlapIssues(adjustmentFields({ toValue: 'one-belt' }), [stored(adjustmentFields())])).toEqual(
      [],
    );
  });

  it('are used in an order that puts named body shapes first, then the one added first', () => {
    const at = (id: string, fields: Partial<Adjustment>) => stored(adjustmentFields(), { id, ...fields });
    const order = inOrderOfUse([
      at('retired', { retiredAt: '2026-04-01T00:00:00.000Z' }),
      at('later', { addedAt: '2026-03-02T10:00:00.000Z' }),
      at('first', {}),
      at('estates', { bodyShapes: ['estate'], addedAt: '2026-03-03T10:00:00.000Z' }),
    ]);
    expect(order.map(({ id }) => id)).toEqual(['estates', 'first', 'later', 'retired']);
  });
});
