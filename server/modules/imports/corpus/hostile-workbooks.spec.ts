import { readImportFile, type FileRead } from '../reading/read-file';
import type { TableRow } from '../reading/table-under-way';
import { UnreadableFile } from '../reading/unreadable-file';
import { WORKBOOK_LIMITS } from '../reading/workbook/limits';
import { readWorkbook } from '../reading/workbook/read-workbook';
import { GOOD_ROW, resultsSheet, rowXml, workbookOf } from './workbook-builder';
import { zipOf } from './zip-builder';

interface Taken {
  readonly read: FileRead;
  readonly rows: readonly TableRow[];
}

async function taken(content: Buffer, sheet?: number): Promise<Taken> {
  const rows: TableRow[] = [];
  const read = await readImportFile(
    content,
    (batch) => {
      rows.push(...batch);
      return Promise.resolve();
    },
    sheet,
  );
  return { read, rows };
}

async function refusal(deed: Promise<unknown>): Promise<string> {
  const outcome = await deed.then(
    () => 'it was taken',
    (error: unknown) => error,
  );
  if (!(outcome instanceof UnreadableFile)) throw outcome;
  expect(outcome.detail).toMatch(/^.{40,}\.$/s);
  return `${outcome.code}: ${outcome.detail}`;
}

const megabytesOf = (bytes: number): number => bytes / 1024 / 1024;

/** What the heap holds more of afterwards than before, at its highest while the deed goes on. */
async function mostHeap(deed: () => Promise<unknown>): Promise<number> {
  const before = process.memoryUsage().heapUsed;
  let most = before;
  const watch = setInterval(() => {
    most = Math.max(most, process.memoryUsage().heapUsed);
  }, 5);
  try {
    await deed();
  } finally {
    clearInterval(watch);
  }
  return megabytesOf(Math.max(most, process.memoryUsage().heapUsed) - before);
}

const DOCTYPE = '<!DOCTYPE x [<!ENTITY secret SYSTEM "file:///etc/passwd">]>';

