import { TestBed } from '@angular/core/testing';
import { NonNullableFormBuilder } from '@angular/forms';
import { policyValues, type PolicyValues } from '#shared/contracts/policies';
import { DEFAULT_LIMITS } from '#shared/core/checks/limits';
import { LIMIT_FIELDS } from './limit-fields';
import {
  contradictions,
  fillPoliciesForm,
  policiesForm,
  readPoliciesForm,
  typedFigure,
  type PoliciesForm,
} from './policies-form';
import { limitDifferences } from './policy-differences';

const SUPPLIED: PolicyValues = policyValues.parse(DEFAULT_LIMITS);

function filled(values: PolicyValues = SUPPLIED): PoliciesForm {
  const form = policiesForm(TestBed.inject(NonNullableFormBuilder));
  fillPoliciesForm(form, values);
  return form;
}

describe('the form of the limits', () => {
  it('gives back what it was filled with, to the last digit', () => {
    expect(readPoliciesForm(filled())).toEqual(SUPPLIED);
  });

  it('asks for every figure of the contract once', () => {
    const leaves = (value: unknown, path: string): readonly string[] =>
      typeof value === 'object' && value !== null
        ? Object.entries(value).flatMap(([key, inner]) => leaves(inner, path === '' ? key : `${path}.${key}`))
        : typeof value === 'number'
          ? [path]
          : [];
    expect(LIMIT_FIELDS.map(({ path }) => path).sort()).toEqual([...leaves(SUPPLIED, '')].sort());
  });

  it('is typed in the units of the trade: per cent, hectopascals, millions of Reynolds number', () => {
    const { blockageCaution, openJetLimit, minimumReynolds, airPressurePa } = filled().getRawValue();
    expect([blockageCaution, openJetLimit, minimumReynolds]).toEqual([5, 35, 2]);
    expect(airPressurePa).toEqual({ from: 930, to: 1050 });
  });

  it('leaves a body shape empty that has no limits yet, whatever the order in which they are kept', () => {
    const [hatch, ...others] = SUPPLIED.plausible;
    const without = { ...SUPPLIED, plausible: [...others].reverse() };
    const field = LIMIT_FIELDS.find(({ path }) => path === 'plausible.0.dragCoefficient.from')!;
    expect(typedFigure(without, field)).toBeUndefined();
    expect(typedFigure({ ...SUPPLIED, plausible: [...others, hatch!] }, field)).toBe(
      hatch!.dragCoefficient.from,
    );
    expect(readPoliciesForm(filled(without)).plausible[0]?.dragCoefficient.from).toBeNaN();
  });

  it('finds what contradicts itself, at the field that is to be changed', () => {
    const form = filled();
    form.controls.blockageCaution.setValue(12);
    form.controls.airTemperatureC.setValue({ from: 30, to: 15 });
    const found = contradictions(readPoliciesForm(form));
    expect(found.map(({ where }) => where)).toEqual(['blockageCaution', 'airTemperatureC.to']);
    for (const { where, detail } of found) {
      expect(form.get(where)).not.toBeNull();
      expect(detail).toMatch(/Choose/);
    }
  });
});

describe('two versions of the limits', () => {
  it('are told apart limit by limit, in the person’s marks', () => {
    const stricter: PolicyValues = {
      ...SUPPLIED,
      machCaution: 0.18,
      blockageExcluded: 0.085,
      plausible: SUPPLIED.plausible.map((body) =>
        body.bodyShape === 'van' ? { ...body, frontalAreaM2: { from: 2.2, to: 5.5 } } : body,
      ),
    };
    expect(limitDifferences(SUPPLIED, stricter, 'de-DE')).toEqual([
      { label: 'Mach number: caution above', before: '0,2', after: '0,18' },
      {
        label: 'Blockage, closed test section: excluded above',
        before: '10\u202f%',
        after: '8,5\u202f%',
      },
      { label: 'Van: Frontal area to', before: '6\u202fm²', after: '5,5\u202fm²' },
    ]);
    expect(limitDifferences(SUPPLIED, SUPPLIED, 'en-GB')).toEqual([]);
  });
});
