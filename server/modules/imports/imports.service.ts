import {
  IMPORT_PAGE_ROWS,
  type ImportDetail,
  type ImportMapping,
  type ImportRow,
  type ImportSummary,
  type RowFilter,
} from '#shared/contracts/imports';
import type { MemberContext, Work } from '../../http/context';
import type { UploadedFile } from '../../http/module';
import { fail } from '../../http/problem-error';
import { enqueueJob, requestCancel } from '../../jobs';
import { Issues } from '../../rules/issue';
import { demandFound, demandVersion, refuseUnusable } from '../../rules/refusals';
import { recordAudit } from '../audit';
import { programmeExists } from '../programmes';
import { CHECK_JOB } from './check-import.job';
import { mappingIssues } from './checking/compiled-mapping';
import { detailOf, summaryOf } from './import-detail';
import { firstMapping, headerHash, importFacts, memorable, openQuestions } from './import-facts';
import { countVerdicts, deleteRows, findRows, insertRows, type Counts } from './import-rows.repository';
import {
  changeImport,
  contentOf,
  describeImport,
  findImport,
  insertImport,
  listImports,
  lockImport,
  rememberedMapping,
  rememberMapping,
  sameFile,
  type ImportRecord,
} from './imports.repository';
import { readImportFile, type FileRead } from './reading/read-file';
import type { TableRow } from './reading/table-under-way';
import { UnreadableFile } from './reading/unreadable-file';
import { STORE_JOB } from './store-import.job';
import { adoptedOfImport, lockVariantsOfImport, withdrawResultsOf } from './store-results.repository';

/** Takes a file in: its rows are kept with the import, and count for nothing. */
export async function bringIn(
  context: MemberContext,
  programmeId: string,
  file: UploadedFile,
): Promise<ImportDetail> {
  if (!(await programmeExists(context.tx, programmeId))) fail('not-found');
  const id = await insertImport(context, {
    programmeId,
    fileName: file.fileName,
    sha256: file.sha256,
    sizeBytes: file.content.length,
  });
  const read = await describe(context, id, file.content, undefined);
  await audit(context, 'import.brought-in', id, [
    { field: 'fileName', after: file.fileName },
    { field: 'sha256', after: file.sha256 },
    { field: 'rows', after: read.rowCount },
  ]);
  return oneImport(context, programmeId, id);
}

/** Reads a file into the rows of an import, and says of the import what was found. */
async function describe(
  context: MemberContext,
  id: string,
  content: Buffer,
  sheet: number | undefined,
): Promise<FileRead> {
  const read = await readable(content, (rows) => insertRows(context.tx, id, rows), sheet);
  const remembered = await rememberedMapping(context.tx, headerHash(read.headings));
  const tables = read.sheets?.filter(({ hasTable }) => hasTable) ?? [];
  await describeImport(context.tx, id, {
    facts: importFacts(read, remembered !== undefined),
    headings: read.headings,
    rowCount: read.rowCount,
    mapping: firstMapping(read, remembered),
    ...(tables.length > 1 ? { content } : {}),
  });
  return read;
}

async function readable(
  content: Buffer,
  store: (rows: readonly TableRow[]) => Promise<void>,
  sheet: number | undefined,
): Promise<FileRead> {
  try {
    return await readImportFile(content, store, sheet);
  } catch (error) {
    const where = sheet === undefined ? 'body.file' : 'body.sheet';
    if (error instanceof UnreadableFile) fail(error.code, { where, detail: error.detail });
    throw error;
  }
}

/** Reads another sheet of a workbook in place of the one before. */
export async function chooseSheet(
  context: MemberContext,
  programmeId: string,
  id: string,
  sheet: number,
  expectedVersion: number,
): Promise<ImportDetail> {
  const record = await held(context, programmeId, id);
  demandVersion(record, expectedVersion);
  demandState(record, 'mapping', 'ready');
  const content = await contentOf(context.tx, id);
  if (content === undefined)
    fail('unusable-input', {
      where: 'body.sheet',
      detail: 'This import has no other sheet that could be read. Bring the file in again.',
    });
  await deleteRows(context.tx, id);
  const read = await describe(context, id, content, sheet);
  await changeImport(context.tx, id, { message: null });
  await audit(context, 'import.sheet-chosen', id, [
    { field: 'sheet', before: nameOfSheet(record.facts), after: nameOfSheet(read) },
    { field: 'rows', before: record.rowCount, after: read.rowCount },
  ]);
  return oneImport(context, programmeId, id);
}

function nameOfSheet({ sheets, sheet }: Pick<FileRead, 'sheets' | 'sheet'>): string {
  return sheets?.[sheet ?? 0]?.name ?? '';
}

export async function allImports(work: Work, programmeId: string): Promise<readonly ImportSummary[]> {
  if (!(await programmeExists(work.tx, programmeId))) fail('not-found');
  const records = await listImports(work.tx, programmeId);
  const summaries: ImportSummary[] = [];
  for (const record of records) summaries.push(await summaryOf(work.tx, record));
  return summaries;
}

export async function oneImport(work: Work, programmeId: string, id: string): Promise<ImportDetail> {
  return detailOf(work.tx, demandFound(await findImport(work.tx, programmeId, id)));
}

/** The import of a command, held for the rest of its transaction. */
export async function held(work: Work, programmeId: string, id: string): Promise<ImportRecord> {
  demandFound(await findImport(work.tx, programmeId, id));
  return demandFound(await lockImport(work.tx, id));
}

/** Stops a command that the import's state does not allow, saying what it is in. @throws {ProblemError} wrong-state */
export function demandState(record: ImportRecord, ...allowed: readonly ImportRecord['state'][]): void {
  if (!allowed.includes(record.state))
    fail('wrong-state', { detail: `This import is ${STATE_WORDS[record.state]}.` });
}

