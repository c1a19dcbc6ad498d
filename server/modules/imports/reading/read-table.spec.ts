import { IMPORT_LIMIT_ROWS } from '#shared/contracts/imports';
import { readImportFile } from './read-file';

const HEADINGS = 'Run;Variant;Cd\n';
const rowsOf = (count: number): string =>
  HEADINGS +
  Array.from({ length: count }, (_, i) => `R-${String(i)};Hatch;0,${String(200 + (i % 100))}\n`).join('');

async function read(text: string | Uint8Array) {
  const batches: number[] = [];
  let last = 0;
  const facts = await readImportFile(typeof text === 'string' ? Buffer.from(text) : text, (rows) => {
    batches.push(rows.length);
    last = rows.at(-1)?.rowNumber ?? 0;
    return Promise.resolve();
  });
  return { facts, batches, last };
}

describe('A large file', () => {
  it('of exactly the limit is handed over in small batches', async () => {
    const { facts, batches, last } = await read(rowsOf(IMPORT_LIMIT_ROWS));
    expect(facts.rowCount).toBe(IMPORT_LIMIT_ROWS);
    expect(last).toBe(IMPORT_LIMIT_ROWS + 1);
    expect(Math.max(...batches)).toBeLessThanOrEqual(500);
  });

  it('of one row more is refused with the number of its rows and what would be accepted', async () => {
    await expect(read(rowsOf(IMPORT_LIMIT_ROWS + 1))).rejects.toMatchObject({
      code: 'too-large',
      detail: expect.stringMatching(/20001 rows.*20000.*[Ss]plit/) as string,
    });
  });

  it('without a line break is refused instead of growing in memory', async () => {
    await expect(read(`${HEADINGS}"${'x'.repeat(3_000_000)}`)).rejects.toMatchObject({
      code: 'unusable-input',
    });
  });

  it('with too many columns is refused with their number', async () => {
    const wide = Array.from({ length: 201 }, (_, i) => `c${String(i)}`).join(',');
    await expect(read(`${wide}\n`)).rejects.toMatchObject({
      detail: expect.stringContaining('201 columns') as string,
    });
  });
});

describe('Bytes that are no text', () => {
  it('are refused where a NUL comes late, and the place is named', async () => {
    const bytes = Buffer.concat([Buffer.from(rowsOf(2000)), Buffer.from([0])]);
    await expect(read(bytes)).rejects.toMatchObject({
      code: 'unsupported-file',
      detail: expect.stringContaining(`byte ${String(bytes.length)}`) as string,
    });
  });

  it('are not mistaken: a multi-byte letter across two chunks stays one letter', async () => {
    const { facts } = await read(`${'Run;Größe;Cd\n'}${'R-1;ä;0,3\n'.repeat(10_000)}`);
    expect(facts.encoding).toBe('utf-8');
    expect(facts.columns[1]?.samples).toEqual(['ä']);
  });
});
