import type { RankedCombination } from '#shared/core/ranking/ranking-output';
import type { QuantityFormat } from '../../../ui/quantity/quantity-format';

export interface CombinationLine {
  readonly words: string;
  readonly warns: boolean;
}

/** How the results of a weighted mean agree: weights, Birge ratio, and the between-results estimate beside it. */
export function combinationLines(
  { weights, chiSquared, birgeRatio, betweenResultsVarianceM4, randomEffectsMeanM2 }: RankedCombination,
  format: QuantityFormat,
): readonly CombinationLine[] {
  const number = (value: number, digits: number) => format.value(value, 'number', { digits });
  const shares = weights.map((weight) => format.text(weight * 100, 'percent', { digits: 0 })).join(', ');
  if (birgeRatio === null) return [];
  const scatters = birgeRatio > 1;
  return [
    {
      words: $localize`Weights ${shares}:WEIGHTS:; χ² ${number(chiSquared, 2)}:CHI2:, Birge ratio ${number(birgeRatio, 2)}:RATIO:; DerSimonian–Laird mean ${format.text(randomEffectsMeanM2, 'drag-area', { digits: 4 })}:MEAN:, scatter between the results ${format.text(Math.sqrt(betweenResultsVarianceM4), 'drag-area', { digits: 4 })}:TAU:.`,
      warns: false,
    },
    ...(scatters
      ? [
          {
            words: $localize`▲ They scatter more than their uncertainties allow: something that none of them names. The uncertainty is widened for it; such widening covers the truth in about 90 % of cases.`,
            warns: true,
          },
        ]
      : []),
  ];
}
