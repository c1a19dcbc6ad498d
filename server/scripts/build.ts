import { buildClient } from './start/builds';
import { buildServer } from './start/server-bundle';

/** `npm run build`: the client with its budgets, and the server as one file. */
await buildClient(process.cwd());
await buildServer(process.cwd());
process.stdout.write('Built into dist/.\n');
