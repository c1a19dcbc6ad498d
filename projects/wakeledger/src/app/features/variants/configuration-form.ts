import { type FormControl, FormGroup, type NonNullableFormBuilder, Validators } from '@angular/forms';
import type { VariantFields } from '#shared/contracts/variants';
import { withoutBlanks } from '../../core/editing/without-blanks';

type ConfigurationInput = VariantFields['configurations'][number];
export type Measure = FormControl<number | null>;

/** Road load (a) built up from rolling resistance and drag area, or (b) measured as f0, f1, f2 of a reference vehicle. */
export type RoadLoadKind = 'build-up' | 'measured';

const measure = (builder: NonNullableFormBuilder, value?: number): Measure =>
  builder.control<number | null>(value ?? null);

function measures<const Names extends readonly string[]>(
  builder: NonNullableFormBuilder,
  names: Names,
  values: { readonly [Name in Names[number]]?: unknown } = {},
): FormGroup<{ [Name in Names[number]]: Measure }> {
  const controls = names.map((name) => {
    const value = values[name as Names[number]];
    return [name, measure(builder, typeof value === 'number' ? value : undefined)];
  });
  return new FormGroup(Object.fromEntries(controls)) as FormGroup<{ [Name in Names[number]]: Measure }>;
}

const REFERENCE = ['f0N', 'f1NPerKmh', 'f2NPerKmh2', 'massKg', 'dragAreaM2', 'airDensityKgM3'] as const;
const ELECTRIC = [
  'driveEfficiency',
  'regenerationEfficiency',
  'regenerationPowerLimitW',
  'auxiliaryPowerW',
  'chargingEfficiency',
  'usableEnergyKWh',
] as const;
const COMBUSTION = ['driveEfficiency', 'willansSlopeEfficiency', 'zeroOutputPowerW'] as const;
const FUEL = ['heatingValueJPerKg', 'densityKgPerL', 'co2KgPerKg'] as const;

/** Controls of one configuration; the names follow the contract, so that a refusal finds its field. */
export function configurationForm(builder: NonNullableFormBuilder, given?: ConfigurationInput) {
  const { combustion } = given ?? {};
  const form = builder.group({
    id: given?.id ?? '',
    name: [given?.name ?? '', [Validators.required, Validators.maxLength(120)]],
    massKg: measure(builder, given?.massKg),
    salesShare: measure(builder, given?.salesShare ?? 0),
    roadLoad: builder.control<RoadLoadKind>(given?.roadLoadReference ? 'measured' : 'build-up'),
    rollingResistance: measure(builder, given?.rollingResistance),
    roadLoadReference: measures(builder, REFERENCE, given?.roadLoadReference),
    hasElectric: given?.electric !== undefined,
    electric: measures(builder, ELECTRIC, given?.electric),
    hasCombustion: combustion !== undefined,
    combustion: builder.group({
      ...measures(builder, COMBUSTION, combustion).controls,
      overrunCut: combustion?.overrunCut ?? true,
      stopStart: combustion?.stopStart ?? true,
      fuel: builder.group({
        name: [combustion?.fuel.name ?? '', [Validators.required, Validators.maxLength(120)]],
        ...measures(builder, FUEL, combustion?.fuel).controls,
      }),
    }),
  });
  enableParts(form);
  return form;
}
export type ConfigurationForm = ReturnType<typeof configurationForm>;

/** A part that is not chosen neither counts nor is asked for; what was typed in it is kept. */
export function enableParts(form: ConfigurationForm): void {
  const { roadLoad, roadLoadReference, hasElectric, electric, hasCombustion, combustion } = form.controls;
  const set = (part: FormGroup, wanted: boolean): void => {
    if (wanted && part.disabled) part.enable({ emitEvent: false });
    if (!wanted && part.enabled) part.disable({ emitEvent: false });
  };
  set(roadLoadReference, roadLoad.value === 'measured');
  set(electric, hasElectric.value);
  set(combustion, hasCombustion.value);
}

/** What the form says, as the contract wants it. Only to be asked of a form that is valid. */
export function configurationOf(form: ConfigurationForm): ConfigurationInput {
  const value = form.getRawValue();
  const { id, name, massKg, salesShare, rollingResistance } = value;
  return {
    ...withoutBlanks({ id, rollingResistance }),
    name: name.trim(),
    massKg: massKg ?? 0,
    salesShare: salesShare ?? 0,
    ...(value.roadLoad === 'measured' ? { roadLoadReference: value.roadLoadReference } : {}),
    ...(value.hasElectric ? { electric: value.electric } : {}),
    ...(value.hasCombustion
      ? {
          combustion: {
            ...value.combustion,
            fuel: { ...value.combustion.fuel, name: value.combustion.fuel.name.trim() },
          },
        }
      : {}),
  } as ConfigurationInput;
}
