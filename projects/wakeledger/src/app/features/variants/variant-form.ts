import { type NonNullableFormBuilder, Validators } from '@angular/forms';
import { type BODY_SHAPES, type FrontalArea, type VariantFields } from '#shared/contracts/variants';
import { withoutBlanks } from '../../core/editing/without-blanks';
import { configurationForm, configurationOf, type ConfigurationForm } from './configuration-form';

type BodyShape = (typeof BODY_SHAPES)[number];
type AreaMethod = FrontalArea['method'];

/** One entry of the frontal area's history. */
export function frontalAreaForm(builder: NonNullableFormBuilder, given?: Partial<FrontalArea>) {
  return builder.group({
    areaM2: builder.control<number | null>(given?.areaM2 ?? null),
    uM2: builder.control<number | null>(given?.uM2 ?? null),
    method: builder.control<AreaMethod>(given?.method ?? 'projected-image'),
    date: [given?.date ?? '', [Validators.required]],
    remark: [given?.remark ?? '', [Validators.maxLength(4000)]],
  });
}
export type FrontalAreaForm = ReturnType<typeof frontalAreaForm>;

/** Controls of a variant; the names follow the contract, so that a refusal finds its field. */
export function variantForm(builder: NonNullableFormBuilder) {
  const measure = () => builder.control<number | null>(null);
  return builder.group({
    name: ['', [Validators.required, Validators.maxLength(120)]],
    bodyShape: builder.control<BodyShape>('hatch'),
    description: ['', [Validators.maxLength(200)]],
    lengthMm: measure(),
    widthMm: measure(),
    heightMm: measure(),
    wheelbaseMm: measure(),
    /** One name a line. */
    aliases: '',
    frontalAreas: builder.array<FrontalAreaForm>([]),
    configurations: builder.array<ConfigurationForm>([]),
    pictureAttachmentId: '',
  });
}
export type VariantForm = ReturnType<typeof variantForm>;

/** Puts a variant into the form, as saved: nothing counts as changed afterwards. */
export function setVariant(form: VariantForm, fields: VariantFields, builder: NonNullableFormBuilder): void {
  const { frontalAreas, configurations } = form.controls;
  frontalAreas.clear({ emitEvent: false });
  configurations.clear({ emitEvent: false });
  for (const area of fields.frontalAreas)
    frontalAreas.push(frontalAreaForm(builder, area), { emitEvent: false });
  for (const each of fields.configurations) {
    configurations.push(configurationForm(builder, each), { emitEvent: false });
  }
  form.patchValue({
    name: fields.name,
    bodyShape: fields.bodyShape,
    description: fields.description ?? '',
    lengthMm: fields.lengthMm ?? null,
    widthMm: fields.widthMm ?? null,
    heightMm: fields.heightMm ?? null,
    wheelbaseMm: fields.wheelbaseMm ?? null,
    aliases: fields.aliases.join('\n'),
    pictureAttachmentId: fields.pictureAttachmentId ?? '',
  });
  form.markAsPristine();
  form.markAsUntouched();
}

/** An empty form: one frontal area waits to be typed, and there is no configuration yet. */
export function clearVariant(form: VariantForm, today: string, builder: NonNullableFormBuilder): void {
  setVariant(
    form,
    { name: '', bodyShape: 'hatch', aliases: [], frontalAreas: [], configurations: [] },
    builder,
  );
  form.controls.frontalAreas.push(frontalAreaForm(builder, { date: today }), { emitEvent: false });
}

/** What the form says, as the contract wants it. Only to be asked of a form that is valid. */
export function variantFieldsOf(form: VariantForm): VariantFields {
  const value = form.getRawValue();
  const { name, bodyShape, description, lengthMm, widthMm, heightMm, wheelbaseMm, pictureAttachmentId } =
    value;
  return {
    name: name.trim(),
    bodyShape,
    ...withoutBlanks({ description, lengthMm, widthMm, heightMm, wheelbaseMm, pictureAttachmentId }),
    aliases: value.aliases
      .split(/\r?\n/)
      .map((alias) => alias.trim())
      .filter((alias) => alias !== ''),
    frontalAreas: value.frontalAreas.map(({ areaM2, uM2, method, date, remark }) => ({
      areaM2: areaM2 ?? 0,
      uM2: uM2 ?? 0,
      method,
      date,
      ...withoutBlanks({ remark }),
    })),
    configurations: form.controls.configurations.controls.map(configurationOf),
  };
}
