import { execFileSync } from 'node:child_process';
import { createHash, randomBytes } from 'node:crypto';
import { chmodSync, existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import * as z from 'zod';
import type { ClusterUser } from '../cluster/find-postgres';

/** Everything that belongs to this installation and not to the repository. */
export const STATE_FOLDER = '.data';

/** The browser tests' own installation: made anew for every run, never the developer's data. */
export const THROWAWAY_FOLDER = '.data/throwaway';

const secrets = z.object({
  session: z.string(),
  superuser: z.string(),
  owner: z.string(),
  maintenance: z.string(),
  tenant: z.string(),
  platform: z.string(),
  /** The password of every demo person: in the private cluster of this installation only. */
  demo: z.string(),
});
export type Secrets = z.infer<typeof secrets>;

export function openStateFolder(root: string, name: string, clusterUser: ClusterUser | undefined): string {
  const folder = join(root, name);
  mkdirSync(folder, { recursive: true });
  // Another user runs the database below it: may pass through, may not look around.
  const mode = clusterUser === undefined ? 0o700 : 0o711;
  chmodSync(join(root, STATE_FOLDER), mode);
  chmodSync(folder, mode);
  return folder;
}

/** The secrets of this installation, drawn at the first start. */
export function openSecrets(folder: string): Secrets {
  const file = join(folder, 'secrets.json');
  if (!existsSync(file)) {
    const draw = () => randomBytes(24).toString('base64url');
    const drawn: Secrets = {
      session: randomBytes(48).toString('base64url'),
      superuser: draw(),
      owner: draw(),
      maintenance: draw(),
      tenant: draw(),
      platform: draw(),
      demo: randomBytes(9).toString('base64url'),
    };
    writePrivate(file, JSON.stringify(drawn, null, 2));
  }
  chmodSync(file, 0o600);
  return secrets.parse(JSON.parse(readFileSync(file, 'utf8')));
}

/** Written whole under another name first: a start that is killed leaves no half file. */
export function writePrivate(file: string, text: string): void {
  writeFileSync(`${file}.new`, text, { mode: 0o600 });
  renameSync(`${file}.new`, file);
}

export interface ClusterFolder {
  readonly folder: string;
  /** Said to the person when the cluster had to be put elsewhere. */
  readonly notice: string | undefined;
}

/** `.data/cluster`, unless the user that runs the database cannot get there: then a folder of that user's. */
export function clusterFolder(stateFolder: string, user: ClusterUser | undefined): ClusterFolder {
  if (user === undefined || canPass(user, stateFolder)) {
    return { folder: join(stateFolder, 'cluster'), notice: undefined };
  }
  const name = `wakeledger-${createHash('sha256').update(stateFolder).digest('hex').slice(0, 12)}`;
  const folder = join(existsSync(user.home) ? user.home : '/var/tmp', name);
  return {
    folder,
    notice: `The user ${user.name}, who runs the database, cannot reach ${stateFolder}: its files are in ${folder}.`,
  };
}

function canPass(user: ClusterUser, folder: string): boolean {
  try {
    execFileSync('/bin/sh', ['-c', 'cd "$0"', folder], {
      uid: user.uid,
      gid: user.gid,
      cwd: '/',
      stdio: 'ignore',
    });
    return true;
  } catch {
    return false;
  }
}
