import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { extname, join } from 'node:path';
import { promisify } from 'node:util';
import { brotliCompress, constants, gzip } from 'node:zlib';

const TEXTS = new Set(['.js', '.css', '.svg', '.json', '.txt', '.webmanifest']);
/** Below this a packet is sent anyway. */
const LEAST_BYTES = 1024;

const brotli = promisify(brotliCompress);
const gzipped = promisify(gzip);

/**
 * Lays a `.br` and a `.gz` beside every text of the built client, so that serving it costs no compression. The page
 * itself is not among them: each answer carries a nonce of its own.
 */
export async function compressClient(folder: string): Promise<void> {
  const names = readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && TEXTS.has(extname(entry.name)))
    .map((entry) => join(entry.parentPath, entry.name));
  await Promise.all(
    names.map(async (name) => {
      const content = readFileSync(name);
      if (content.length < LEAST_BYTES) return;
      const params = {
        [constants.BROTLI_PARAM_QUALITY]: 10,
        [constants.BROTLI_PARAM_SIZE_HINT]: content.length,
      };
      writeFileSync(`${name}.br`, await brotli(content, { params }));
      writeFileSync(`${name}.gz`, await gzipped(content, { level: 9 }));
    }),
  );
}
