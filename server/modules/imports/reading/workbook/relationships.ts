import type { WorkbookArchive } from './archive';
import { readXml } from './xml-part';

export interface Relationship {
  readonly id: string;
  /** The last word of the type: `worksheet`, `sharedStrings`; the same in both editions of the format. */
  readonly type: string;
  /** The name of a part; undefined where the target lies outside the workbook, and then it is never followed. */
  readonly part: string | undefined;
}

/** What a part refers to; empty when it refers to nothing. */
export async function relationshipsOf(
  archive: WorkbookArchive,
  part: string,
): Promise<readonly Relationship[]> {
  const slash = part.lastIndexOf('/');
  const folder = part.slice(0, slash + 1);
  const name = `${folder}_rels/${part.slice(slash + 1)}.rels`;
  if (!archive.has(name)) return [];
  const found: Relationship[] = [];
  await readXml(archive, name, {
    open: (element, attributes) => {
      if (element !== 'Relationship') return;
      const { Id = '', Type = '', Target = '', TargetMode } = attributes;
      found.push({
        id: Id,
        type: Type.slice(Type.lastIndexOf('/') + 1),
        part: TargetMode === 'External' ? undefined : resolved(folder, Target),
      });
    },
  });
  return found;
}

function resolved(folder: string, target: string): string {
  if (target.startsWith('/')) return target.slice(1);
  const names: string[] = [];
  for (const name of `${folder}${target}`.split('/')) {
    if (name === '..') names.pop();
    else if (name !== '' && name !== '.') names.push(name);
  }
  return names.join('/');
}
