import { existsSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { writePrivate } from './state-folder';

/**
 * Keeps a second start of the same installation from taking the first one's database away. A note left by a killed
 * process does not count: its number is looked up, and it must be one of ours.
 *
 * @throws {Error} when this installation runs already
 */
export function takeStartLock(stateFolder: string): () => void {
  const file = join(stateFolder, 'start.pid');
  const other = existsSync(file) ? Number(readFileSync(file, 'utf8')) : 0;
  if (other > 1 && other !== process.pid && isAStart(other)) {
    throw new Error(`This installation runs already (process ${other}). Stop it first, or use its address.`);
  }
  writePrivate(file, String(process.pid));
  return () => rmSync(file, { force: true });
}

function isAStart(pid: number): boolean {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').includes('scripts/start.mjs');
  } catch {
    return false;
  }
}
