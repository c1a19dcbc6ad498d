import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { installerPrefix } from '../start/install-postgres';

export const CHROMIUM = '/usr/bin/chromium';

/**
 * Debian's Chromium for the browser journeys; installed when it is missing and we may.
 *
 * @throws {Error} saying what to run when we may not
 */
export function ensureChromium(): void {
  if (existsSync(CHROMIUM)) return;
  const prefix = installerPrefix();
  if (prefix !== undefined) {
    process.stdout.write('Installing Chromium from Debian’s packages …\n');
    const script = 'apt-get update -q && apt-get install -q -y --no-install-recommends chromium';
    const [program = 'sh', ...words] = [
      ...prefix,
      'sh',
      '-c',
      `DEBIAN_FRONTEND=noninteractive; export DEBIAN_FRONTEND; ${script}`,
    ];
    spawnSync(program, words, { stdio: ['ignore', 'ignore', 'inherit'] });
  }
  if (existsSync(CHROMIUM)) return;
  throw new Error(
    'Chromium is not installed. As root, run:\n' +
      '  apt-get update && apt-get install --no-install-recommends chromium\nthen test again.',
  );
}
