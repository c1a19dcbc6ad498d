import { type ChildProcess, spawn } from 'node:child_process';
import { closeSync, openSync } from 'node:fs';
import { createServer } from 'node:net';

export interface ServerProcess {
  readonly ended: Promise<number>;
  readonly stop: () => Promise<void>;
}

/** Starts the server and waits until it listens. Its log goes to `logFile`, what it cannot log to our own stderr. */
export async function startServer(
  command: readonly string[],
  root: string,
  env: NodeJS.ProcessEnv,
  logFile: string | undefined,
): Promise<ServerProcess> {
  const log = logFile === undefined ? undefined : openSync(logFile, 'a', 0o600);
  const child: ChildProcess = spawn(process.execPath, [...command], {
    cwd: root,
    env,
    // Not in our process group: Ctrl-C reaches us alone, and we stop things in order.
    detached: true,
    stdio: ['ignore', log ?? 'inherit', 'inherit', 'ipc'],
  });
  if (log !== undefined) closeSync(log);
  const ended = new Promise<number>((resolve) => child.once('exit', (code) => resolve(code ?? 1)));
  const ready = new Promise<'ready'>((resolve) => child.once('message', () => resolve('ready')));
  const first = await Promise.race([ready, ended]);
  if (first !== 'ready') {
    throw new Error(`The server did not start${logFile === undefined ? '' : `; its log is ${logFile}`}.`);
  }
  return {
    ended,
    stop: async () => {
      child.kill('SIGTERM');
      await ended;
    },
  };
}

/** Waits a moment for a port that a server which is just stopping may still hold. @throws {Error} when it stays taken */
export async function requirePort(host: string, port: number): Promise<void> {
  for (let attempt = 0; ; attempt += 1) {
    if (await isFree(host, port)) return;
    if (attempt >= 40) {
      throw new Error(`Port ${port} is in use by another program. Choose another one: PORT=4301 npm start`);
    }
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
}

function isFree(host: string, port: number): Promise<boolean> {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen(port, host, () => probe.close(() => resolve(true)));
  });
}
