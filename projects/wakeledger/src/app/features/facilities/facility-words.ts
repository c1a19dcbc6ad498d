import type { FacilityFields } from '#shared/contracts/facilities';
import { compareConditions } from '../../ui/condition/compare-conditions';
import type { NumberLocale } from '../../core/numbers/number-locale';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import type { BlockageMethodName } from '../../ui/words/evidence-words';

/** What each blockage method does, and what it wants, for the person who chooses. */
export const BLOCKAGE_METHOD_HINTS: Readonly<Record<BlockageMethodName, string>> = {
  none: $localize`The figure stays as measured. State what that may cost, as a share of the drag area.`,
  'area-ratio': $localize`ε = β/4 and C_c = C_D/(1 + ε)²: for streamlined bodies in closed sections; needs nothing more.`,
  maskell: $localize`C_c = C_D/(1 + θ·x/A_t): for bluff bodies; needs θ of this facility, for which there is no default.`,
  factor: $localize`C_c = C_D/k with k = q_c/q from the facility’s own calibration: the one for open jets and slotted walls.`,
};

type Uncertainties = Omit<FacilityFields, 'name' | 'kind' | 'usualCondition'>;

/** One line of the facility's uncertainties: `0.5 %, ν 12`. Empty where nothing is stated. */
export function uncertaintyWords(
  parts: { readonly relative?: number; readonly m2?: number; readonly degreesOfFreedom?: number },
  format: QuantityFormat,
): string {
  return [
    parts.relative === undefined ? '' : format.text(parts.relative * 100, 'percent', { digits: 2 }),
    parts.m2 === undefined ? '' : format.text(parts.m2, 'drag-area', { digits: 4 }),
    parts.degreesOfFreedom === undefined ? '' : `ν ${parts.degreesOfFreedom}`,
  ]
    .filter((part) => part !== '')
    .join(', ');
}

/** The four lines, each with what it means and what is stated. */
export function uncertaintyLines(
  fields: Uncertainties,
  format: QuantityFormat,
): readonly { readonly label: string; readonly words: string }[] {
  const lines = [
    {
      label: $localize`bias`,
      words: uncertaintyWords({ relative: fields.biasURelative, m2: fields.biasUM2 }, format),
    },
    {
      label: $localize`session`,
      words: uncertaintyWords(
        {
          relative: fields.sessionURelative,
          m2: fields.sessionUM2,
          degreesOfFreedom: fields.sessionDegreesOfFreedom,
        },
        format,
      ),
    },
    {
      label: $localize`installation`,
      words: uncertaintyWords(
        {
          relative: fields.installationURelative,
          m2: fields.installationUM2,
          degreesOfFreedom: fields.installationDegreesOfFreedom,
        },
        format,
      ),
    },
    {
      label: $localize`repeatability`,
      words: uncertaintyWords(
        {
          relative: fields.repeatabilityURelative,
          degreesOfFreedom: fields.repeatabilityDegreesOfFreedom,
        },
        format,
      ),
    },
  ];
  return lines.filter(({ words }) => words !== '');
}

/** The usual condition in one line, only what is stated. */
export function usualConditionWords(
  fields: Pick<FacilityFields, 'usualCondition'>,
  locale: NumberLocale,
): string {
  return compareConditions({}, fields.usualCondition, locale)
    .filter(({ item }) => fields.usualCondition[item] !== undefined)
    .map(({ words, stated }) => `${words.toLocaleLowerCase()} ${stated}`)
    .join(', ');
}
