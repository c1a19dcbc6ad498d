import type { ImportMapping } from '#shared/contracts/imports';
import { checkGroup, type GroupVerdict } from '../checking/check-group';
import type { CheckContext } from '../checking/check-context';
import { compileMapping, mappingIssues } from '../checking/compiled-mapping';
import { guessedMapping } from '../reading/guessed-mapping';
import { readImportFile, type FileRead } from '../reading/read-file';
import type { TableRow } from '../reading/table-under-way';

export interface JudgedFile {
  readonly read: FileRead;
  readonly mapping: ImportMapping;
  readonly issues: readonly { readonly where: string; readonly detail: string }[];
  readonly groups: readonly GroupVerdict[];
}

/** A whole file through reading, guessing and checking, as the module does it in steps; for tests. */
export async function judgeFile(
  content: Uint8Array,
  choices: Partial<ImportMapping>,
  context: CheckContext,
): Promise<JudgedFile> {
  const rows: TableRow[] = [];
  const read = await readImportFile(content, (batch) => {
    rows.push(...batch);
    return Promise.resolve();
  });
  const mapping = { ...guessedMapping(read), ...choices };
  const open = { decimal: read.decimalFound === 'ambiguous', dateOrder: read.dateOrderFound === 'ambiguous' };
  const issues = mappingIssues(mapping, read.headings, open);
  if (issues.length > 0) return { read, mapping, issues, groups: [] };
  const compiled = compileMapping(mapping, read.headings, open);
  const column = compiled.sources.get('name')?.column ?? 0;
  const groups = new Map<string, TableRow[]>();
  for (const row of rows) {
    const key = row.cells[column] ?? '';
    groups.set(key, [...(groups.get(key) ?? []), row]);
  }
  return {
    read,
    mapping,
    issues,
    groups: [...groups.values()].map((group) => checkGroup(group, compiled, context)),
  };
}
