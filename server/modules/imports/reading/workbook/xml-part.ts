import { TextDecoder } from 'node:util';
import { SaxesParser } from 'saxes';
import { UnreadableFile } from '../unreadable-file';
import type { WorkbookArchive } from './archive';
import { damaged } from './limits';

/** What is told of a part while it is read; names without their prefix. */
export interface XmlReader {
  readonly open?: (name: string, attributes: Readonly<Record<string, string>>) => void;
  readonly close?: (name: string) => void;
  readonly text?: (text: string) => void;
  /** After each piece of the part, so that what was gathered can be handed on before more is read. */
  readonly piece?: () => Promise<void>;
}

/** Text between two tags cannot be longer: a cell holds 32 767 characters at most. */
const MOST_CHARACTERS_AT_ONCE = 1_000_000;

/**
 * Reads a part as XML, piece by piece. Entities from outside do not exist here; a document type declaration, in which
 * they are made, is refused.
 *
 * @throws {UnreadableFile} with the name of the part
 */
export async function readXml(archive: WorkbookArchive, part: string, reader: XmlReader): Promise<void> {
  await parse(archive, part, reader, false);
}

/** Looks at the beginning of every part for a document type declaration; it can stand before the first element only. */
export async function refuseDocumentTypes(archive: WorkbookArchive): Promise<void> {
  for (const part of archive.names) await parse(archive, part, {}, true);
}

async function parse(
  archive: WorkbookArchive,
  part: string,
  reader: XmlReader,
  beginningOnly: boolean,
): Promise<void> {
  let quiet = 0;
  let rootSeen = false;
  const told = () => {
    quiet = 0;
  };
  const parser = new SaxesParser({ xmlns: false, position: false });
  parser.on('xmldecl', ({ encoding }) => {
    told();
    if (!beginningOnly && encoding !== undefined && !/^utf-?(8|16)$/i.test(encoding))
      throw damaged(`its part ${part} is written in ${encoding}, and only UTF-8 and UTF-16 are allowed.`);
  });
  parser.on('doctype', () => {
    throw withDocumentType(part);
  });
  parser.on('opentag', ({ name, attributes }) => {
    told();
    rootSeen = true;
    reader.open?.(localName(name), attributes);
  });
  parser.on('closetag', ({ name }) => {
    told();
    reader.close?.(localName(name));
  });
  parser.on('text', (text) => {
    told();
    reader.text?.(text);
  });
  parser.on('cdata', (text) => {
    told();
    reader.text?.(text);
  });
  parser.on('error', (error) => {
    throw beginningOnly ? new NotXml() : notWellFormed(part, error.message);
  });
  try {
    for await (const text of textOf(archive, part, beginningOnly)) {
      quiet += text.length;
      parser.write(text);
      if (quiet > MOST_CHARACTERS_AT_ONCE)
        throw damaged(`its part ${part} holds a text of more than a million characters.`);
      if (beginningOnly && rootSeen) return;
      await reader.piece?.();
    }
    if (!beginningOnly) parser.close();
  } catch (error) {
    if (!(error instanceof NotXml)) throw error;
  }
}

/** A part that nobody reads may be what it likes (a picture, a drawing in loose markup), but for a document type. */
class NotXml extends Error {
  override readonly name = 'NotXml';
}

async function* textOf(
  archive: WorkbookArchive,
  part: string,
  beginningOnly: boolean,
): AsyncGenerator<string> {
  let decoder: TextDecoder | undefined;
  for await (const chunk of archive.bytesOf(part)) {
    if (decoder === undefined) {
      if (beginningOnly && !looksLikeXml(chunk)) throw new NotXml();
      decoder = new TextDecoder(encodingOf(chunk), { fatal: !beginningOnly });
    }
    yield decodedPiece(decoder, chunk, part);
  }
  if (decoder !== undefined && !beginningOnly) yield decodedPiece(decoder, undefined, part);
}

function decodedPiece(decoder: TextDecoder, chunk: Uint8Array | undefined, part: string): string {
  try {
    return chunk === undefined ? decoder.decode() : decoder.decode(chunk, { stream: true });
  } catch {
    throw damaged(`the text of its part ${part} is not what it says it is written in.`);
  }
}

/** XML in UTF-16 shows by its mark or by the NUL beside its first sign (XML 1.0, appendix F). */
function encodingOf(chunk: Uint8Array): 'utf-8' | 'utf-16le' | 'utf-16be' {
  const [first, second] = chunk;
  if ((first === 0xff && second === 0xfe) || (first === 0x3c && second === 0)) return 'utf-16le';
  if ((first === 0xfe && second === 0xff) || (first === 0 && second === 0x3c)) return 'utf-16be';
  return 'utf-8';
}

function looksLikeXml(chunk: Uint8Array): boolean {
  const beginning = new TextDecoder('latin1').decode(chunk.subarray(0, 400));
  return /^(?:\u00ef\u00bb\u00bf|\u00ff\u00fe|\u00fe\u00ff)?[\s\0]*</.test(beginning);
}

function localName(name: string): string {
  const colon = name.indexOf(':');
  return colon < 0 ? name : name.slice(colon + 1);
}

function withDocumentType(part: string): UnreadableFile {
  return new UnreadableFile(
    'unsupported-file',
    `The part ${part} of this workbook holds a document type declaration (DOCTYPE), which no spreadsheet program writes and which can pull in other files. Save it anew as .xlsx, or the sheet as CSV, and bring that in.`,
  );
}

/** The XML reader says line and column first, which nobody can look up here. */
function notWellFormed(part: string, message: string): UnreadableFile {
  return damaged(`its part ${part} is not well-formed XML (${message.slice(0, 200)}).`);
}
