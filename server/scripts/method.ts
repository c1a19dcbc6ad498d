/**
 * The machine entry of the method: `npm run -s method -- <operation> < in.json`. One JSON object in, one out, exit code 0; a refusal
 * is a Problem object on standard error with exit code 2. No server, no database, no network.
 */
import { readFileSync } from 'node:fs';
import process from 'node:process';
import { run } from './method/run';

const answer = await run(process.argv.slice(2), () => readFileSync(0, 'utf8'));
process.stdout.write(answer.stdout);
process.stderr.write(answer.stderr);
process.exitCode = answer.exitCode;
