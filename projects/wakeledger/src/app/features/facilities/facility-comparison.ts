import type { FacilityFields } from '#shared/contracts/facilities';
import type { ComparedField } from '../../core/editing/conflict-rows';
import type { NumberLocale } from '../../core/numbers/number-locale';
import { CONDITION_ITEMS, conditionItemWord, conditionValueWords } from '../../ui/condition/condition-words';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import { BLOCKAGE_METHOD_WORDS, FACILITY_KIND_WORDS } from '../../ui/words/evidence-words';
import { uncertaintyWords } from './facility-words';

/** A facility's fields as they read beside those of a colleague's version, in the order of the form. */
export function facilityComparison(
  format: QuantityFormat,
  locale: NumberLocale,
): readonly ComparedField<FacilityFields>[] {
  return [
    { label: $localize`Name`, read: ({ name }) => name },
    { label: $localize`Kind`, read: ({ kind }) => FACILITY_KIND_WORDS[kind] },
    {
      label: $localize`Section or nozzle`,
      read: ({ areaM2 }) => (areaM2 === undefined ? '' : format.text(areaM2, 'area')),
    },
    { label: $localize`Blockage`, read: ({ blockage }) => blockageWords(blockage) },
    ...CONDITION_ITEMS.map((item) => ({
      label: conditionItemWord(item),
      read: ({ usualCondition }: FacilityFields) => conditionValueWords(item, usualCondition[item], locale),
    })),
    {
      label: $localize`Bias`,
      read: (f) => uncertaintyWords({ relative: f.biasURelative, m2: f.biasUM2 }, format),
    },
    {
      label: $localize`Session`,
      read: ({ sessionURelative: relative, sessionUM2: m2, sessionDegreesOfFreedom: degreesOfFreedom }) =>
        uncertaintyWords({ relative, m2, degreesOfFreedom }, format),
    },
    {
      label: $localize`Installation`,
      read: (f) =>
        uncertaintyWords(
          {
            relative: f.installationURelative,
            m2: f.installationUM2,
            degreesOfFreedom: f.installationDegreesOfFreedom,
          },
          format,
        ),
    },
    {
      label: $localize`Repeatability`,
      read: ({ repeatabilityURelative: relative, repeatabilityDegreesOfFreedom: degreesOfFreedom }) =>
        uncertaintyWords({ relative, degreesOfFreedom }, format),
    },
    {
      label: $localize`Check body`,
      read: ({ checkBody }) => [checkBody?.name, checkBody?.remark].filter(Boolean).join(': '),
    },
    { label: $localize`Remark`, read: ({ remark }) => remark ?? '' },
  ];
}

/** How a facility corrects for blockage, in one line; empty where it does not say. */
export function blockageWords(blockage: FacilityFields['blockage']): string {
  if (blockage === undefined) return '';
  const { method, theta, factor, uFractionOfCorrection, uRelative } = blockage;
  return [
    BLOCKAGE_METHOD_WORDS[method],
    theta === undefined ? '' : `θ ${theta}`,
    factor === undefined ? '' : `k ${factor}`,
    uFractionOfCorrection === undefined
      ? ''
      : $localize`u ${uFractionOfCorrection}:FRACTION: of the correction`,
    uRelative === undefined ? '' : $localize`u ${uRelative}:FRACTION: of the drag area`,
  ]
    .filter((part) => part !== '')
    .join(', ');
}
