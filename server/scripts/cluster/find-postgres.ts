import { execFileSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';

const DEBIAN = '/usr/lib/postgresql';

/** Where initdb, postgres and pg_ctl are: Debian keeps each major version apart. Undefined when none is installed. */
export function findPostgres(): string | undefined {
  const versions = existsSync(DEBIAN) ? readdirSync(DEBIAN) : [];
  const newestFirst = versions
    .filter((version) => /^\d+$/.test(version))
    .sort((a, b) => Number(b) - Number(a))
    .map((version) => join(DEBIAN, version, 'bin'));
  const onPath = (process.env['PATH'] ?? '').split(':').filter((directory) => directory !== '');
  return [...newestFirst, ...onPath].find((directory) =>
    ['initdb', 'postgres', 'pg_ctl'].every((program) => existsSync(join(directory, program))),
  );
}

/** PostgreSQL refuses to run as root: then an unprivileged user runs it. */
export interface ClusterUser {
  readonly name: string;
  readonly uid: number;
  readonly gid: number;
  readonly home: string;
}

/** The user that runs the cluster: ourselves, or `postgres` (else `nobody`) when we are root. */
export function clusterUser(): ClusterUser | undefined {
  if (process.getuid?.() !== 0) return undefined;
  for (const name of ['postgres', 'nobody']) {
    const entry = passwdEntry(name);
    if (entry !== undefined) return entry;
  }
  throw new Error(
    'Running as root, and there is neither a user `postgres` nor `nobody` to run the database.',
  );
}

function passwdEntry(name: string): ClusterUser | undefined {
  try {
    const [, , uid, gid, , home] = execFileSync('getent', ['passwd', name], { encoding: 'utf8' })
      .trim()
      .split(':');
    return { name, uid: Number(uid), gid: Number(gid), home: home ?? '/' };
  } catch {
    return undefined;
  }
}
