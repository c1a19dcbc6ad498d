import { TestBed } from '@angular/core/testing';
import { NonNullableFormBuilder } from '@angular/forms';
import { type ProgrammeFields, programmeFields } from '#shared/contracts/programmes';
import { conflictRows } from '../../core/editing/conflict-rows';
import { programmeComparison } from './programme-comparison';
import { fillProgrammeForm, newProgrammeValues, programmeForm, readProgrammeForm } from './programme-form';

const DUNLIN: ProgrammeFields = {
  name: 'Dunlin',
  referenceSpeedKmh: 140,
  referenceAir: { state: 'custom', temperatureC: 20, pressurePa: 100000, relativeHumidity: 0.44 },
  referenceCondition: {
    ground: 'several-belts',
    wheels: 'rotating',
    wheelVentilationInForce: false,
    payloadKg: 0,
  },
  characteristicLengthM: 2.65,
  characteristicLengthName: 'wheelbase',
  commonArea: { kind: 'fixed', areaM2: 2.19 },
  confidence: 0.95,
  windSpeedMs: 3,
  frictionLine: 'off',
  referenceFacilityId: '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0050',
  milestones: [{ id: '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0051', name: 'Clay freeze', date: '2027-03-14' }],
  remark: 'From the book of March.',
};

describe('a programme’s form', () => {
  const throughForm = (fields: ProgrammeFields): ProgrammeFields => {
    const builder = TestBed.inject(NonNullableFormBuilder);
    const form = programmeForm(builder);
    fillProgrammeForm(form, fields, builder);
    return readProgrammeForm(form);
  };
  const plain = (value: unknown): unknown => JSON.parse(JSON.stringify(value));

  it('gives back what it was filled with, to the last digit', () => {
    expect(plain(throughForm(DUNLIN))).toEqual(plain(DUNLIN));
  });

  it('keeps the other kinds of area and air', () => {
    const other: ProgrammeFields = {
      ...DUNLIN,
      referenceAir: { state: 'un-gtr-15' },
      commonArea: { kind: 'variant', variantId: '7a1b1c3e-58f6-4a37-8f7a-1f6f6f0a0052' },
      milestones: [],
    };
    expect(plain(throughForm(other))).toEqual(plain(other));
  });

  it('begins a new programme with values that the contract takes, once it has a name', () => {
    const fields = { ...throughForm(newProgrammeValues()), name: 'Sanderling' };
    expect(programmeFields.safeParse(plain(fields)).success).toBe(true);
  });

  it('shows a colleague’s edit field by field, in words', () => {
    const comparison = programmeComparison({
      locale: 'en-GB',
      variant: () => 'Hatch',
      facility: () => 'Halmere',
    });
    const rows = conflictRows(comparison, {
      before: DUNLIN,
      mine: { ...DUNLIN, referenceSpeedKmh: 120 },
      theirs: { ...DUNLIN, referenceCondition: { ...DUNLIN.referenceCondition, cooling: 'open' } },
    });
    expect(rows.map(({ label, mine, theirs }) => [label, mine, theirs])).toEqual([
      ['Reference speed', '120\u202fkm/h', '140\u202fkm/h'],
      ['Cooling', 'not stated', 'open'],
    ]);
  });
});
