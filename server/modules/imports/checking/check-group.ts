import type { ImportField } from '#shared/contracts/import-fields';
import type { RowReason, Verdict } from '#shared/contracts/imports';
import type { ResultFields } from '#shared/contracts/results';
import { resultIssues } from '../../results';
import type { CheckContext } from './check-context';
import type { CompiledMapping } from './compiled-mapping';
import { draftResult } from './draft-result';
import { fieldOfIssue } from './field-of-issue';
import { fieldOfCheck, methodChecks } from './method-checks';
import { caution, cautionOf, readRow, refusal, type CheckedRow, type RowValues } from './read-row';
import { resultLevelOf } from './result-level';

export interface RowVerdict {
  readonly rowNumber: number;
  readonly verdict: Verdict;
  readonly reasons: readonly RowReason[];
}

export interface GroupVerdict {
  readonly rows: readonly RowVerdict[];
  /** What would be stored; undefined where any row is refused or the variant is skipped. */
  readonly draft: ResultFields | undefined;
}

const MOST_POINTS = 400;

/**
 * Judges the rows of one name, which make up one result (a yaw sweep has several). One refused row refuses the result:
 * half a sweep is never stored silently; skip the row, and the rest stands by itself.
 */
export function checkGroup(
  group: readonly CheckedRow[],
  mapping: CompiledMapping,
  context: CheckContext,
): GroupVerdict {
  const reasons = new Reasons(mapping);
  const rows = group.map((row) => readRow(row, mapping));
  for (const row of rows) for (const reason of row.reasons) reasons.add(row.row.rowNumber, reason);
  const [first] = rows;
  if (first === undefined) return { rows: [], draft: undefined };

  const level = resultLevelOf(rows, mapping);
  for (const [rowNumber, list] of level.reasons) for (const reason of list) reasons.add(rowNumber, reason);
  const name = level.values.get('name');
  const variantText = level.values.get('variant');
  const facilityText = level.values.get('facility');
  const variant = typeof variantText === 'string' ? context.variantOf(variantText) : undefined;
  if (variant === 'skip') return skipped(rows, String(variantText), mapping);
  const facility = typeof facilityText === 'string' ? context.facilityOf(facilityText) : undefined;

  for (const row of rows) {
    const number = row.row.rowNumber;
    if (row.reasons.some(({ code }) => code === 'ragged-row')) continue;
    for (const field of ['name', 'variant', 'facility', 'testDate', 'scale'] as const)
      if (!level.values.has(field) && !unreadable(row, field))
        reasons.refuse(number, field, 'missing-input', 'This cell is empty, and every result needs it.');
    if (typeof variantText === 'string' && variant === undefined && row.values.has('variant'))
      reasons.refuse(
        number,
        'variant',
        'unknown-variant',
        `The programme has no variant “${variantText}”. Match it to one, create it, or skip its rows.`,
      );
    if (typeof facilityText === 'string' && facility === undefined && row.values.has('facility'))
      reasons.refuse(
        number,
        'facility',
        'unknown-facility',
        `There is no facility “${facilityText}”. Match it to one of the organisation’s facilities, or add it there first.`,
      );
    if (typeof name === 'string' && context.isNameTaken(name))
      reasons.refuse(
        number,
        'name',
        'name-taken',
        `The programme has a result “${name}” already. Give this one another name, or skip it.`,
      );
  }
  checkRepeats(rows, mapping, reasons);
  const valueField = oneQuantity(rows, reasons);
  if (rows.length > MOST_POINTS)
    reasons.refuse(
      first.row.rowNumber,
      'name',
      'too-many-points',
      `${String(rows.length)} rows have this name; one result holds up to ${String(MOST_POINTS)} points. Choose the column that tells results apart.`,
    );
  if (reasons.anyRefusal || variant === undefined || facility === undefined || valueField === undefined)
    return { rows: reasons.verdicts(rows), draft: undefined };

  const draft = draftResult(rows, level.values, valueField, variant, facility, mapping);
  statedWithoutK(level.values, first, reasons);
  const issues = resultIssues(draft, {
    latestPastDay: context.latestPastDay,
    facility,
    frontalAreaM2: variant.frontalAreaM2,
  });
  for (const issue of issues) {
    const { field, point } = fieldOfIssue(issue.where, valueField, mapping);
    const row = (point === undefined ? firstWith(rows, field) : rows[point]) ?? first;
    reasons.refuse(row.row.rowNumber, field, issue.reason ?? 'unusable-input', issue.detail);
  }
  if (!reasons.anyRefusal && context.checks !== undefined)
    for (const check of methodChecks(draft, variant, facility, context.checks)) {
      const field =
        check.refusal === null
          ? fieldOfCheck(check, valueField)
          : fieldOfIssue(check.refusal.where, valueField, mapping).field;
      reasons.add((firstWith(rows, field) ?? first).row.rowNumber, cautionOf(mapping, field, check));
    }
  return { rows: reasons.verdicts(rows), draft: reasons.anyRefusal ? undefined : draft };
}

