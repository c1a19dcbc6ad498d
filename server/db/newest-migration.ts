import { readFileSync } from 'node:fs';
import { join } from 'node:path';

interface Journal {
  readonly entries: readonly { readonly when: number }[];
}

/** When the newest migration that this code knows was written, as drizzle-kit's journal states it. */
export function newestMigration(directory: string): number {
  const journal = JSON.parse(readFileSync(join(directory, 'meta', '_journal.json'), 'utf8')) as Journal;
  return Math.max(...journal.entries.map((entry) => entry.when));
}
