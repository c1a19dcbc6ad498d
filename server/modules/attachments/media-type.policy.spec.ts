import { mediaTypeOf, safeFileName } from './media-type.policy';

const bytes = (...parts: readonly (string | number)[]): Uint8Array =>
  new Uint8Array(
    parts.flatMap((part) => (typeof part === 'number' ? [part] : [...new TextEncoder().encode(part)])),
  );
const PNG = bytes(0x89, 'PNG', 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13, 'IHDR');
const JPEG = bytes(0xff, 0xd8, 0xff, 0xe0, 0, 16, 'JFIF');
const WEBP = bytes('RIFF', 1, 2, 3, 4, 'WEBPVP8 ');
const PROGRAM = bytes('MZ', 0x90, 0, 3, 0, 0, 0);

describe('what a file is', () => {
  it.each([
    ['PNG', PNG, 'image/png'],
    ['JPEG', JPEG, 'image/jpeg'],
    ['WebP', WEBP, 'image/webp'],
    ['PDF', bytes('%PDF-1.7\n', 0xe2, 0xe3), 'application/pdf'],
  ])('is told by the content for %s, whatever the name', (_name, content, type) => {
    expect(mediaTypeOf(content, 'anything.txt', 'evidence')).toEqual({ accepted: true, type });
  });

  it('tells CSV from other text by the name alone', () => {
    const text = bytes('speed;force\n120;312,5\n');
    expect(mediaTypeOf(text, 'RUN.CSV', 'evidence')).toEqual({ accepted: true, type: 'text/csv' });
    expect(mediaTypeOf(text, 'notes', 'evidence')).toEqual({ accepted: true, type: 'text/plain' });
  });

  it.each(['picture.png', 'picture.jpg', 'report.pdf', 'values.csv', 'notes.txt'])(
    'is a program even when it is called %s, and is refused as one',
    (fileName) => {
      const verdict = mediaTypeOf(PROGRAM, fileName, 'evidence');
      expect(verdict).toMatchObject({ accepted: false });
      expect(verdict).toHaveProperty('detail', expect.stringMatching(/Windows program.*Evidence is PDF/));
    },
  );

  it('refuses a script, which would pass as text', () => {
    expect(mediaTypeOf(bytes('#!/bin/sh\necho hello\n'), 'a.txt', 'evidence')).toMatchObject({
      accepted: false,
    });
  });

  it('refuses a spreadsheet in words that name the archive that it is', () => {
    expect(mediaTypeOf(bytes('PK', 3, 4, 20, 0), 'values.csv', 'evidence')).toHaveProperty(
      'detail',
      expect.stringContaining('ZIP archive'),
    );
  });

  it('refuses text with NUL bytes, text that is not UTF-8, and an empty file', () => {
    for (const content of [bytes('a', 0, 'b'), bytes('a', 0xff, 'b'), bytes()]) {
      expect(mediaTypeOf(content, 'a.txt', 'evidence')).toMatchObject({ accepted: false });
    }
  });

  it('takes no PDF and no text as a picture', () => {
    expect(mediaTypeOf(bytes('%PDF-1.7'), 'a.png', 'picture')).toHaveProperty(
      'detail',
      'By its content this file is application/pdf. A picture is PNG, JPEG or WebP.',
    );
    expect(mediaTypeOf(bytes('<svg onload="x"/>'), 'a.png', 'picture')).toMatchObject({ accepted: false });
    expect(mediaTypeOf(PNG, 'a.png', 'picture')).toMatchObject({ accepted: true });
  });
});

describe('a file’s name', () => {
  it.each([
    ['..\\..\\etc\\report.pdf', 'report.pdf'],
    ['/tmp/räder vorn.png', 'räder vorn.png'],
    ['a"b\r\nSet-Cookie: x.pdf', 'abSet-Cookie x.pdf'],
    ['..', 'file'],
    ['', 'file'],
  ])('%j becomes %j', (stated, kept) => {
    expect(safeFileName(stated)).toBe(kept);
  });
});
