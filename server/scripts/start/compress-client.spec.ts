import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { brotliDecompressSync, gunzipSync } from 'node:zlib';
import { compressClient } from './compress-client';

const LONG = 'export const word = 1;\n'.repeat(200);

test('every long text of the built client gets both forms beside it, the page, pictures and short ones do not', async () => {
  const folder = mkdtempSync(join(tmpdir(), 'wakeledger-built-'));
  try {
    mkdirSync(join(folder, 'media'));
    const names = ['main-A.js', 'media/drawing.svg', 'index.html', 'media/type.woff2'];
    for (const name of names) writeFileSync(join(folder, name), LONG);
    writeFileSync(join(folder, 'short.js'), '1;');
    await compressClient(folder);
    for (const name of ['main-A.js', 'media/drawing.svg']) {
      expect(brotliDecompressSync(readFileSync(join(folder, `${name}.br`))).toString()).toBe(LONG);
      expect(gunzipSync(readFileSync(join(folder, `${name}.gz`))).toString()).toBe(LONG);
    }
    for (const name of ['index.html', 'media/type.woff2', 'short.js']) {
      expect(existsSync(join(folder, `${name}.br`))).toBe(false);
    }
  } finally {
    rmSync(folder, { recursive: true });
  }
});
