import type { Result, ResultPoint } from '#shared/contracts/results';
import type { Reduction } from '#shared/core/reduction/reduction';
import type { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { QUANTITY_UNITS, QUANTITY_WORDS } from '../../../ui/words/evidence-words';
import { exactly } from './raw-lines';

interface Column {
  readonly field: keyof ResultPoint;
  readonly head: string;
}

/** The columns that this result fills, each with its unit; yaw and value always. */
export function pointColumns(result: Pick<Result, 'quantity' | 'points'>): readonly Column[] {
  const unit = QUANTITY_UNITS[result.quantity];
  const of = (words: string, unitOf = unit): string => (unitOf === '' ? words : `${words}, ${unitOf}`);
  const all: readonly Column[] = [
    { field: 'yawDeg', head: of($localize`Yaw`, '°') },
    { field: 'value', head: of(QUANTITY_WORDS[result.quantity]) },
    { field: 's', head: of($localize`s of one reading`) },
    { field: 'n', head: $localize`Readings` },
    { field: 'speedKmh', head: of($localize`Speed`, 'km/h') },
    { field: 'dynamicPressurePa', head: of($localize`Dynamic pressure`, 'Pa') },
    { field: 'tareN', head: of($localize`Tare`, 'N') },
    { field: 'frontLift', head: of($localize`Front lift`) },
    { field: 'rearLift', head: of($localize`Rear lift`) },
    { field: 'sideForce', head: of($localize`Side force`) },
  ];
  return all.filter(
    ({ field }) =>
      field === 'yawDeg' || field === 'value' || result.points.some((point) => point[field] !== undefined),
  );
}

/** The points as they came, and what each is at full scale; a dash where nothing is stated. */
export function pointRows(
  result: Pick<Result, 'quantity' | 'points'>,
  reduction: Reduction | undefined,
  format: QuantityFormat,
): readonly { readonly cells: readonly string[]; readonly dragArea: string }[] {
  const columns = pointColumns(result);
  return result.points.map((point, position) => {
    const reduced = reduction?.points[position];
    return {
      cells: columns.map(({ field }) => {
        const value = point[field];
        return value === undefined ? '–' : exactly(value, format);
      }),
      dragArea: reduced ? format.value(reduced.dragAreaM2, 'drag-area', { digits: 4 }) : '–',
    };
  });
}
