/// <reference lib="webworker" />
import { sampleLowest, type LowestSamplingInput } from '#shared/core/ranking/lowest-sampling';

/** Draws P(lowest) beside the page, so that the page never waits for it. */
addEventListener('message', ({ data }: MessageEvent<{ id: number; input: LowestSamplingInput }>) => {
  postMessage({ id: data.id, probabilities: sampleLowest(data.input) });
});
