import { deflateRawSync } from 'node:zlib';

export interface ZipPart {
  readonly name: string;
  readonly content: string | Buffer;
  /** What the archive says that the part unpacks to, where that is a lie. */
  readonly declaredBytes?: number;
  readonly locked?: true;
}

/** A zip archive as told, lies and all (APPNOTE.TXT 6.3.10, sections 4.3.7, 4.3.12 and 4.3.16); for tests. */
export function zipOf(parts: readonly ZipPart[]): Buffer {
  const local: Buffer[] = [];
  const central: Buffer[] = [];
  let at = 0;
  for (const part of parts) {
    const name = Buffer.from(part.name);
    const content = Buffer.from(part.content);
    const packed = deflateRawSync(content, { level: 6 });
    const fields = Buffer.alloc(26);
    fields.writeUInt16LE(20, 0);
    fields.writeUInt16LE(part.locked === true ? 0x0801 : 0x0800, 2);
    fields.writeUInt16LE(8, 4);
    // Time, date and checksum stay 0: the reader that is tested looks at none of them.
    fields.writeUInt32LE(packed.length, 14);
    fields.writeUInt32LE(part.declaredBytes ?? content.length, 18);
    fields.writeUInt16LE(name.length, 22);
    local.push(Buffer.from([0x50, 0x4b, 3, 4]), fields, name, packed);
    const tail = Buffer.alloc(14);
    tail.writeUInt32LE(at, 10);
    central.push(Buffer.from([0x50, 0x4b, 1, 2, 20, 0]), fields, tail, name);
    at += 30 + name.length + packed.length;
  }
  const directory = Buffer.concat(central);
  const end = Buffer.alloc(22);
  end.write('PK\x05\x06', 'latin1');
  end.writeUInt16LE(parts.length, 8);
  end.writeUInt16LE(parts.length, 10);
  end.writeUInt32LE(directory.length, 12);
  end.writeUInt32LE(at, 16);
  return Buffer.concat([...local, directory, end]);
}
