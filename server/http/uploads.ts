import { createHash } from 'node:crypto';
import type { Request } from 'express';
import busboy from 'busboy';
import type { UploadedFile } from './module';
import { ProblemError, fail } from './problem-error';

/**
 * Reads the one file of a multipart request (field `file`), keeping at most `maximumBytes` in memory. What comes
 * beyond is read and dropped, so that the sender hears the refusal instead of a broken connection.
 *
 * @throws {ProblemError} too-large, malformed-input
 */
export async function readUpload(req: Request, maximumBytes: number): Promise<UploadedFile> {
  if (!req.is('multipart/form-data')) {
    fail('malformed-input', {
      where: 'body',
      detail: 'Send multipart/form-data with one file in the field `file`.',
    });
  }
  return new Promise((resolve, reject) => {
    let file: UploadedFile | undefined;
    let refusal: ProblemError | undefined;
    const parser = busboy({
      headers: req.headers,
      defParamCharset: 'utf8',
      // The parser calls a file that just reaches its limit too large already; ours is the last one that passes.
      limits: { files: 1, fields: 0, parts: 2, fileSize: maximumBytes + 1, headerPairs: 50 },
    });
    const giveUp = (detail: string) => {
      refusal ??= new ProblemError('malformed-input', { where: 'body', detail });
    };
    parser.on('file', (field, stream, info) => {
      const chunks: Buffer[] = [];
      const hash = createHash('sha256');
      stream.on('data', (chunk: Buffer) => {
        if (refusal !== undefined) return;
        chunks.push(chunk);
        hash.update(chunk);
      });
      stream.on('limit', () => {
        chunks.length = 0;
        refusal = new ProblemError('too-large', {
          where: 'body.file',
          detail: `At most ${Math.floor(maximumBytes / 1024 / 1024)} MB can be taken.`,
        });
      });
      stream.on('close', () => {
        if (field !== 'file') giveUp('The file belongs in the field `file`.');
        if (refusal !== undefined) return;
        file = {
          fileName: plainName(info.filename),
          mediaType: info.mimeType,
          content: Buffer.concat(chunks),
          sha256: hash.digest('hex'),
        };
      });
    });
    parser.on('field', () => giveUp('Only the field `file` is expected.'));
    parser.on('fieldsLimit', () => giveUp('Only the field `file` is expected.'));
    parser.on('filesLimit', () => giveUp('One file at a time.'));
    parser.on('partsLimit', () => giveUp('One file at a time.'));
    const settle = () => {
      if (refusal !== undefined) reject(refusal);
      else if (file === undefined) {
        reject(new ProblemError('malformed-input', { where: 'body.file', detail: 'The file is missing.' }));
      } else resolve(file);
    };
    parser.on('close', settle);
    parser.on('error', () => {
      giveUp('The upload ended early or is not well formed.');
      req.unpipe(parser);
      req.resume();
      settle();
    });
    req.on('aborted', () => parser.destroy(new Error('aborted')));
    req.pipe(parser);
  });
}

/** The last part of the name, without control characters: shown to people, never used as a path. */
function plainName(given: string | undefined): string {
  const name = (given ?? '').split(/[/\\]/).at(-1)?.replace(/\p{C}/gu, '').trim().slice(0, 200);
  return name ? name : 'file';
}
