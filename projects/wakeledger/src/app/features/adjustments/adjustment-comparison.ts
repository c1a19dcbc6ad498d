import type { AdjustmentFields } from '#shared/contracts/adjustments';
import type { ComparedField } from '../../core/editing/conflict-rows';
import type { NumberLocale } from '../../core/numbers/number-locale';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import { shapeWords, subjectWords, worthWords } from './adjustment-words';

/** The fields of an adjustment as two people's edits are held against each other. */
export function adjustmentComparison(
  format: QuantityFormat,
  locale: NumberLocale,
): readonly ComparedField<AdjustmentFields>[] {
  return [
    { label: $localize`Name`, read: ({ name }) => name },
    { label: $localize`Difference`, read: (fields) => subjectWords(fields, locale) },
    { label: $localize`Worth in drag area`, read: (fields) => worthWords(fields, format) },
    {
      label: $localize`Degrees of freedom`,
      read: ({ degreesOfFreedom }) =>
        degreesOfFreedom === undefined
          ? $localize`infinite`
          : format.value(degreesOfFreedom, 'number', { digits: 1 }),
    },
    { label: $localize`Holds for`, read: shapeWords },
    { label: $localize`Evidence`, read: ({ evidence }) => evidence },
  ];
}
