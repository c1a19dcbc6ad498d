import {
  NUMERIC_ITEMS,
  type Adjustment,
  type AdjustmentFields,
  type AdjustmentItem,
} from '#shared/contracts/adjustments';
import { condition } from '#shared/contracts/condition';
import { Issues, type Issue } from '../../rules/issue';

export function isNumericItem(item: AdjustmentItem): boolean {
  return NUMERIC_ITEMS.some((numeric) => numeric === item);
}

const ZERO_U =
  'An uncertainty of zero is never known: nothing is measured exactly. State the standard uncertainty, above 0; where nobody measured it, say what it could be at most and take half of that.';
const MISSING_U = 'The standard uncertainty is needed, above 0. Without it the figure could not be defended.';
const OTHER_KIND_NUMERIC = 'This item is a number: state what one unit of it is worth, and leave this out.';
const OTHER_KIND_CATEGORICAL =
  'This item is a word: state from what, to what and what that is worth, and leave this out.';

function uncertaintyIssues(u: number | undefined, where: string): readonly Issue[] {
  return new Issues()
    .when(u === undefined, where, MISSING_U, 'missing-input')
    .when(u === 0, where, ZERO_U, 'uncertainty-zero').list;
}

function valueIssues(fields: AdjustmentFields, side: 'fromValue' | 'toValue'): readonly Issue[] {
  const { item, [side]: value } = fields;
  if (value === undefined) {
    return [
      {
        where: side,
        reason: 'missing-input',
        detail:
          side === 'fromValue'
            ? 'Say what the result was measured with.'
            : 'Say what the programme refers to.',
      },
    ];
  }
  const readable = condition.shape[item].safeParse(value).success;
  return new Issues().when(!readable, side, 'This item has no such value. Choose one of its own values.')
    .list;
}

function categoricalIssues(fields: AdjustmentFields): readonly Issue[] {
  const { fromValue, toValue, deltaDragAreaM2, uM2, perUnitDragAreaM2, uPerUnitM2 } = fields;
  return new Issues()
    .add(valueIssues(fields, 'fromValue'))
    .add(valueIssues(fields, 'toValue'))
    .when(
      fromValue !== undefined && fromValue === toValue,
      'toValue',
      'From and to are the same, so there is nothing to adjust. Choose two different values.',
      'same-value',
    )
    .when(
      deltaDragAreaM2 === undefined,
      'deltaDragAreaM2',
      'Say what the difference is worth in m² of drag area; 0 is allowed where none was found.',
      'missing-input',
    )
    .add(uncertaintyIssues(uM2, 'uM2'))
    .when(perUnitDragAreaM2 !== undefined, 'perUnitDragAreaM2', OTHER_KIND_CATEGORICAL)
    .when(uPerUnitM2 !== undefined, 'uPerUnitM2', OTHER_KIND_CATEGORICAL).list;
}

function numericIssues(fields: AdjustmentFields): readonly Issue[] {
  const { fromValue, toValue, deltaDragAreaM2, uM2, perUnitDragAreaM2, uPerUnitM2 } = fields;
  return new Issues()
    .when(
      perUnitDragAreaM2 === undefined,
      'perUnitDragAreaM2',
      'Say what one unit is worth in m² of drag area; 0 is allowed where no effect was found.',
      'missing-input',
    )
    .add(uncertaintyIssues(uPerUnitM2, 'uPerUnitM2'))
    .when(fromValue !== undefined, 'fromValue', OTHER_KIND_NUMERIC)
    .when(toValue !== undefined, 'toValue', OTHER_KIND_NUMERIC)
    .when(deltaDragAreaM2 !== undefined, 'deltaDragAreaM2', OTHER_KIND_NUMERIC)
    .when(uM2 !== undefined, 'uM2', OTHER_KIND_NUMERIC).list;
}

/** What is wrong with an adjustment beyond the form of its fields. */
export function adjustmentIssues(fields: AdjustmentFields): readonly Issue[] {
  const { bodyShapes } = fields;
  return new Issues()
    .add(isNumericItem(fields.item) ? numericIssues(fields) : categoricalIssues(fields))
    .when(
      new Set(bodyShapes).size !== bodyShapes.length,
      'bodyShapes',
      'A body shape is named twice. Name each once.',
    ).list;
}

type Fit = Pick<AdjustmentFields, 'item' | 'fromValue' | 'toValue' | 'bodyShapes'>;

/** Whether two adjustments are for the same difference, in whichever direction: each is used backwards as well. */
function sameDifference(one: Fit, other: Fit): boolean {
  if (one.item !== other.item) return false;
  if (isNumericItem(one.item)) return true;
  return (
    (one.fromValue === other.fromValue && one.toValue === other.toValue) ||
    (one.fromValue === other.toValue && one.toValue === other.fromValue)
  );
}

/** One for named body shapes may stand beside one for every shape: it is the closer one, and goes first. */
function sameShapes(one: Fit, other: Fit): boolean {
  if (one.bodyShapes.length === 0 || other.bodyShapes.length === 0) {
    return one.bodyShapes.length === other.bodyShapes.length;
  }
  return one.bodyShapes.some((shape) => other.bodyShapes.includes(shape));
}

/** An adjustment that would fit where one in use fits already: nobody could say which of the two was meant. */
export function overlapIssues(fields: Fit, others: readonly Adjustment[]): readonly Issue[] {
  const twin = others.find(
    (other) => other.retiredAt === undefined && sameDifference(fields, other) && sameShapes(fields, other),
  );
  return twin === undefined
    ? []
    : [
        {
          where: fields.bodyShapes.length === 0 ? 'item' : 'bodyShapes',
          reason: 'fits-already',
          detail: `“${twin.name}” fits this difference already, and only the first that fits is used. Change that one, retire it, or name body shapes that it does not hold for.`,
        },
      ];
}

/** Those in use first, the ones for named body shapes before those for every shape, each by when it was added. */
export function inOrderOfUse(adjustments: readonly Adjustment[]): readonly Adjustment[] {
  const rank = ({ retiredAt, bodyShapes }: Adjustment): number =>
    retiredAt !== undefined ? 2 : bodyShapes.length > 0 ? 0 : 1;
  return [...adjustments].sort(
    (one, other) =>
      rank(one) - rank(other) ||
      Date.parse(one.addedAt) - Date.parse(other.addedAt) ||
      (one.id < other.id ? -1 : 1),
  );
}
