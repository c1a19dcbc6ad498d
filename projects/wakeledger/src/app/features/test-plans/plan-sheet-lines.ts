import type { Facility } from '#shared/contracts/facilities';
import type { PolicyValues } from '#shared/contracts/policies';
import type { Programme } from '#shared/contracts/programmes';
import type { TestPlan } from '#shared/contracts/test-plans';
import type { Variant } from '#shared/contracts/variants';
import type { NumberLocale } from '../../core/numbers/number-locale';
import { CONDITION_ITEMS, conditionItemWord, conditionValueWords } from '../../ui/condition/condition-words';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import { FACILITY_KIND_WORDS } from '../../ui/words/evidence-words';
import { targetWords } from './plan-comparison';
import { reynoldsWords, speedWords } from './plan-words';

export interface SheetLine {
  readonly label: string;
  readonly words: string;
}
export interface SheetPart {
  readonly title: string;
  readonly lines: readonly SheetLine[];
}

export interface SheetContent {
  readonly plan: TestPlan;
  readonly facility: Facility;
  readonly variant: Variant;
  readonly programme: Programme;
  readonly policies: PolicyValues;
}

/** What stands on the sheet beside its figures, part by part; what is not stated is left out. */
export function sheetLines(
  content: SheetContent,
  format: QuantityFormat,
  locale: NumberLocale,
): readonly SheetPart[] {
  return [
    { title: $localize`What`, lines: whatLines(content, format) },
    { title: $localize`Where`, lines: whereLines(content, format) },
    { title: $localize`Condition`, lines: conditionLines(content, locale) },
    { title: $localize`Limits`, lines: limitLines(content, format) },
  ].filter(({ lines }) => lines.length > 0);
}

const line = (label: string, words: string | undefined): readonly SheetLine[] =>
  words === undefined ? [] : [{ label, words }];

function whatLines({ plan: { inputs }, variant, programme }: SheetContent, format: QuantityFormat) {
  const length = format.text(programme.characteristicLengthM, 'number', { digits: 3 });
  return [
    ...line($localize`Variant`, variant.name),
    ...line($localize`Scale`, format.value(inputs.scale, 'number', { digits: 3 })),
    ...line($localize`Frontal area, full size`, format.text(inputs.frontalAreaM2, 'area')),
    ...line($localize`Drag coefficient assumed`, format.value(inputs.dragCoefficient, 'coefficient')),
    ...line($localize`Reynolds number to reach`, targetWords(inputs, format)),
    ...line(
      $localize`It is formed with`,
      $localize`${programme.characteristicLengthName}:NAME:, ${length}:LENGTH: m at full size`,
    ),
    ...line($localize`Turbulence or trips`, inputs.turbulence === true ? $localize`added` : $localize`none`),
  ];
}

function whereLines({ plan: { inputs }, facility }: SheetContent, format: QuantityFormat) {
  const { areaM2 } = facility;
  const text = (value: number | undefined, write: (value: number) => string) =>
    value === undefined ? undefined : write(value);
  return [
    ...line($localize`Facility`, facility.name),
    ...line($localize`Kind`, FACILITY_KIND_WORDS[facility.kind]),
    ...line(
      $localize`Section or nozzle`,
      text(areaM2, (area) => format.text(area, 'area', { digits: 2 })),
    ),
    ...line(
      $localize`Speed settled on`,
      text(inputs.speedKmh, (speed) => speedWords(speed, format)),
    ),
    ...line(
      $localize`Air`,
      $localize`${format.text(inputs.tunnelTemperatureC, 'temperature')}:TEMPERATURE:, ${format.text(inputs.tunnelPressurePa, 'pressure', { digits: 0 })}:PRESSURE:, taken as dry`,
    ),
  ];
}

function conditionLines({ plan: { inputs } }: SheetContent, locale: NumberLocale) {
  return CONDITION_ITEMS.filter((item) => inputs.condition[item] !== undefined).map((item) => ({
    label: conditionItemWord(item),
    words: conditionValueWords(item, inputs.condition[item], locale),
  }));
}

function limitLines({ plan: { inputs }, facility, policies }: SheetContent, format: QuantityFormat) {
  const mach = (value: number) => format.value(value, 'number', { digits: 2 });
  const percent = (value: number) => format.text(100 * value, 'percent', { digits: 0 });
  return [
    ...line(
      $localize`Mach number`,
      $localize`caution above ${mach(policies.machCaution)}:CAUTION:, refused above ${mach(policies.machExcluded)}:LIMIT:`,
    ),
    ...line(
      $localize`Blockage`,
      facility.kind === 'open-jet'
        ? $localize`refused above ${percent(policies.openJetLimit)}:LIMIT: of the nozzle`
        : $localize`caution above ${percent(policies.blockageCaution)}:CAUTION:, refused above ${percent(policies.blockageExcluded)}:LIMIT:`,
    ),
    ...line($localize`Minimum Reynolds number`, reynoldsWords(policies.minimumReynolds, format)),
    ...line(
      $localize`Highest speed of the facility`,
      inputs.maximumSpeedKmh === undefined ? undefined : speedWords(inputs.maximumSpeedKmh, format),
    ),
    ...line(
      $localize`Force balance carries`,
      inputs.maximumForceN === undefined
        ? undefined
        : format.text(inputs.maximumForceN, 'force', { digits: 0 }),
    ),
  ];
}
