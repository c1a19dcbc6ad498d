import type { Adjustment, AdjustmentFields, AdjustmentItem } from '#shared/contracts/adjustments';
import { NUMERIC_ITEMS } from '#shared/contracts/adjustments';
import type { NumberLocale } from '../../core/numbers/number-locale';
import { conditionItemWord, conditionValueWords } from '../../ui/condition/condition-words';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import { BODY_SHAPE_NAMES } from '../../ui/words/body-shape-words';

export function isNumericItem(item: AdjustmentItem): boolean {
  return NUMERIC_ITEMS.some((numeric) => numeric === item);
}

/** What one unit of a numeric item is. */
export const UNIT_OF_ITEM: Partial<Readonly<Record<AdjustmentItem, string>>> = {
  rideHeightFrontMm: 'mm',
  rideHeightRearMm: 'mm',
  payloadKg: 'kg',
};

/** One digit more than a drag area is shown with: most adjustments are a few thousandths of a square metre. */
const DIGITS = 4;

/** `from fixed floor to several belts`, or `per mm` */
export function differenceWords(
  { item, fromValue, toValue }: Pick<AdjustmentFields, 'item' | 'fromValue' | 'toValue'>,
  locale: NumberLocale,
): string {
  if (isNumericItem(item)) {
    const unit = UNIT_OF_ITEM[item];
    return unit === undefined ? $localize`per unit` : $localize`per ${unit}:UNIT:`;
  }
  const words = (value: typeof fromValue): string => conditionValueWords(item, value as never, locale);
  return $localize`from ${words(fromValue)}:FROM: to ${words(toValue)}:TO:`;
}

/** `+0.0120 m² ± 0.0040`, standard uncertainty, per unit where the item is a number. */
export function worthWords(fields: AdjustmentFields, format: QuantityFormat): string {
  const worth = fields.perUnitDragAreaM2 ?? fields.deltaDragAreaM2 ?? 0;
  const u = fields.uPerUnitM2 ?? fields.uM2 ?? 0;
  const digits = isNumericItem(fields.item) ? DIGITS + 2 : DIGITS;
  const value = format.text(worth, 'drag-area', { digits, signed: true });
  return $localize`${value}:VALUE:, u ${format.value(u, 'drag-area', { digits })}:U:`;
}

export function shapeWords({ bodyShapes }: Pick<Adjustment, 'bodyShapes'>): string {
  return bodyShapes.length === 0
    ? $localize`every body shape`
    : bodyShapes.map((shape) => BODY_SHAPE_NAMES[shape]).join(', ');
}

/** `Ground, from fixed floor to several belts` */
export function subjectWords(fields: AdjustmentFields, locale: NumberLocale): string {
  return `${conditionItemWord(fields.item)}, ${differenceWords(fields, locale)}`;
}
