import { correlatedDragArea, correlationAmounts } from '../correlation/correlation';
import { refuse } from '../refusal';
import { amount, type Amount } from '../uncertainty/budget';
import { biasAmountOf, biasKey } from './facility-amounts';
import type { CorrelationStep, ReductionContext, ResultParts } from './reduction';

/**
 * A figure carried to the programme's reference facility; null where the result needs none.
 *
 * @throws {Refused} the codes of the operation correlation
 */
export function correlationStepOf(parts: ResultParts, dragAreaM2: number): CorrelationStep | null {
  const { correlation, facility } = parts;
  if (correlation === null) return null;
  const fit = correlation.fit();
  return {
    correlation,
    fit,
    fromM2: dragAreaM2,
    dragAreaM2: correlatedDragArea(fit, dragAreaM2, correlation.input.id),
    droppedKey: biasKey(facility),
  };
}

/**
 * The amounts after a correlation [m²]: the reference facility's bias instead of the facility's own, all others times b, and
 * what the correlation itself adds (method section 8).
 *
 * @throws {Refused} unknown-facility (the reference)
 */
export function correlatedAmounts(
  before: readonly Amount[],
  step: CorrelationStep,
  { variant }: ResultParts,
  { facilities }: ReductionContext,
): Amount[] {
  const { correlation, fit, fromM2, dragAreaM2, droppedKey } = step;
  const { id, referenceFacilityId } = correlation.input;
  const reference =
    facilities.get(referenceFacilityId) ??
    refuse(
      'unknown-facility',
      `correlation:${id}`,
      `There is no reference facility “${referenceFacilityId}”.`,
    );
  const after: Amount[] = [];
  for (const entry of before) {
    if (entry.key !== droppedKey) after.push({ ...entry, amountM2: entry.amountM2 * fit.slope });
  }
  after.push(
    ...correlationAmounts(fit, fromM2, id, variant.id),
    amount(biasKey(reference), biasAmountOf(reference, dragAreaM2)),
  );
  return after;
}
