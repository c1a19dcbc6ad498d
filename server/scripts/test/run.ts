import { spawn } from 'node:child_process';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { add, NOTHING, type Tally } from './tally';
import { ensurePostgres } from '../start/install-postgres';
import { ensureChromium } from './install-chromium';
import { testSteps, type Step } from './steps';

/**
 * Runs every check of the project and ends with one line, `N passed, N failed`, summed over all of them.
 * `--quick` leaves out what needs a database or a browser.
 */
export async function runAllChecks(words: readonly string[]): Promise<void> {
  const quick = words.includes('--quick');
  if (!quick) {
    ensurePostgres((line) => process.stdout.write(`${line}\n`));
    ensureChromium();
  }
  const reports = await mkdtemp(join(tmpdir(), 'wakeledger-reports-'));
  let total: Tally = NOTHING;
  const failures: string[] = [];
  try {
    for (const step of testSteps(reports).filter((candidate) => candidate.quick || !quick)) {
      const tally = await run(step, reports);
      if (tally.failed > 0) failures.push(step.name);
      total = add(total, tally);
    }
  } finally {
    await rm(reports, { recursive: true, force: true });
  }
  if (failures.length > 0) process.stdout.write(`\nfailed: ${failures.join('; ')}\n`);
  process.stdout.write(`\n${total.passed} passed, ${total.failed} failed\n`);
  process.exitCode = total.failed > 0 ? 1 : 0;
}

async function run(step: Step, reports: string): Promise<Tally> {
  process.stdout.write(`\n── ${step.name}\n`);
  const started = Date.now();
  const exitCode = await exitCodeOf(step.command, reports);
  const tally = step.tally(step.report === undefined ? undefined : await readReport(step.report), exitCode);
  const seconds = ((Date.now() - started) / 1000).toFixed(1);
  process.stdout.write(`── ${step.name}: ${tally.passed} passed, ${tally.failed} failed, ${seconds} s\n`);
  return tally;
}

function exitCodeOf(command: readonly string[], reports: string): Promise<number> {
  const [program = '', ...words] = command;
  return new Promise((resolve) => {
    const child = spawn(program, words, {
      stdio: ['ignore', 'inherit', 'inherit'],
      env: {
        ...process.env,
        NG_CLI_ANALYTICS: 'false',
        PLAYWRIGHT_JSON_OUTPUT_FILE: join(reports, 'playwright.json'),
      },
    });
    child.on('error', () => resolve(127));
    child.on('exit', (code) => resolve(code ?? 1));
  });
}

async function readReport(path: string): Promise<unknown> {
  try {
    return JSON.parse(await readFile(path, 'utf8')) as unknown;
  } catch {
    return undefined;
  }
}
