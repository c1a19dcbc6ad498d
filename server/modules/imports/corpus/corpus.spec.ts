import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { resultFields } from '#shared/contracts/results';
import type { ImportMapping } from '#shared/contracts/imports';
import { UnreadableFile } from '../reading/unreadable-file';
import { CORPUS_SURROUNDINGS } from './corpus-surroundings';
import { judgeFile, type JudgedFile } from './judge-file';

interface Expected {
  readonly choices?: Partial<ImportMapping>;
  readonly refused?: { readonly code: string; readonly says: string };
  readonly encoding?: string;
  readonly delimiter?: string;
  readonly decimal?: string;
  readonly dateOrder?: string;
  readonly blankLines?: number;
  /** Of a workbook: its sheets with their filled rows, the one that is proposed, and all that is said of it. */
  readonly sheets?: Readonly<Record<string, string>>;
  readonly sheet?: string;
  readonly notes?: readonly string[];
  readonly columns?: Readonly<Record<string, string>>;
  /** What is asked before rows can be checked. */
  readonly asks?: readonly string[];
  /** Row number → verdict and then, for each reason, its code and the heading of the cell. */
  readonly rows?: Readonly<Record<string, readonly string[]>>;
}

const corpus = join(__dirname);
/** The workbooks were written by openpyxl 3.1.5 and XlsxWriter 3.2.9, two libraries that have no part in reading them. */
const files = readdirSync(corpus).filter((file) => /\.(csv|xlsx)$/.test(file));
const expectedOf = (file: string): Expected =>
  JSON.parse(readFileSync(join(corpus, file.replace(/\.(csv|xlsx)$/, '.expected.json')), 'utf8')) as Expected;

async function judged(file: string): Promise<JudgedFile | UnreadableFile> {
  try {
    return await judgeFile(
      readFileSync(join(corpus, file)),
      expectedOf(file).choices ?? {},
      CORPUS_SURROUNDINGS,
    );
  } catch (error) {
    if (error instanceof UnreadableFile) return error;
    throw error;
  }
}

function seen(file: JudgedFile | UnreadableFile): Omit<Expected, 'choices'> {
  if (file instanceof UnreadableFile) return { refused: { code: file.code, says: file.detail } };
  const { read, issues, groups } = file;
  return {
    ...(read.sheets === undefined
      ? {}
      : {
          sheets: Object.fromEntries(
            read.sheets.map(({ name, filledRows, hasTable, hidden }) => [
              name,
              `${String(filledRows)} rows${hasTable ? '' : ', no table'}${hidden ? ', hidden' : ''}`,
            ]),
          ),
          sheet: read.sheets[read.sheet ?? -1]?.name,
          notes: read.notes,
        }),
    encoding: read.encoding,
    delimiter: read.delimiter,
    decimal: read.decimalFound,
    dateOrder: read.dateOrderFound,
    blankLines: read.blankLines,
    columns: Object.fromEntries(
      read.guesses.map(({ index, field, unit }) => [
        read.headings[index],
        unit === undefined ? field : `${field} in ${unit}`,
      ]),
    ),
    asks: issues.map(({ where }) => where),
    rows: Object.fromEntries(
      groups
        .flatMap(({ rows }) => rows)
        .map(({ rowNumber, verdict, reasons }) => [
          String(rowNumber),
          [
            verdict,
            ...reasons.map(({ code, column }) =>
              column === undefined ? code : `${code} @ ${read.headings[column] ?? ''}`,
            ),
          ],
        ]),
    ),
  };
}

describe('The corpus of good and bad files', () => {
  it('has an expectation for every file', () => {
    expect(files.length).toBeGreaterThan(20);
    for (const file of files) expect(Object.keys(expectedOf(file))).not.toHaveLength(0);
  });

  it.each(files)('%s is read, guessed and judged row by row as expected', async (file) => {
    const { choices: _choices, ...expected } = expectedOf(file);
    expect(JSON.parse(JSON.stringify(seen(await judged(file))))).toEqual(expected);
  });

  it.each(files)(
    '%s: every refusal and caution names what is wrong and what would be accepted',
    async (file) => {
      const result = await judged(file);
      const words =
        result instanceof UnreadableFile
          ? [result.detail]
          : result.groups.flatMap(({ rows }) =>
              rows.flatMap(({ reasons }) =>
                reasons.flatMap((reason) => ('detail' in reason ? reason.detail : [])),
              ),
            );
      for (const detail of words) expect(detail).toMatch(/^.{25,}[.?]$/s);
    },
  );

  it.each(files)('%s: what would be stored satisfies the contract of a result', async (file) => {
    const result = await judged(file);
    if (result instanceof UnreadableFile) return;
    for (const { draft } of result.groups) {
      if (draft === undefined) continue;
      const variantId = draft.variantId.startsWith('new:')
        ? '018f0000-0000-7000-8000-000000000009'
        : draft.variantId;
      expect(resultFields.safeParse({ ...draft, variantId }).error).toBeUndefined();
    }
  });

  it.each(files)('%s: a refused row never reaches the store, an accepted one always does', async (file) => {
    const result = await judged(file);
    if (result instanceof UnreadableFile) return;
    for (const { rows, draft } of result.groups) {
      const kept = rows.every(({ verdict }) => verdict === 'accepted' || verdict === 'cautioned');
      expect(draft !== undefined).toBe(kept);
      if (draft !== undefined) expect(draft.points).toHaveLength(rows.length);
    }
  });
});
