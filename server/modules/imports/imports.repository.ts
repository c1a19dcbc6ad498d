import { and, asc, desc, eq, ne, sql } from 'drizzle-orm';
import type { ImportMapping, ImportState } from '#shared/contracts/imports';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { present } from '../../db/returned-row';
import { importMappings, imports } from '../../db/tables/imports';
import { memberships } from '../../db/tables/organisations';
import type { ImportFacts } from './import-facts';

export interface ImportRecord {
  readonly id: string;
  readonly version: number;
  readonly programmeId: string;
  readonly fileName: string;
  readonly sha256: string;
  readonly sizeBytes: number;
  readonly state: ImportState;
  readonly mapping: ImportMapping;
  readonly headings: readonly string[];
  readonly facts: ImportFacts;
  readonly rowCount: number;
  readonly resultCount: number;
  readonly message: string | undefined;
  readonly jobId: string | undefined;
  readonly createdAt: Date;
  readonly createdBy: string;
}

const COLUMNS = {
  id: imports.id,
  version: imports.version,
  programmeId: imports.programmeId,
  fileName: imports.fileName,
  sha256: imports.sha256,
  sizeBytes: imports.sizeBytes,
  state: imports.state,
  mapping: imports.mapping,
  headings: imports.header,
  facts: imports.summary,
  rowCount: imports.rowCount,
  // The column counts rows of progress while the import is stored, and ends as the number of results.
  resultCount: imports.progressRows,
  failure: imports.failure,
  jobId: imports.jobId,
  createdAt: imports.createdAt,
  createdBy: memberships.displayName,
};

const select = (tx: Tx) =>
  tx.select(COLUMNS).from(imports).innerJoin(memberships, eq(memberships.userId, imports.createdBy));

type Row = Awaited<ReturnType<typeof select>>[number];

/** The jsonb columns hold what this module alone has written; their types are those it wrote. */
function recordOf(row: Row): ImportRecord {
  const { failure, jobId, state, mapping, headings, facts, ...rest } = row;
  return {
    ...rest,
    // `reading` lasts no longer than the transaction of the upload, so nobody ever sees it.
    state: state === 'reading' ? 'failed' : state,
    mapping: mapping as ImportMapping,
    headings: headings ?? [],
    facts: facts as ImportFacts,
    message: typeof failure === 'string' ? failure : undefined,
    jobId: jobId ?? undefined,
  };
}

export async function findImport(tx: Tx, programmeId: string, id: string): Promise<ImportRecord | undefined> {
  const [row] = await select(tx).where(and(eq(imports.programmeId, programmeId), eq(imports.id, id)));
  return row && recordOf(row);
}

/** As `findImport`, by its id alone and for the rest of the transaction: two commands of one import wait for each other. */
export async function lockImport(tx: Tx, id: string): Promise<ImportRecord | undefined> {
  await tx.select({ id: imports.id }).from(imports).where(eq(imports.id, id)).for('update');
  const [row] = await select(tx).where(eq(imports.id, id));
  return row && recordOf(row);
}

export async function listImports(tx: Tx, programmeId: string): Promise<readonly ImportRecord[]> {
  const rows = await select(tx)
    .where(eq(imports.programmeId, programmeId))
    .orderBy(desc(imports.createdAt), asc(imports.id))
    .limit(500);
  return rows.map(recordOf);
}

/** The newest other import of the same bytes (of a workbook, of the same sheet) in the programme, unless it was laid aside. */
export async function sameFile(tx: Tx, record: ImportRecord): Promise<ImportRecord | undefined> {
  const [row] = await select(tx)
    .where(
      and(
        eq(imports.programmeId, record.programmeId),
        eq(imports.sha256, record.sha256),
        ne(imports.id, record.id),
        sql`(${imports.summary}->>'sheet') is not distinct from ${record.facts.sheet === undefined ? null : String(record.facts.sheet)}`,
        sql`${imports.state} not in ('cancelled', 'failed')`,
      ),
    )
    .orderBy(sql`${imports.state} <> 'stored'`, desc(imports.createdAt))
    .limit(1);
  return row && recordOf(row);
}

export interface NewImport {
  readonly programmeId: string;
  readonly fileName: string;
  readonly sha256: string;
  readonly sizeBytes: number;
}

/** Makes room for the rows; `describeImport` says the rest once the file has been read. */
export async function insertImport(work: Work, fresh: NewImport): Promise<string> {
  const [row] = await work.tx
    .insert(imports)
    .values({ ...fresh, createdBy: work.userId, createdAt: work.now })
    .returning({ id: imports.id });
  return present(row).id;
}

export async function describeImport(
  tx: Tx,
  id: string,
  read: {
    readonly facts: ImportFacts;
    readonly headings: readonly string[];
    readonly rowCount: number;
    readonly mapping: ImportMapping;
    /** The file itself, where another sheet of it may be asked for. */
    readonly content?: Buffer;
  },
): Promise<void> {
  await tx
    .update(imports)
    .set({
      state: 'mapping',
      content: read.content ?? null,
      summary: read.facts,
      header: read.headings,
      rowCount: read.rowCount,
      mapping: read.mapping,
      encoding: read.facts.encoding ?? null,
      delimiter: read.facts.delimiter ?? null,
      decimal: read.facts.decimalFound ?? null,
    })
    .where(eq(imports.id, id));
}

/** The file, where it was kept. */
export async function contentOf(tx: Tx, id: string): Promise<Buffer | undefined> {
  const [row] = await tx.select({ content: imports.content }).from(imports).where(eq(imports.id, id));
  return row?.content ?? undefined;
}

const OVER: ReadonlySet<ImportState> = new Set<ImportState>(['stored', 'withdrawn', 'cancelled']);

export interface ImportChange {
  readonly state?: ImportState;
  readonly mapping?: ImportMapping;
  readonly jobId?: string;
  readonly message?: string | null;
  readonly resultCount?: number;
  readonly storedAt?: Date;
  readonly withdrawnAt?: Date;
}

export async function changeImport(tx: Tx, id: string, change: ImportChange): Promise<void> {
  const { message, resultCount, ...rest } = change;
  await tx
    .update(imports)
    .set({
      ...rest,
      ...(message === undefined ? {} : { failure: message }),
      ...(resultCount === undefined ? {} : { progressRows: resultCount }),
      // No other sheet of it can be asked for any more.
      ...(change.state !== undefined && OVER.has(change.state) ? { content: null } : {}),
      updatedAt: sql`clock_timestamp()`,
      version: sql`${imports.version} + 1`,
    })
    .where(eq(imports.id, id));
}

export async function rememberedMapping(tx: Tx, headerHash: string): Promise<ImportMapping | undefined> {
  const [row] = await tx
    .select({ mapping: importMappings.mapping })
    .from(importMappings)
    .where(eq(importMappings.headerHash, headerHash));
  return row && (row.mapping as ImportMapping);
}

export async function rememberMapping(tx: Tx, headerHash: string, mapping: ImportMapping): Promise<void> {
  await tx
    .insert(importMappings)
    .values({ headerHash, mapping })
    .onConflictDoUpdate({
      target: [importMappings.organisationId, importMappings.headerHash],
      set: { mapping, updatedAt: sql`clock_timestamp()` },
    });
}
