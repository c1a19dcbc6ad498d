import { TestBed } from '@angular/core/testing';
import type { TestedModel } from '#shared/contracts/facilities';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { tooLargeModels } from './tested-models';

const model = (resultName: string, modelAreaM2: number): TestedModel => ({
  programmeId: 'p',
  resultId: resultName,
  resultName,
  variantName: 'Dunlin Hatch',
  modelAreaM2,
});

describe('models that stood in a facility', () => {
  const models = [model('H-1', 2.17), model('H-2', 0.35), model('H-3', 0.35)];
  const found = (areaM2: number | null) => tooLargeModels(models, areaM2, TestBed.inject(QuantityFormat));

  it('are no trouble in a section that is larger than all, or while no area is typed', () => {
    expect(found(24)).toBeUndefined();
    expect(found(null)).toBeUndefined();
  });

  it('are named with their results where they would fill the section or more', () => {
    expect(found(2.17)?.named).toEqual([
      {
        id: 'H-1',
        name: 'H-1',
        words: 'Dunlin Hatch, a model of 2.170\u202fm²',
        link: ['/programmes', 'p', 'results', 'H-1'],
      },
    ]);
    expect(found(0.2)?.named).toHaveLength(3);
  });

  it('are counted beyond the first six', () => {
    const many = Array.from({ length: 9 }, (_each, i) => model(`H-${i}`, 2));
    expect(tooLargeModels(many, 1, TestBed.inject(QuantityFormat))).toMatchObject({ more: 3 });
  });
});
