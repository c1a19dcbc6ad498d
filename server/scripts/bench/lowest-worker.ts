import { parentPort, workerData } from 'node:worker_threads';
import { sampleLowest, type LowestSamplingInput } from '#shared/core/ranking/lowest-sampling';

// Answers every request with the shares, so that whoever asks measures what a person waits for.
const { input } = workerData as { readonly input: LowestSamplingInput };
parentPort?.on('message', () => {
  parentPort?.postMessage(sampleLowest(input));
});
