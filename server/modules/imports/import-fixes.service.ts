import type { ImportDetail, ImportFix } from '#shared/contracts/imports';
import type { MemberContext } from '../../http/context';
import { fail } from '../../http/problem-error';
import { compiled, nameSource } from './check-import.job';
import { surroundingsOf } from './check-surroundings';
import { checkGroup } from './checking/check-group';
import { groupsOf } from './groups';
import {
  changeCells,
  hasRow,
  regroupRows,
  rowsOfGroups,
  skipRows,
  writeVerdicts,
  type Touched,
} from './import-rows.repository';
import { changeImport, type ImportRecord } from './imports.repository';
import { demandState, held, oneImport } from './imports.service';

export interface FixReply {
  readonly changedRows: number;
  readonly checkedRows: number;
  readonly import: ImportDetail;
}

/** Corrects cells or skips rows, and judges again every result that has lost, gained or kept one of them; nothing else. */
export async function fixRows(
  context: MemberContext,
  programmeId: string,
  id: string,
  fix: ImportFix,
): Promise<FixReply> {
  const record = await held(context, programmeId, id);
  demandState(record, 'ready');
  const touched = await apply(context, record, fix);
  const name = nameSource(record.mapping);
  const moved =
    'column' in name && touched.changedRows > 0
      ? await regroupRows(context.tx, id, name.column, touched.rowNumbers)
      : [];
  const groupKeys = [...new Set([...touched.groupKeys, ...moved])];
  const checkedRows = await judgeAgain(context, record, groupKeys);
  if (touched.changedRows > 0) await changeImport(context.tx, id, {});
  return { changedRows: touched.changedRows, checkedRows, import: await oneImport(context, programmeId, id) };
}

async function apply(context: MemberContext, record: ImportRecord, fix: ImportFix): Promise<Touched> {
  if (fix.kind === 'skip' || fix.kind === 'unskip') return skipRows(context.tx, record.id, fix);
  const width = record.headings.length;
  if (fix.column >= width)
    fail('unusable-input', { where: 'column', detail: `The file has ${String(width)} columns.` });
  if (fix.kind === 'cell' && !(await hasRow(context.tx, record.id, fix.rowNumber)))
    fail('unusable-input', { where: 'rowNumber', detail: `There is no row ${String(fix.rowNumber)}.` });
  return changeCells(context.tx, record.id, { ...fix, text: fix.text.replaceAll('\0', '') }, width);
}

async function judgeAgain(
  context: MemberContext,
  record: ImportRecord,
  groupKeys: readonly string[],
): Promise<number> {
  if (groupKeys.length === 0) return 0;
  const mapping = compiled(record);
  const surroundings = await surroundingsOf(context, record);
  const rows = await rowsOfGroups(context.tx, record.id, groupKeys);
  const verdicts = groupsOf(rows).flatMap((group) => checkGroup(group, mapping, surroundings.context).rows);
  await writeVerdicts(context.tx, record.id, verdicts);
  return verdicts.length;
}
