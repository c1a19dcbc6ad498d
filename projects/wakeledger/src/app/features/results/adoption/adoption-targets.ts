import type { Adoption } from '#shared/contracts/adoptions';
import type { Result } from '#shared/contracts/results';
import type { Reduction } from '#shared/core/reduction/reduction';
import type { QuantityFormat } from '../../../ui/quantity/quantity-format';
import type { AdoptionTarget } from './adoption-dialog';
import { offeredResults } from './offered-results';

interface Surroundings {
  readonly reductions: ReadonlyMap<string, Reduction>;
  readonly variantName: (variantId: string) => string;
  readonly facilityName: (facilityId: string) => string;
}

/** The variants of the selected results, each with its results to choose from and the selected ones chosen. */
export function adoptionTargets(
  selected: readonly Result[],
  results: readonly Result[],
  standing: ReadonlyMap<string, Adoption>,
  { reductions, variantName, facilityName }: Surroundings,
  format: QuantityFormat,
): readonly AdoptionTarget[] {
  const chosen = selected.filter(({ withdrawn }) => withdrawn === undefined);
  return [...new Set(chosen.map(({ variantId }) => variantId))].map((variantId) => ({
    variantId,
    variantName: variantName(variantId),
    standing: standing.get(variantId),
    offered: offeredResults(
      results.filter((each) => each.variantId === variantId),
      reductions,
      facilityName,
      format,
    ),
    resultIds: chosen.filter((each) => each.variantId === variantId).map(({ id }) => id),
  }));
}
