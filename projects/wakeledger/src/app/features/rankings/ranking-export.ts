import type { RankingView } from '#shared/core/ranking/ranking-view';
import type { CsvCell } from '../../core/export/csv';
import { evidenceWords } from './evidence-line';
import { cautionWords } from './method-words';

/** The ranking as it is shown, one line a variant; the numbers plain and with every digit, units in the head. */
export function rankingRows(
  view: RankingView,
  lowest: ReadonlyMap<string, number> | undefined,
): readonly (readonly CsvCell[])[] {
  const head = [
    $localize`rank`,
    $localize`variant`,
    $localize`drag area in m²`,
    $localize`U of drag area in m²`,
    $localize`coverage factor`,
    $localize`degrees of freedom`,
    $localize`drag coefficient on common area`,
    $localize`common area in m²`,
    $localize`drag coefficient on own area`,
    $localize`U of drag coefficient on own area`,
    $localize`own area in m²`,
    $localize`energy at the wheel in Wh/km`,
    $localize`U of energy in Wh/km`,
    $localize`cycle`,
    $localize`configuration`,
    $localize`mass in kg`,
    $localize`probability lower than the next`,
    $localize`probability of the lowest`,
    $localize`evidence`,
    $localize`cautions`,
  ];
  const rows = view.rows.map((row): readonly CsvCell[] => [
    row.rank,
    row.name,
    row.figure.dragAreaM2,
    row.figure.expandedUncertaintyM2,
    row.figure.coverageFactor,
    row.figure.effectiveDegreesOfFreedom,
    row.onCommonArea.value,
    row.onCommonArea.areaM2,
    row.onOwnArea.value,
    row.onOwnArea.expandedUncertainty,
    row.onOwnArea.areaM2,
    row.energy?.wheelEnergyWhPerKm,
    row.energy?.expandedUncertaintyWhPerKm,
    row.energy ? view.cycle?.name : undefined,
    row.configuration,
    row.massKg,
    row.probabilityLowerThanNext,
    lowest?.get(row.variantId),
    evidenceWords(row),
    row.cautions.map(cautionWords).join('; '),
  ]);
  return [head, ...rows];
}

/** The same rows, each saying that nobody has decided this: a saved table travels without its page. */
export function markedAsTried(rows: readonly (readonly CsvCell[])[]): readonly (readonly CsvCell[])[] {
  return rows.map((row, index) => [...row, index === 0 ? $localize`state` : $localize`tried, not saved`]);
}
