import { zipOf, type ZipPart } from './zip-builder';

const MAIN = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const TYPE = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const PACKAGE = 'http://schemas.openxmlformats.org/package/2006/relationships';

export interface BuiltSheet {
  readonly name: string;
  /** What stands in the sheet's part, from `sheetData` on. */
  readonly xml: string;
}

export interface BuiltWorkbook {
  readonly sheets?: readonly BuiltSheet[];
  readonly sharedStrings?: string;
  /** Lines of the workbook's own relationships besides those of its sheets. */
  readonly relationships?: string;
  /** Further parts, or others in place of those with the same name. */
  readonly parts?: readonly ZipPart[];
}

const HEADINGS = ['Run', 'Variant', 'Facility', 'Date', 'CdA [m²]', 'Scale', 'Speed [km/h]', 'Air state'];
export const GOOD_ROW = ['R-1', 'Liftback', 'Halmere', '2026-03-25', 0.576, 1, 140, 'ISA'] as const;

export function rowXml(number: number, cells: readonly (string | number)[]): string {
  const each = cells.map((cell, column) => {
    const address = `${String.fromCharCode(65 + column)}${String(number)}`;
    return typeof cell === 'number'
      ? `<c r="${address}"><v>${String(cell)}</v></c>`
      : `<c r="${address}" t="inlineStr"><is><t>${cell}</t></is></c>`;
  });
  return `<row r="${String(number)}">${each.join('')}</row>`;
}

/** A sheet of results with headings; `after` is put behind the rows. */
export function resultsSheet(more = '', after = '', name = 'Results'): BuiltSheet {
  return {
    name,
    xml: `<sheetData>${rowXml(1, HEADINGS)}${rowXml(2, GOOD_ROW)}${more}</sheetData>${after}`,
  };
}

/** A workbook part by part, as small as the format allows; for tests. */
export function workbookOf({
  sheets = [resultsSheet()],
  sharedStrings,
  relationships = '',
  parts = [],
}: BuiltWorkbook): Buffer {
  const all = new Map<string, ZipPart>();
  const add = (name: string, content: string) => all.set(name, { name, content });
  add('[Content_Types].xml', '<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types"/>');
  add(
    '_rels/.rels',
    `<Relationships xmlns="${PACKAGE}"><Relationship Id="w" Type="${TYPE}/officeDocument" Target="xl/workbook.xml"/></Relationships>`,
  );
  add(
    'xl/workbook.xml',
    `<workbook xmlns="${MAIN}" xmlns:r="${TYPE}"><sheets>${sheets
      .map(({ name }, i) => `<sheet name="${name}" sheetId="${String(i + 1)}" r:id="s${String(i)}"/>`)
      .join('')}</sheets></workbook>`,
  );
  add(
    'xl/_rels/workbook.xml.rels',
    `<Relationships xmlns="${PACKAGE}">${sheets
      .map(
        (_, i) =>
          `<Relationship Id="s${String(i)}" Type="${TYPE}/worksheet" Target="worksheets/sheet${String(i)}.xml"/>`,
      )
      .join('')}${
      sharedStrings === undefined
        ? ''
        : `<Relationship Id="t" Type="${TYPE}/sharedStrings" Target="sharedStrings.xml"/>`
    }${relationships}</Relationships>`,
  );
  sheets.forEach(({ xml }, i) =>
    add(`xl/worksheets/sheet${String(i)}.xml`, `<worksheet xmlns="${MAIN}">${xml}</worksheet>`),
  );
  if (sharedStrings !== undefined) add('xl/sharedStrings.xml', `<sst xmlns="${MAIN}">${sharedStrings}</sst>`);
  for (const part of parts) all.set(part.name, part);
  return zipOf([...all.values()]);
}
