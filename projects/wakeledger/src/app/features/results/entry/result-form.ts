import { type NonNullableFormBuilder, Validators } from '@angular/forms';
import type { AirState } from '#shared/contracts/condition';
import type { ResultFields } from '#shared/contracts/results';
import { filledOrAbsent, withoutBlanks } from '../../../core/editing/without-blanks';
import { conditionForm, conditionOf } from '../../../ui/condition/condition-form';
import { PRESSURE_UNITS, SPEED_UNITS, inBaseUnit } from '../../../ui/field/measured-units';
import type { QuantityName } from '../../../ui/words/evidence-words';

export type AirName = NonNullable<AirState['state']>;
type AreaScale = NonNullable<ResultFields['quotedAreaScale']>;

/** One reading; speed in the unit chosen for the result. */
export function pointForm(builder: NonNullableFormBuilder, yawDeg: number | null = null) {
  const measure = (value: number | null = null) => builder.control<number | null>(value);
  return builder.group({
    yawDeg: measure(yawDeg),
    value: measure(),
    s: measure(),
    n: measure(),
    speedKmh: measure(),
    tareN: measure(),
  });
}
export type PointForm = ReturnType<typeof pointForm>;

/** Controls of a result entered by hand; the names follow the contract, so that a refusal finds its field. */
export function resultForm(builder: NonNullableFormBuilder) {
  const measure = (value: number | null = null) => builder.control<number | null>(value);
  const text = (limit: number) => builder.control('', [Validators.maxLength(limit)]);
  return builder.group({
    name: ['', [Validators.required, Validators.maxLength(120)]],
    variantId: ['', [Validators.required]],
    facilityId: ['', [Validators.required]],
    testDate: ['', [Validators.required]],
    quantity: builder.control<QuantityName>('coefficient'),
    scale: measure(1),
    quotedAreaM2: measure(),
    quotedAreaUM2: measure(),
    quotedAreaScale: builder.control<AreaScale>('full'),
    flowBy: builder.control<'speed' | 'pressure'>('speed'),
    speedKmh: measure(),
    speedUnit: 'km/h',
    dynamicPressurePa: measure(),
    air: builder.group({
      state: builder.control<AirName>('custom'),
      temperatureC: measure(),
      pressurePa: measure(),
      pressureUnit: 'hPa',
      /** In per cent. */
      relativeHumidity: measure(),
    }),
    tareAlreadySubtracted: builder.control<'yes' | 'no'>('yes'),
    tareN: measure(),
    condition: conditionForm(),
    blockageAlreadyCorrectedBy: text(120),
    turbulenceGenerationOrTrips: false,
    stated: builder.group({
      expandedU: measure(),
      k: measure(2),
      degreesOfFreedom: measure(),
      includesFacilityBias: false,
    }),
    session: text(120),
    installation: text(120),
    model: text(120),
    source: text(400),
    remark: text(4000),
    points: builder.array([pointForm(builder, 0)]),
    attachmentId: '',
    /** The planned test that this was; it stays here and is not sent. */
    planId: '',
  });
}
export type ResultForm = ReturnType<typeof resultForm>;
type Typed = ReturnType<ResultForm['getRawValue']>;

/** What the form says, as the contract wants it. What does not belong to the quantity or scale is left out. */
export function resultFieldsOf(form: ResultForm): ResultFields {
  const value = form.getRawValue();
  const { quantity, name, variantId, facilityId, testDate, scale, flowBy } = value;
  const isForce = quantity === 'force';
  const speed = flowBy === 'speed' ? speedOf(value.speedKmh, value.speedUnit) : null;
  return {
    variantId,
    facilityId,
    name: name.trim(),
    testDate,
    quantity,
    scale: scale ?? Number.NaN,
    condition: conditionOf(form.controls.condition),
    ...areaOf(value),
    ...withoutBlanks({
      speedKmh: speed,
      dynamicPressurePa: flowBy === 'pressure' ? value.dynamicPressurePa : null,
      tareN: isForce && value.tareAlreadySubtracted === 'no' ? value.tareN : null,
      blockageAlreadyCorrectedBy: value.blockageAlreadyCorrectedBy,
      session: value.session,
      installation: value.installation,
      model: (scale ?? 1) < 1 ? value.model : '',
      source: value.source,
      remark: value.remark,
      attachmentId: value.attachmentId,
    }),
    ...(isForce ? { tareAlreadySubtracted: value.tareAlreadySubtracted === 'yes' } : {}),
    ...((scale ?? 1) < 1 ? { turbulenceGenerationOrTrips: value.turbulenceGenerationOrTrips } : {}),
    air: airOf(value.air),
    ...statedOf(value),
    points: value.points.map((point) => ({
      yawDeg: point.yawDeg ?? Number.NaN,
      value: point.value ?? Number.NaN,
      ...withoutBlanks({
        s: point.s,
        n: point.n,
        speedKmh: speedOf(point.speedKmh, value.speedUnit),
        tareN: isForce && value.tareAlreadySubtracted === 'no' ? point.tareN : null,
      }),
    })),
  };
}

const speedOf = (typed: number | null, unit: string): number | null =>
  typed === null ? null : inBaseUnit(typed, unit, SPEED_UNITS);

/** The area belongs to a coefficient; of a force it may be told, of the others it is not asked. */
function areaOf({ quantity, quotedAreaM2, quotedAreaUM2, quotedAreaScale }: Typed): Partial<ResultFields> {
  if (quantity === 'drag-area' || quantity === 'coastdown-f2') return {};
  const area = filledOrAbsent({ quotedAreaM2, quotedAreaUM2 });
  return area || quantity === 'coefficient' ? { ...area, quotedAreaScale } : {};
}

function airOf({ state, temperatureC, pressurePa, pressureUnit, relativeHumidity }: Typed['air']): AirState {
  if (state !== 'custom') return { state };
  return {
    state,
    ...withoutBlanks({
      temperatureC,
      pressurePa: pressurePa === null ? null : inBaseUnit(pressurePa, pressureUnit, PRESSURE_UNITS),
      relativeHumidity: relativeHumidity === null ? null : Number((relativeHumidity / 100).toPrecision(12)),
    }),
  };
}

function statedOf({ stated }: Typed): Pick<ResultFields, 'stated'> {
  const { expandedU, k, degreesOfFreedom, includesFacilityBias } = stated;
  if (expandedU === null) return {};
  return {
    stated: {
      expandedU,
      k: k ?? Number.NaN,
      ...withoutBlanks({ degreesOfFreedom }),
      includesFacilityBias,
    },
  };
}
