import { spawnSync } from 'node:child_process';
import { join } from 'node:path';

export interface Violation {
  readonly from: string;
  readonly rule: { readonly name: string };
}

/** The folders that the rules speak about. */
export const CRUISED = ['shared', 'server', 'projects', 'seeds', 'e2e'] as const;

/** Checks one tree against the repository's rules, as `npm run architecture` does, and returns what it finds. */
export function cruise(root: string, tree: string, folders: readonly string[]): readonly Violation[] {
  const tool = join(root, 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs');
  const rules = join(root, '.dependency-cruiser.cjs');
  const { stdout, stderr } = spawnSync(process.execPath, [tool, '-c', rules, '-T', 'json', ...folders], {
    cwd: tree,
    encoding: 'utf8',
    maxBuffer: 64 * 1024 * 1024,
  });
  if (!stdout) throw new Error(stderr);
  const answer = JSON.parse(stdout) as { readonly summary: { readonly violations: readonly Violation[] } };
  return answer.summary.violations;
}
