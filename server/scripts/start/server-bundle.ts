import { mkdirSync, readFileSync, renameSync, statSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { build } from 'esbuild';

export const SERVER_BUNDLE = 'dist/server/main.mjs';
/** Which files went into the bundle, each with its time of change and size. */
const SOURCES = 'dist/server/main.sources.json';

type Source = readonly [path: string, changedMs: number, bytes: number];

/** Whether every file that went into the bundle is still as it was. */
export function serverBundleIsFresh(root: string): boolean {
  try {
    const sources = JSON.parse(readFileSync(join(root, SOURCES), 'utf8')) as readonly Source[];
    statSync(join(root, SERVER_BUNDLE));
    return sources.every(([path, changedMs, bytes]) => {
      const now = statSync(join(root, path));
      return now.mtimeMs === changedMs && now.size === bytes;
    });
  } catch {
    return false;
  }
}

/** One file of the server's own code; packages stay outside it. */
export async function buildServer(root: string): Promise<void> {
  const { metafile, outputFiles } = await build({
    absWorkingDir: root,
    entryPoints: ['server/main.ts'],
    outfile: SERVER_BUNDLE,
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external',
    sourcemap: true,
    metafile: true,
    write: false,
    logLevel: 'error',
  });
  mkdirSync(dirname(join(root, SERVER_BUNDLE)), { recursive: true });
  for (const { path, contents } of outputFiles) writeWhole(path, contents);
  // A setting of the compiler or another package is a change, too.
  const paths = [...Object.keys(metafile.inputs), 'tsconfig.json', 'package.json'];
  const sources = paths.map((path): Source => {
    const { mtimeMs, size } = statSync(join(root, path));
    return [path, mtimeMs, size];
  });
  writeWhole(join(root, SOURCES), JSON.stringify(sources));
}

/** Under another name first: a start that is killed leaves no half file, and a server that runs keeps its own. */
function writeWhole(path: string, content: Uint8Array | string): void {
  const draft = `${path}.${process.pid}`;
  writeFileSync(draft, content);
  renameSync(draft, path);
}
