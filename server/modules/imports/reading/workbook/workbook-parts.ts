import { UnreadableFile } from '../unreadable-file';
import type { WorkbookArchive } from './archive';
import { damaged } from './limits';
import { relationshipsOf } from './relationships';
import { readXml } from './xml-part';

export interface SheetPart {
  readonly name: string;
  readonly part: string;
  readonly hidden: boolean;
}

/** What stands in a workbook beside the cells. */
export interface WorkbookParts {
  readonly sheets: readonly SheetPart[];
  readonly sharedStrings: string | undefined;
  readonly styles: string | undefined;
  /** Dates are counted from 1904 instead of 1900. */
  readonly from1904: boolean;
  readonly linksToOtherWorkbooks: number;
  readonly hasDataConnections: boolean;
  readonly hasMacros: boolean;
}

/** Finds the sheets of a workbook and what they need. @throws {UnreadableFile} when it is none that can be read */
export async function workbookParts(archive: WorkbookArchive): Promise<WorkbookParts> {
  const main = await mainPart(archive);
  const relationships = await relationshipsOf(archive, main);
  const partOf = new Map(relationships.map((one) => [one.id, one]));
  const sheets: SheetPart[] = [];
  let from1904 = false;
  await readXml(archive, main, {
    open: (element, attributes) => {
      if (element === 'workbookPr') from1904 = /^(1|true|on)$/.test(attributes['date1904'] ?? '');
      if (element !== 'sheet') return;
      const target = partOf.get(relationId(attributes) ?? '');
      // A sheet of a chart or a dialog has no cells.
      if (target?.type !== 'worksheet' || target.part === undefined) return;
      if (!archive.has(target.part)) throw damaged(`the sheet “${attributes['name'] ?? ''}” is missing.`);
      sheets.push({
        name: attributes['name'] ?? '',
        part: target.part,
        hidden: /hidden/i.test(attributes['state'] ?? ''),
      });
    },
  });
  const target = (type: string) => relationships.find((one) => one.type === type)?.part;
  return {
    sheets,
    sharedStrings: target('sharedStrings'),
    styles: target('styles'),
    from1904,
    linksToOtherWorkbooks: relationships.filter(({ type }) => type === 'externalLink').length,
    hasDataConnections: relationships.some(({ type }) => type === 'connections'),
    hasMacros: archive.names.some((name) => /(^|\/)vbaproject\.bin$|(^|\/)macrosheets\//.test(name)),
  };
}

async function mainPart(archive: WorkbookArchive): Promise<string> {
  const main = (await relationshipsOf(archive, '')).find(({ type }) => type === 'officeDocument')?.part;
  if (main === undefined || !archive.has(main))
    throw new UnreadableFile(
      'unsupported-file',
      'This is a zip archive without a workbook in it. A CSV file or a workbook (.xlsx) is accepted.',
    );
  if (main.toLowerCase().endsWith('.bin'))
    throw new UnreadableFile(
      'unsupported-file',
      'This is a workbook in the binary format (.xlsb). Open it there and save it as .xlsx or CSV, then bring that in.',
    );
  if (!/(^|\/)xl\//i.test(main) && !/workbook/i.test(main))
    throw new UnreadableFile(
      'unsupported-file',
      'This is an Office document, but no workbook. A CSV file or a workbook (.xlsx) is accepted.',
    );
  return main;
}

/** The relationship's id is the one attribute of that name with a prefix, whichever prefix it is. */
function relationId(attributes: Readonly<Record<string, string>>): string | undefined {
  return Object.entries(attributes).find(([name]) => name.endsWith(':id'))?.[1];
}
