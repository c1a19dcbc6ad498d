/** `npm start`: makes the clone ready, then hands over to start/run.ts. */
import process from 'node:process';
import './ready.mjs';

const { start } = await import('./start/run.ts');
await start(process.argv.slice(2));
