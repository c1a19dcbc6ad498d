import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { initialFiles } from './bundle-size/initial-files';

/** What a first visitor may have to download before the first lazily loaded page, compressed, without fonts. */
const MOST_BYTES = 200_000;

const folder = join(import.meta.dirname, '../../dist/client');
const sizes = initialFiles(folder).map((name) => ({
  name,
  bytes: gzipSync(readFileSync(join(folder, name)), { level: 6 }).length,
}));
const total = sizes.reduce((sum, { bytes }) => sum + bytes, 0);
const inThousands = (bytes: number): string => `${(bytes / 1000).toFixed(1)} kB`;

for (const { name, bytes } of sizes.toSorted((one, other) => other.bytes - one.bytes)) {
  console.log(`${inThousands(bytes).padStart(10)}  ${name}`);
}
console.log(
  `${inThousands(total).padStart(10)}  initial download, compressed; at most ${inThousands(MOST_BYTES)}`,
);
if (total > MOST_BYTES) {
  console.error('The initial download is over its budget: load what one page needs with that page.');
  process.exitCode = 1;
}
