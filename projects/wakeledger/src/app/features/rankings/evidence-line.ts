import type { ViewEvidence, ViewRow } from '#shared/core/ranking/ranking-view';

function sizeWords({ facilityKind, scale }: ViewEvidence): string {
  if (facilityKind === 'simulation') return $localize`simulation`;
  if (facilityKind === 'road') return $localize`road`;
  return scale === 1 ? $localize`full size` : $localize`${Math.round(scale * 100)}:PERCENT: % model`;
}

/** `VT-0231 · Halmere · full size`, and that it was adopted. */
export function evidenceWords(row: Pick<ViewRow, 'evidence'>): string {
  return row.evidence
    .map((each) => {
      const parts = [each.name, each.facilityName, sizeWords(each)];
      if (each.adopted) parts.push($localize`adopted`);
      return parts.join(' · ');
    })
    .join('; ');
}
