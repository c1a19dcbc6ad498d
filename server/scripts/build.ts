import { buildClient, buildServer } from './start/builds';

/** `npm run build`: the client with its budgets, and the server as one file. */
buildClient(process.cwd());
await buildServer(process.cwd());
process.stdout.write('Built into dist/.\n');
