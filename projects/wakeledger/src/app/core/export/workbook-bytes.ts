import { strToU8, zipSync } from 'fflate';
import { escaped, sheetXml } from './sheet-xml';
import type { SheetToWrite } from './workbook';

export const WORKBOOK_MEDIA_TYPE = 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet';

const HEAD = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n';
const MAIN = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const RELATIONSHIPS = 'http://schemas.openxmlformats.org/package/2006/relationships';
const TYPE = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const CONTENT = 'application/vnd.openxmlformats-officedocument.spreadsheetml';
/** The earliest day that a zip archive can name: the same table gives the same bytes. */
const SAME_DAY = new Date(1980, 0, 1);

/**
 * A workbook of plain sheets (ISO/IEC 29500). It is written in one go on the page's own thread: a worker made of a text
 * would be against the content security policy, and thousands of rows take a fraction of a second.
 */
export function workbookBytes(sheets: readonly SheetToWrite[]): Uint8Array<ArrayBuffer> {
  const names = sheetNames(sheets.map(({ name }) => name));
  const files: Record<string, string> = {
    '[Content_Types].xml': contentTypes(sheets.length),
    '_rels/.rels': relationships([['officeDocument', 'xl/workbook.xml']]),
    'xl/workbook.xml': workbookXml(names),
    'xl/_rels/workbook.xml.rels': relationships([
      ...sheets.map((_, index): readonly [string, string] => [
        'worksheet',
        `worksheets/sheet${String(index + 1)}.xml`,
      ]),
      ['styles', 'styles.xml'],
    ]),
    'xl/styles.xml': STYLES_XML,
  };
  sheets.forEach(({ rows }, index) => {
    files[`xl/worksheets/sheet${String(index + 1)}.xml`] = sheetXml(rows);
  });
  const bytes = Object.fromEntries(Object.entries(files).map(([name, text]) => [name, strToU8(text)]));
  return new Uint8Array(zipSync(bytes, { mtime: SAME_DAY }));
}

/** Names that every program takes: at most 31 characters, without `[ ] : * ? / \`, each once. */
function sheetNames(wanted: readonly string[]): readonly string[] {
  const taken = new Set<string>();
  return wanted.map((name, index) => {
    const plain = name
      .replace(/[[\]:*?/\\]/g, ' ')
      .replace(/^'+|'+$/g, '')
      .trim()
      .slice(0, 31);
    const free =
      plain === '' || taken.has(plain.toLowerCase())
        ? `${plain.slice(0, 26)} ${String(index + 1)}`.trim()
        : plain;
    taken.add(free.toLowerCase());
    return free;
  });
}

function contentTypes(sheets: number): string {
  const overrides = Array.from(
    { length: sheets },
    (_, index) =>
      `<Override PartName="/xl/worksheets/sheet${String(index + 1)}.xml" ContentType="${CONTENT}.worksheet+xml"/>`,
  );
  return `${HEAD}<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/><Default Extension="xml" ContentType="application/xml"/><Override PartName="/xl/workbook.xml" ContentType="${CONTENT}.sheet.main+xml"/><Override PartName="/xl/styles.xml" ContentType="${CONTENT}.styles+xml"/>${overrides.join('')}</Types>`;
}

function relationships(list: readonly (readonly [type: string, target: string])[]): string {
  const each = list.map(
    ([type, target], index) =>
      `<Relationship Id="rId${String(index + 1)}" Type="${TYPE}/${type}" Target="${target}"/>`,
  );
  return `${HEAD}<Relationships xmlns="${RELATIONSHIPS}">${each.join('')}</Relationships>`;
}

function workbookXml(names: readonly string[]): string {
  const sheets = names.map((name, index) => {
    const number = String(index + 1);
    return `<sheet name="${escaped(name)}" sheetId="${number}" r:id="rId${number}"/>`;
  });
  return `${HEAD}<workbook xmlns="${MAIN}" xmlns:r="${TYPE}"><sheets>${sheets.join('')}</sheets></workbook>`;
}

/** Plain; bold for headings; text that must stay text. */
const STYLES_XML = `${HEAD}<styleSheet xmlns="${MAIN}"><fonts count="2"><font><sz val="11"/><name val="Calibri"/></font><font><b/><sz val="11"/><name val="Calibri"/></font></fonts><fills count="2"><fill><patternFill patternType="none"/></fill><fill><patternFill patternType="gray125"/></fill></fills><borders count="1"><border/></borders><cellStyleXfs count="1"><xf/></cellStyleXfs><cellXfs count="3"><xf fontId="0" xfId="0"/><xf fontId="1" xfId="0" applyFont="1"/><xf fontId="0" xfId="0" quotePrefix="1"/></cellXfs><cellStyles count="1"><cellStyle name="Normal" xfId="0" builtinId="0"/></cellStyles></styleSheet>`;
