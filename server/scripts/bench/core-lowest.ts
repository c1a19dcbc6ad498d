import { once } from 'node:events';
import { Worker } from 'node:worker_threads';
import { comparablesOf } from '#shared/core/ranking/comparables';
import { lowestSamplingInputOf } from '#shared/core/ranking/lowest-sampling';
import { benchFleet } from './core-fleet';
import type { BenchPart } from './bench-part';

const VARIANTS = 300;
const GOAL_MS = 1000;
const ROUNDS = 5;

/** A worker does not inherit the loader of TypeScript: it registers its own, then loads the module that answers. */
const WORKER_START = `
  import('tsx/esm/api').then(({ register }) => {
    register();
    return import(require('node:worker_threads').workerData.entry);
  });
`;

/** P(lowest) of many variants in a worker: the time from asking to the answer, the first (not yet compiled) one apart. */
export const coreLowest: BenchPart = {
  name: 'core-lowest',
  run: async () => {
    const set = comparablesOf(
      benchFleet(VARIANTS)
        .map(({ variant, zeroYaw }) => ({
          id: variant.id,
          value: zeroYaw.dragAreaM2,
          budget: zeroYaw.budget,
          rate: 1,
        }))
        .sort((a, b) => a.value - b.value),
    );
    const input = lowestSamplingInputOf(set, 1);
    const worker = new Worker(WORKER_START, {
      eval: true,
      workerData: { input, entry: new URL('./lowest-worker.ts', import.meta.url).href },
    });
    try {
      const times: number[] = [];
      for (let round = 0; round < ROUNDS; round++) {
        const start = performance.now();
        worker.postMessage('sample');
        const [shares] = (await once(worker, 'message')) as [Record<string, number>];
        times.push(performance.now() - start);
        const total = Object.values(shares).reduce((sum, share) => sum + share, 0);
        if (Math.abs(total - 1) > 1e-9) throw new Error('the shares do not sum to 1');
      }
      const [first = NaN, ...later] = times;
      const usual = later.sort((a, b) => a - b)[Math.floor(later.length / 2)] ?? NaN;
      return [
        {
          what: `P(lowest) of ${VARIANTS} variants, ${input.draws} draws, in a worker`,
          measured: `${usual.toFixed(0)} ms (the first, with the worker’s start and compilation, ${first.toFixed(0)} ms)`,
          goal: { words: `under ${GOAL_MS} ms`, met: usual < GOAL_MS },
        },
      ];
    } finally {
      await worker.terminate();
    }
  },
};
