import { type NonNullableFormBuilder, Validators } from '@angular/forms';
import { TUNNEL_KINDS } from '#shared/core/ranking/ranking-input';
import type { Facility, FacilityChange, FacilityFields } from '#shared/contracts/facilities';
import { filledOrAbsent, withoutBlanks } from '../../core/editing/without-blanks';
import { conditionForm, conditionOf, setCondition } from '../../ui/condition/condition-form';
import type { BlockageMethodName, FacilityKindName } from '../../ui/words/evidence-words';

/** Typed in per cent of the drag area; the contract holds fractions. */
const RELATIVE = [
  'biasURelative',
  'sessionURelative',
  'installationURelative',
  'repeatabilityURelative',
] as const;
const AS_TYPED = [
  'areaM2',
  'biasUM2',
  'sessionUM2',
  'sessionDegreesOfFreedom',
  'installationUM2',
  'installationDegreesOfFreedom',
  'repeatabilityDegreesOfFreedom',
] as const;

export function isTunnel(kind: FacilityKindName): boolean {
  return TUNNEL_KINDS.some((tunnel) => tunnel === kind);
}

/** Controls of a facility; the names follow the contract, so that a refusal finds its field. */
export function facilityForm(builder: NonNullableFormBuilder) {
  const measure = () => builder.control<number | null>(null);
  return builder.group({
    name: ['', [Validators.required, Validators.maxLength(120)]],
    kind: builder.control<FacilityKindName>('closed'),
    areaM2: measure(),
    blockage: builder.group({
      method: builder.control<BlockageMethodName>('none'),
      theta: measure(),
      factor: measure(),
      uFractionOfCorrection: measure(),
      uRelative: measure(),
    }),
    usualCondition: conditionForm(),
    biasURelative: measure(),
    biasUM2: measure(),
    sessionURelative: measure(),
    sessionUM2: measure(),
    sessionDegreesOfFreedom: measure(),
    installationURelative: measure(),
    installationUM2: measure(),
    installationDegreesOfFreedom: measure(),
    repeatabilityURelative: measure(),
    repeatabilityDegreesOfFreedom: measure(),
    checkBody: builder.group({
      name: ['', [Validators.maxLength(120)]],
      remark: ['', [Validators.maxLength(4000)]],
    }),
    remark: ['', [Validators.maxLength(4000)]],
    /** Why corrections change; kept with the version, not with the facility. */
    comment: ['', [Validators.minLength(3), Validators.maxLength(1000)]],
  });
}
export type FacilityForm = ReturnType<typeof facilityForm>;

const toPercent = (fraction: number): number => Number((fraction * 100).toPrecision(12));
const fromPercent = (percent: number): number => Number((percent / 100).toPrecision(12));

/** Puts a facility into the form, as saved: nothing counts as changed afterwards. */
export function setFacility(form: FacilityForm, fields: FacilityFields | Facility): void {
  form.reset();
  const { blockage } = fields;
  form.patchValue({
    name: fields.name,
    kind: fields.kind,
    remark: fields.remark ?? '',
    checkBody: { name: fields.checkBody?.name ?? '', remark: fields.checkBody?.remark ?? '' },
    blockage: {
      method: blockage?.method ?? 'none',
      theta: blockage?.theta ?? null,
      factor: blockage?.factor ?? null,
      uFractionOfCorrection: blockage?.uFractionOfCorrection ?? null,
      uRelative: blockage?.uRelative === undefined ? null : toPercent(blockage.uRelative),
    },
    ...Object.fromEntries(AS_TYPED.map((name) => [name, fields[name] ?? null])),
    ...Object.fromEntries(
      RELATIVE.map((name) => {
        const fraction = fields[name];
        return [name, fraction === undefined ? null : toPercent(fraction)];
      }),
    ),
  });
  setCondition(form.controls.usualCondition, fields.usualCondition);
  form.markAsPristine();
  form.markAsUntouched();
}

/** What the form says, as the contract wants it. Fields that do not belong to the chosen kind or method are left out. */
export function facilityFieldsOf(form: FacilityForm): FacilityFields {
  const value = form.getRawValue();
  const { name, kind, areaM2, blockage, checkBody, remark } = value;
  const tunnel = isTunnel(kind);
  const relative = Object.fromEntries(
    RELATIVE.map((field) => {
      const percent = value[field];
      return [field, percent === null ? null : fromPercent(percent)];
    }),
  );
  const asTyped = Object.fromEntries(
    AS_TYPED.filter((field) => field !== 'areaM2').map((field) => [field, value[field]]),
  );
  return {
    name: name.trim(),
    kind,
    usualCondition: conditionOf(form.controls.usualCondition),
    ...withoutBlanks({ areaM2: tunnel ? areaM2 : null, remark, ...relative, ...asTyped }),
    ...(tunnel ? { blockage: blockageOf(blockage) } : {}),
    ...(checkBody.name.trim() === ''
      ? {}
      : { checkBody: { name: checkBody.name.trim(), ...withoutBlanks({ remark: checkBody.remark }) } }),
  };
}

/** As {@link facilityFieldsOf}, with the comment that goes with the change. */
export function facilityChangeOf(form: FacilityForm): FacilityChange {
  return { ...facilityFieldsOf(form), ...withoutBlanks({ comment: form.controls.comment.value }) };
}

/** What a check body says of the session scatter, on its way into the form. */
export interface TakenOver {
  /** Of the drag area. */
  readonly uRelative: number;
  readonly degreesOfFreedom: number;
  readonly comment: string;
}

/** Puts a measured session scatter in the place of the stated one; still to be confirmed by saving. */
export function takeOver(form: FacilityForm, { uRelative, degreesOfFreedom, comment }: TakenOver): void {
  form.patchValue({
    sessionURelative: toPercent(uRelative),
    sessionUM2: null,
    sessionDegreesOfFreedom: degreesOfFreedom,
    comment,
  });
  form.markAsDirty();
}

function blockageOf(
  value: ReturnType<FacilityForm['controls']['blockage']['getRawValue']>,
): NonNullable<FacilityFields['blockage']> {
  const { method, theta, factor, uFractionOfCorrection, uRelative } = value;
  return {
    method,
    ...filledOrAbsent({
      theta: method === 'maskell' ? theta : null,
      factor: method === 'factor' ? factor : null,
      uFractionOfCorrection: method === 'none' ? null : uFractionOfCorrection,
      uRelative: method === 'none' && uRelative !== null ? fromPercent(uRelative) : null,
    }),
  };
}
