/** `npm test`: makes the clone ready, then hands over to test/run.ts. */
import process from 'node:process';
import './ready.mjs';

const { runAllChecks } = await import('./test/run.ts');
await runAllChecks(process.argv.slice(2));
