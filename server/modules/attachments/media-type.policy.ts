import type { ATTACHMENT_TYPES, AttachmentPurpose } from '#shared/contracts/attachments';

export type AttachmentType = (typeof ATTACHMENT_TYPES)[number];

/** What the first bytes give away. `at` is where the pattern begins. */
interface Signature {
  readonly type: AttachmentType;
  readonly bytes: readonly number[];
  readonly at?: number;
}

const ascii = (text: string): readonly number[] => [...text].map((letter) => letter.charCodeAt(0));

const SIGNATURES: readonly Signature[] = [
  { type: 'application/pdf', bytes: ascii('%PDF-') },
  { type: 'image/png', bytes: [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a] },
  { type: 'image/jpeg', bytes: [0xff, 0xd8, 0xff] },
  { type: 'image/webp', bytes: ascii('WEBP'), at: 8 },
];

/** Kinds that people bring along by mistake, or under another name; they are refused by the name of what they are. */
const REFUSED_KINDS: readonly { readonly words: string; readonly bytes: readonly number[] }[] = [
  { words: 'a Windows program', bytes: ascii('MZ') },
  { words: 'a Linux program', bytes: [0x7f, ...ascii('ELF')] },
  { words: 'a macOS program', bytes: [0xcf, 0xfa, 0xed, 0xfe] },
  {
    words: 'a ZIP archive (spreadsheets and text documents are such archives)',
    bytes: ascii('PK\u0003\u0004'),
  },
  { words: 'a compressed archive', bytes: [0x1f, 0x8b] },
  { words: 'a script', bytes: ascii('#!') },
  { words: 'an old office document', bytes: [0xd0, 0xcf, 0x11, 0xe0] },
];

const ACCEPTED_FOR: Readonly<Record<AttachmentPurpose, readonly AttachmentType[]>> = {
  picture: ['image/png', 'image/jpeg', 'image/webp'],
  evidence: ['application/pdf', 'image/png', 'image/jpeg', 'image/webp', 'text/csv', 'text/plain'],
};

const ACCEPTED_WORDS: Readonly<Record<AttachmentPurpose, string>> = {
  picture: 'A picture is PNG, JPEG or WebP.',
  evidence: 'Evidence is PDF, PNG, JPEG, WebP, CSV or plain text in UTF-8.',
};

export type MediaTypeVerdict =
  | { readonly accepted: true; readonly type: AttachmentType }
  | { readonly accepted: false; readonly detail: string };

/** What a file is, by its content and never by its name; the name only tells CSV from other plain text. */
export function mediaTypeOf(
  content: Uint8Array,
  fileName: string,
  purpose: AttachmentPurpose,
): MediaTypeVerdict {
  const type = signatureOf(content) ?? textTypeOf(content, fileName);
  if (type !== undefined && ACCEPTED_FOR[purpose].includes(type)) return { accepted: true, type };
  return { accepted: false, detail: `${whatItIs(content, type)} ${ACCEPTED_WORDS[purpose]}` };
}

function startsWith(content: Uint8Array, bytes: readonly number[], at = 0): boolean {
  return content.length >= at + bytes.length && bytes.every((byte, i) => content[at + i] === byte);
}

function signatureOf(content: Uint8Array): AttachmentType | undefined {
  return SIGNATURES.find((signature) => startsWith(content, signature.bytes, signature.at))?.type;
}

/** Text is UTF-8 throughout, without control characters but line ends, tabs and form feeds. */
function textTypeOf(content: Uint8Array, fileName: string): AttachmentType | undefined {
  if (content.length === 0 || refusedKindOf(content) !== undefined || content.some(isControl))
    return undefined;
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(content);
  } catch {
    return undefined;
  }
  return fileName.toLowerCase().endsWith('.csv') ? 'text/csv' : 'text/plain';
}

const isControl = (byte: number): boolean => byte < 0x20 && ![0x09, 0x0a, 0x0c, 0x0d].includes(byte);

function refusedKindOf(content: Uint8Array): string | undefined {
  return REFUSED_KINDS.find((kind) => startsWith(content, kind.bytes))?.words;
}

function whatItIs(content: Uint8Array, type: AttachmentType | undefined): string {
  if (content.length === 0) return 'The file is empty.';
  if (type !== undefined) return `By its content this file is ${type}.`;
  const kind = refusedKindOf(content);
  return kind === undefined
    ? 'This file’s content is of no kind that is known here.'
    : `By its content this file is ${kind}, whatever its name says.`;
}

/** A name that can stand in a header and on any disk: the last part of a path, without controls, quotes or slashes. */
export function safeFileName(stated: string): string {
  const last = stated.split(/[\\/]/).at(-1) ?? '';
  const plain = [...last]
    .filter(
      (letter) =>
        letter.charCodeAt(0) >= 0x20 && letter.charCodeAt(0) !== 0x7f && !'"<>|:*?'.includes(letter),
    )
    .join('')
    .trim()
    .slice(0, 200);
  return plain === '' || /^\.+$/.test(plain) ? 'file' : plain;
}
