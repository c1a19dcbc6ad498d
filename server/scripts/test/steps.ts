import { join } from 'node:path';
import { tallyOfExit, tallyOfJest, tallyOfPlaywright, type Tally } from './tally';

export interface Step {
  readonly name: string;
  readonly command: readonly string[];
  /** The runner's own report, read after the command has ended. */
  readonly report?: string;
  readonly tally: (report: unknown, exitCode: number) => Tally;
  /** `check`: needs neither a database nor a browser; what `npm run check` runs. */
  readonly quick: boolean;
}

const plain = (_report: unknown, exitCode: number): Tally => tallyOfExit(exitCode);
const npx = (...words: string[]): readonly string[] => ['npx', '--no-install', ...words];

/** All that `npm test` runs, in this order: the cheapest complaint comes first. */
export function testSteps(reportFolder: string): readonly Step[] {
  const jestReport = join(reportFolder, 'jest.json');
  const playwrightReport = join(reportFolder, 'playwright.json');
  return [
    { name: 'format', command: npx('prettier', '--check', '.'), tally: plain, quick: true },
    { name: 'lint', command: npx('eslint', '.', '--max-warnings', '0'), tally: plain, quick: true },
    {
      name: 'types: server, shared, seeds, e2e',
      command: npx('tsc', '-p', 'tsconfig.json'),
      tally: plain,
      quick: true,
    },
    {
      name: 'types: shared without DOM and Node',
      command: npx('tsc', '-p', 'shared/tsconfig.json'),
      tally: plain,
      quick: true,
    },
    {
      name: 'types: client and its tests',
      command: npx('ngc', '-p', 'projects/wakeledger/tsconfig.spec.json', '--noEmit'),
      tally: plain,
      quick: true,
    },
    { name: 'architecture', command: ['npm', 'run', '-s', 'architecture'], tally: plain, quick: true },
    {
      name: 'jest: shared, server, client',
      command: npx('jest', '--json', `--outputFile=${jestReport}`),
      report: jestReport,
      tally: tallyOfJest,
      quick: false,
    },
    {
      name: 'production build with its budgets',
      command: ['npm', 'run', '-s', 'build'],
      tally: plain,
      quick: false,
    },
    { name: 'initial download', command: ['npm', 'run', '-s', 'bundle-size'], tally: plain, quick: false },
    {
      name: 'browser journeys',
      command: npx('playwright', 'test', '-c', 'e2e/playwright.config.ts'),
      report: playwrightReport,
      tally: tallyOfPlaywright,
      quick: false,
    },
  ];
}
