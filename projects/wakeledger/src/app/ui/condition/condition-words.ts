import {
  COOLINGS,
  GROUNDS,
  MIRRORS,
  WHEELS,
  type Condition,
  type ConditionItem,
} from '#shared/contracts/condition';
import { formatNumber, THIN_SPACE } from '../../core/numbers/format-number';
import type { NumberLocale } from '../../core/numbers/number-locale';

type Choice = string;

const ITEM_WORDS: Readonly<Record<ConditionItem, string>> = {
  ground: $localize`Ground`,
  wheels: $localize`Wheels`,
  cooling: $localize`Cooling`,
  mirrors: $localize`Mirrors`,
  rideHeightFrontMm: $localize`Ride height, front`,
  rideHeightRearMm: $localize`Ride height, rear`,
  payloadKg: $localize`Payload`,
  tyres: $localize`Tyres`,
  beltSpeedRatio: $localize`Belt speed over wind speed`,
  wheelVentilationInForce: $localize`Wheel ventilation in the force`,
};

/** The items in the order in which they are read and typed. */
export const CONDITION_ITEMS = Object.keys(ITEM_WORDS) as readonly ConditionItem[];

const CHOICE_WORDS: Readonly<Record<Choice, string>> = {
  'fixed-floor': $localize`fixed floor`,
  'boundary-layer-control': $localize`boundary-layer control`,
  'one-belt': $localize`one belt`,
  'several-belts': $localize`several belts`,
  'simulated-moving-ground': $localize`simulated moving ground`,
  road: $localize`road`,
  stationary: $localize`stationary`,
  rotating: $localize`rotating`,
  open: $localize`open`,
  closed: $localize`closed`,
  'mock-up': $localize`mock-up`,
  fitted: $localize`fitted`,
  removed: $localize`removed`,
};

/** The items that are chosen from a list, each with what it may be. */
export const CONDITION_CHOICES = {
  ground: GROUNDS,
  wheels: WHEELS,
  cooling: COOLINGS,
  mirrors: MIRRORS,
} as const satisfies Partial<Record<ConditionItem, readonly string[]>>;

const UNITS: Partial<Readonly<Record<ConditionItem, string>>> = {
  rideHeightFrontMm: 'mm',
  rideHeightRearMm: 'mm',
  payloadKg: 'kg',
};

export function conditionItemWord(item: ConditionItem): string {
  return ITEM_WORDS[item];
}

export function conditionChoiceWord(choice: string): string {
  return CHOICE_WORDS[choice] ?? choice;
}

/** Whether a text names an item of the condition, for what the method answers as open text. */
export function isConditionItem(item: string): item is ConditionItem {
  return Object.hasOwn(ITEM_WORDS, item);
}

/** One item's value in words, with its unit; `not stated` where there is none. */
export function conditionValueWords(
  item: ConditionItem,
  value: Condition[ConditionItem] | null,
  locale: NumberLocale,
): string {
  if (value === undefined || value === null) return $localize`not stated`;
  if (typeof value === 'boolean') return value ? $localize`yes` : $localize`no`;
  if (typeof value === 'string') return conditionChoiceWord(value);
  const unit = UNITS[item];
  const text = formatNumber(value, digitsOf(value), locale);
  return unit ? `${text}${THIN_SPACE}${unit}` : text;
}

/** As many digits as were typed, three at most. */
function digitsOf(value: number): number {
  return Math.min(3, (String(value).split('.')[1] ?? '').length);
}