describe('A workbook that means harm or is broken', () => {
  it('is built rightly by these tests: the same workbook without harm is taken', async () => {
    const { read, rows } = await taken(workbookOf({}));
    expect(rows).toEqual([{ rowNumber: 2, cells: GOOD_ROW.map(String) }]);
    expect(read.sheets).toEqual([{ name: 'Results', hidden: false, filledRows: 2, hasTable: true }]);
  });

  it.each([
    'xl/worksheets/sheet0.xml',
    'xl/workbook.xml',
    '_rels/.rels',
    '[Content_Types].xml',
    'xl/sharedStrings.xml',
    'docProps/core.xml',
    'xl/drawings/nobody-reads-this',
  ])('with a document type declaration in %s is refused, and the part is named', async (name) => {
    const content = `<?xml version="1.0"?>\n<!-- hello -->${DOCTYPE}<x>&secret;</x>`;
    expect(await refusal(taken(workbookOf({ parts: [{ name, content }] })))).toMatch(
      new RegExp(`^unsupported-file: The part ${name.toLowerCase().replace(/[[\].]/g, '\\$&')} .*DOCTYPE`),
    );
  });

  it('cannot hide the declaration in UTF-16, with or without its mark', async () => {
    const text = `<?xml version="1.0" encoding="UTF-16"?>${DOCTYPE}<x/>`;
    for (const written of [`\ufeff${text}`, text]) {
      const content = Buffer.from(written, 'utf16le');
      for (const bytes of [content, Buffer.from(content).swap16()])
        expect(
          await refusal(taken(workbookOf({ parts: [{ name: 'xl/comments1.xml', content: bytes }] }))),
        ).toContain('DOCTYPE');
    }
  });

  it('may hold parts that nobody reads, in loose markup or another encoding or none at all', async () => {
    const parts = [
      { name: 'xl/drawings/vmlDrawing1.vml', content: '<xml><br><font color=red></xml>' },
      {
        name: 'customXml/item1.xml',
        content: Buffer.from('<?xml version="1.0" encoding="ISO-8859-1"?><x>\u00e4</x>', 'latin1'),
      },
      { name: 'xl/printerSettings/1.bin', content: Buffer.from([0x3c, 0xff, 0xfe, 0, 1, 2]) },
      { name: 'xl/media/empty.emf', content: '' },
    ];
    expect((await taken(workbookOf({ parts }))).rows).toHaveLength(1);
  });

  it('cannot multiply entities: without a declaration none exist', async () => {
    const sheet = resultsSheet(rowXml(3, ['&lol9;', 'b', 'c', 'd', 1]));
    expect(await refusal(taken(workbookOf({ sheets: [sheet] })))).toMatch(/unusable-input.*not well-formed/);
  });

  it('that declares to unpack to more than is taken is refused before anything is unpacked', async () => {
    const big = { name: 'xl/media/a.xml', content: '<x/>', declaredBytes: 3_000_000_000 };
    const words = await refusal(taken(workbookOf({ parts: [big] })));
    expect(words).toMatch(/^too-large: Unpacked, the workbook has more than 128 MB/);
  });

  it('that sums up to too much in small parts is refused as well', async () => {
    const parts = Array.from({ length: 10 }, (_, place) => ({
      name: `xl/a${String(place)}.xml`,
      content: '<x/>',
      declaredBytes: 20_000_000,
    }));
    expect(await refusal(taken(workbookOf({ parts })))).toMatch(/^too-large: Unpacked/);
  });

  it('that unpacks to more than it declares is stopped there, and memory stays small', async () => {
    const bomb = Buffer.from(`<worksheet><sheetData>${' '.repeat(40 * 1024 * 1024)}</sheetData></worksheet>`);
    const content = workbookOf({
      parts: [{ name: 'xl/worksheets/sheet0.xml', content: bomb, declaredBytes: 5000 }],
    });
    expect(content.length).toBeLessThan(200_000);
    const heap = await mostHeap(async () => {
      expect(await refusal(taken(content))).toMatch(/unpacks to more than it declares/);
    });
    expect(heap).toBeLessThan(36);
  }, 60_000);

  it('with one endless text is stopped long before it is held in memory', async () => {
    const text = 'x'.repeat(40 * 1024 * 1024);
    const sheet = resultsSheet(`<row r="3"><c r="A3" t="inlineStr"><is><t>${text}</t></is></c></row>`);
    const content = workbookOf({ sheets: [sheet] });
    const heap = await mostHeap(async () => {
      expect(await refusal(taken(content))).toMatch(/a text of more than a million characters/);
    });
    expect(heap).toBeLessThan(36);
  }, 60_000);

  it('with shared texts too long to be held is refused', async () => {
    const item = `<si><t>${'x'.repeat(30_000)}</t></si>`;
    const content = workbookOf({ sharedStrings: item.repeat(40) });
    expect(
      await refusal(
        readWorkbook(content, () => Promise.resolve(), undefined, {
          ...WORKBOOK_LIMITS,
          sharedCharacters: 1_000_000,
        }),
      ),
    ).toMatch(/^too-large: The texts of this workbook/);
  });

  it('of too many parts is refused', async () => {
    const parts = Array.from({ length: 2001 }, (_, place) => ({ name: `xl/${String(place)}`, content: '' }));
    expect(await refusal(taken(workbookOf({ parts })))).toMatch(/^too-large: .* made of 20\d\d parts/);
  });

  it('that takes too long is given up', async () => {
    const limits = { ...WORKBOOK_LIMITS, milliseconds: 0 };
    expect(await refusal(readWorkbook(workbookOf({}), () => Promise.resolve(), undefined, limits))).toMatch(
      /^too-large: Reading this workbook takes longer than 0 s/,
    );
  });

  it('with two parts of one name, or one that is locked, is refused', async () => {
    const twin = [
      { name: 'xl/workbook.xml', content: '<x/>' },
      { name: 'XL/Workbook.xml', content: '<x/>' },
    ];
    expect(await refusal(taken(zipOf(twin)))).toMatch(/two parts with the name XL\/Workbook.xml/);
    const locked = [{ name: 'xl/workbook.xml', content: '<x/>', locked: true as const }];
    expect(await refusal(taken(workbookOf({ parts: locked })))).toMatch(/^unsupported-file: .*password/);
  });

  it('whose part leads out of the archive is refused', async () => {
    expect(await refusal(taken(zipOf([{ name: '../../evil.xml', content: '<x/>' }])))).toMatch(/damaged/);
  });

  it('with merged areas without end is refused, and one over the whole sheet costs nothing', async () => {
    const many = `<mergeCells>${'<mergeCell ref="A3:A4"/>'.repeat(20_001)}</mergeCells>`;
    expect(await refusal(taken(workbookOf({ sheets: [resultsSheet('', many)] })))).toMatch(
      /^too-large: A sheet has more than 20000 merged areas/,
    );
    const whole = '<mergeCells><mergeCell ref="A3:XFD1048576"/></mergeCells>';
    expect((await taken(workbookOf({ sheets: [resultsSheet('', whole)] }))).rows).toHaveLength(1);
  });

  it.each([
    ['a row that no sheet has', '<row r="1048577"><c r="A1048577"><v>1</v></c></row>', /a row 1048577/],
    ['a column that no sheet has', '<row r="3"><c r="XFE3"><v>1</v></c></row>', /holds a cell XFE3/],
    ['a cell of another row', '<row r="3"><c r="A9"><v>1</v></c></row>', /row 3 holds a cell A9/],
    ['rows that go back', '<row r="2"/>', /row 2 follows row 2/],
    ['cells that go back', '<row r="3"><c r="B3"><v>1</v></c><c r="A3"><v>1</v></c></row>', /do not follow/],
    ['a shared text that is missing', '<row r="3"><c r="A3" t="s"><v>7</v></c></row>', /A3 refers to text 7/],
  ])('with %s is refused as damaged', async (_, row, words) => {
    expect(await refusal(taken(workbookOf({ sheets: [resultsSheet(row)] })))).toMatch(words);
  });

  it('cut off in the middle of a sheet is refused as damaged', async () => {
    const content = '<worksheet><sheetData><row r="1"><c r="A1"><v>1';
    expect(
      await refusal(taken(workbookOf({ parts: [{ name: 'xl/worksheets/sheet0.xml', content }] }))),
    ).toMatch(/sheet0.xml is not well-formed/);
  });

  it('whose sheet is missing is refused as damaged', async () => {
    const name = 'xl/_rels/workbook.xml.rels';
    const content =
      '<Relationships><Relationship Id="s0" Type="http://x/worksheet" Target="worksheets/gone.xml"/></Relationships>';
    expect(await refusal(taken(workbookOf({ parts: [{ name, content }] })))).toMatch(
      /the sheet “Results” is missing/,
    );
  });
});

