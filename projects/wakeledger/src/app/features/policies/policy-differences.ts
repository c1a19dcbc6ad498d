import type { PolicyValues } from '#shared/contracts/policies';
import type { ComparedField } from '../../core/editing/conflict-rows';
import { formatForInput, THIN_SPACE } from '../../core/numbers/format-number';
import type { NumberLocale } from '../../core/numbers/number-locale';
import { LIMIT_FIELDS } from './limit-fields';
import { typedFigure } from './policies-form';

/** Each limit in words, for showing two sets of them beside each other. */
export function comparedLimits(locale: NumberLocale): readonly ComparedField<PolicyValues>[] {
  return LIMIT_FIELDS.map((field) => ({
    label: field.label,
    read: (values) => {
      const figure = typedFigure(values, field);
      if (figure === undefined || Number.isNaN(figure)) return '';
      const text = formatForInput(figure, locale);
      return field.unit === '' ? text : `${text}${THIN_SPACE}${field.unit}`;
    },
  }));
}

export interface LimitDifference {
  readonly label: string;
  readonly before: string;
  readonly after: string;
}

/** The limits in which two sets differ, in the order of the page. */
export function limitDifferences(
  before: PolicyValues,
  after: PolicyValues,
  locale: NumberLocale,
): readonly LimitDifference[] {
  return comparedLimits(locale)
    .map(({ label, read }) => ({ label, before: read(before), after: read(after) }))
    .filter((each) => each.before !== each.after);
}
