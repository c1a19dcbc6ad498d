/**
 * Makes a fresh clone able to run anything: runs before anything is installed, so it uses nothing but Node.js. Installs the
 * packages when they are missing or not those of the lock file. After it, TypeScript can be imported.
 */
import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import process from 'node:process';
import { fileURLToPath } from 'node:url';

const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');
process.chdir(root);

/** The packages of a lock file as far as they must be there: path and version. */
function packagesOf(file) {
  try {
    const { packages } = JSON.parse(readFileSync(join(root, file), 'utf8'));
    return new Map(
      Object.entries(packages)
        .filter(([path, entry]) => path !== '' && !entry.optional && !entry.devOptional)
        .map(([path, entry]) => [path, entry.version]),
    );
  } catch {
    return undefined;
  }
}

/** npm keeps what it has installed in a hidden lock file of its own. */
function packagesAreThere() {
  const wanted = packagesOf('package-lock.json');
  const installed = packagesOf('node_modules/.package-lock.json');
  if (wanted === undefined || installed === undefined) return false;
  return [...wanted].every(([path, version]) => installed.get(path) === version);
}

const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
if (major !== 20 || minor < 19) {
  process.stderr.write(`Wakeledger runs on Node.js 20 (20.19 or later); this is ${process.versions.node}.\n`);
  process.exit(1);
}
if (!packagesAreThere()) {
  process.stdout.write('Installing the packages (npm ci) …\n');
  const npm = process.env.npm_execpath;
  const [program, words] = npm?.endsWith('.js') ? [process.execPath, [npm, 'ci']] : ['npm', ['ci']];
  const done = spawnSync(program, words, { stdio: ['ignore', 'inherit', 'inherit'] });
  if (done.status !== 0) process.exit(done.status ?? 1);
}

const { register } = await import('tsx/esm/api');
register();
