import { csvText, type CsvCell } from '../../core/export/csv';
import { CHECK_WORDS } from './result-check';
import { STATE_WORDS } from './page/state-words';
import type { ResultRow } from './result-rows';

export function resultsCsv(rows: readonly ResultRow[]): string {
  return csvText(resultsTable(rows));
}

/** The rows that are shown, in their order, as a table to take along: plain numbers, units in the heads. */
export function resultsTable(rows: readonly ResultRow[]): readonly (readonly CsvCell[])[] {
  return [
    [
      $localize`Result`,
      $localize`Variant`,
      $localize`Facility`,
      $localize`Tested`,
      $localize`Quantity`,
      $localize`Value at zero yaw`,
      $localize`Unit of the value`,
      $localize`Yaw angles`,
      $localize`Speed in km/h`,
      $localize`Scale`,
      $localize`C_D·A at the reference in m²`,
      $localize`U in m²`,
      $localize`Check`,
      $localize`Why`,
      $localize`State`,
      $localize`Session`,
    ],
    ...rows.map((row) => [
      row.name,
      row.variant,
      row.facility,
      row.testDate,
      row.quantity,
      row.value,
      row.unit,
      row.angles,
      row.speedKmh,
      row.scale,
      row.dragAreaM2,
      row.expandedUM2,
      CHECK_WORDS[row.check.state],
      row.check.reasons.join(' '),
      STATE_WORDS[row.state],
      row.session,
    ]),
  ];
}
