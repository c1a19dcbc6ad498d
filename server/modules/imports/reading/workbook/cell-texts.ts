import type { WorkbookArchive } from './archive';
import { UnreadableFile } from '../unreadable-file';
import { readXml, type XmlReader } from './xml-part';

/** A sign that XML cannot hold is written as `_x000D_` (ISO/IEC 29500-1, 22.9.2.19). */
export function unescaped(text: string): string {
  return text.includes('_x')
    ? text.replace(/_x([0-9A-Fa-f]{4})_/g, (_, code: string) => String.fromCharCode(parseInt(code, 16)))
    : text;
}

/** The text of a cell with runs of different looks, as one; how its signs are pronounced (`rPh`) is no part of it. */
export class RichText {
  #text = '';
  #inText = false;
  #aside = 0;

  open(element: string): void {
    if (element === 'rPh') this.#aside += 1;
    this.#inText = element === 't' && this.#aside === 0;
  }

  close(element: string): void {
    if (element === 'rPh') this.#aside -= 1;
    this.#inText = false;
  }

  add(text: string): void {
    if (this.#inText) this.#text += text;
  }

  /** Hands the text over and begins anew. */
  take(): string {
    const whole = unescaped(this.#text);
    this.#text = '';
    this.#inText = false;
    this.#aside = 0;
    return whole;
  }
}

/** The texts that cells share, in their order. @throws {UnreadableFile} when they are too long together */
export async function sharedTexts(
  archive: WorkbookArchive,
  part: string | undefined,
): Promise<readonly string[]> {
  if (part === undefined || !archive.has(part)) return [];
  const texts: string[] = [];
  const rich = new RichText();
  let characters = 0;
  const reader: XmlReader = {
    open: (element) => rich.open(element),
    text: (text) => rich.add(text),
    close: (element) => {
      rich.close(element);
      if (element !== 'si') return;
      const text = rich.take();
      characters += text.length + 16;
      if (characters > archive.limits.sharedCharacters)
        throw new UnreadableFile(
          'too-large',
          'The texts of this workbook are too long to be held together. Save the sheet with the results on its own, or as CSV, and bring that in.',
        );
      texts.push(text);
    },
  };
  await readXml(archive, part, reader);
  return texts;
}
