/**
 * Starts the machine entry of the method from a bundle, because compiling some sixty files at every call would take longer than
 * the answer may. The bundle is kept beside the packages and made again when any file that went into it has changed. Who may not
 * write there gets the same answer from a bundle of their own, made for the one call.
 */
import { mkdirSync, readFileSync, renameSync, statSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import process from 'node:process';
import { fileURLToPath, pathToFileURL } from 'node:url';

const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');
const folder = join(root, 'node_modules', '.cache', 'wakeledger');
const bundle = join(folder, 'method.mjs');
const sources = join(folder, 'method.sources.json');

/** Whether every file that went into the bundle is still as it was: by time of change and size. */
function isFresh() {
  try {
    /** @type {[string, number, number][]} */
    const files = JSON.parse(readFileSync(sources, 'utf8'));
    statSync(bundle);
    return files.every(([path, time, size]) => {
      const now = statSync(join(root, path));
      return now.mtimeMs === time && now.size === size;
    });
  } catch {
    return false;
  }
}

/** Written under a name of its own first, so that calls at the same time never read half a file. */
function writeWhole(path, text) {
  const draft = `${path}.${process.pid}`;
  writeFileSync(draft, text);
  renameSync(draft, path);
}

/** Makes the bundle and keeps it if it may. @returns the address to load it from */
async function makeBundle() {
  const { build } = await import('esbuild');
  const made = await build({
    absWorkingDir: root,
    entryPoints: ['server/scripts/method.ts'],
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    write: false,
    metafile: true,
    logLevel: 'error',
  });
  const files = Object.keys(made.metafile.inputs).map((path) => {
    const { mtimeMs, size } = statSync(join(root, path));
    return [path, mtimeMs, size];
  });
  const { text } = made.outputFiles[0];
  try {
    mkdirSync(folder, { recursive: true });
    writeWhole(bundle, text);
    writeWhole(sources, JSON.stringify(files));
    return pathToFileURL(bundle).href;
  } catch (error) {
    if (error.code !== 'EACCES' && error.code !== 'EROFS' && error.code !== 'EPERM') throw error;
    return `data:text/javascript,${encodeURIComponent(text)}`;
  }
}

await import(isFresh() ? pathToFileURL(bundle).href : await makeBundle());
