/**
 * The machine entry of the method: `npm run -s method -- <operation> < in.json`. One JSON object in, one out, exit code 0; a refusal
 * is a Problem object on standard error with exit code 2. No server, no database, no network.
 */
import process from 'node:process';
import { text } from 'node:stream/consumers';
import { run } from './method/run';

/** Read as a stream: what is started through npm may get a pipe that must be waited for, where reading at once would fail. */
const answer = await run(process.argv.slice(2), () => text(process.stdin));
process.stdout.write(answer.stdout);
process.stderr.write(answer.stderr);
process.exitCode = answer.exitCode;
