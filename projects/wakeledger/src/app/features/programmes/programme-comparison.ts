import type { ProgrammeFields } from '#shared/contracts/programmes';
import type { ComparedField } from '../../core/editing/conflict-rows';
import { formatForInput } from '../../core/numbers/format-number';
import type { NumberLocale } from '../../core/numbers/number-locale';
import { CONDITION_ITEMS, conditionItemWord, conditionValueWords } from '../../ui/condition/condition-words';
import { AIR_STATE_WORDS } from '../../ui/words/evidence-words';

/** What becomes of a result that no sweep brings to the reference Reynolds number. */
export const FRICTION_LINE_WORDS = {
  on: $localize`moved along the friction line`,
  off: $localize`left where it was measured`,
} as const;

export interface NamesKnown {
  readonly locale: NumberLocale;
  variant(id: string): string;
  facility(id: string): string;
}

/** A programme's fields in words, for showing two people's edits beside each other. */
export function programmeComparison({
  locale,
  variant,
  facility,
}: NamesKnown): readonly ComparedField<ProgrammeFields>[] {
  const number = (value: number, unit: string): string => `${formatForInput(value, locale)}\u202f${unit}`;
  return [
    { label: $localize`Name`, read: (each) => each.name },
    { label: $localize`Reference speed`, read: (each) => number(each.referenceSpeedKmh, 'km/h') },
    { label: $localize`Reference air`, read: ({ referenceAir: air }) => airWords(air, number) },
    ...CONDITION_ITEMS.map((item) => ({
      label: conditionItemWord(item),
      read: ({ referenceCondition }: ProgrammeFields) =>
        conditionValueWords(item, referenceCondition[item], locale),
    })),
    {
      label: $localize`Characteristic length`,
      read: (each) => `${each.characteristicLengthName}, ${number(each.characteristicLengthM, 'm')}`,
    },
    {
      label: $localize`Common reference area`,
      read: ({ commonArea }) => {
        if (!commonArea) return $localize`left open`;
        return commonArea.kind === 'fixed' ? number(commonArea.areaM2, 'm²') : variant(commonArea.variantId);
      },
    },
    { label: $localize`Confidence`, read: (each) => number(each.confidence * 100, '%') },
    { label: $localize`Wind speed`, read: (each) => number(each.windSpeedMs, 'm/s') },
    {
      label: $localize`Reynolds number without a sweep`,
      read: ({ frictionLine }) => FRICTION_LINE_WORDS[frictionLine ?? 'on'],
    },
    {
      label: $localize`Sign-off facility`,
      read: ({ referenceFacilityId: id }) => (id ? facility(id) : ''),
    },
    {
      label: $localize`Milestones`,
      read: ({ milestones }) => milestones.map(({ name, date }) => `${name} ${date}`).join('; '),
    },
    { label: $localize`Remark`, read: (each) => each.remark ?? '' },
  ];
}

function airWords(
  air: ProgrammeFields['referenceAir'],
  number: (value: number, unit: string) => string,
): string {
  if (air.state && air.state !== 'custom') return AIR_STATE_WORDS[air.state];
  return [
    air.temperatureC !== undefined && number(air.temperatureC, '°C'),
    air.pressurePa !== undefined && number(air.pressurePa, 'Pa'),
    air.relativeHumidity !== undefined && number(air.relativeHumidity * 100, '%'),
  ]
    .filter(Boolean)
    .join(', ');
}