const STATE_WORDS: Readonly<Record<ImportRecord['state'], string>> = {
  mapping: 'waiting for its columns to be assigned',
  checking: 'being checked',
  ready: 'checked, and waits to be stored',
  storing: 'being stored',
  stored: 'stored already',
  withdrawn: 'withdrawn',
  cancelled: 'laid aside',
  failed: 'broken off',
};

/** Says what the columns mean, and has every row judged by it. */
export async function mapColumns(
  context: MemberContext,
  programmeId: string,
  id: string,
  mapping: ImportMapping,
  expectedVersion: number,
): Promise<ImportDetail> {
  const record = await held(context, programmeId, id);
  demandVersion(record, expectedVersion);
  demandState(record, 'mapping', 'ready');
  refuseUnusable([
    ...mappingIssues(mapping, record.headings, openQuestions(record.facts)),
    ...choiceIssues(mapping),
  ]);
  await rememberMapping(context.tx, headerHash(record.headings), memorable(mapping));
  const jobId = await enqueueJob(context, CHECK_JOB, { importId: id }, record.rowCount);
  await changeImport(context.tx, id, { state: 'checking', mapping, jobId, message: null });
  return oneImport(context, programmeId, id);
}

/** A configuration needs both figures or none: half of one could not be stored. */
function choiceIssues(mapping: ImportMapping) {
  const issues = new Issues();
  mapping.variants.forEach((choice, position) => {
    if (choice.action !== 'create') return;
    issues.when(
      (choice.massKg === undefined) !== (choice.rollingResistance === undefined),
      `variants.${String(position)}`,
      `For ${choice.name}, state mass and rolling resistance together, or leave both for later.`,
    );
  });
  return issues.list;
}

export async function rowsOf(
  work: Work,
  programmeId: string,
  id: string,
  filter: RowFilter,
  offset: number,
  limit: number,
): Promise<{ rows: ImportRow[]; total: number; counts: Counts }> {
  demandFound(await findImport(work.tx, programmeId, id));
  const { rows, total } = await findRows(work.tx, id, filter, offset, Math.min(limit, IMPORT_PAGE_ROWS));
  return { rows: [...rows], total, counts: await countVerdicts(work.tx, id) };
}

export async function confirm(
  context: MemberContext,
  programmeId: string,
  id: string,
  leavingOutRefusedRows: number,
  expectedVersion: number,
): Promise<ImportDetail> {
  const record = await held(context, programmeId, id);
  demandVersion(record, expectedVersion);
  demandState(record, 'ready');
  const counts = await countVerdicts(context.tx, id);
  if (counts.refused !== leavingOutRefusedRows)
    fail('conflict', {
      currentVersion: record.version,
      detail: `${String(counts.refused)} rows are refused by now. Look at them again before storing.`,
    });
  const kept = counts.accepted + counts.cautioned;
  if (kept === 0)
    fail('unusable-input', {
      detail: 'No row can be stored: all are refused or skipped. Mend some of them first.',
    });
  const same = await sameFile(context.tx, record);
  if (same?.state === 'stored')
    fail('already-exists', {
      where: 'file',
      detail: `The same file was stored by ${same.createdBy} on ${same.createdAt.toISOString().slice(0, 10)}. Withdraw that import first, or bring in another file.`,
    });
  const jobId = await enqueueJob(context, STORE_JOB, { importId: id }, kept);
  await changeImport(context.tx, id, { state: 'storing', jobId, message: null });
  return oneImport(context, programmeId, id);
}

/** Stops the work that runs. It ends at its next step; the import then is where it was before. */
export async function stop(context: MemberContext, programmeId: string, id: string): Promise<ImportDetail> {
  const record = await held(context, programmeId, id);
  demandState(record, 'checking', 'storing');
  if (record.jobId !== undefined) await requestCancel(context.tx, record.jobId, context.now);
  context.wakeJobs();
  return oneImport(context, programmeId, id);
}

export async function discard(
  context: MemberContext,
  programmeId: string,
  id: string,
): Promise<ImportDetail> {
  const record = await held(context, programmeId, id);
  demandState(record, 'mapping', 'ready', 'failed');
  await deleteRows(context.tx, id);
  await changeImport(context.tx, id, { state: 'cancelled', message: null });
  await audit(context, 'import.laid-aside', id, [{ field: 'fileName', before: record.fileName }]);
  return oneImport(context, programmeId, id);
}

export async function withdraw(
  context: MemberContext,
  programmeId: string,
  id: string,
  reason: string,
): Promise<ImportDetail> {
  const record = await held(context, programmeId, id);
  demandState(record, 'stored');
  await lockVariantsOfImport(context.tx, id);
  const adopted = await adoptedOfImport(context.tx, id);
  if (adopted.length > 0)
    fail('still-in-use', {
      detail: `Adopted results rest on it: ${adopted.join(', ')}. Adopt other results or release them, then withdraw the import.`,
    });
  const withdrawn = await withdrawResultsOf(context, id, reason);
  await changeImport(context.tx, id, { state: 'withdrawn', withdrawnAt: context.now, message: reason });
  await audit(context, 'import.withdrawn', id, [
    { field: 'reason', after: reason },
    { field: 'results', before: withdrawn, after: 0 },
  ]);
  return oneImport(context, programmeId, id);
}

function audit(
  work: Work,
  action: string,
  entityId: string,
  summary: Parameters<typeof recordAudit>[1]['summary'],
): Promise<void> {
  return recordAudit(work, { action, entityKind: 'import', entityId, summary });
}
