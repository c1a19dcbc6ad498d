import type { WorkbookArchive } from './archive';
import { readXml } from './xml-part';

/** What a number in a cell is, by its format. */
export type NumberKind = 'number' | 'percent' | 'date' | 'time';

/** Formats that need not be written out (ISO/IEC 29500-1, 18.8.30), with those of East Asian languages. */
function builtIn(id: number): NumberKind {
  if (id === 9 || id === 10) return 'percent';
  if ((id >= 18 && id <= 21) || (id >= 45 && id <= 47) || (id >= 32 && id <= 35)) return 'time';
  if ((id >= 14 && id <= 22) || (id >= 27 && id <= 36) || (id >= 50 && id <= 58)) return 'date';
  return 'number';
}

/** What a format code shows: texts, colours and conditions aside, letters of days and hours make a date or a time. */
export function kindOfFormat(code: string): NumberKind {
  const first = code
    .replace(/"[^"]*"/g, '')
    .replace(/\\./g, '')
    .replace(/[_*]./g, '')
    .split(';')[0];
  // A duration such as [h]:mm counts hours beyond a day: it is a number of days and no date.
  if (/\[(h+|m+|s+)\]/i.test(first ?? '')) return 'number';
  const plain = (first ?? '').replace(/\[[^\]]*\]/g, '').replace(/general/gi, '');
  if (/[dy]/i.test(plain) || /m{3,}/i.test(plain)) return 'date';
  if (/[hs]/i.test(plain)) return 'time';
  if (/m/i.test(plain)) return 'date';
  return plain.includes('%') ? 'percent' : 'number';
}

/** For each style of a cell, by its place, what a number in it is. */
export async function numberKinds(
  archive: WorkbookArchive,
  part: string | undefined,
): Promise<readonly NumberKind[]> {
  if (part === undefined || !archive.has(part)) return [];
  const written = new Map<number, NumberKind>();
  const ids: number[] = [];
  let inCellStyles = false;
  await readXml(archive, part, {
    open: (element, attributes) => {
      if (element === 'numFmt')
        written.set(Number(attributes['numFmtId']), kindOfFormat(attributes['formatCode'] ?? ''));
      if (element === 'cellXfs') inCellStyles = true;
      if (element === 'xf' && inCellStyles) ids.push(Number(attributes['numFmtId'] ?? 0));
    },
    close: (element) => {
      if (element === 'cellXfs') inCellStyles = false;
    },
  });
  return ids.map((id) => written.get(id) ?? builtIn(id));
}