describe('A file that is no workbook of this kind', () => {
  const compound = (text: string): Buffer =>
    Buffer.concat([
      Buffer.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1]),
      Buffer.alloc(5000),
      Buffer.from(text, 'utf16le'),
    ]);
  const main = (part: string): string =>
    `<Relationships><Relationship Id="w" Type="http://x/officeDocument" Target="${part}"/></Relationships>`;

  it('is told apart: locked, old, binary, open document, text document, plain archive', async () => {
    const cases: readonly (readonly [Buffer, RegExp])[] = [
      [compound('EncryptedPackage'), /locked with a password.*take the password off/],
      [compound('Workbook'), /old Office document \(\.xls\).*save it as a workbook \(\.xlsx\)/],
      [
        zipOf([
          { name: '_rels/.rels', content: main('xl/workbook.bin') },
          { name: 'xl/workbook.bin', content: 'x' },
        ]),
        /binary format \(\.xlsb\)/,
      ],
      [
        Buffer.from('PK\x03\x04 mimetypeapplication/vnd.oasis.opendocument.spreadsheet'),
        /OpenDocument file \(\.ods\)/,
      ],
      [
        zipOf([
          { name: '_rels/.rels', content: main('word/document.xml') },
          { name: 'word/document.xml', content: '<x/>' },
        ]),
        /an Office document, but no workbook/,
      ],
      [zipOf([{ name: 'notes.txt', content: 'hello' }]), /a zip archive without a workbook/],
    ];
    for (const [content, words] of cases)
      expect(await refusal(taken(content))).toMatch(new RegExp(`^unsupported-file: .*${words.source}`));
  });
});

