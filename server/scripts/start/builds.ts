import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { build } from 'esbuild';

export const CLIENT_FOLDER = 'dist/client';
export const SERVER_BUNDLE = 'dist/server/main.mjs';
const STAMP = 'dist/client.built-from';
const SOURCES = ['projects', 'shared', 'angular.json', 'package-lock.json', 'tsconfig.json'];

/** Builds the client unless what stands in dist was built from these very sources. */
export function buildClientWhenStale(root: string, say: (line: string) => void): void {
  const fingerprint = fingerprintOf(root);
  const stamp = join(root, STAMP);
  const standing = existsSync(stamp) ? readFileSync(stamp, 'utf8') : '';
  if (standing === fingerprint && existsSync(join(root, CLIENT_FOLDER, 'index.html'))) return;
  say('Building the client …');
  buildClient(root);
}

/** @throws {Error} when the build fails; what it said has been printed */
export function buildClient(root: string): void {
  const fingerprint = fingerprintOf(root);
  const done = spawnSync(process.execPath, ['node_modules/@angular/cli/bin/ng.js', 'build'], {
    cwd: root,
    stdio: ['ignore', 'pipe', 'pipe'],
    encoding: 'utf8',
    env: { ...process.env, NG_CLI_ANALYTICS: 'false' },
  });
  if (done.status !== 0) {
    process.stderr.write(`${done.stdout}\n${done.stderr}\n`);
    throw new Error('The client cannot be built.');
  }
  mkdirSync(join(root, 'dist'), { recursive: true });
  writeFileSync(join(root, STAMP), fingerprint);
}

/** One file of the server's own code; packages stay outside it. */
export async function buildServer(root: string): Promise<void> {
  await build({
    absWorkingDir: root,
    entryPoints: ['server/main.ts'],
    outfile: SERVER_BUNDLE,
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external',
    sourcemap: true,
    logLevel: 'error',
  });
}

function fingerprintOf(root: string): string {
  const hash = createHash('sha256');
  const add = (path: string) => {
    const entries = tryList(join(root, path));
    if (entries === undefined) {
      hash
        .update(path)
        .update('\0')
        .update(readFileSync(join(root, path)))
        .update('\0');
      return;
    }
    for (const name of entries) if (!name.endsWith('.spec.ts')) add(join(path, name));
  };
  SOURCES.filter((path) => existsSync(join(root, path))).forEach(add);
  return hash.digest('hex');
}

function tryList(path: string): readonly string[] | undefined {
  try {
    return readdirSync(path).sort();
  } catch {
    return undefined;
  }
}
