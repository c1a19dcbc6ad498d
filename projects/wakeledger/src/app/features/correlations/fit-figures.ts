import type { CorrelationFit } from '#shared/core/correlation/correlation';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';

export interface FitFigure {
  readonly label: string;
  readonly words: string;
}

/** What the fit says, each figure with its name. */
export function fitFigures(fit: CorrelationFit, format: QuantityFormat): readonly FitFigure[] {
  const area = (value: number, signed = false): string =>
    format.text(value, 'drag-area', { digits: 4, signed });
  const number = (value: number): string => format.value(value, 'number', { digits: 3 });
  return [
    {
      label: $localize`Slope b`,
      words: fit.offsetOnly
        ? $localize`1: under five pairs only the offset is fitted`
        : $localize`${number(fit.slope)}:SLOPE:, u ${number(fit.slopeUncertainty)}:U:`,
    },
    { label: $localize`Offset a`, words: area(fit.interceptM2, true) },
    {
      label: $localize`Level`,
      words: $localize`${area(fit.centroidM2)}:FROM: is carried to ${area(fit.referenceCentroidM2)}:TO:, u ${area(fit.levelUncertaintyM2)}:U:`,
    },
    {
      label: $localize`Widened by`,
      words:
        fit.wideningFactor > 1
          ? $localize`${number(fit.wideningFactor)}:FACTOR:: the pairs scatter more than their own u explain`
          : $localize`1: the pairs scatter no more than their own u explain`,
    },
    {
      label: $localize`Scatter between geometries`,
      words: area(fit.betweenPairsStandardDeviationM2),
    },
    {
      label: $localize`Holds from`,
      words: $localize`${area(fit.validFromM2)}:FROM: to ${area(fit.validToM2)}:TO:; a figure outside is refused, not extrapolated`,
    },
    {
      label: $localize`Pairs`,
      words: Number.isFinite(fit.degreesOfFreedom)
        ? $localize`${fit.pairs.length}:PAIRS:, ${fit.degreesOfFreedom}:FREEDOM: degrees of freedom`
        : $localize`${fit.pairs.length}:PAIRS:, none to spare: nothing shows how far they scatter`,
    },
  ];
}

/** `CdA of Halmere = +0.0120 m² + 0.984 · CdA of Burnholt`, for those who listen and for the table. */
export function lineSentence(
  fit: CorrelationFit,
  names: { readonly from: string; readonly to: string },
  format: QuantityFormat,
): string {
  const offset = format.text(fit.interceptM2, 'drag-area', { digits: 4 });
  const slope = format.value(fit.slope, 'number', { digits: 3 });
  return $localize`Drag area in ${names.to}:TO: = ${offset}:OFFSET: + ${slope}:SLOPE: × drag area in ${names.from}:FROM:`;
}
