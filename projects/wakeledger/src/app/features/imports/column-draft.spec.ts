import type { ImportDetail } from '#shared/contracts/imports';
import { askedConstants, draftOf, freeConstants, mappingOf, withColumn, withConstant } from './column-draft';

const DETAIL = {
  columns: [{ index: 0 }, { index: 1 }, { index: 2 }],
  mapping: {
    decimal: 'comma',
    columns: [
      { index: 0, field: 'name' },
      { index: 1, field: 'dragForce', unit: 'kN' },
    ],
    constants: [],
    variants: [{ action: 'skip', text: 'Mule' }],
    facilities: [],
  },
} as unknown as ImportDetail;

describe('The columns step', () => {
  it('begins with what was guessed and gives it back unchanged', () => {
    expect(mappingOf(draftOf(DETAIL), DETAIL.mapping)).toEqual(DETAIL.mapping);
  });

  it('asks for one value for all rows where a needed field has no column', () => {
    expect(askedConstants(draftOf(DETAIL))).toEqual([
      'variant',
      'facility',
      'testDate',
      'scale',
      'tareAlreadySubtracted',
      'airState',
      'speed',
    ]);
  });

  it('stops asking once a column holds it', () => {
    const draft = withColumn(draftOf(DETAIL), 2, 'scale');
    expect(askedConstants(draft)).not.toContain('scale');
    expect(freeConstants(draft)).not.toContain('scale');
  });

  it('takes a comma in a value for all rows, and never offers one for what was measured', () => {
    const draft = withConstant(draftOf(DETAIL), 'scale', { text: '0,4' });
    expect(mappingOf(draft, DETAIL.mapping).constants).toEqual([{ field: 'scale', text: '0.4', unit: '1' }]);
    expect(freeConstants(draft)).not.toContain('dragCoefficient');
  });

  it('forgets the value for all rows when a column takes its place', () => {
    const draft = withColumn(withConstant(draftOf(DETAIL), 'scale', { text: '1' }), 2, 'scale');
    expect(mappingOf(draft, DETAIL.mapping).constants).toEqual([]);
  });
});
