import type { ImportMapping } from '#shared/contracts/imports';
import type { JobKind, JobRun } from '../../jobs';
import { surroundingsOf } from './check-surroundings';
import { checkGroup } from './checking/check-group';
import { compileMapping, type CompiledMapping } from './checking/compiled-mapping';
import { groupPages } from './groups';
import { openQuestions } from './import-facts';
import { pageOfGroups, setGroupKeys, writeVerdicts } from './import-rows.repository';
import { changeImport, lockImport, type ImportRecord } from './imports.repository';
import { importIdOf } from './job-payload';

export const CHECK_JOB = 'import-check';

export function compiled(record: ImportRecord): CompiledMapping {
  return compileMapping(record.mapping, record.headings, openQuestions(record.facts));
}

/** The column that names results, or the one name for all rows. */
export function nameSource(
  mapping: ImportMapping,
): { readonly column: number } | { readonly constant: string } {
  const column = mapping.columns.find(({ field }) => field === 'name');
  if (column !== undefined) return { column: column.index };
  return { constant: mapping.constants.find(({ field }) => field === 'name')?.text ?? '' };
}

/**
 * Judges every row, page by page, each page in a transaction of its own: what is written so far is seen at once, and a
 * server that dies begins anew without harm, because the same rows get the same verdicts.
 */
export const checkImportJob: JobKind = {
  kind: CHECK_JOB,
  run: async (run) => {
    const importId = importIdOf(run.payload);
    const prepared = await run.inTransaction(async (work) => {
      const record = await lockImport(work.tx, importId);
      if (record?.state !== 'checking') return undefined;
      await setGroupKeys(work.tx, importId, nameSource(record.mapping));
      return { record, surroundings: await surroundingsOf(work, record) };
    });
    if (prepared === undefined) return;
    const { record, surroundings } = prepared;
    const mapping = compiled(record);
    let done = 0;
    for await (const groups of groupPages((after, limit) => page(run, importId, after, limit))) {
      const verdicts = groups.flatMap((group) => checkGroup(group, mapping, surroundings.context).rows);
      await run.inTransaction(({ tx }) => writeVerdicts(tx, importId, verdicts));
      done += verdicts.length;
      await run.progress(done, record.rowCount, 'Checking rows');
    }
    await run.inTransaction(async ({ tx }) => {
      const now = await lockImport(tx, importId);
      if (now?.state === 'checking') await changeImport(tx, importId, { state: 'ready', message: null });
    });
  },
  onEnd: async ({ tx }, payload, outcome, reason) => {
    const record = await lockImport(tx, importIdOf(payload));
    if (record?.state !== 'checking') return;
    await changeImport(tx, record.id, {
      state: 'mapping',
      message: outcome === 'cancelled' ? null : `The check did not finish. ${reason}`,
    });
  },
};

const page = (run: JobRun, importId: string, ...place: [Parameters<typeof pageOfGroups>[2], number]) =>
  run.inTransaction(({ tx }) => pageOfGroups(tx, importId, ...place));
