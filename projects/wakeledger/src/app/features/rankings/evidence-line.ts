import type { ViewEvidence, ViewRow } from '#shared/core/ranking/ranking-view';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';

function sizeWords({ facilityKind, scale }: ViewEvidence): string {
  if (facilityKind === 'simulation') return $localize`simulation`;
  if (facilityKind === 'road') return $localize`road`;
  return scale === 1 ? $localize`full size` : $localize`${Math.round(scale * 100)}:PERCENT: % model`;
}

/** `VT-0231 · Halmere · full size`, and that it was adopted; of a weighted mean each result, and that it is one. */
export function evidenceWords(row: Pick<ViewRow, 'evidence' | 'rule'>): string {
  const words = resultWords(row);
  return row.rule === 'weighted-mean' && row.evidence.length > 1
    ? $localize`weighted mean of ${words}:RESULTS:`
    : words;
}

function resultWords(row: Pick<ViewRow, 'evidence'>): string {
  return row.evidence
    .map((each) => {
      const parts = [each.name, each.facilityName, sizeWords(each)];
      if (each.adopted) parts.push($localize`adopted`);
      return parts.join(' · ');
    })
    .join('; ');
}

/** Said of a weighted mean whose results scatter more than their uncertainties allow; nothing where they do not. */
export function scatterWords(
  { combination }: Pick<ViewRow, 'combination'>,
  format: QuantityFormat,
): readonly string[] {
  const ratio = combination?.birgeRatio ?? 0;
  if (ratio <= 1) return [];
  const shown = format.value(ratio, 'number', { digits: 1 });
  return [
    $localize`its results scatter more than their uncertainties allow (Birge ratio ${shown}:RATIO:): the mean is widened, which covers the truth in about 90 %`,
  ];
}
