import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { compressClient } from './compress-client';
import { buildServer, serverBundleIsFresh } from './server-bundle';

export const CLIENT_FOLDER = 'dist/client';
const STAMP = 'dist/client.built-from';
const SOURCES = [
  'projects',
  'shared',
  'angular.json',
  'package-lock.json',
  'tsconfig.json',
  'server/scripts/start/compress-client.ts',
];

/**
 * Builds the client and the server unless what stands in dist was built from these very sources. Runs beside whatever
 * else a start has to do.
 *
 * @param signal ends a build that is under way
 */
export async function bringBuildsUpToDate(
  root: string,
  say: (line: string) => void,
  signal: AbortSignal,
): Promise<void> {
  if (!serverBundleIsFresh(root)) {
    await buildServer(root);
    prepareMachineEntry(root);
  }
  if (clientIsFresh(root)) return;
  say('Building the client …');
  await buildClient(root, signal);
}

function clientIsFresh(root: string): boolean {
  const stamp = join(root, STAMP);
  const standing = existsSync(stamp) ? readFileSync(stamp, 'utf8') : '';
  return standing === fingerprintOf(root) && existsSync(join(root, CLIENT_FOLDER, 'index.html'));
}

/** @throws {Error} when the build fails; what it said has been printed */
export async function buildClient(root: string, signal?: AbortSignal): Promise<void> {
  const fingerprint = fingerprintOf(root);
  // Until the end the folder is half a client.
  rmSync(join(root, STAMP), { force: true });
  const { code, output } = await runBuild(root, signal);
  if (signal?.aborted) throw new Error('The build of the client was stopped.');
  if (code !== 0) {
    process.stderr.write(`${output}\n`);
    throw new Error('The client cannot be built.');
  }
  await compressClient(join(root, CLIENT_FOLDER));
  mkdirSync(join(root, 'dist'), { recursive: true });
  writeFileSync(join(root, STAMP), fingerprint);
}

function runBuild(root: string, signal: AbortSignal | undefined): Promise<{ code: number; output: string }> {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, ['node_modules/@angular/cli/bin/ng.js', 'build'], {
      cwd: root,
      stdio: ['ignore', 'pipe', 'pipe'],
      env: { ...process.env, NG_CLI_ANALYTICS: 'false' },
      ...(signal === undefined ? {} : { signal }),
    });
    let output = '';
    const collect = (chunk: Buffer) => {
      output += chunk.toString('utf8');
    };
    child.stdout.on('data', collect);
    child.stderr.on('data', collect);
    child.once('error', (error) => resolve({ code: 1, output: `${output}\n${error.message}` }));
    child.once('close', (code) => resolve({ code: code ?? 1, output }));
  });
}

/** The machine entry keeps a bundle of its own, made at its first call: here is time for it, there is none. */
function prepareMachineEntry(root: string): void {
  spawn(process.execPath, ['server/scripts/method.mjs', '--list'], {
    cwd: root,
    stdio: 'ignore',
    detached: true,
  }).unref();
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
