import { strFromU8, unzipSync } from 'fflate';
import { workbookBytes } from './workbook-bytes';
import type { SheetToWrite } from './workbook';

/** The cells of a sheet as a reader of XML sees them: address → type, style and content. */
function cellsOf(sheets: readonly SheetToWrite[], sheet = 1): Record<string, readonly (string | null)[]> {
  const part = unzipSync(workbookBytes(sheets))[`xl/worksheets/sheet${String(sheet)}.xml`];
  const xml = new DOMParser().parseFromString(strFromU8(part!), 'application/xml');
  expect(xml.querySelector('parsererror')).toBeNull();
  return Object.fromEntries(
    [...xml.querySelectorAll('c')].map((cell) => [
      cell.getAttribute('r'),
      [cell.getAttribute('t'), cell.getAttribute('s'), cell.textContent],
    ]),
  );
}

const cellsOfRow = (row: SheetToWrite['rows'][number]) => cellsOf([{ name: 'Any', rows: [['Head'], row] }]);

describe('workbookBytes', () => {
  it('writes numbers as numbers with every digit, negative and tiny ones too', () => {
    expect(cellsOfRow([0.594, -0.0125, 1e-9, 12_345_678.9])).toMatchObject({
      A2: [null, null, '0.594'],
      B2: [null, null, '-0.0125'],
      C2: [null, null, '1e-9'],
      D2: [null, null, '12345678.9'],
    });
  });

  it.each(['=1+1', '+1+1', '-2+3', '@SUM(A1)', '\t=1', '  =1', '＝1', '−1 count', '=HYPERLINK("x")'])(
    'keeps %j as text that stays text when it is edited, and nothing in it as a formula',
    (text) => {
      expect(cellsOfRow([text])).toMatchObject({ A2: ['inlineStr', '2', text] });
    },
  );

  it('never writes a formula, whatever is in a table', () => {
    const files = unzipSync(workbookBytes([{ name: '=A1', rows: [['=1'], ['<f>1</f>']] }]));
    for (const bytes of Object.values(files)) expect(strFromU8(bytes)).not.toMatch(/<f[ >]/);
  });

  it('keeps signs of markup, quotation marks and line breaks', () => {
    const text = 'belt, "wide" & <long>\nRun _x0041_ β';
    const [type, , content] = cellsOfRow([text])['A2']!;
    expect(type).toBe('inlineStr');
    expect(content).toBe('belt, "wide" & <long>\nRun _x005F_x0041_ β');
  });

  it('leaves out what XML cannot hold: control signs and halves of a pair', () => {
    expect(cellsOfRow(['a\u0000b\u000bc\ud800d'])['A2']?.[2]).toBe('abcd');
  });

  it('leaves a missing value empty, and a number that is none', () => {
    expect(Object.keys(cellsOfRow([null, undefined, '', Number.NaN, Infinity, true]))).toEqual(['A1', 'F2']);
    expect(cellsOfRow([true])['A2']).toEqual(['b', null, '1']);
  });

  it('cuts a text that is longer than a cell and says so by a sign', () => {
    const content = cellsOfRow(['x'.repeat(40_000)])['A2']?.[2];
    expect(content).toHaveLength(32_767);
    expect(content).toMatch(/ …$/);
  });

  it('names columns beyond Z and sheets as every program takes them', () => {
    const rows = [Array.from({ length: 28 }, (_, column) => `Head ${String(column)}`), [1]];
    expect(cellsOf([{ name: 'Any', rows }])['AB1']?.[2]).toBe('Head 27');
    const files = unzipSync(
      workbookBytes([
        { name: "'Yaw: 0/5 [deg]'", rows },
        { name: 'yaw  0 5  deg', rows },
        { name: '?', rows },
      ]),
    );
    const names = [
      ...new DOMParser()
        .parseFromString(strFromU8(files['xl/workbook.xml']!), 'application/xml')
        .querySelectorAll('sheet'),
    ].map((sheet) => sheet.getAttribute('name'));
    expect(new Set(names.map((name) => name?.toLowerCase())).size).toBe(3);
    for (const name of names) expect(name).toMatch(/^[^[\]:*?/\\]{1,31}$/);
  });

  it('gives the same bytes for the same table', () => {
    const sheet = [{ name: 'Any', rows: [['Head'], [1]] }];
    expect(workbookBytes(sheet)).toEqual(workbookBytes(sheet));
  });
});
