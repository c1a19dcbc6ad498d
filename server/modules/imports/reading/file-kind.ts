interface Signature {
  readonly bytes: readonly number[];
  readonly at?: number;
  readonly looksLike: string;
}

/** What people bring instead of a CSV file, by its first bytes: the name of a file proves nothing. */
const SIGNATURES: readonly Signature[] = [
  { bytes: [0x4d, 0x5a], looksLike: 'a Windows program' },
  { bytes: [0x7f, 0x45, 0x4c, 0x46], looksLike: 'a Linux program' },
  { bytes: [0xcf, 0xfa, 0xed, 0xfe], looksLike: 'a macOS program' },
  { bytes: [0xca, 0xfe, 0xba, 0xbe], looksLike: 'a program' },
  { bytes: [0x23, 0x21], looksLike: 'a script' },
  { bytes: [0x25, 0x50, 0x44, 0x46], looksLike: 'a PDF document' },
  { bytes: [0x89, 0x50, 0x4e, 0x47], looksLike: 'a PNG picture' },
  { bytes: [0xff, 0xd8, 0xff], looksLike: 'a JPEG picture' },
  { bytes: [0x47, 0x49, 0x46, 0x38], looksLike: 'a GIF picture' },
  { bytes: [0x1f, 0x8b], looksLike: 'a gzip archive' },
  { bytes: [0x42, 0x5a, 0x68], looksLike: 'a bzip2 archive' },
  { bytes: [0xfd, 0x37, 0x7a, 0x58, 0x5a], looksLike: 'an xz archive' },
  { bytes: [0x37, 0x7a, 0xbc, 0xaf], looksLike: 'a 7z archive' },
  { bytes: [0x52, 0x61, 0x72, 0x21], looksLike: 'a rar archive' },
  { bytes: [0x89, 0x48, 0x44, 0x46], looksLike: 'an HDF5 file' },
  { bytes: [0x75, 0x73, 0x74, 0x61, 0x72], at: 257, looksLike: 'a tar archive' },
];

const ZIP = [0x50, 0x4b, 0x03, 0x04] as const;

function startsWith(head: Uint8Array, bytes: readonly number[], at = 0): boolean {
  return bytes.every((byte, index) => head[at + index] === byte);
}

/** Whether a file is a zip archive, as workbooks are. */
export function isZip(head: Uint8Array): boolean {
  return startsWith(head, ZIP);
}

/** A compound file: an old Office document, or a new one behind a password. */
const COMPOUND = [0xd0, 0xcf, 0x11, 0xe0] as const;

function compoundKind(content: Uint8Array): string {
  const bytes = Buffer.from(content.buffer, content.byteOffset, content.byteLength);
  return bytes.includes('EncryptedPackage', 0, 'utf16le')
    ? 'a workbook locked with a password'
    : 'an old Office document (.xls)';
}

/** An OpenDocument file names its kind in clear text at its beginning. */
const OPEN_DOCUMENT = 'application/vnd.oasis.opendocument';

/** What a file is by its bytes, in words; undefined when nothing speaks against text or a workbook. */
export function otherKindOfFile(content: Uint8Array): string | undefined {
  const head = content.subarray(0, 4096);
  if (startsWith(head, COMPOUND)) return compoundKind(content);
  if (isZip(head))
    return new TextDecoder('latin1').decode(head).includes(OPEN_DOCUMENT)
      ? 'an OpenDocument file (.ods)'
      : undefined;
  return SIGNATURES.find((signature) => startsWith(head, signature.bytes, signature.at))?.looksLike;
}

/** How such a file becomes one that can be read. */
export function wayOut(looksLike: string): string {
  if (looksLike.includes('password'))
    return 'Open it, take the password off, save it as .xlsx and bring that in.';
  return /OpenDocument|Office/.test(looksLike)
    ? 'Open it there, save it as a workbook (.xlsx) or the sheet as CSV, then bring that in.'
    : 'A CSV file is accepted (text, one row a line, columns set apart by semicolon, comma or tab), or a workbook (.xlsx).';
}
