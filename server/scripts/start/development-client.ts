import { spawn } from 'node:child_process';

/** The client's development server on http://localhost:4200, passing /api on; returns how to stop it. */
export function startDevelopmentClient(root: string): () => Promise<void> {
  const child = spawn(process.execPath, ['node_modules/@angular/cli/bin/ng.js', 'serve', '--port', '4200'], {
    cwd: root,
    detached: true,
    stdio: ['ignore', 'inherit', 'inherit'],
    env: { ...process.env, NG_CLI_ANALYTICS: 'false' },
  });
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  return async () => {
    child.kill('SIGTERM');
    await ended;
  };
}
