import { fromBufferPromise, type Entry, type ZipFile } from 'yauzl';
import { UnreadableFile } from '../unreadable-file';
import { damaged, TimeAllowed, type WorkbookLimits } from './limits';

/** The parts of a workbook, each read as a stream: nothing is inflated before it is asked for, nor more than it declares. */
export class WorkbookArchive {
  private constructor(
    private readonly zip: ZipFile,
    private readonly entries: ReadonlyMap<string, Entry>,
    readonly limits: WorkbookLimits,
    readonly time: TimeAllowed,
  ) {}

  /**
   * Looks through the table of contents before anything is inflated.
   *
   * @throws {UnreadableFile} when there are too many parts, too much is declared, two have one name, one is locked
   */
  static async open(content: Uint8Array, limits: WorkbookLimits): Promise<WorkbookArchive> {
    const time = new TimeAllowed(limits.milliseconds);
    const bytes = Buffer.from(content.buffer, content.byteOffset, content.byteLength);
    try {
      const zip = await fromBufferPromise(bytes, { lazyEntries: true, autoClose: false });
      return new WorkbookArchive(zip, await contents(zip, limits, time), limits, time);
    } catch (error) {
      throw inWords(error);
    }
  }

  get names(): readonly string[] {
    return [...this.entries.keys()];
  }

  has(name: string): boolean {
    return this.entries.has(nameKey(name));
  }

  /** The bytes of a part, inflated piece by piece. @throws {UnreadableFile} without such a part; when it is not what it declares */
  async *bytesOf(name: string): AsyncGenerator<Uint8Array> {
    const entry = this.entries.get(nameKey(name));
    if (entry === undefined) throw damaged(`its part ${name} is missing.`);
    try {
      const stream = await this.zip.openReadStreamPromise(entry);
      for await (const chunk of stream as AsyncIterable<Uint8Array>) {
        this.time.check();
        yield chunk;
      }
    } catch (error) {
      throw inWords(error);
    }
  }
}

/** Names of parts are compared without capital letters (ISO/IEC 29500-2, 6.2.2.3). */
function nameKey(name: string): string {
  return name.replace(/^\//, '').toLowerCase();
}

async function contents(
  zip: ZipFile,
  limits: WorkbookLimits,
  time: TimeAllowed,
): Promise<ReadonlyMap<string, Entry>> {
  if (zip.entryCount > limits.parts) throw tooManyParts(zip.entryCount, limits);
  const entries = new Map<string, Entry>();
  let inflated = 0;
  for await (const entry of zip.eachEntry()) {
    time.check();
    if (entry.fileName.endsWith('/')) continue;
    if (entry.isEncrypted())
      throw new UnreadableFile(
        'unsupported-file',
        `The part ${entry.fileName} is locked with a password. Take the password off, save the workbook and bring that in.`,
      );
    inflated += entry.uncompressedSize;
    if (inflated > limits.inflatedBytes) throw tooMuch(limits);
    const key = nameKey(entry.fileName);
    if (entries.has(key)) throw damaged(`it has two parts with the name ${entry.fileName}.`);
    entries.set(key, entry);
    if (entries.size > limits.parts) throw tooManyParts(entries.size, limits);
  }
  return entries;
}

function tooManyParts(count: number, limits: WorkbookLimits): UnreadableFile {
  return new UnreadableFile(
    'too-large',
    `The workbook is made of ${String(count)} parts; up to ${String(limits.parts)} can be taken. Save the sheet with the results on its own and bring that in.`,
  );
}

function tooMuch(limits: WorkbookLimits): UnreadableFile {
  return new UnreadableFile(
    'too-large',
    `Unpacked, the workbook has more than ${String(Math.round(limits.inflatedBytes / 1024 / 1024))} MB, and no more can be taken. Save the sheet with the results on its own, or as CSV, and bring that in.`,
  );
}

/** What the archive's own reader objects to. */
function inWords(error: unknown): unknown {
  if (error instanceof UnreadableFile || !(error instanceof Error)) return error;
  if (/too many bytes in the stream/i.test(error.message))
    return damaged('a part of it unpacks to more than it declares.');
  return damaged(`as a zip archive it cannot be read (${error.message.slice(0, 200).replace(/\.$/, '')}).`);
}
