import { createServer, type Server } from 'node:http';
import { createApp } from './app';
import { readConfig } from './config';
import { createContainer } from './container';
import { assertRequestRoles } from './db/request-roles';
import { createJobRunner } from './jobs/job-runner';
import { MODULES } from './modules/registry';

/** How long requests that are under way may take to end once the server was asked to stop. */
const DRAIN_MS = 8000;

const config = readConfig(process.env);
const container = createContainer(config);
await assertRequestRoles(container.pools);

const runner = createJobRunner(
  container,
  MODULES.flatMap((module) => module.jobs ?? []),
);
const server = createServer(createApp(container, MODULES));
await new Promise<void>((resolve, reject) => {
  server.once('error', reject);
  server.listen(config.port, config.host, resolve);
});
runner.start();
container.log.info({ port: config.port }, 'listening');
// `npm start` waits for this before it prints its line.
process.send?.({ ready: true });

let stopping = false;
const stop = (reason: string) => {
  if (stopping) return;
  stopping = true;
  container.log.info({ reason }, 'stopping');
  Promise.all([drain(server), runner.stop()])
    .then(() => container.close())
    .then(
      () => process.exit(0),
      (err: unknown) => {
        container.log.error({ err }, 'stopping failed');
        process.exit(1);
      },
    );
};
process.on('SIGTERM', () => stop('SIGTERM'));
process.on('SIGINT', () => stop('SIGINT'));
// The parent that started us is gone without a word: nobody would stop us later.
process.on('disconnect', () => stop('the parent process ended'));

function drain(listening: Server): Promise<void> {
  return new Promise((resolve) => {
    listening.close(() => resolve());
    listening.closeIdleConnections();
    setTimeout(() => listening.closeAllConnections(), DRAIN_MS).unref();
  });
}
