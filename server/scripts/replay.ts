import { currentUrls, withClient } from './start/database';
import { replayEvaluations } from './replay/replay-evaluations';
import { differencesAsText, summaryAsText } from './replay/replay-report';

/**
 * `npm run replay`: computes every stored evaluation of every organisation again and names those that come to something else.
 * `--json` prints one object a line, the summary last. Exit 1 where anything differs.
 */
const asJson = process.argv.includes('--json');
const { urls } = currentUrls(process.env, process.cwd());
const summary = await withClient(urls.maintenance, (client) =>
  replayEvaluations(client, (outcome) => {
    if (asJson) process.stdout.write(`${JSON.stringify(outcome)}\n`);
    else for (const line of differencesAsText(outcome)) process.stdout.write(`${line}\n`);
  }),
);
process.stdout.write(asJson ? `${JSON.stringify(summary)}\n` : `${summaryAsText(summary)}\n`);
process.exitCode = summary.moved > 0 ? 1 : 0;
