import { type NonNullableFormBuilder, Validators } from '@angular/forms';
import type { Adjustment, AdjustmentFields, AdjustmentItem } from '#shared/contracts/adjustments';
import type { BODY_SHAPES } from '#shared/contracts/variants';
import { withoutBlanks } from '../../core/editing/without-blanks';
import { isNumericItem } from './adjustment-words';

export type BodyShape = (typeof BODY_SHAPES)[number];
/** In what the worth is typed: it is kept in m² of drag area either way. */
export type WorthUnit = 'm2' | 'counts';

/** One count is a thousandth in C_D on a named area; the aeronautical ten-thousandth is never meant. */
export const COUNT = 0.001;

/** Controls of an adjustment. Worth and u stand for the pair of fields that the kind of the item asks for. */
export function adjustmentForm(builder: NonNullableFormBuilder) {
  const measure = () => builder.control<number | null>(null);
  return builder.group({
    name: ['', [Validators.required, Validators.maxLength(120)]],
    item: builder.control<AdjustmentItem>('ground'),
    fromValue: '',
    toValue: '',
    unit: builder.control<WorthUnit>('m2'),
    worth: measure(),
    u: measure(),
    countsAreaM2: measure(),
    degreesOfFreedom: measure(),
    bodyShapes: builder.control<readonly BodyShape[]>([]),
    evidence: ['', [Validators.required, Validators.minLength(3), Validators.maxLength(1000)]],
    attachmentId: '',
  });
}
export type AdjustmentForm = ReturnType<typeof adjustmentForm>;

/** Yes and no stand in a choice as words. */
const typedValue = (value: AdjustmentFields['fromValue']): string =>
  value === undefined ? '' : typeof value === 'boolean' ? (value ? 'yes' : 'no') : String(value);

function valueOf(item: AdjustmentItem, text: string): AdjustmentFields['fromValue'] {
  const plain = text.trim();
  if (plain === '') return undefined;
  return item === 'wheelVentilationInForce' ? plain === 'yes' : plain;
}

/** Puts an adjustment into the form, as saved: nothing counts as changed afterwards. */
export function setAdjustment(form: AdjustmentForm, fields: AdjustmentFields | Adjustment): void {
  form.reset();
  form.patchValue({
    name: fields.name,
    item: fields.item,
    fromValue: typedValue(fields.fromValue),
    toValue: typedValue(fields.toValue),
    worth: fields.perUnitDragAreaM2 ?? fields.deltaDragAreaM2 ?? null,
    u: fields.uPerUnitM2 ?? fields.uM2 ?? null,
    degreesOfFreedom: fields.degreesOfFreedom ?? null,
    bodyShapes: fields.bodyShapes,
    evidence: fields.evidence,
    attachmentId: fields.attachmentId ?? '',
  });
  form.markAsPristine();
  form.markAsUntouched();
}

/** A typed amount in m² of drag area; undefined where something is missing. Twelve digits: what was typed, no more. */
export function inSquareMetres(
  amount: number | null,
  unit: WorthUnit,
  areaM2: number | null,
): number | undefined {
  if (amount === null) return undefined;
  if (unit === 'm2') return amount;
  return areaM2 === null ? undefined : Number((amount * COUNT * areaM2).toPrecision(12));
}

/** What the form says, as the contract wants it. */
export function adjustmentFieldsOf(form: AdjustmentForm): AdjustmentFields {
  const value = form.getRawValue();
  const { item, unit, countsAreaM2, degreesOfFreedom, attachmentId } = value;
  const worth = inSquareMetres(value.worth, unit, countsAreaM2);
  const u = inSquareMetres(value.u, unit, countsAreaM2);
  const numeric = isNumericItem(item);
  return {
    name: value.name.trim(),
    item,
    bodyShapes: [...value.bodyShapes],
    evidence: value.evidence.trim(),
    ...withoutBlanks({
      fromValue: numeric ? undefined : valueOf(item, value.fromValue),
      toValue: numeric ? undefined : valueOf(item, value.toValue),
      deltaDragAreaM2: numeric ? undefined : worth,
      uM2: numeric ? undefined : u,
      perUnitDragAreaM2: numeric ? worth : undefined,
      uPerUnitM2: numeric ? u : undefined,
      degreesOfFreedom,
      attachmentId,
    }),
  };
}

const FIELD_OF: Readonly<Record<string, string>> = {
  deltaDragAreaM2: 'worth',
  perUnitDragAreaM2: 'worth',
  uM2: 'u',
  uPerUnitM2: 'u',
};

/** Which control of the form a refusal of the server is about. */
export const controlOf = (where: string): string => FIELD_OF[where] ?? where;
