import type { TestPlanFields, TestPlanInputs } from '#shared/contracts/test-plans';
import type { ComparedField } from '../../core/editing/conflict-rows';
import type { NumberLocale } from '../../core/numbers/number-locale';
import { CONDITION_ITEMS, conditionItemWord, conditionValueWords } from '../../ui/condition/condition-words';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import type { QuantityKind } from '../../ui/quantity/quantity-kinds';
import { reynoldsWords } from './plan-words';

interface Names {
  readonly variant: (id: string) => string;
  readonly facility: (id: string) => string;
}

type NumberField = {
  [K in keyof TestPlanInputs]-?: NonNullable<TestPlanInputs[K]> extends number ? K : never;
}[keyof TestPlanInputs];

const NUMBERS: readonly (readonly [NumberField, string, QuantityKind])[] = [
  ['scale', $localize`Scale`, 'number'],
  ['frontalAreaM2', $localize`Frontal area`, 'area'],
  ['dragCoefficient', $localize`Drag coefficient`, 'coefficient'],
  ['coefficientAreaM2', $localize`Its reference area`, 'area'],
  ['tunnelTemperatureC', $localize`Air temperature`, 'temperature'],
  ['tunnelPressurePa', $localize`Static pressure`, 'pressure'],
  ['maximumSpeedKmh', $localize`Highest speed`, 'speed'],
  ['maximumForceN', $localize`Force balance carries`, 'force'],
  ['speedKmh', $localize`Speed settled on`, 'speed'],
];

export function targetWords({ target }: TestPlanInputs, format: QuantityFormat): string {
  if (target.basis === 'reference') return $localize`that of the full-size vehicle at the reference`;
  const reynolds = reynoldsWords(target.reynolds, format);
  return target.basis === 'typed'
    ? $localize`${reynolds}:REYNOLDS:, typed`
    : $localize`${reynolds}:REYNOLDS:, accepted by a measured sweep`;
}

/** The fields of a plan as they read, for two people who changed it at once. */
export function planComparison(
  format: QuantityFormat,
  locale: NumberLocale,
  names: Names,
): readonly ComparedField<TestPlanFields>[] {
  return [
    { label: $localize`Name`, read: ({ name }) => name },
    { label: $localize`Variant`, read: ({ variantId }) => names.variant(variantId) },
    { label: $localize`Facility`, read: ({ facilityId }) => names.facility(facilityId) },
    ...NUMBERS.map(([field, label, kind]) => ({
      label,
      read: ({ inputs }: TestPlanFields) => {
        const value = inputs[field];
        return value === undefined || Number.isNaN(value) ? '' : format.text(value, kind);
      },
    })),
    { label: $localize`To be reached`, read: ({ inputs }) => targetWords(inputs, format) },
    {
      label: $localize`Cooling gas`,
      read: ({ inputs }) => (inputs.coolingGas === 'nitrogen' ? $localize`nitrogen` : $localize`air`),
    },
    {
      label: $localize`Turbulence or trips`,
      read: ({ inputs }) => (inputs.turbulence === true ? $localize`yes` : $localize`no`),
    },
    ...CONDITION_ITEMS.map((item) => ({
      label: conditionItemWord(item),
      read: ({ inputs }: TestPlanFields) =>
        inputs.condition[item] === undefined ? '' : conditionValueWords(item, inputs.condition[item], locale),
    })),
    { label: $localize`Remark`, read: ({ inputs }) => inputs.remark ?? '' },
  ];
}
