import { execFileSync, spawnSync } from 'node:child_process';
import { findPostgres } from '../cluster/find-postgres';

// Debian's package would set up a cluster of the machine's own, on the default port, started at every boot.
const NO_MAIN_CLUSTER = '/etc/postgresql-common/createcluster.d/wakeledger.conf';
const SCRIPT = [
  'set -e',
  'export DEBIAN_FRONTEND=noninteractive',
  'apt-get update -q',
  'apt-get install -q -y --no-install-recommends postgresql-common',
  `mkdir -p "$(dirname ${NO_MAIN_CLUSTER})"`,
  `echo 'create_main_cluster = false' > ${NO_MAIN_CLUSTER}`,
  `trap 'rm -f ${NO_MAIN_CLUSTER}' EXIT`,
  'apt-get install -q -y --no-install-recommends postgresql',
].join('\n');

/**
 * Where PostgreSQL's programs are; installed from Debian's packages when they are missing and we may.
 *
 * @throws {Error} saying what to run when we may not
 */
export function ensurePostgres(say: (line: string) => void): string {
  const present = findPostgres();
  if (present !== undefined) return present;
  const prefix = installerPrefix();
  if (prefix === undefined) {
    throw new Error(
      'PostgreSQL is not installed, and this user may not install it. As root, run:\n' +
        '  apt-get update && apt-get install --no-install-recommends postgresql\n' +
        'then start again. (The cluster that Debian sets up by itself is not used.)',
    );
  }
  say('Installing PostgreSQL from Debian’s packages …');
  const [program = 'sh', ...words] = [...prefix, 'sh', '-c', SCRIPT];
  const done = spawnSync(program, words, { stdio: ['ignore', 'ignore', 'inherit'] });
  const installed = findPostgres();
  if (done.status !== 0 || installed === undefined) {
    throw new Error(
      'PostgreSQL could not be installed. Run: apt-get install --no-install-recommends postgresql',
    );
  }
  return installed;
}

/** What goes before a command that needs root; undefined when root is out of reach. */
export function installerPrefix(): readonly string[] | undefined {
  if (process.getuid?.() === 0) return [];
  try {
    execFileSync('sudo', ['-n', 'true'], { stdio: 'ignore' });
    return ['sudo', '-n'];
  } catch {
    return undefined;
  }
}
