import type { Configuration, VariantFields } from '#shared/contracts/variants';
import type { ComparedField } from '../../core/editing/conflict-rows';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import { BODY_SHAPE_NAMES } from '../../ui/words/body-shape-words';
import { AREA_METHOD_WORDS, configurationWords } from './variant-words';

/** A variant's fields as they read beside those of a colleague's version, in the order of the form. */
export function variantComparison(format: QuantityFormat): readonly ComparedField<VariantFields>[] {
  const length = (value: number | undefined): string =>
    value === undefined ? '' : format.text(value, 'length');
  return [
    { label: $localize`Name`, read: ({ name }) => name },
    { label: $localize`Body`, read: ({ bodyShape }) => BODY_SHAPE_NAMES[bodyShape] },
    { label: $localize`Description`, read: ({ description }) => description ?? '' },
    { label: $localize`Length`, read: ({ lengthMm }) => length(lengthMm) },
    { label: $localize`Width`, read: ({ widthMm }) => length(widthMm) },
    { label: $localize`Height`, read: ({ heightMm }) => length(heightMm) },
    { label: $localize`Wheelbase`, read: ({ wheelbaseMm }) => length(wheelbaseMm) },
    { label: $localize`Other names`, read: ({ aliases }) => aliases.join(', ') },
    { label: $localize`Frontal areas`, read: ({ frontalAreas }) => areasWords(frontalAreas, format) },
    {
      label: $localize`Configurations`,
      read: ({ configurations }) =>
        configurations.map((each) => `${configurationWords(each, format)}${detailWords(each)}`).join('; '),
    },
    {
      label: $localize`Picture`,
      read: ({ pictureAttachmentId }) =>
        pictureAttachmentId === undefined
          ? $localize`drawn`
          : $localize`own picture (${pictureAttachmentId}:ID:)`,
    },
  ];
}

function areasWords(areas: VariantFields['frontalAreas'], format: QuantityFormat): string {
  return areas
    .map(({ areaM2, uM2, method, date, remark }) =>
      [
        date,
        format.text(areaM2, 'area', { digits: 4 }),
        `u ${format.text(uM2, 'area', { digits: 4 })}`,
        AREA_METHOD_WORDS[method],
        remark ?? '',
      ]
        .filter((part) => part !== '')
        .join(', '),
    )
    .join('; ');
}

/** What the line of a configuration leaves out, so that no difference stays unseen. */
function detailWords(each: Partial<Configuration>): string {
  const parts = [
    each.rollingResistance === undefined ? '' : `C_rr ${each.rollingResistance}`,
    ...Object.entries({ ...each.roadLoadReference, ...each.electric }).map(
      ([name, value]) => `${name} ${value}`,
    ),
    ...Object.entries({ ...each.combustion, ...each.combustion?.fuel })
      .filter(([name]) => name !== 'fuel')
      .map(([name, value]) => `${name} ${value}`),
  ].filter((part) => part !== '');
  return parts.length > 0 ? ` (${parts.join(', ')})` : '';
}
