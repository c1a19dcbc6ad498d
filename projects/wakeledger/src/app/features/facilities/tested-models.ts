import type { TestedModel } from '#shared/contracts/facilities';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';

/** As many as a person takes in at once. */
const NAMED = 6;

export interface TooLarge {
  readonly named: readonly {
    readonly id: string;
    readonly name: string;
    readonly words: string;
    readonly link: readonly string[];
  }[];
  readonly more: number;
}

/** The results whose models would not fit into a section of this area; undefined where all would, or no area is typed. */
export function tooLargeModels(
  models: readonly TestedModel[],
  areaM2: number | null,
  format: QuantityFormat,
): TooLarge | undefined {
  if (areaM2 === null) return undefined;
  const found = models.filter(({ modelAreaM2 }) => modelAreaM2 >= areaM2);
  if (found.length === 0) return undefined;
  return {
    named: found.slice(0, NAMED).map(({ programmeId, resultId, resultName, variantName, modelAreaM2 }) => ({
      id: resultId,
      name: resultName,
      words: $localize`${variantName}:VARIANT:, a model of ${format.text(modelAreaM2, 'area')}:AREA:`,
      link: ['/programmes', programmeId, 'results', resultId],
    })),
    more: Math.max(0, found.length - NAMED),
  };
}
