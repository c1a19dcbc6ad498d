import {
  type FormArray,
  type FormControl,
  type FormGroup,
  type NonNullableFormBuilder,
  Validators,
} from '@angular/forms';
import type { AirState } from '#shared/contracts/condition';
import type { CommonArea, Programme, ProgrammeFields } from '#shared/contracts/programmes';
import { type ConditionForm, conditionForm, conditionOf } from '../../ui/condition/condition-form';

type Nullable = FormControl<number | null>;

export type MilestoneForm = FormGroup<{
  id: FormControl<string>;
  name: FormControl<string>;
  date: FormControl<string>;
}>;

export type ProgrammeForm = FormGroup<{
  name: FormControl<string>;
  referenceSpeedKmh: Nullable;
  airState: FormControl<string>;
  temperatureC: Nullable;
  pressureHPa: Nullable;
  humidityPercent: Nullable;
  condition: ConditionForm;
  characteristicLengthM: Nullable;
  characteristicLengthName: FormControl<string>;
  areaPolicy: FormControl<string>;
  areaM2: Nullable;
  areaVariantId: FormControl<string>;
  confidencePercent: Nullable;
  windSpeedMs: Nullable;
  frictionLine: FormControl<string>;
  referenceFacilityId: FormControl<string>;
  milestones: FormArray<MilestoneForm>;
  remark: FormControl<string>;
}>;

export function milestoneForm(builder: NonNullableFormBuilder): MilestoneForm {
  return builder.group({
    id: '',
    name: ['', [Validators.required, Validators.maxLength(120)]],
    date: ['', Validators.required],
  });
}

export function programmeForm(builder: NonNullableFormBuilder): ProgrammeForm {
  const number = (): Nullable => builder.control<number | null>(null);
  return builder.group({
    name: ['', [Validators.required, Validators.maxLength(120)]],
    referenceSpeedKmh: number(),
    airState: builder.control<string>('un-gtr-15'),
    temperatureC: number(),
    pressureHPa: number(),
    humidityPercent: number(),
    condition: conditionForm(),
    characteristicLengthM: number(),
    characteristicLengthName: ['', [Validators.required, Validators.maxLength(60)]],
    areaPolicy: builder.control<string>('open'),
    areaM2: number(),
    areaVariantId: '',
    confidencePercent: number(),
    windSpeedMs: number(),
    frictionLine: builder.control<string>('on'),
    referenceFacilityId: '',
    milestones: builder.array<MilestoneForm>([]),
    remark: ['', Validators.maxLength(4000)],
  });
}

/** What a new programme begins with; every figure can be changed before it is saved. */
export function newProgrammeValues(): ProgrammeFields {
  return {
    name: '',
    referenceSpeedKmh: 140,
    referenceAir: { state: 'un-gtr-15' },
    referenceCondition: {},
    characteristicLengthM: 2.6,
    characteristicLengthName: $localize`wheelbase`,
    confidence: 0.95,
    windSpeedMs: 3,
    frictionLine: 'on',
    milestones: [],
  };
}

export function fillProgrammeForm(
  form: ProgrammeForm,
  fields: ProgrammeFields | Programme,
  builder: NonNullableFormBuilder,
): void {
  const { referenceAir: air, commonArea } = fields;
  while (form.controls.milestones.length > fields.milestones.length) form.controls.milestones.removeAt(0);
  while (form.controls.milestones.length < fields.milestones.length) {
    form.controls.milestones.push(milestoneForm(builder));
  }
  form.reset({
    name: fields.name,
    referenceSpeedKmh: fields.referenceSpeedKmh,
    airState: air.state ?? 'custom',
    temperatureC: air.temperatureC ?? null,
    pressureHPa: air.pressurePa === undefined ? null : air.pressurePa / 100,
    humidityPercent: air.relativeHumidity === undefined ? null : tidy(air.relativeHumidity * 100),
    condition: conditionForm(fields.referenceCondition).getRawValue(),
    characteristicLengthM: fields.characteristicLengthM,
    characteristicLengthName: fields.characteristicLengthName,
    areaPolicy: commonArea?.kind ?? 'open',
    areaM2: commonArea?.kind === 'fixed' ? commonArea.areaM2 : null,
    areaVariantId: commonArea?.kind === 'variant' ? commonArea.variantId : '',
    confidencePercent: tidy(fields.confidence * 100),
    windSpeedMs: fields.windSpeedMs,
    frictionLine: fields.frictionLine ?? 'on',
    referenceFacilityId: fields.referenceFacilityId ?? '',
    milestones: fields.milestones.map(({ id, name, date }) => ({ id: id ?? '', name, date })),
    remark: fields.remark ?? '',
  });
}

/** The form's values as the contract wants them; call it on a valid form only. */
export function readProgrammeForm(form: ProgrammeForm): ProgrammeFields {
  const value = form.getRawValue();
  return {
    name: value.name.trim(),
    referenceSpeedKmh: value.referenceSpeedKmh ?? 0,
    referenceAir: readAir(value),
    referenceCondition: conditionOf(form.controls.condition),
    characteristicLengthM: value.characteristicLengthM ?? 0,
    characteristicLengthName: value.characteristicLengthName.trim(),
    commonArea: readArea(value),
    confidence: tidy((value.confidencePercent ?? 0) / 100),
    windSpeedMs: value.windSpeedMs ?? 0,
    frictionLine: value.frictionLine === 'off' ? 'off' : 'on',
    referenceFacilityId: value.referenceFacilityId || undefined,
    milestones: value.milestones.map(({ id, name, date }) => ({
      id: id || undefined,
      name: name.trim(),
      date,
    })),
    remark: value.remark.trim() || undefined,
  };
}

type Values = ReturnType<ProgrammeForm['getRawValue']>;

function readAir(value: Values): AirState {
  if (value.airState !== 'custom') return { state: value.airState as AirState['state'] };
  return {
    state: 'custom',
    temperatureC: value.temperatureC ?? undefined,
    pressurePa: value.pressureHPa === null ? undefined : tidy(value.pressureHPa * 100),
    relativeHumidity: value.humidityPercent === null ? undefined : tidy(value.humidityPercent / 100),
  };
}

function readArea(value: Values): CommonArea | undefined {
  if (value.areaPolicy === 'fixed' && value.areaM2 !== null) return { kind: 'fixed', areaM2: value.areaM2 };
  if (value.areaPolicy === 'variant' && value.areaVariantId) {
    return { kind: 'variant', variantId: value.areaVariantId };
  }
  return undefined;
}

/** Takes off what a change of unit adds in the sixteenth digit, so that 45 % stays 45 % both ways. */
function tidy(value: number): number {
  return Number(value.toPrecision(12));
}