describe('A workbook with more in it than cells', () => {
  const links = (count: number): string =>
    Array.from(
      { length: count },
      (_, place) =>
        `<Relationship Id="x${String(place)}" Type="http://x/relationships/externalLink" Target="externalLinks/${String(place)}.xml"/>`,
    ).join('');

  it('says that links to other workbooks are not followed, and takes what was calculated last', async () => {
    const row = `<row r="3"><c r="A3" t="str"><f>[1]Sheet1!A1</f><v>R-2</v></c>${rowXml(3, GOOD_ROW)
      .replace(/^<row r="3"><c.*?<\/c>/, '')
      .replace('</row>', '')}</row>`;
    const target = '<externalLink><externalBook id="rId1"/></externalLink>';
    const { read, rows } = await taken(
      workbookOf({
        sheets: [resultsSheet(row)],
        relationships: links(2),
        parts: [
          { name: 'xl/externalLinks/0.xml', content: target },
          {
            name: 'xl/externalLinks/_rels/0.xml.rels',
            content:
              '<Relationships><Relationship Id="rId1" Type="http://x/externalLinkPath" Target="http://127.0.0.1:1/secret.xlsx" TargetMode="External"/></Relationships>',
          },
        ],
      }),
    );
    expect(rows[1]?.cells[0]).toBe('R-2');
    expect(read.notes).toContain(
      'The workbook refers to 2 other workbooks: the links are not followed, and what was calculated last from them is taken.',
    );
    expect(read.notes.join()).not.toContain('secret');
  });

  it('does not follow a sheet or texts that lie outside of it', async () => {
    const name = 'xl/_rels/workbook.xml.rels';
    const content =
      '<Relationships><Relationship Id="s0" Type="http://x/worksheet" Target="http://127.0.0.1:1/sheet.xml" TargetMode="External"/></Relationships>';
    expect(await refusal(taken(workbookOf({ parts: [{ name, content }] })))).toMatch(/None of the 0 sheet/);
  });

  it('is read as data where it holds macros or data connections, and that is said', async () => {
    const { read } = await taken(
      workbookOf({
        relationships: '<Relationship Id="c" Type="http://x/connections" Target="connections.xml"/>',
        parts: [
          { name: 'xl/vbaProject.bin', content: Buffer.from([0xd0, 0xcf, 0x11, 0xe0]) },
          { name: 'xl/connections.xml', content: '<connections/>' },
        ],
      }),
    );
    expect(read.notes).toContain('The workbook holds macros: they are ignored and never run.');
    expect(read.notes).toContain('The workbook has connections to other data: they are not followed.');
  });

  it('gives the sheet that was chosen, and refuses one without a table by name', async () => {
    const sheets = [
      resultsSheet(),
      { name: 'Notes', xml: '<sheetData/>' },
      resultsSheet(rowXml(3, GOOD_ROW), '', 'More'),
    ];
    const content = workbookOf({ sheets });
    expect((await taken(content)).read.sheet).toBe(0);
    const { read, rows } = await taken(content, 2);
    expect([read.sheet, rows.length, read.notes[0]]).toEqual([
      2,
      2,
      'Read from the sheet “More”, one of 3 of the workbook.',
    ]);
    expect(await refusal(taken(content, 1))).toMatch(/The sheet “Notes” holds no table/);
    expect(await refusal(taken(content, 7))).toMatch(/None of the 3 sheet/);
  });

  it('reads a cell however far away in memory that does not grow with the distance', async () => {
    const far = '<row r="1048576"><c r="A1048576"><v>1</v></c><c r="XFD1048576"><v>2</v></c></row>';
    const heap = await mostHeap(async () => {
      const { read, rows } = await taken(workbookOf({ sheets: [resultsSheet(far)] }));
      expect(rows.map(({ rowNumber, cells }) => [rowNumber, cells.length])).toEqual([
        [2, 8],
        [1_048_576, 8],
      ]);
      expect(read.notes).toContain('Cells far beyond the table were passed over (the first is XFD1048576).');
      expect(read.blankLines).toBe(1_048_573);
    });
    expect(heap).toBeLessThan(30);
  });

  it('is refused with more rows than can be taken, as a CSV file is', async () => {
    const rows = Array.from(
      { length: 20_001 },
      (_, place) => `<row r="${String(place + 3)}"><c><v>1</v></c></row>`,
    );
    expect(await refusal(taken(workbookOf({ sheets: [resultsSheet(rows.join(''))] })))).toMatch(
      /^too-large: The file has 20002 rows; up to 20000/,
    );
  });

  it('reads texts with runs, escapes and pronunciation as the text that is seen', async () => {
    const sharedStrings =
      '<si><r><rPr><b/></rPr><t>R</t></r><r><t xml:space="preserve">-2 </t></r><rPh sb="0" eb="1"><t>aloud</t></rPh></si><si><t>one_x0009_two _x005F_x0041_</t></si>';
    const row = '<row r="3"><c r="A3" t="s"><v>0</v></c><c r="B3" t="s"><v>1</v></c></row>';
    const { rows } = await taken(workbookOf({ sheets: [resultsSheet(row)], sharedStrings }));
    expect(rows[1]?.cells.slice(0, 2)).toEqual(['R-2', 'one\ttwo _x0041_']);
  });
});
