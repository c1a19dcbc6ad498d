import type { ENCODINGS } from '#shared/contracts/imports';

export type Encoding = (typeof ENCODINGS)[number];

export interface EncodingFound {
  readonly encoding: Encoding;
  readonly byteOrderMark: boolean;
}

/** Why bytes are no text at all, for a person. */
export interface NotText {
  readonly notText: string;
}

/** Text has tab, line feed, form feed and carriage return below the space, and nothing else. */
const TEXT_CONTROLS = new Set([0x09, 0x0a, 0x0c, 0x0d]);
const HEAD_BYTES = 4096;

/**
 * Finds the encoding while the bytes pass by, in constant memory: by the byte-order mark; else by the NUL bytes that
 * Latin text has at every other place in UTF-16; else UTF-8 where every byte fits it, and Windows-1252 where not.
 */
export class EncodingWatch {
  #head = new Uint8Array(0);
  #decided: EncodingFound | undefined;
  #decidedByHead = false;
  readonly #utf8 = new TextDecoder('utf-8', { fatal: true });
  #isUtf8 = true;
  #position = 0;
  #trouble: string | undefined;

  feed(chunk: Uint8Array): void {
    const start = this.#position;
    this.#position += chunk.length;
    if (!this.#decidedByHead) {
      this.#head = joined(this.#head, chunk.subarray(0, HEAD_BYTES - this.#head.length));
      if (this.#head.length < HEAD_BYTES) {
        this.#watch(chunk, start);
        return;
      }
      this.#decideByHead();
    }
    this.#watch(chunk, start);
  }

  end(): EncodingFound | NotText {
    if (!this.#decidedByHead) this.#decideByHead();
    if (this.#decided !== undefined && this.#decided.encoding.startsWith('utf-16')) return this.#decided;
    if (this.#trouble !== undefined) return { notText: this.#trouble };
    if (this.#isUtf8) {
      try {
        this.#utf8.decode();
      } catch {
        this.#isUtf8 = false;
      }
    }
    if (this.#isUtf8) return { encoding: 'utf-8', byteOrderMark: this.#decided?.byteOrderMark ?? false };
    if (this.#decided?.byteOrderMark === true)
      return { notText: 'It begins with the mark of UTF-8, but its bytes are not UTF-8.' };
    return { encoding: 'windows-1252', byteOrderMark: false };
  }

  /** The trouble found so far that no later byte can mend, to refuse a large file early. */
  get trouble(): string | undefined {
    return this.#decidedByHead && !(this.#decided?.encoding.startsWith('utf-16') ?? false)
      ? this.#trouble
      : undefined;
  }

  #decideByHead(): void {
    this.#decidedByHead = true;
    this.#decided = byMark(this.#head) ?? byNulPattern(this.#head);
  }

  #watch(chunk: Uint8Array, start: number): void {
    if (this.#decided?.encoding.startsWith('utf-16') === true) return;
    if (this.#trouble === undefined) this.#trouble = troubleIn(chunk, start);
    if (!this.#isUtf8) return;
    try {
      this.#utf8.decode(chunk, { stream: true });
    } catch {
      this.#isUtf8 = false;
    }
  }
}

function joined(first: Uint8Array, second: Uint8Array): Uint8Array<ArrayBuffer> {
  const both = new Uint8Array(first.length + second.length);
  both.set(first);
  both.set(second, first.length);
  return both;
}

function byMark(head: Uint8Array): EncodingFound | undefined {
  if (head[0] === 0xef && head[1] === 0xbb && head[2] === 0xbf)
    return { encoding: 'utf-8', byteOrderMark: true };
  if (head[0] === 0xff && head[1] === 0xfe) return { encoding: 'utf-16le', byteOrderMark: true };
  if (head[0] === 0xfe && head[1] === 0xff) return { encoding: 'utf-16be', byteOrderMark: true };
  return undefined;
}

/** In UTF-16 without a mark, Latin letters, digits and separators have a NUL at every even or every odd place. */
function byNulPattern(head: Uint8Array): EncodingFound | undefined {
  const nuls = [0, 0];
  head.forEach((byte, place) => {
    if (byte === 0) nuls[place % 2] = (nuls[place % 2] ?? 0) + 1;
  });
  const [even = 0, odd = 0] = nuls;
  const half = head.length / 2;
  if (half < 4) return undefined;
  if (odd > 0.7 * half && even < 0.02 * half) return { encoding: 'utf-16le', byteOrderMark: false };
  if (even > 0.7 * half && odd < 0.02 * half) return { encoding: 'utf-16be', byteOrderMark: false };
  return undefined;
}

function troubleIn(chunk: Uint8Array, start: number): string | undefined {
  for (let place = 0; place < chunk.length; place += 1) {
    const byte = chunk[place] ?? 0;
    if (byte === 0) return `It holds a NUL byte (at byte ${String(start + place + 1)}), which no text does.`;
    if (byte < 0x20 && !TEXT_CONTROLS.has(byte))
      return `It holds the control byte ${String(byte)} (at byte ${String(start + place + 1)}), which no text does.`;
  }
  return undefined;
}

const ENCODING_WORDS: Readonly<Record<Encoding, string>> = {
  'utf-8': 'UTF-8',
  'utf-16le': 'UTF-16 (little endian)',
  'utf-16be': 'UTF-16 (big endian)',
  'windows-1252': 'Windows-1252',
};

/** The encoding for a person, with how it was known. */
export function encodingInWords(found: EncodingFound): string {
  const known = found.byteOrderMark ? 'by its byte-order mark' : 'by its bytes';
  return `Read as ${ENCODING_WORDS[found.encoding]}, known ${known}.`;
}
