import { TestBed } from '@angular/core/testing';
import { NonNullableFormBuilder } from '@angular/forms';
import { variantFields as contract, type VariantFields } from '#shared/contracts/variants';
import { variantFields } from '#shared/testing/domain-fields';
import { conflictRows } from '../../core/editing/conflict-rows';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { enableParts } from './configuration-form';
import { variantComparison } from './variant-comparison';
import { clearVariant, setVariant, variantFieldsOf, variantForm } from './variant-form';
import { standingArea } from './variant-words';

const FULL: VariantFields = variantFields({
  description: 'five-door hatch',
  aliases: ['D5H', 'Hatch'],
  frontalAreas: [
    { areaM2: 2.17, uM2: 0.006, method: 'laser', date: '2026-02-11', remark: 'clay 3' },
    { areaM2: 2.2, uM2: 0.02, method: 'cad', date: '2025-01-05' },
  ],
  configurations: [
    {
      name: 'Petrol',
      massKg: 1370,
      salesShare: 0.4,
      roadLoadReference: {
        f0N: 118,
        f1NPerKmh: 0.61,
        f2NPerKmh2: 0.0312,
        massKg: 1400,
        dragAreaM2: 0.6,
        airDensityKgM3: 1.189,
      },
      combustion: {
        driveEfficiency: 0.93,
        willansSlopeEfficiency: 0.4,
        zeroOutputPowerW: 6200,
        overrunCut: true,
        stopStart: false,
        fuel: { name: 'Petrol E10', heatingValueJPerKg: 41.5e6, densityKgPerL: 0.748, co2KgPerKg: 3.05 },
      },
    },
    { name: 'Electric', massKg: 1655, rollingResistance: 0.0085, salesShare: 0.6 },
  ],
});

describe('a variant’s form', () => {
  const builder = (): NonNullableFormBuilder => TestBed.inject(NonNullableFormBuilder);
  const filled = (fields: VariantFields) => {
    const form = variantForm(builder());
    setVariant(form, fields, builder());
    return form;
  };

  it('gives back what it was filled with, both forms of road load and a powertrain included', () => {
    const fields = variantFieldsOf(filled(FULL));
    expect(fields).toEqual(FULL);
    expect(contract.safeParse(fields).success).toBe(true);
  });

  it('counts as untouched after it was filled', () => {
    expect(filled(FULL).dirty).toBe(false);
  });

  it('leaves out what is no longer chosen and keeps it for when it is chosen again', () => {
    const form = filled(FULL);
    const petrol = form.controls.configurations.at(0);
    petrol.controls.hasCombustion.setValue(false);
    enableParts(petrol);
    expect(variantFieldsOf(form).configurations[0]).not.toHaveProperty('combustion');
    petrol.controls.hasCombustion.setValue(true);
    enableParts(petrol);
    expect(variantFieldsOf(form).configurations[0]?.combustion?.zeroOutputPowerW).toBe(6200);
  });

  it('begins a new variant with one area to be typed and nothing else', () => {
    const form = variantForm(builder());
    clearVariant(form, '2026-12-01', builder());
    expect(form.getRawValue().frontalAreas).toEqual([
      { areaM2: null, uM2: null, method: 'projected-image', date: '2026-12-01', remark: '' },
    ]);
    expect(form.controls.configurations.length).toBe(0);
  });

  it('shows every difference between two edits, even inside a configuration', () => {
    const [petrol, electric] = FULL.configurations;
    const theirs = { ...FULL, configurations: [{ ...petrol!, rollingResistance: 0.01 }, electric!] };
    const rows = conflictRows(variantComparison(TestBed.inject(QuantityFormat)), {
      before: FULL,
      mine: { ...FULL, heightMm: 1440 },
      theirs,
    });
    expect(rows.map(({ label }) => label)).toEqual(['Height', 'Configurations']);
  });
});

describe('standingArea', () => {
  it('takes the newest by date wherever it stands', () => {
    expect(standingArea(FULL.frontalAreas)?.method).toBe('laser');
    expect(standingArea([])).toBeUndefined();
  });
});