class Reasons {
  readonly #byRow = new Map<number, RowReason[]>();
  anyRefusal = false;

  constructor(private readonly mapping: CompiledMapping) {}

  add(rowNumber: number, reason: RowReason): void {
    if (reason.verdict === 'refused') this.anyRefusal = true;
    const list = this.#byRow.get(rowNumber);
    if (list === undefined) this.#byRow.set(rowNumber, [reason]);
    else list.push(reason);
  }

  refuse(rowNumber: number, field: ImportField | undefined, code: string, detail: string): void {
    this.add(rowNumber, refusal(this.mapping, field, code, detail));
  }

  verdicts(rows: readonly RowValues[]): readonly RowVerdict[] {
    const refused = rows.filter((row) => this.#of(row).some(({ verdict }) => verdict === 'refused'));
    return rows.map((row) => {
      const own = this.#of(row);
      const { rowNumber } = row.row;
      const [culprit] = refused;
      if (culprit !== undefined && !refused.includes(row)) {
        const detail = `Row ${String(culprit.row.rowNumber)} of the same result is refused. Mend or skip that row.`;
        return {
          rowNumber,
          verdict: 'refused',
          reasons: [...own, refusal(this.mapping, undefined, 'same-result', detail)],
        };
      }
      return {
        rowNumber,
        verdict: culprit !== undefined ? 'refused' : own.length > 0 ? 'cautioned' : 'accepted',
        reasons: own,
      };
    });
  }

  #of(row: RowValues): readonly RowReason[] {
    return this.#byRow.get(row.row.rowNumber) ?? [];
  }
}

/** The cell has a text that could not be read: its own reason says so, and "empty" would be untrue. */
function unreadable(row: RowValues, field: ImportField): boolean {
  return row.reasons.some((reason) => reason.field === field);
}

function firstWith(rows: readonly RowValues[], field: ImportField | undefined): RowValues | undefined {
  return field === undefined ? undefined : rows.find((row) => row.values.has(field));
}

function skipped(rows: readonly RowValues[], text: string, mapping: CompiledMapping): GroupVerdict {
  const reason = caution(mapping, 'variant', 'variant-skipped', `Rows of “${text}” are skipped, as chosen.`);
  return {
    rows: rows.map((row) => ({ rowNumber: row.row.rowNumber, verdict: 'skipped', reasons: [reason] })),
    draft: undefined,
  };
}

/** The same row twice is a slip; the same yaw twice is a repeat, and said. */
function checkRepeats(rows: readonly RowValues[], mapping: CompiledMapping, reasons: Reasons): void {
  const seen = new Map<string, number>();
  const yaws = new Map<number, number>();
  for (const row of rows) {
    const { rowNumber, cells } = row.row;
    const text = cells.join('\u001f');
    const same = seen.get(text);
    if (same !== undefined) {
      reasons.refuse(
        rowNumber,
        undefined,
        'row-twice',
        `This row is the same as row ${String(same)}, cell by cell. Skip one of them, or mend what should differ.`,
      );
      continue;
    }
    seen.set(text, rowNumber);
    const stated = row.values.get('yaw');
    const yaw = typeof stated === 'number' ? stated : 0;
    const earlier = yaws.get(yaw);
    if (earlier === undefined) yaws.set(yaw, rowNumber);
    else
      reasons.add(
        rowNumber,
        caution(
          mapping,
          'name',
          'repeat',
          `Row ${String(earlier)} has the same name and the same yaw: this row is taken as a repeat of it.`,
        ),
      );
  }
}

function oneQuantity(rows: readonly RowValues[], reasons: Reasons): ImportField | undefined {
  const first = rows.find((row) => row.value !== undefined);
  for (const row of rows)
    if (first !== undefined && row.value !== undefined && row.value !== first.value)
      reasons.refuse(
        row.row.rowNumber,
        row.value,
        'two-quantities',
        `Row ${String(first.row.rowNumber)} of the same result fills another quantity. One result is of one quantity: give this row another name.`,
      );
  return first?.value;
}

function statedWithoutK(level: ReadonlyMap<ImportField, unknown>, first: RowValues, reasons: Reasons): void {
  const { rowNumber } = first.row;
  if (level.has('expandedU') && !level.has('k'))
    reasons.refuse(
      rowNumber,
      'k',
      'missing-input',
      'An expanded uncertainty means nothing without its coverage factor k. State k (2 is usual), or leave U out.',
    );
  if (!level.has('expandedU') && level.has('k') && level.has('degreesOfFreedom'))
    reasons.refuse(
      rowNumber,
      'expandedU',
      'missing-input',
      'Coverage factor and degrees of freedom belong to an uncertainty that is not stated. State U, or leave them out.',
    );
}
